using BenchmarkDotNet.Attributes;
using MathNet.Numerics.Distributions;

namespace DiagnosticAccuracy.Benchmarks;

/// <summary>Intervals of 1,000 random proportions, x and n drawn with n from 10 to a million, beside two calls of MathNet's beta quantile each.</summary>
public class ProportionBenchmarks
{
    private const int Proportions = 1000;
    private readonly Proportion[] _proportions = new Proportion[Proportions];

    [GlobalSetup]
    public void Setup()
    {
        Random random = new(20250102);
        for (int i = 0; i < Proportions; i++)
        {
            int n = (int)Math.Pow(10, 1 + (5 * random.NextDouble()));
            _proportions[i] = new Proportion(random.Next(1, n), n);
        }
    }

    [Benchmark(Baseline = true, OperationsPerInvoke = Proportions, Description = "Two beta quantiles of MathNet")]
    public double TwoQuantiles()
    {
        double sum = 0;
        foreach (Proportion proportion in _proportions)
        {
            sum += Beta.InvCDF(proportion.Successes, proportion.Failures + 1, 0.025);
            sum += Beta.InvCDF(proportion.Successes + 1, proportion.Failures, 0.975);
        }

        return sum;
    }

    [Benchmark(OperationsPerInvoke = Proportions, Description = "Clopper-Pearson interval")]
    public double ClopperPearson() => Sum(ProportionMethod.ClopperPearson);

    [Benchmark(OperationsPerInvoke = Proportions, Description = "Wilson interval")]
    public double Wilson() => Sum(ProportionMethod.Wilson);

    private double Sum(ProportionMethod method)
    {
        double sum = 0;
        foreach (Proportion proportion in _proportions)
        {
            ConfidenceInterval interval = proportion.Interval(default, method);
            sum += interval.Lower + interval.Upper;
        }

        return sum;
    }
}
