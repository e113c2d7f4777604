using DiagnosticAccuracy.Numerics;

namespace DiagnosticAccuracy.Proportions;

/// <summary>The exact interval of one proportion: all p under which neither binomial tail at the observed count is too small.</summary>
/// <remarks>Clopper and Pearson, Biometrika 1934;26:404, in its beta form.</remarks>
internal static class ClopperPearson
{
    public const string Name = "Clopper-Pearson exact";

    public static ConfidenceInterval Interval(Proportion proportion, Confidence confidence)
    {
        if (!proportion.IsDefined)
        {
            return ConfidenceInterval.Undefined(proportion.WhyUndefined!, confidence, Name);
        }

        double x = proportion.Successes;
        double misses = proportion.Failures;
        double lower = proportion.Successes == 0 || !confidence.HasLower
            ? 0
            : IncompleteBeta.LowerQuantile(x, misses + 1, confidence.LowerTail).X;
        double upper = proportion.Failures == 0 || !confidence.HasUpper
            ? 1
            : IncompleteBeta.UpperQuantile(x + 1, misses, confidence.UpperTail).X;
        return new ConfidenceInterval(lower, upper, confidence, Name);
    }
}
