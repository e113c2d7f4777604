namespace DiagnosticAccuracy.Proportions;

/// <summary>The interval of a difference of two independent proportions that combines the Wilson score interval of each.</summary>
/// <remarks>Newcombe, Stat Med 1998;17:873, method 10.</remarks>
internal readonly struct HybridScore(ProportionDifference difference) : INormalLimits
{
    public const string Name = "hybrid score (Newcombe)";

    public static ConfidenceInterval Interval(ProportionDifference difference, Confidence confidence) => difference.IsDefined
        ? NormalInterval.Of(new HybridScore(difference), confidence, -1, 1, Name)
        : ConfidenceInterval.Undefined(difference.WhyUndefined!, confidence, Name);

    public double Lower(double z) => difference.Value - Reach(difference.First, difference.Second, z);

    public double Upper(double z) => difference.Value + Reach(difference.Second, difference.First, z);

    // How far the one proportion may lie below, and the other above.
    private static double Reach(Proportion below, Proportion above, double z)
    {
        double down = below.Value - WilsonScore.SmallerRoot(below, z);
        double up = WilsonScore.LargerRoot(above, z) - above.Value;
        return Math.Sqrt((down * down) + (up * up));
    }
}
