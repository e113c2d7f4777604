namespace DiagnosticAccuracy.Proportions;

/// <summary>The interval of a ratio of two independent proportions that is normal on the logarithm.</summary>
/// <remarks>Katz, Baptista, Azen and Pike, Biometrics 1978;34:469; Simel, Samsa and Matchar, J Clin Epidemiol 1991;44:763.</remarks>
internal readonly struct LogRatio : INormalLimits
{
    public const string Name = "log";
    public const string EmptyName = ScoreRatio.KoopmanName + ", since the log method has no limit with an empty cell";
    public const string FullName = ScoreRatio.KoopmanName + ", since the log method has no width when every trial is a success";

    private readonly double _value;
    private readonly double _standardError;

    private LogRatio(double value, double standardError)
    {
        _value = value;
        _standardError = standardError;
    }

    public static ConfidenceInterval Interval(ProportionRatio ratio, Confidence confidence)
    {
        if (!ratio.IsDefined)
        {
            return ConfidenceInterval.Undefined(ratio.WhyUndefined!, confidence, Name);
        }

        Proportion numerator = ratio.Numerator;
        Proportion denominator = ratio.Denominator;
        if (numerator.Successes == 0 || denominator.Successes == 0)
        {
            return ScoreRatio.Interval(ratio, confidence, 1, EmptyName);
        }

        if (numerator.Failures == 0 && denominator.Failures == 0)
        {
            return ScoreRatio.Interval(ratio, confidence, 1, FullName);
        }

        // 1/x1 - 1/n1 + 1/x2 - 1/n2, without the differences.
        double variance = (numerator.Failures / (double)numerator.Successes / numerator.Trials)
            + (denominator.Failures / (double)denominator.Successes / denominator.Trials);
        return NormalInterval.Of(new LogRatio(ratio.Value, Math.Sqrt(variance)), confidence, 0, double.PositiveInfinity, Name);
    }

    public double Lower(double z) => _value * Math.Exp(-z * _standardError);

    public double Upper(double z) => _value * Math.Exp(z * _standardError);
}
