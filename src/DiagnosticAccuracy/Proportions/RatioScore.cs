namespace DiagnosticAccuracy.Proportions;

/// <summary>
/// The score statistic of "the first proportion is r times the second one", with the variance at the maximum of the likelihood
/// under that hypothesis.
/// </summary>
/// <remarks>
/// <para>z = (x1/n1 - r x2/n2) / sqrt(factor (p1 q1 / n1 + r^2 p2 q2 / n2)), p1 = r p2. The equation of the maximum,
/// N r p^2 - (r (n1 + x2) + x1 + n2) p + x1 + x2 = 0, is solved for p2, q2 = 1 - p2 and q1 = 1 - p1 each without cancellation,
/// so that proportions near 1 keep their digits. Its discriminant is (r (n1 + x2) - x1 - n2)^2 + 4 r f1 f2, f the failures.</para>
/// <para>The factor is 1 (Koopman 1984; Gart and Nam 1988) or N / (N - 1) (Miettinen and Nurminen 1985).</para>
/// </remarks>
internal readonly struct RatioScore(Proportion first, Proportion second, double varianceFactor)
{
    public Proportion First => first;

    public Proportion Second => second;

    public double Estimate => first.Value / second.Value;

    public double Statistic(double ratio)
    {
        RatioScoreParts parts = Parts(ratio);
        return parts.Difference == 0 ? 0 : parts.Difference / Math.Sqrt(parts.Variance);
    }

    /// <summary>What the statistic is made of.</summary>
    public RatioScoreParts Parts(double ratio)
    {
        double n1 = first.Trials;
        double n2 = second.Trials;
        double f1 = first.Failures;
        double f2 = second.Failures;
        double x1 = first.Successes;
        double x2 = second.Successes;
        double excess = ratio - 1;

        // Near a ratio of 1 the whole counts cancel, and only the failures are left.
        bool nearOne = ratio > 0.5 && ratio < 2;
        double rise = nearOne ? (excess * (n1 + x2)) + (f1 - f2) : (ratio * (n1 + x2)) - (x1 + n2);
        double forQ2 = nearOne ? (excess * (n1 + n2 + f2)) + f1 + f2 : (ratio * (n1 + n2 + f2)) - (x1 + n2);
        double forQ1 = nearOne ? f1 + f2 - (excess * (n1 + x2)) : (2 * n1) + n2 - x1 - (ratio * (n1 + x2));
        double root = Math.Sqrt((rise * rise) + (4 * ratio * f1 * f2));

        double p1 = 2 * ratio * (x1 + x2) / ((ratio * (n1 + x2)) + x1 + n2 + root);
        double q2 = LargerRoot(forQ2, excess * f2, root, ratio * (n1 + n2));
        double q1 = LargerRoot(forQ1, -excess * f1, root, n1 + n2);
        double variance = varianceFactor * p1 * ((q1 / n1) + (ratio * q2 / n2));

        double difference = first.Value - (ratio * second.Value);
        if (nearOne)
        {
            double equal = second.Value > 0.5 ? (f2 / n2) - (f1 / n1) : first.Value - second.Value;
            difference = equal - (excess * second.Value);
        }

        return new RatioScoreParts(difference, variance);
    }

    // The larger root of a q^2 - b q + c = 0 with the root of its discriminant.
    private static double LargerRoot(double b, double c, double root, double a) =>
        b >= 0 ? (b + root) / (2 * a) : 2 * c / (b - root);
}
