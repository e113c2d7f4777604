namespace DiagnosticAccuracy.Proportions;

/// <summary>The difference of two independent proportions plus and minus a multiple of its estimated standard error, cut at -1 and 1.</summary>
/// <remarks>Newcombe, Stat Med 1998;17:873, methods 1 and, with continuity correction, 2; Agresti and Caffo, Am Stat 2000;54:280.</remarks>
internal readonly struct WaldDifference(double centre, double variance, double correction) : INormalLimits
{
    public const string Name = "Wald";
    public const string ContinuityName = "Wald with continuity correction";
    public const string AgrestiCaffoName = "Agresti-Caffo";

    public static ConfidenceInterval Interval(ProportionDifference difference, Confidence confidence) =>
        Of(difference, confidence, 0, Name);

    public static ConfidenceInterval WithContinuity(ProportionDifference difference, Confidence confidence) =>
        Of(difference, confidence, (0.5 / difference.First.Trials) + (0.5 / difference.Second.Trials), ContinuityName);

    public static ConfidenceInterval AgrestiCaffo(ProportionDifference difference, Confidence confidence)
    {
        if (!difference.IsDefined)
        {
            return ConfidenceInterval.Undefined(difference.WhyUndefined!, confidence, AgrestiCaffoName);
        }

        double n1 = difference.First.Trials + 2.0;
        double n2 = difference.Second.Trials + 2.0;
        double p1 = (difference.First.Successes + 1.0) / n1;
        double p2 = (difference.Second.Successes + 1.0) / n2;
        double q1 = (difference.First.Failures + 1.0) / n1;
        double q2 = (difference.Second.Failures + 1.0) / n2;
        return NormalInterval.Of(new WaldDifference(p1 - p2, (p1 * q1 / n1) + (p2 * q2 / n2), 0), confidence, -1, 1, AgrestiCaffoName);
    }

    public double Lower(double z) => centre - (z * Math.Sqrt(variance)) - correction;

    public double Upper(double z) => centre + (z * Math.Sqrt(variance)) + correction;

    private static ConfidenceInterval Of(ProportionDifference difference, Confidence confidence, double correction, string name) =>
        difference.IsDefined
            ? NormalInterval.Of(
                new WaldDifference(difference.Value, Wald.Variance(difference.First) + Wald.Variance(difference.Second), correction), confidence, -1, 1, name)
            : ConfidenceInterval.Undefined(difference.WhyUndefined!, confidence, name);
}
