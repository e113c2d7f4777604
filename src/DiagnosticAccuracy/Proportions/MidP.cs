using DiagnosticAccuracy.Numerics;

namespace DiagnosticAccuracy.Proportions;

/// <summary>
/// The interval of one proportion from the binomial tails, of which each holds half of the probability of the observed count.
/// </summary>
/// <remarks>Lancaster, J Am Stat Assoc 1961;56:223; Newcombe, Stat Med 1998;17:857, method 6.</remarks>
internal static class MidP
{
    public const string Name = "mid-P";

    public static ConfidenceInterval Interval(Proportion proportion, Confidence confidence)
    {
        if (!proportion.IsDefined)
        {
            return ConfidenceInterval.Undefined(proportion.WhyUndefined!, confidence, Name);
        }

        double x = proportion.Successes;
        double misses = proportion.Failures;
        double lower = confidence.HasLower ? Lower(x, misses, confidence.LowerTail) : 0;
        double upper = confidence.HasUpper ? Upper(x, misses, confidence.UpperTail) : 1;
        return new ConfidenceInterval(lower, upper, confidence, Name);
    }

    // P(X > x) + P(X = x) / 2 = tail. Both tails of which this is the mean have their root by a beta quantile, and it lies between.
    private static double Lower(double x, double misses, double tail)
    {
        double n = x + misses;
        if (x == 0)
        {
            return tail <= 0.5 ? 0 : -ElementaryFunctions.Expm1(Math.Log(2 * (1 - tail)) / n);
        }

        if (misses == 0)
        {
            return tail >= 0.5 ? 1 : Math.Exp(Math.Log(2 * tail) / n);
        }

        double least = IncompleteBeta.LowerQuantile(x, misses + 1, tail).X;
        double most = IncompleteBeta.LowerQuantile(x + 1, misses, tail).X;
        return Between(new MeanOfTails(x, misses, tail, above: true), least, most);
    }

    // P(X < x) + P(X = x) / 2 = tail.
    private static double Upper(double x, double misses, double tail)
    {
        double n = x + misses;
        if (misses == 0)
        {
            return tail <= 0.5 ? 1 : Math.Exp(Math.Log(2 * (1 - tail)) / n);
        }

        if (x == 0)
        {
            return tail >= 0.5 ? 0 : -ElementaryFunctions.Expm1(Math.Log(2 * tail) / n);
        }

        double least = IncompleteBeta.UpperQuantile(x, misses + 1, tail).X;
        double most = IncompleteBeta.UpperQuantile(x + 1, misses, tail).X;
        return Between(new MeanOfTails(x, misses, tail, above: false), least, most);
    }

    // Sought on the logarithm, so that small limits keep their digits.
    private static double Between(MeanOfTails f, double least, double most)
    {
        double low = Math.Log(least);
        double high = Math.Log(most);
        if (!(low < high) || f.Value(low) * f.Value(high) > 0)
        {
            // The two quantiles agree to the last digits; so does what lies between.
            return least + ((most - least) / 2);
        }

        return Math.Min(most, Math.Max(least, Math.Exp(RootFinding.Find(f, low, high, RootFinding.DefaultRelativeAccuracy, 1e-16))));
    }

    private readonly struct MeanOfTails(double x, double misses, double tail, bool above) : IFunction
    {
        public double Value(double logarithm)
        {
            double p = Math.Exp(logarithm);
            double q = -ElementaryFunctions.Expm1(logarithm);
            double sum = above
                ? IncompleteBeta.Lower(x, misses + 1, p, q) + IncompleteBeta.Lower(x + 1, misses, p, q)
                : IncompleteBeta.Upper(x, misses + 1, p, q) + IncompleteBeta.Upper(x + 1, misses, p, q);
            return Math.Log(sum) - Math.Log(2 * tail);
        }
    }
}
