using DiagnosticAccuracy.Numerics;

namespace DiagnosticAccuracy.Proportions;

/// <summary>
/// The equal-tailed interval of one proportion from the beta distribution with shapes x + 1/2 and n - x + 1/2; the limit is 0 at 0 of n
/// and 1 at n of n, and the other limit is left alone.
/// </summary>
/// <remarks>Brown, Cai and DasGupta, Stat Sci 2001;16:101.</remarks>
internal static class Jeffreys
{
    public const string Name = "Jeffreys, limit 0 at 0 of n and 1 at n of n";

    public static ConfidenceInterval Interval(Proportion proportion, Confidence confidence)
    {
        if (!proportion.IsDefined)
        {
            return ConfidenceInterval.Undefined(proportion.WhyUndefined!, confidence, Name);
        }

        double a = proportion.Successes + 0.5;
        double b = proportion.Failures + 0.5;
        double lower = proportion.Successes == 0 || !confidence.HasLower
            ? 0
            : IncompleteBeta.LowerQuantile(a, b, confidence.LowerTail).X;
        double upper = proportion.Failures == 0 || !confidence.HasUpper
            ? 1
            : IncompleteBeta.UpperQuantile(a, b, confidence.UpperTail).X;
        return new ConfidenceInterval(lower, upper, confidence, Name);
    }
}
