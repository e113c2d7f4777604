using BenchmarkDotNet.Attributes;

namespace DiagnosticAccuracy.Benchmarks;

/// <summary>From scores and status to the area with its DeLong error, beside sorting the same number of doubles.</summary>
public class AreaBenchmarks
{
    private double[] _scores = [];
    private double[] _copy = [];
    private bool[] _status = [];

    [Params(1_000, 100_000, 1_000_000)]
    public int Subjects { get; set; }

    [GlobalSetup]
    public void Setup()
    {
        // Two normal groups one standard deviation apart, three in ten with the condition.
        Random random = new(20250101);
        _scores = new double[Subjects];
        _status = new bool[Subjects];
        for (int i = 0; i < Subjects; i++)
        {
            _status[i] = random.NextDouble() < 0.3;
            double normal = Math.Sqrt(-2 * Math.Log(1 - random.NextDouble())) * Math.Cos(2 * Math.PI * random.NextDouble());
            _scores[i] = normal + (_status[i] ? 1 : 0);
        }

        _copy = new double[Subjects];
    }

    [Benchmark(Baseline = true, Description = "Array.Sort(double[])")]
    public double[] ArraySort()
    {
        _scores.CopyTo(_copy, 0);
        Array.Sort(_copy);
        return _copy;
    }

    [Benchmark(Description = "Area with DeLong error")]
    public double AreaFromScores() =>
        AreaUnderCurve.FromScores(_scores, _status, ScoreDirection.HigherIsPositive).StandardError.Value;

    [Benchmark(Description = "Sample, then area with DeLong error")]
    public double AreaOfSample()
    {
        ScoredSample sample = ScoredSample.Create(_scores, _status, ScoreDirection.HigherIsPositive);
        return AreaUnderCurve.Of(sample).StandardError.Value;
    }

    [Benchmark(Description = "Whole curve and area")]
    public int WholeCurve() =>
        RocCurve.Empirical(ScoredSample.Create(_scores, _status, ScoreDirection.HigherIsPositive)).Points.Count;

    [Benchmark(Description = "Paired comparison of two tests")]
    public double Paired() =>
        RocComparison.Paired(PairedScores.Create(
            _scores, ScoreDirection.HigherIsPositive, _scores, ScoreDirection.LowerIsPositive, _status)).Covariance.Value;
}
