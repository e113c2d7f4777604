using DiagnosticAccuracy.Numerics;

namespace DiagnosticAccuracy.Proportions;

/// <summary>All differences of two independent proportions that the score test does not reject.</summary>
/// <remarks>Mee, Biometrics 1984;40:1175; Miettinen and Nurminen, Stat Med 1985;4:213.</remarks>
internal readonly struct ScoreDifference(ProportionDifference difference, double varianceFactor) : INormalLimits
{
    public const string MeeName = "score (Mee)";
    public const string MiettinenNurminenName = "score (Miettinen-Nurminen)";

    public static ConfidenceInterval Mee(ProportionDifference difference, Confidence confidence) =>
        Interval(difference, confidence, 1, MeeName);

    public static ConfidenceInterval MiettinenNurminen(ProportionDifference difference, Confidence confidence)
    {
        double total = (double)difference.First.Trials + difference.Second.Trials;
        return Interval(difference, confidence, total / (total - 1), MiettinenNurminenName);
    }

    // The lower limit is the upper one with the groups swapped.
    public double Lower(double z) => -Limit(difference.Second, difference.First, z);

    public double Upper(double z) => Limit(difference.First, difference.Second, z);

    private static ConfidenceInterval Interval(ProportionDifference difference, Confidence confidence, double varianceFactor, string name) =>
        difference.IsDefined
            ? NormalInterval.Of(new ScoreDifference(difference, varianceFactor), confidence, -1, 1, name)
            : ConfidenceInterval.Undefined(difference.WhyUndefined!, confidence, name);

    // The statistic falls from 0 at the estimate to minus infinity at 1.
    private double Limit(Proportion first, Proportion second, double z)
    {
        DifferenceScore score = new(first, second, varianceFactor);
        double low = score.Estimate;
        if (low >= 1 || z == 0)
        {
            return low;
        }

        DistanceToQuantile f = new(score, z);
        double rough = Math.Sqrt(Wald.Variance(first) + Wald.Variance(second)) + (0.5 / first.Trials) + (0.5 / second.Trials);
        double step = Math.Max(z, 0.1) * rough;
        double high = low;
        do
        {
            low = high;
            high = Math.Min(1, low + step);
            step *= 2;
        }
        while (high < 1 && f.Value(high) > 0);

        return RootFinding.Find(f, low, high, RootFinding.DefaultRelativeAccuracy, 1e-28);
    }

    private readonly struct DistanceToQuantile(DifferenceScore score, double z) : IFunction
    {
        public double Value(double x) => x >= 1 ? double.NegativeInfinity : score.Statistic(x) + z;
    }
}
