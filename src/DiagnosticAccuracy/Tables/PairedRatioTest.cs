using DiagnosticAccuracy.Tables;

namespace DiagnosticAccuracy;

/// <summary>
/// The score test of a ratio of two proportions of the same subjects against a margin (Nam and Blackwelder 2002), with the interval that agrees
/// with it.
/// </summary>
/// <remarks><c>default(PairedRatioTest)</c> is undefined, with the cause <see cref="UndefinedCause.NotComputed"/>.</remarks>
public readonly record struct PairedRatioTest
{
    internal PairedRatioTest(RatioMargin margin, PairedRatio ratio, Quantity statistic, Quantity pValue)
    {
        Margin = margin;
        Ratio = ratio;
        Statistic = statistic;
        PValue = pValue;
    }

    /// <summary>Gets the margin that was stated.</summary>
    public RatioMargin Margin { get; }

    /// <summary>Gets the observed ratio.</summary>
    public PairedRatio Ratio { get; }

    /// <summary>
    /// Gets the score statistic z, positive when the observed ratio lies above the bound (also where it has to lie below); it is 0 when the
    /// observed ratio is the bound itself, even where no variance is left.
    /// </summary>
    public Quantity Statistic { get; }

    /// <summary>
    /// Gets the one-sided p-value, from 0 to 1: the probability under the bound of a statistic as far or further on the side that is to be shown, by
    /// the normal distribution.
    /// </summary>
    public Quantity PValue { get; }

    /// <summary>
    /// The score interval, which agrees with the test: its bound at a one-sided level does not lie on the wrong side of the margin's bound exactly
    /// when the p-value is at most one minus the level.
    /// </summary>
    /// <param name="confidence">Level and side; two-sided 95 % unless said, each limit of which goes with a one-sided 2.5 % test.</param>
    /// <returns>The interval; undefined where the ratio is.</returns>
    public ConfidenceInterval Interval(Confidence confidence = default) => NamBlackwelder.Interval(Ratio, confidence, NamBlackwelder.Name);

    /// <summary>For example "ratio above 0.9: z = 2.1, p = 0.0179".</summary>
    /// <returns>The text, in the invariant culture.</returns>
    public override string ToString() => $"{Margin}: z = {Statistic}, p = {PValue}";
}
