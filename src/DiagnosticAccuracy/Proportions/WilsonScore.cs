using DiagnosticAccuracy.Numerics;

namespace DiagnosticAccuracy.Proportions;

/// <summary>The score interval of one proportion: all p that a score test of "the proportion is p" does not reject.</summary>
/// <remarks>Wilson, J Am Stat Assoc 1927;22:209. No continuity correction.</remarks>
internal static class WilsonScore
{
    public const string Name = "Wilson score";

    public static ConfidenceInterval Interval(Proportion proportion, Confidence confidence)
    {
        if (!proportion.IsDefined)
        {
            return ConfidenceInterval.Undefined(proportion.WhyUndefined!, confidence, Name);
        }

        // A one-sided level below one half has a negative z: its limit is the other root.
        double z = StandardNormal.UpperQuantile(confidence.Tail);
        double lower = 0;
        double upper = 1;
        if (confidence.HasLower)
        {
            lower = z >= 0 ? SmallerRoot(proportion, z) : LargerRoot(proportion, z);
        }

        if (confidence.HasUpper)
        {
            upper = z >= 0 ? LargerRoot(proportion, z) : SmallerRoot(proportion, z);
        }

        return new ConfidenceInterval(lower, upper, confidence, Name);
    }

    // The roots of (x/n - p)^2 = z^2 p (1 - p) / n. Their product is x^2 / (n (n + z^2)), so the smaller one is the product
    // over the larger one, which loses no digits however small it is.
    internal static double SmallerRoot(Proportion proportion, double z)
    {
        if (proportion.Successes == 0)
        {
            return 0;
        }

        double x = proportion.Successes;
        return Math.Min(x / LargerRootTimesDenominator(proportion, z) * proportion.Value, proportion.Value);
    }

    internal static double LargerRoot(Proportion proportion, double z)
    {
        if (proportion.Failures == 0)
        {
            return 1;
        }

        double root = LargerRootTimesDenominator(proportion, z) / (proportion.Trials + (z * z));
        return Math.Min(1, Math.Max(root, proportion.Value));
    }

    private static double LargerRootTimesDenominator(Proportion proportion, double z)
    {
        double halfSquare = z * z / 2;
        double spread = Math.Abs(z) * Math.Sqrt((proportion.Value * proportion.Failures) + (halfSquare / 2));
        return proportion.Successes + halfSquare + spread;
    }
}
