using DiagnosticAccuracy.Proportions;

namespace DiagnosticAccuracy.Tables;

/// <summary>The interval of a ratio of two predictive values that is normal on the logarithm.</summary>
/// <remarks>
/// ln (T/n) changes by 1/T - 1/n with a right call more and by -1/n with a wrong one; a subject contributes the square of the difference of its changes
/// for both tests. Moskowitz and Pepe, Clin Trials 2006;3:272.
/// </remarks>
internal readonly struct LogPredictiveRatio(double value, double standardError) : INormalLimits
{
    public const string Name = "log (Moskowitz-Pepe)";

    private static readonly UndefinedReason NoLimit = new(
        UndefinedCause.MethodHasNoLimit, "a predictive value is zero, where the logarithm has no limit; the score tests are defined there");

    private static readonly UndefinedReason NoVariance = new(
        UndefinedCause.ZeroVariance, "the estimated variance is zero, as when the tests call the same subjects or every call is right");

    public static ConfidenceInterval Interval(RelativePredictiveValue ratio, PredictiveCells cells, Confidence confidence)
    {
        if (!ratio.IsDefined)
        {
            return ConfidenceInterval.Undefined(ratio.WhyUndefined!, confidence, Name);
        }

        if (ratio.First.Successes == 0 || ratio.Second.Successes == 0)
        {
            return ConfidenceInterval.Undefined(NoLimit, confidence, Name);
        }

        double variance = Variance(ratio.First, ratio.Second, cells);
        return variance == 0
            ? ConfidenceInterval.Undefined(NoVariance, confidence, Name)
            : NormalInterval.Of(new LogPredictiveRatio(ratio.Value, Math.Sqrt(variance)), confidence, 0, double.PositiveInfinity, Name);
    }

    public double Lower(double z) => value * Math.Exp(-z * standardError);

    public double Upper(double z) => value * Math.Exp(z * standardError);

    private static double Variance(Proportion first, Proportion second, PredictiveCells cells)
    {
        // 1/T - 1/n, without the difference.
        double rightFirst = first.Failures / (double)first.Successes / first.Trials;
        double rightSecond = second.Failures / (double)second.Successes / second.Trials;
        return Sum(cells.Right, rightFirst, rightSecond) + Sum(cells.Wrong, -1.0 / first.Trials, -1.0 / second.Trials);
    }

    private static double Sum(PairedTable table, double first, double second)
    {
        double both = first - second;
        return (table.BothPositive * both * both) + (table.FirstOnly * first * first) + (table.SecondOnly * second * second);
    }
}
