namespace DiagnosticAccuracy.Proportions;

/// <summary>The Wald formula of one proportion after half of z squared was added to successes and to failures, cut at 0 and 1.</summary>
/// <remarks>Agresti and Coull, Am Stat 1998;52:119, in the form of Brown, Cai and DasGupta, Stat Sci 2001;16:101.</remarks>
internal readonly struct AgrestiCoull(Proportion proportion) : INormalLimits
{
    public const string Name = "Agresti-Coull";

    public static ConfidenceInterval Interval(Proportion proportion, Confidence confidence) => proportion.IsDefined
        ? NormalInterval.Of(new AgrestiCoull(proportion), confidence, 0, 1, Name)
        : ConfidenceInterval.Undefined(proportion.WhyUndefined!, confidence, Name);

    public double Lower(double z) => Math.Min(proportion.Value, Centre(z) - Margin(z));

    public double Upper(double z) => Math.Max(proportion.Value, Centre(z) + Margin(z));

    private double Centre(double z) => (proportion.Successes + (z * z / 2)) / (proportion.Trials + (z * z));

    private double Margin(double z)
    {
        double added = z * z / 2;
        double trials = proportion.Trials + (z * z);
        return z * Math.Sqrt((proportion.Successes + added) / trials * ((proportion.Failures + added) / trials) / trials);
    }
}
