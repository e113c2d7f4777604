using DiagnosticAccuracy.Tables;

namespace DiagnosticAccuracy;

/// <summary>
/// The score test of a difference of two proportions of the same subjects against a margin (Nam 1997), with the interval that agrees with it.
/// </summary>
/// <remarks><c>default(PairedDifferenceTest)</c> is undefined, with the cause <see cref="UndefinedCause.NotComputed"/>.</remarks>
public readonly record struct PairedDifferenceTest
{
    internal PairedDifferenceTest(DifferenceMargin margin, PairedDifference difference, Quantity statistic, Quantity pValue)
    {
        Margin = margin;
        Difference = difference;
        Statistic = statistic;
        PValue = pValue;
    }

    /// <summary>Gets the margin that was stated.</summary>
    public DifferenceMargin Margin { get; }

    /// <summary>Gets the observed difference.</summary>
    public PairedDifference Difference { get; }

    /// <summary>
    /// Gets the score statistic z, positive when the observed difference lies above the bound; it is 0 when the observed difference is the
    /// bound itself, even where no variance is left.
    /// </summary>
    public Quantity Statistic { get; }

    /// <summary>Gets the one-sided p-value, from 0 to 1: the probability under the bound of a statistic as large or larger, by the normal distribution.</summary>
    public Quantity PValue { get; }

    /// <summary>
    /// Tango's score interval, which agrees with the test: its lower bound at a one-sided level lies at or above the margin's bound exactly when
    /// the p-value is at most one minus the level.
    /// </summary>
    /// <param name="confidence">Level and side; two-sided 95 % unless said, whose lower limit goes with a one-sided 2.5 % test.</param>
    /// <returns>The interval; undefined where the difference is.</returns>
    public ConfidenceInterval Interval(Confidence confidence = default) => TangoScore.Interval(Difference, confidence);

    /// <summary>For example "difference above -0.05: z = 2.1, p = 0.0179".</summary>
    /// <returns>The text, in the invariant culture.</returns>
    public override string ToString() => $"{Margin}: z = {Statistic}, p = {PValue}";
}
