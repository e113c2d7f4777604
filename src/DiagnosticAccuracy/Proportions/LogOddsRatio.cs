namespace DiagnosticAccuracy.Proportions;

/// <summary>The interval of an odds ratio that is normal on the logarithm.</summary>
/// <remarks>Woolf, Ann Hum Genet 1955;19:251. With one half added: Haldane, Ann Hum Genet 1956;20:309; Anscombe, Biometrika 1956;43:461.</remarks>
internal readonly struct LogOddsRatio : INormalLimits
{
    public const string Name = "log (Woolf)";
    public const string AddHalfName = "log with 1/2 added to each cell";
    public const string EmptyName = ConditionalOddsRatio.ExactName + ", since the log method has no limit with an empty cell";

    private readonly double _value;
    private readonly double _standardError;

    private LogOddsRatio(OddsRatio odds, double added)
    {
        double a = odds.First.Successes + added;
        double b = odds.First.Failures + added;
        double c = odds.Second.Successes + added;
        double d = odds.Second.Failures + added;
        _value = a * d / (b * c);
        _standardError = Math.Sqrt((1 / a) + (1 / b) + (1 / c) + (1 / d));
    }

    public static ConfidenceInterval Interval(OddsRatio odds, Confidence confidence)
    {
        if (!odds.IsDefined)
        {
            return ConfidenceInterval.Undefined(odds.WhyUndefined!, confidence, Name);
        }

        return odds.HasEmptyCell
            ? ConditionalOddsRatio.Interval(odds, confidence, 1, EmptyName)
            : NormalInterval.Of(new LogOddsRatio(odds, 0), confidence, 0, double.PositiveInfinity, Name);
    }

    public static ConfidenceInterval AddHalf(OddsRatio odds, Confidence confidence) => odds.IsDefined
        ? NormalInterval.Of(new LogOddsRatio(odds, 0.5), confidence, 0, double.PositiveInfinity, AddHalfName)
        : ConfidenceInterval.Undefined(odds.WhyUndefined!, confidence, AddHalfName);

    public double Lower(double z) => _value * Math.Exp(-z * _standardError);

    public double Upper(double z) => _value * Math.Exp(z * _standardError);
}
