namespace DiagnosticAccuracy;

/// <summary>The part of the ROC square in which a partial area is taken. It is stated before the data are seen.</summary>
/// <remarks><c>default(PartialAreaRange)</c> is the whole range of false-positive rates.</remarks>
public readonly record struct PartialAreaRange
{
    private readonly double _from;
    private readonly double _to;

    private PartialAreaRange(PartialAreaKind kind, double from, double to)
    {
        Kind = kind;
        _from = from;
        _to = to;
    }

    /// <summary>Gets which definition of a partial area this is.</summary>
    public PartialAreaKind Kind { get; }

    /// <summary>
    /// Gets the lower end of the range of false-positive rates or of sensitivities; for <see cref="PartialAreaKind.Both"/> the least sensitivity.
    /// </summary>
    public double From => _from;

    /// <summary>
    /// Gets the upper end of the range of false-positive rates or of sensitivities; for <see cref="PartialAreaKind.Both"/> the greatest false-positive rate.
    /// </summary>
    public double To => _to == 0 ? 1 : _to;

    /// <summary>Gets the area of a perfect test in this part.</summary>
    public double LargestPossible => Kind == PartialAreaKind.Both ? To * (1 - From) : To - From;

    /// <summary>The area under the curve over a range of false-positive rates (1 - specificity): McClish, Med Decis Making 1989;9:190.</summary>
    /// <param name="from">The lower end, from 0 and below <paramref name="to"/>.</param>
    /// <param name="to">The upper end, at most 1.</param>
    /// <returns>The range.</returns>
    /// <exception cref="ArgumentOutOfRangeException">An end is NaN or outside of 0 to 1, or the range has no width.</exception>
    public static PartialAreaRange OverFalsePositiveRate(double from, double to) => Checked(PartialAreaKind.OverFalsePositiveRate, from, to);

    /// <summary>
    /// The area between the curve and the right side over a range of sensitivities: Jiang, Metz and Nishikawa, Radiology 1996;201:745.
    /// </summary>
    /// <param name="from">The lower end, from 0 and below <paramref name="to"/>.</param>
    /// <param name="to">The upper end, at most 1.</param>
    /// <returns>The range.</returns>
    /// <exception cref="ArgumentOutOfRangeException">An end is NaN or outside of 0 to 1, or the range has no width.</exception>
    public static PartialAreaRange OverSensitivity(double from, double to) => Checked(PartialAreaKind.OverSensitivity, from, to);

    /// <summary>
    /// The area under the curve above a least sensitivity and left of a greatest false-positive rate (two-way partial area): Yang, Lu, Lyu and Hu,
    /// Stat Med 2019.
    /// </summary>
    /// <param name="leastSensitivity">From 0 to below 1.</param>
    /// <param name="greatestFalsePositiveRate">Above 0 and at most 1.</param>
    /// <returns>The range.</returns>
    /// <exception cref="ArgumentOutOfRangeException">An argument is NaN or outside of its range.</exception>
    public static PartialAreaRange Both(double leastSensitivity, double greatestFalsePositiveRate)
    {
        if (!(leastSensitivity >= 0 && leastSensitivity < 1))
        {
            throw Guard.OutOfRange(nameof(leastSensitivity), leastSensitivity, "from 0 to below 1");
        }

        if (!(greatestFalsePositiveRate > 0 && greatestFalsePositiveRate <= 1))
        {
            throw Guard.OutOfRange(nameof(greatestFalsePositiveRate), greatestFalsePositiveRate, "above 0 and at most 1");
        }

        return new PartialAreaRange(PartialAreaKind.Both, leastSensitivity, greatestFalsePositiveRate);
    }

    /// <summary>For example "false-positive rate from 0 to 0.1".</summary>
    /// <returns>The text, in the invariant culture.</returns>
    public override string ToString() => Kind switch
    {
        PartialAreaKind.OverFalsePositiveRate => $"false-positive rate from {Display.Of(From)} to {Display.Of(To)}",
        PartialAreaKind.OverSensitivity => $"sensitivity from {Display.Of(From)} to {Display.Of(To)}",
        _ => $"sensitivity at least {Display.Of(From)} and false-positive rate at most {Display.Of(To)}",
    };

    private static PartialAreaRange Checked(PartialAreaKind kind, double from, double to)
    {
        Guard.Probability(from);
        Guard.Probability(to);
        return from < to
            ? new PartialAreaRange(kind, from, to)
            : throw Guard.OutOfRange(nameof(to), to, $"above the lower end, {Display.Exact(from)}");
    }
}
