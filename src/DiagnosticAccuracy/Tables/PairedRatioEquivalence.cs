using DiagnosticAccuracy.Tables;

namespace DiagnosticAccuracy;

/// <summary>
/// Two one-sided score tests of a ratio of two proportions of the same subjects against two margins, with the interval that agrees with them.
/// </summary>
/// <remarks><c>default(PairedRatioEquivalence)</c> is undefined, with the cause <see cref="UndefinedCause.NotComputed"/>.</remarks>
public readonly record struct PairedRatioEquivalence
{
    internal PairedRatioEquivalence(
        RatioEquivalenceMargins margins, PairedRatio ratio, Quantity lowerStatistic, Quantity upperStatistic, Quantity pValue)
    {
        Margins = margins;
        Ratio = ratio;
        LowerStatistic = lowerStatistic;
        UpperStatistic = upperStatistic;
        PValue = pValue;
    }

    /// <summary>Gets the margins that were stated.</summary>
    public RatioEquivalenceMargins Margins { get; }

    /// <summary>Gets the observed ratio.</summary>
    public PairedRatio Ratio { get; }

    /// <summary>Gets the score statistic z at the lower margin; equivalence wants it large.</summary>
    public Quantity LowerStatistic { get; }

    /// <summary>Gets the score statistic z at the upper margin; equivalence wants it far below 0.</summary>
    public Quantity UpperStatistic { get; }

    /// <summary>Gets the p-value of equivalence: the larger one of both one-sided p-values.</summary>
    public Quantity PValue { get; }

    /// <summary>
    /// The score interval, which agrees with the tests: a two-sided interval that leaves out alpha on each side, such as 90 % for alpha = 0.05, lies
    /// within the margins exactly when the p-value is at most alpha.
    /// </summary>
    /// <param name="confidence">Level and side; two-sided 95 % unless said, which goes with alpha = 0.025.</param>
    /// <returns>The interval; undefined where the ratio is.</returns>
    public ConfidenceInterval Interval(Confidence confidence = default) => NamBlackwelder.Interval(Ratio, confidence, NamBlackwelder.Name);

    /// <summary>For example "ratio above 0.9 and below 1.11111: z = 2.1 and -2.5, p = 0.0179".</summary>
    /// <returns>The text, in the invariant culture.</returns>
    public override string ToString() => $"{Margins}: z = {LowerStatistic} and {UpperStatistic}, p = {PValue}";
}
