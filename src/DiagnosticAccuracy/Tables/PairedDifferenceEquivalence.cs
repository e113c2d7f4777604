using DiagnosticAccuracy.Tables;

namespace DiagnosticAccuracy;

/// <summary>
/// Two one-sided score tests of a difference of two proportions of the same subjects against two margins, with the interval that agrees with them.
/// </summary>
/// <remarks><c>default(PairedDifferenceEquivalence)</c> is undefined, with the cause <see cref="UndefinedCause.NotComputed"/>.</remarks>
public readonly record struct PairedDifferenceEquivalence
{
    internal PairedDifferenceEquivalence(
        DifferenceEquivalenceMargins margins, PairedDifference difference, Quantity lowerStatistic, Quantity upperStatistic, Quantity pValue)
    {
        Margins = margins;
        Difference = difference;
        LowerStatistic = lowerStatistic;
        UpperStatistic = upperStatistic;
        PValue = pValue;
    }

    /// <summary>Gets the margins that were stated.</summary>
    public DifferenceEquivalenceMargins Margins { get; }

    /// <summary>Gets the observed difference.</summary>
    public PairedDifference Difference { get; }

    /// <summary>Gets the score statistic z at the lower margin; equivalence wants it large.</summary>
    public Quantity LowerStatistic { get; }

    /// <summary>Gets the score statistic z at the upper margin; equivalence wants it far below 0.</summary>
    public Quantity UpperStatistic { get; }

    /// <summary>Gets the p-value of equivalence: the larger one of both one-sided p-values.</summary>
    public Quantity PValue { get; }

    /// <summary>
    /// Tango's score interval, which agrees with the tests: a two-sided interval that leaves out alpha on each side, such as 90 % for alpha = 0.05, lies
    /// within the margins exactly when the p-value is at most alpha.
    /// </summary>
    /// <param name="confidence">Level and side; two-sided 95 % unless said, which goes with alpha = 0.025.</param>
    /// <returns>The interval; undefined where the difference is.</returns>
    public ConfidenceInterval Interval(Confidence confidence = default) => TangoScore.Interval(Difference, confidence);

    /// <summary>For example "difference above -0.05 and below 0.05: z = 2.1 and -2.5, p = 0.0179".</summary>
    /// <returns>The text, in the invariant culture.</returns>
    public override string ToString() => $"{Margins}: z = {LowerStatistic} and {UpperStatistic}, p = {PValue}";
}
