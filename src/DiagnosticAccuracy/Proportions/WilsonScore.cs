namespace DiagnosticAccuracy.Proportions;

/// <summary>The score interval of one proportion: all p that a score test of "the proportion is p" does not reject.</summary>
/// <remarks>Wilson, J Am Stat Assoc 1927;22:209. With continuity correction: Newcombe, Stat Med 1998;17:857, method 4.</remarks>
internal readonly struct WilsonScore(Proportion proportion, double correction) : INormalLimits
{
    public const string Name = "Wilson score";
    public const string ContinuityName = "Wilson score with continuity correction";

    public static ConfidenceInterval Interval(Proportion proportion, Confidence confidence) => proportion.IsDefined
        ? NormalInterval.Of(new WilsonScore(proportion, 0), confidence, 0, 1, Name)
        : ConfidenceInterval.Undefined(proportion.WhyUndefined!, confidence, Name);

    public static ConfidenceInterval WithContinuity(Proportion proportion, Confidence confidence) => proportion.IsDefined
        ? NormalInterval.Of(new WilsonScore(proportion, 0.5), confidence, 0, 1, ContinuityName)
        : ConfidenceInterval.Undefined(proportion.WhyUndefined!, confidence, ContinuityName);

    /// <summary>The limit below the estimate. The continuity correction takes half a count from the successes first.</summary>
    public static double SmallerRoot(Proportion proportion, double z, double correction = 0)
    {
        if (proportion.Successes == 0)
        {
            return 0;
        }

        // The roots of (x/n - p)^2 = z^2 p (1 - p) / n. Their product is x^2 / (n (n + z^2)), so the smaller one is the product
        // over the larger one, which loses no digits however small it is.
        double x = proportion.Successes - correction;
        double share = correction == 0 ? proportion.Value : x / proportion.Trials;
        return Math.Min(x / LargerRootTimesDenominator(x, proportion.Failures + correction, share, z) * share, proportion.Value);
    }

    /// <summary>The limit above the estimate. The continuity correction adds half a count to the successes first.</summary>
    public static double LargerRoot(Proportion proportion, double z, double correction = 0)
    {
        if (proportion.Failures == 0)
        {
            return 1;
        }

        double x = proportion.Successes + correction;
        double share = correction == 0 ? proportion.Value : x / proportion.Trials;
        double root = LargerRootTimesDenominator(x, proportion.Failures - correction, share, z) / (proportion.Trials + (z * z));
        return Math.Min(1, Math.Max(root, proportion.Value));
    }

    public double Lower(double z) => SmallerRoot(proportion, z, correction);

    public double Upper(double z) => LargerRoot(proportion, z, correction);

    private static double LargerRootTimesDenominator(double x, double misses, double share, double z)
    {
        double halfSquare = z * z / 2;
        double spread = z * Math.Sqrt((share * misses) + (halfSquare / 2));
        return x + halfSquare + spread;
    }
}
