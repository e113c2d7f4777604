using DiagnosticAccuracy.Proportions;

namespace DiagnosticAccuracy.Tables;

/// <summary>
/// The interval of a difference of two proportions of the same subjects that combines the Wilson score interval of each with their correlation.
/// </summary>
/// <remarks>Newcombe, Stat Med 1998;17:2635, methods 8 and, with the corrected correlation, 10.</remarks>
internal readonly struct NewcombePaired(PairedDifference difference, double phi) : INormalLimits
{
    public const string Name = "hybrid score (Newcombe)";
    public const string CorrectedName = "hybrid score with phi correction (Newcombe)";

    public static ConfidenceInterval Interval(PairedDifference difference, Confidence confidence, bool correctPhi)
    {
        string name = correctPhi ? CorrectedName : Name;
        return difference.IsDefined
            ? NormalInterval.Of(new NewcombePaired(difference, Phi(difference.Table, correctPhi)), confidence, -1, 1, name)
            : ConfidenceInterval.Undefined(difference.WhyUndefined!, confidence, name);
    }

    public double Lower(double z) => difference.Value - Reach(difference.First, difference.Second, z);

    public double Upper(double z) => difference.Value + Reach(difference.Second, difference.First, z);

    /// <summary>The correlation of both tests; 0 where a test has one result only.</summary>
    private static double Phi(PairedTable table, bool correct)
    {
        double a = table.BothPositive;
        double b = table.FirstOnly;
        double c = table.SecondOnly;
        double d = table.BothNegative;
        double numerator = (a * d) - (b * c);
        if (correct && numerator > 0)
        {
            numerator = Math.Max(0, numerator - (table.Total / 2.0));
        }

        double denominator = Math.Sqrt((a + b) * (c + d)) * Math.Sqrt((a + c) * (b + d));
        return denominator == 0 ? 0 : Math.Max(-1, Math.Min(1, numerator / denominator));
    }

    // The root of down^2 - 2 phi down up + up^2; of large proportions by their failures, which keep their digits.
    private double Reach(Proportion below, Proportion above, double z)
    {
        double down = below.Value > 0.5 ? Above(below.Complement, z) : Below(below, z);
        double up = above.Value > 0.5 ? Below(above.Complement, z) : Above(above, z);
        double gap = down - up;
        return Math.Sqrt((gap * gap) + (2 * (1 - phi) * down * up));
    }

    private static double Below(Proportion proportion, double z) => proportion.Value - WilsonScore.SmallerRoot(proportion, z);

    private static double Above(Proportion proportion, double z) => WilsonScore.LargerRoot(proportion, z) - proportion.Value;
}
