using DiagnosticAccuracy.Numerics;

namespace DiagnosticAccuracy.Proportions;

/// <summary>All ratios of two independent proportions that the score test does not reject.</summary>
/// <remarks>Koopman, Biometrics 1984;40:513; Gart and Nam, Biometrics 1988;44:323; Miettinen and Nurminen, Stat Med 1985;4:213.</remarks>
internal readonly struct ScoreRatio : INormalLimits
{
    public const string KoopmanName = "score (Koopman)";
    public const string MiettinenNurminenName = "score (Miettinen-Nurminen)";

    private readonly RatioScore _score;

    private ScoreRatio(RatioScore score) => _score = score;

    public static ConfidenceInterval Koopman(ProportionRatio ratio, Confidence confidence) => Interval(ratio, confidence, 1, KoopmanName);

    public static ConfidenceInterval MiettinenNurminen(ProportionRatio ratio, Confidence confidence)
    {
        double total = (double)ratio.Numerator.Trials + ratio.Denominator.Trials;
        return Interval(ratio, confidence, total / (total - 1), MiettinenNurminenName);
    }

    public static ConfidenceInterval Interval(ProportionRatio ratio, Confidence confidence, double varianceFactor, string name) =>
        ratio.IsDefined
            ? NormalInterval.Of(
                new ScoreRatio(new RatioScore(ratio.Numerator, ratio.Denominator, varianceFactor)), confidence, 0, double.PositiveInfinity, name)
            : ConfidenceInterval.Undefined(ratio.WhyUndefined!, confidence, name);

    public double Lower(double z) => z == 0 || _score.First.Successes == 0 ? _score.Estimate : Solve(z);

    public double Upper(double z) => z == 0 || _score.Second.Successes == 0 ? _score.Estimate : Solve(-z);

    // The statistic falls from infinity (0 when the first proportion is zero) to minus infinity (0 when the second one is) as
    // the logarithm of the ratio rises.
    private double Solve(double z)
    {
        double x1 = Math.Max(_score.First.Successes, 0.5);
        double x2 = Math.Max(_score.Second.Successes, 0.5);
        double start = Math.Log(x1 / _score.First.Trials) - Math.Log(x2 / _score.Second.Trials);
        double spread = Math.Sqrt(((_score.First.Failures + 0.5) / x1 / _score.First.Trials) + ((_score.Second.Failures + 0.5) / x2 / _score.Second.Trials));
        double root = FallingRoot.Find(new ScoreOfLogarithm(_score, z), start, Math.Max(0.5, Math.Abs(z)) * spread);
        return Math.Exp(root);
    }

    private readonly struct ScoreOfLogarithm(RatioScore score, double target) : IFunction
    {
        public double Value(double x) => score.Statistic(Math.Exp(x)) - target;
    }
}
