namespace DiagnosticAccuracy.Proportions;

/// <summary>The estimate of one proportion plus and minus a multiple of its estimated standard error, cut at 0 and 1.</summary>
/// <remarks>Newcombe, Stat Med 1998;17:857, methods 1 and, with continuity correction, 2.</remarks>
internal readonly struct Wald(Proportion proportion, double correction) : INormalLimits
{
    public const string Name = "Wald";
    public const string ContinuityName = "Wald with continuity correction";

    public static ConfidenceInterval Interval(Proportion proportion, Confidence confidence) => proportion.IsDefined
        ? NormalInterval.Of(new Wald(proportion, 0), confidence, 0, 1, Name)
        : ConfidenceInterval.Undefined(proportion.WhyUndefined!, confidence, Name);

    public static ConfidenceInterval WithContinuity(Proportion proportion, Confidence confidence) => proportion.IsDefined
        ? NormalInterval.Of(new Wald(proportion, 0.5 / proportion.Trials), confidence, 0, 1, ContinuityName)
        : ConfidenceInterval.Undefined(proportion.WhyUndefined!, confidence, ContinuityName);

    /// <summary>The estimated variance of an estimated proportion.</summary>
    public static double Variance(Proportion proportion) =>
        proportion.Value * (proportion.Failures / (double)proportion.Trials) / proportion.Trials;

    public double Lower(double z) => proportion.Value - (z * Math.Sqrt(Variance(proportion))) - correction;

    public double Upper(double z) => proportion.Value + (z * Math.Sqrt(Variance(proportion))) + correction;
}
