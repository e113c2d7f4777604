using DiagnosticAccuracy.Numerics;
using DiagnosticAccuracy.Proportions;

namespace DiagnosticAccuracy.Tables;

/// <summary>
/// All common ratios that the stratified score test does not reject: sum w (p1 - r p0) over the root of sum w^2 V, w = n1 n0 / n the weights of Mantel
/// and Haenszel and V the variance of each stratum at the maximum of its likelihood under the ratio r.
/// </summary>
/// <remarks>
/// Miettinen and Nurminen, Stat Med 1985;4:213, without their factor n / (n - 1). The statistic is zero at the ratio of Mantel and
/// Haenszel; for one stratum the limits are those of Koopman.
/// </remarks>
internal readonly struct StratifiedRatioScore : INormalLimits, IFunction
{
    public const string Name = "stratified score";

    private readonly RatioScore[] _scores;
    private readonly double[] _weights;
    private readonly double _estimate;
    private readonly double _start;
    private readonly double _target;

    private StratifiedRatioScore(RatioScore[] scores, double[] weights, double estimate, double start, double target)
    {
        _scores = scores;
        _weights = weights;
        _estimate = estimate;
        _start = start;
        _target = target;
    }

    public static ConfidenceInterval Interval(IReadOnlyList<ConfusionMatrix> strata, PooledKind kind, double estimate, Confidence confidence, string name)
    {
        ConfusionMatrix[] filled = [.. strata.Where(MantelHaenszel.HasBothGroups)];
        RatioScore[] scores = new RatioScore[filled.Length];
        double[] weights = new double[filled.Length];
        double numerator = 0;
        double denominator = 0;
        for (int i = 0; i < filled.Length; i++)
        {
            Proportion with = MantelHaenszel.With(filled[i], kind);
            Proportion without = MantelHaenszel.Without(filled[i], kind);
            scores[i] = new RatioScore(with, without, 1);
            weights[i] = (double)with.Trials / filled[i].Total * without.Trials;

            // Only a point to start from: half a subject more in each stratum, so that it is never at an end.
            numerator += (with.Successes + 0.5) * without.Trials / filled[i].Total;
            denominator += (without.Successes + 0.5) * with.Trials / filled[i].Total;
        }

        double start = Math.Log(numerator) - Math.Log(denominator);
        return NormalInterval.Of(
            new StratifiedRatioScore(scores, weights, estimate, start, 0), confidence, 0, double.PositiveInfinity, name);
    }

    public double Lower(double z) => z == 0 || _estimate == 0 ? _estimate : Solve(z);

    public double Upper(double z) => z == 0 || double.IsPositiveInfinity(_estimate) ? _estimate : Solve(-z);

    /// <summary>The statistic at the exponential of the argument, less the target.</summary>
    public double Value(double x)
    {
        double ratio = Math.Exp(x);
        double difference = 0;
        double variance = 0;
        for (int i = 0; i < _scores.Length; i++)
        {
            RatioScoreParts parts = _scores[i].Parts(ratio);
            difference += _weights[i] * parts.Difference;
            variance += _weights[i] * _weights[i] * parts.Variance;
        }

        return (difference == 0 ? 0 : difference / Math.Sqrt(variance)) - _target;
    }

    private double Solve(double z) =>
        Math.Exp(FallingRoot.Find(new StratifiedRatioScore(_scores, _weights, _estimate, _start, z), _start, 0.5));
}
