namespace DiagnosticAccuracy.Tables;

/// <summary>Ratios pooled over strata.</summary>
internal static class MantelHaenszel
{
    public const string RatioName = "log with the Greenland-Robins variance";
    public const string OddsName = "log with the Robins-Breslow-Greenland variance";

    private static readonly UndefinedReason NothingToCompare = new(
        UndefinedCause.ZeroOverZero, "no stratum has subjects of both groups and the results that the ratio compares");

    private static readonly UndefinedReason NoLogError = new(
        UndefinedCause.MethodHasNoLimit,
        "a pooled ratio of zero or infinity has no standard error on the log scale; its interval takes its limits from a score or exact method");

    /// <summary>
    /// sum(x1 n0 / n) / sum(x0 n1 / n); the variance of its logarithm is sum((n1 n0 (x1 + x0) - x1 x0 n) / n^2) over the product of the two sums. The
    /// numerator is written x1 n1 (n0 - x0) + x0 n0 (n1 - x1), which does not cancel.
    /// </summary>
    public static PooledRatio Ratio(IReadOnlyList<ConfusionMatrix> strata, PooledKind kind)
    {
        double numerator = 0;
        double denominator = 0;
        double spread = 0;
        foreach (ConfusionMatrix table in strata.Where(HasBothGroups))
        {
            Proportion with = With(table, kind);
            Proportion without = Without(table, kind);
            double n = table.Total;
            double n1 = with.Trials / n;
            double n0 = without.Trials / n;
            numerator += with.Successes * n0;
            denominator += without.Successes * n1;
            spread += (with.Successes * n1 * (without.Failures / n)) + (without.Successes * n0 * (with.Failures / n));
        }

        return Pooled(strata, kind, numerator, denominator, () => spread / (numerator * denominator), RatioName);
    }

    /// <summary>
    /// R / S with R = sum(a d / n), S = sum(b c / n). With P = (a + d) / n, Q = (b + c) / n, the variance of its logarithm is
    /// sum(P r) / (2 R^2) + sum(P s + Q r) / (2 R S) + sum(Q s) / (2 S^2).
    /// </summary>
    public static PooledRatio OddsRatio(IReadOnlyList<ConfusionMatrix> strata)
    {
        double sumR = 0;
        double sumS = 0;
        double pr = 0;
        double psqr = 0;
        double qs = 0;
        foreach (ConfusionMatrix table in strata.Where(HasBothGroups))
        {
            double n = table.Total;
            double r = table.TruePositives * (table.TrueNegatives / n);
            double s = table.FalsePositives * (table.FalseNegatives / n);
            double p = (table.TruePositives + (double)table.TrueNegatives) / n;
            double q = (table.FalsePositives + (double)table.FalseNegatives) / n;
            sumR += r;
            sumS += s;
            pr += p * r;
            psqr += (p * s) + (q * r);
            qs += q * s;
        }

        return Pooled(
            strata,
            PooledKind.OddsRatio,
            sumR,
            sumS,
            () => (pr / (2 * sumR * sumR)) + (psqr / (2 * sumR * sumS)) + (qs / (2 * sumS * sumS)),
            OddsName);
    }

    public static bool HasBothGroups(ConfusionMatrix table) => table.WithCondition > 0 && table.WithoutCondition > 0;

    public static Proportion With(ConfusionMatrix table, PooledKind kind) =>
        kind == PooledKind.NegativeLikelihoodRatio ? table.FalseNegativeRate : table.Sensitivity;

    public static Proportion Without(ConfusionMatrix table, PooledKind kind) =>
        kind == PooledKind.NegativeLikelihoodRatio ? table.Specificity : table.FalsePositiveRate;

    private static PooledRatio Pooled(
        IReadOnlyList<ConfusionMatrix> strata, PooledKind kind, double numerator, double denominator, Func<double> logVariance, string method)
    {
        if (numerator == 0 && denominator == 0)
        {
            return new PooledRatio(strata, kind, Quantity.Undefined(NothingToCompare), Quantity.Undefined(NothingToCompare), method);
        }

        return new PooledRatio(
            strata,
            kind,
            Quantity.Of(denominator == 0 ? double.PositiveInfinity : numerator / denominator),
            numerator == 0 || denominator == 0 ? Quantity.Undefined(NoLogError) : Quantity.Of(Math.Sqrt(logVariance())),
            method);
    }
}
