using DiagnosticAccuracy.Proportions;

namespace DiagnosticAccuracy.Tables;

/// <summary>
/// The interval of a ratio of two proportions of the same subjects from a Wilson score interval of each, at a quantile that is adjusted to
/// their correlation.
/// </summary>
/// <remarks>
/// Among the m subjects with a positive result, the Wilson limits of x1/m and x2/m at the quantile z A / (B + C), where
/// A = sqrt((b + c + 2) / ((x1 + 1) (x2 + 1))), B = sqrt((c + 1) / ((m + 2) (x1 + 1))) and C = sqrt((b + 1) / ((m + 2) (x2 + 1))): from the lower one of
/// the first over the upper one of the second, to the upper one over the lower one. Bonett and Price, Stat Med 2006;25:3039.
/// </remarks>
internal readonly struct BonettPriceRatio(PairedTable table) : INormalLimits
{
    public const string Name = "hybrid score (Bonett-Price)";

    public static ConfidenceInterval Interval(PairedRatio ratio, Confidence confidence) => ratio.IsDefined
        ? NormalInterval.Of(new BonettPriceRatio(ratio.Table), confidence, 0, double.PositiveInfinity, Name)
        : ConfidenceInterval.Undefined(ratio.WhyUndefined!, confidence, Name);

    public double Lower(double z)
    {
        Proportion first = Among(table.FirstPositives);
        Proportion second = Among(table.SecondPositives);
        double adjusted = z * Adjustment();
        return WilsonScore.SmallerRoot(first, adjusted) / WilsonScore.LargerRoot(second, adjusted);
    }

    public double Upper(double z)
    {
        Proportion first = Among(table.FirstPositives);
        Proportion second = Among(table.SecondPositives);
        double adjusted = z * Adjustment();
        return WilsonScore.LargerRoot(first, adjusted) / WilsonScore.SmallerRoot(second, adjusted);
    }

    private Proportion Among(long positives) => new(positives, table.BothPositive + table.Discordant);

    private double Adjustment()
    {
        double b = table.FirstOnly;
        double c = table.SecondOnly;
        double x1 = table.FirstPositives + 1.0;
        double x2 = table.SecondPositives + 1.0;
        double m = table.BothPositive + b + c + 2;
        return Math.Sqrt((b + c + 2) / x1 / x2) / (Math.Sqrt((c + 1) / m / x1) + Math.Sqrt((b + 1) / m / x2));
    }
}
