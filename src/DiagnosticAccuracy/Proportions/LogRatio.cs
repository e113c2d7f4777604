namespace DiagnosticAccuracy.Proportions;

/// <summary>The interval of a ratio of two independent proportions that is normal on the logarithm.</summary>
/// <remarks>Katz, Baptista, Azen and Pike, Biometrics 1978;34:469; Simel, Samsa and Matchar, J Clin Epidemiol 1991;44:763. With one
/// half added: Walter, Biometrika 1975;62:371; Pettigrew, Gart and Thomas, Biometrika 1986;73:425.</remarks>
internal readonly struct LogRatio : INormalLimits
{
    public const string Name = "log";
    public const string AddHalfName = "log with 1/2 added to successes and trials";
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

    public static ConfidenceInterval AddHalf(ProportionRatio ratio, Confidence confidence)
    {
        if (!ratio.IsDefined)
        {
            return ConfidenceInterval.Undefined(ratio.WhyUndefined!, confidence, AddHalfName);
        }

        Proportion numerator = ratio.Numerator;
        Proportion denominator = ratio.Denominator;
        if (numerator.Failures == 0 && denominator.Failures == 0)
        {
            return ScoreRatio.Interval(ratio, confidence, 1, FullName);
        }

        double x1 = numerator.Successes + 0.5;
        double x2 = denominator.Successes + 0.5;
        double n1 = numerator.Trials + 0.5;
        double n2 = denominator.Trials + 0.5;
        double variance = (numerator.Failures / x1 / n1) + (denominator.Failures / x2 / n2);
        return NormalInterval.Of(new LogRatio(x1 / n1 / (x2 / n2), Math.Sqrt(variance)), confidence, 0, double.PositiveInfinity, AddHalfName);
    }

    public double Lower(double z) => _value * Math.Exp(-z * _standardError);

    public double Upper(double z) => _value * Math.Exp(z * _standardError);
}
