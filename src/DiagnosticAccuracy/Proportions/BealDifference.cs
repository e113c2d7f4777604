namespace DiagnosticAccuracy.Proportions;

/// <summary>
/// Beal's interval of a difference of two independent proportions: the quadratic that remains when the sum of both proportions is replaced
/// by an estimate; cut at -1 and 1.
/// </summary>
/// <remarks>Beal, Biometrics 1987;43:941; Newcombe, Stat Med 1998;17:873, methods 3 (Haldane) and 4 (Jeffreys-Perks).</remarks>
internal readonly struct BealDifference(ProportionDifference difference, double middle) : INormalLimits
{
    public const string HaldaneName = "Haldane (Beal)";
    public const string JeffreysPerksName = "Jeffreys-Perks (Beal)";

    public static ConfidenceInterval Haldane(ProportionDifference difference, Confidence confidence) =>
        Interval(difference, confidence, 0, HaldaneName);

    public static ConfidenceInterval JeffreysPerks(ProportionDifference difference, Confidence confidence) =>
        Interval(difference, confidence, 0.5, JeffreysPerksName);

    public double Lower(double z) => Centre(z) - Margin(z);

    public double Upper(double z) => Centre(z) + Margin(z);

    private static ConfidenceInterval Interval(ProportionDifference difference, Confidence confidence, double added, string name)
    {
        if (!difference.IsDefined)
        {
            return ConfidenceInterval.Undefined(difference.WhyUndefined!, confidence, name);
        }

        double middle = (Share(difference.First, added) + Share(difference.Second, added)) / 2;
        return NormalInterval.Of(new BealDifference(difference, middle), confidence, -1, 1, name);
    }

    private static double Share(Proportion proportion, double added) =>
        (proportion.Successes + added) / (proportion.Trials + (2 * added));

    // Sum and difference of the inverse group sizes, over 4; how far the middle lies from one half, doubled.
    private double U => ((1.0 / difference.First.Trials) + (1.0 / difference.Second.Trials)) / 4;

    private double V => ((1.0 / difference.First.Trials) - (1.0 / difference.Second.Trials)) / 4;

    private double Tilt => 1 - (2 * middle);

    private double Centre(double z) => (difference.Value + (z * z * V * Tilt)) / (1 + (z * z * U));

    private double Margin(double z)
    {
        double d = difference.Value;
        double spread = middle * (1 - middle);
        double squared = (U * ((4 * spread) - (d * d)))
            + (2 * V * Tilt * d)
            + (4 * z * z * U * U * spread)
            + (z * z * V * V * Tilt * Tilt);
        return z / (1 + (z * z * U)) * Math.Sqrt(Math.Max(0, squared));
    }
}
