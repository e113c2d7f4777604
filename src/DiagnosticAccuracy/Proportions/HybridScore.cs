namespace DiagnosticAccuracy.Proportions;

/// <summary>The interval of a difference of two independent proportions that combines the Wilson score interval of each.</summary>
/// <remarks>Newcombe, Stat Med 1998;17:873, methods 10 and, with continuity correction, 11.</remarks>
internal readonly struct HybridScore(ProportionDifference difference, double correction) : INormalLimits
{
    public const string Name = "hybrid score (Newcombe)";
    public const string ContinuityName = "hybrid score with continuity correction (Newcombe)";

    public static ConfidenceInterval Interval(ProportionDifference difference, Confidence confidence) => difference.IsDefined
        ? NormalInterval.Of(new HybridScore(difference, 0), confidence, -1, 1, Name)
        : ConfidenceInterval.Undefined(difference.WhyUndefined!, confidence, Name);

    public static ConfidenceInterval WithContinuity(ProportionDifference difference, Confidence confidence) => difference.IsDefined
        ? NormalInterval.Of(new HybridScore(difference, 0.5), confidence, -1, 1, ContinuityName)
        : ConfidenceInterval.Undefined(difference.WhyUndefined!, confidence, ContinuityName);

    public double Lower(double z) => difference.Value - Reach(difference.First, difference.Second, z);

    public double Upper(double z) => difference.Value + Reach(difference.Second, difference.First, z);

    // How far the one proportion may lie below, and the other above; of large proportions by their failures, which keep their digits.
    private double Reach(Proportion below, Proportion above, double z)
    {
        double down = below.Value > 0.5 ? Above(below.Complement, z) : Below(below, z);
        double up = above.Value > 0.5 ? Below(above.Complement, z) : Above(above, z);
        return Math.Sqrt((down * down) + (up * up));
    }

    private double Below(Proportion proportion, double z) => proportion.Value - WilsonScore.SmallerRoot(proportion, z, correction);

    private double Above(Proportion proportion, double z) => WilsonScore.LargerRoot(proportion, z, correction) - proportion.Value;
}
