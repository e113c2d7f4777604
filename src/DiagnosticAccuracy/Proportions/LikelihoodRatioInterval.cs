using DiagnosticAccuracy.Numerics;

namespace DiagnosticAccuracy.Proportions;

/// <summary>
/// All p of which twice the logarithm of the likelihood ratio against the estimate is not above the square of the normal quantile.
/// </summary>
/// <remarks>Newcombe, Stat Med 1998;17:857, the likelihood-based interval.</remarks>
internal readonly struct LikelihoodRatioInterval(Proportion proportion) : INormalLimits
{
    public const string Name = "likelihood ratio";

    public static ConfidenceInterval Interval(Proportion proportion, Confidence confidence) => proportion.IsDefined
        ? NormalInterval.Of(new LikelihoodRatioInterval(proportion), confidence, 0, 1, Name)
        : ConfidenceInterval.Undefined(proportion.WhyUndefined!, confidence, Name);

    public double Lower(double z) => Smaller(proportion.Successes, proportion.Failures, z);

    public double Upper(double z)
    {
        // The limit above a small estimate is found as it is, that above a large one by its complement: each keeps its digits.
        double x = proportion.Successes;
        double misses = proportion.Failures;
        return x <= misses ? Larger(x, misses, z) : 1 - Smaller(misses, x, z);
    }

    private static double Smaller(double x, double misses, double z)
    {
        double n = x + misses;
        if (x == 0 || misses == 0 || z == 0)
        {
            return x == 0 ? 0 : x / n * Math.Exp(-z * z / (2 * n));
        }

        // The deviance is at least -2 (x t - f ln(f/n)), t the logarithm of p over the estimate, which bounds the root from below.
        double least = (misses * ElementaryFunctions.Log1P(-x / n)) - (z * z / 2);
        double root = RootFinding.Find(new Deviance(x, misses, z), least / x * 1.000001, 0, RootFinding.DefaultRelativeAccuracy, 1e-300);
        return x / n * Math.Exp(root);
    }

    private static double Larger(double x, double misses, double z)
    {
        double n = x + misses;
        if (x == 0)
        {
            return -ElementaryFunctions.Expm1(-z * z / (2 * n));
        }

        if (z == 0)
        {
            return x / n;
        }

        double root = RootFinding.Find(new Deviance(x, misses, z), 0, -Math.Log(x / n), RootFinding.DefaultRelativeAccuracy, 1e-300);
        return x / n * Math.Exp(root);
    }

    /// <summary>The root of the deviance, less the quantile, by the logarithm t of p over the estimate.</summary>
    private readonly struct Deviance(double x, double misses, double z) : IFunction
    {
        // With u = p / estimate - 1 and v = (1-p) / (1-estimate) - 1, x u + f v = 0, so that both linear terms can be taken out:
        // -2 (x (ln(1+u) - u) + f (ln(1+v) - v)), which has no cancellation near the estimate.
        public double Value(double t)
        {
            double u = ElementaryFunctions.Expm1(t);
            double v = Math.Max(-1, -u * x / misses);
            double successes = Math.Abs(u) < 0.5 ? ElementaryFunctions.Log1PMinusX(u) : t - u;
            double half = -(x * successes) - (misses * ElementaryFunctions.Log1PMinusX(v));
            return Math.Sqrt(2 * Math.Max(0, half)) - z;
        }
    }
}
