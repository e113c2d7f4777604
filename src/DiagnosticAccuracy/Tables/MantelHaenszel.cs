namespace DiagnosticAccuracy.Tables;

/// <summary>Ratios pooled over strata, and tests of whether the strata share them.</summary>
internal static class MantelHaenszel
{
    private static readonly UndefinedReason NothingToCompare = new(
        UndefinedCause.ZeroOverZero, "no stratum has subjects of both groups and the results that the ratio compares");

    private static readonly UndefinedReason NoLogError = new(
        UndefinedCause.MethodHasNoLimit, "a pooled ratio of zero or infinity has no standard error on the log scale");

    /// <summary>
    /// sum(x1 n0 / n) / sum(x0 n1 / n); the variance of its logarithm is sum((n1 n0 (x1 + x0) - x1 x0 n) / n^2) over the product of the two sums.
    /// </summary>
    public static PooledRatio RiskRatio(
        IReadOnlyList<ConfusionMatrix> strata, Func<ConfusionMatrix, long> countWith, Func<ConfusionMatrix, long> countWithout, string method)
    {
        double numerator = 0;
        double denominator = 0;
        double spread = 0;
        foreach (ConfusionMatrix table in strata.Where(HasBothGroups))
        {
            double n1 = table.WithCondition;
            double n0 = table.WithoutCondition;
            double n = n1 + n0;
            double x1 = countWith(table);
            double x0 = countWithout(table);
            numerator += x1 * (n0 / n);
            denominator += x0 * (n1 / n);
            spread += (n1 / n * n0 / n * (x1 + x0)) - (x1 / n * x0);
        }

        return Ratio(numerator, denominator, () => spread / (numerator * denominator), method);
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

        return Ratio(
            sumR,
            sumS,
            () => (pr / (2 * sumR * sumR)) + (psqr / (2 * sumR * sumS)) + (qs / (2 * sumS * sumS)),
            "log with the Robins-Breslow-Greenland variance");
    }

    /// <summary>
    /// sum((a - E)^2 / V) - (sum a - sum E)^2 / sum V, with E the expected cell under the pooled odds ratio and the margins of the stratum and
    /// 1 / V = 1/E + 1/(m - E) + 1/(n1 - E) + 1/(n0 - m + E).
    /// </summary>
    public static HomogeneityTest BreslowDay(IReadOnlyList<ConfusionMatrix> strata, PooledRatio pooled)
    {
        const string method = "Breslow-Day with Tarone's correction";
        ConfusionMatrix[] comparable = [.. strata.Where(table => HasBothGroups(table) && table.Positives > 0 && table.Negatives > 0)];
        if (comparable.Length < 2)
        {
            return new HomogeneityTest(Few("an odds ratio"), Math.Max(0, comparable.Length - 1), method);
        }

        if (!pooled.IsDefined || pooled.Value == 0 || double.IsPositiveInfinity(pooled.Value))
        {
            return new HomogeneityTest(Quantity.Undefined(pooled.WhyUndefined ?? NoLogError), comparable.Length - 1, method);
        }

        double statistic = 0;
        double gap = 0;
        double variance = 0;
        foreach (ConfusionMatrix table in comparable)
        {
            double expected = ExpectedTruePositives(table, pooled.Value);
            double v = 1 / ((1 / expected) + (1 / (table.Positives - expected)) + (1 / (table.WithCondition - expected))
                + (1 / (table.WithoutCondition - table.Positives + expected)));
            statistic += (table.TruePositives - expected) * (table.TruePositives - expected) / v;
            gap += table.TruePositives - expected;
            variance += v;
        }

        return new HomogeneityTest(Quantity.Of(Math.Max(0, statistic - (gap * gap / variance))), comparable.Length - 1, method);
    }

    public static HomogeneityTest Pearson(IReadOnlyList<Proportion> proportions, string method)
    {
        Proportion[] filled = [.. proportions.Where(p => p.IsDefined)];
        if (filled.Length < 2)
        {
            return new HomogeneityTest(Few("a proportion"), Math.Max(0, filled.Length - 1), method);
        }

        double successes = filled.Sum(p => (double)p.Successes);
        double failures = filled.Sum(p => (double)p.Failures);
        if (successes == 0 || failures == 0)
        {
            // All strata are exactly alike.
            return new HomogeneityTest(Quantity.Of(0), filled.Length - 1, method);
        }

        double share = successes / (successes + failures);
        double rest = failures / (successes + failures);
        return new HomogeneityTest(
            Quantity.Of(filled.Sum(p => p.Trials * (p.Value - share) * (p.Value - share) / (share * rest))), filled.Length - 1, method);
    }

    private static bool HasBothGroups(ConfusionMatrix table) => table.WithCondition > 0 && table.WithoutCondition > 0;

    private static PooledRatio Ratio(double numerator, double denominator, Func<double> logVariance, string method)
    {
        if (numerator == 0 && denominator == 0)
        {
            return new PooledRatio(Quantity.Undefined(NothingToCompare), Quantity.Undefined(NothingToCompare), method);
        }

        double value = denominator == 0 ? double.PositiveInfinity : numerator / denominator;
        return new PooledRatio(
            Quantity.Of(value),
            numerator == 0 || denominator == 0 ? Quantity.Undefined(NoLogError) : Quantity.Of(Math.Sqrt(Math.Max(0, logVariance()))),
            method);
    }

    private static Quantity Few(string what) =>
        Quantity.Undefined(UndefinedCause.TooFewSubjects, $"fewer than two strata have {what} to compare");

    // E (n0 - m + E) = psi (m - E) (n1 - E), the root between max(0, m - n0) and min(m, n1), in the form that does not cancel.
    private static double ExpectedTruePositives(ConfusionMatrix table, double oddsRatio)
    {
        double m = table.Positives;
        double n1 = table.WithCondition;
        double n0 = table.WithoutCondition;
        if (oddsRatio == 1)
        {
            return m * (n1 / (n1 + n0));
        }

        double linear = n0 - m + (oddsRatio * (m + n1));
        double discriminant = Math.Sqrt((linear * linear) + (4 * (1 - oddsRatio) * oddsRatio * m * n1));
        return 2 * oddsRatio * m * n1 / (linear + discriminant);
    }
}
