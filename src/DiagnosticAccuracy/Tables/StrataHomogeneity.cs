namespace DiagnosticAccuracy.Tables;

/// <summary>Tests of whether strata share one value of a measure.</summary>
internal static class StrataHomogeneity
{
    private static readonly UndefinedReason AllAtOneEnd = new(
        UndefinedCause.ZeroOverZero, "the odds ratios of all strata are zero or all infinite, so that the test divides zero by zero");

    /// <summary>
    /// sum((a - E)^2 / V) - (sum a - sum E)^2 / sum V, with E the expected cell under the pooled odds ratio and the margins of the stratum and
    /// 1 / V the sum of the inverses of the four expected cells.
    /// </summary>
    public static HomogeneityTest BreslowDay(IReadOnlyList<ConfusionMatrix> strata, PooledRatio pooled)
    {
        const string method = "Breslow-Day with Tarone's correction";
        ConfusionMatrix[] comparable = [.. strata.Where(table => MantelHaenszel.HasBothGroups(table) && table.Positives > 0 && table.Negatives > 0)];
        if (comparable.Length < 2)
        {
            return new HomogeneityTest(Few("an odds ratio"), Math.Max(0, comparable.Length - 1), method);
        }

        if (!pooled.IsDefined || pooled.Value == 0 || double.IsPositiveInfinity(pooled.Value))
        {
            return new HomogeneityTest(Quantity.Undefined(pooled.WhyUndefined ?? AllAtOneEnd), comparable.Length - 1, method);
        }

        double odds = pooled.Value;
        double statistic = 0;
        double gap = 0;
        double variance = 0;
        foreach (ConfusionMatrix table in comparable)
        {
            double tp = Expected(table.Positives, table.Negatives, table.WithCondition, table.WithoutCondition, odds);
            double fp = Expected(table.Positives, table.Negatives, table.WithoutCondition, table.WithCondition, 1 / odds);
            double fn = Expected(table.Negatives, table.Positives, table.WithCondition, table.WithoutCondition, 1 / odds);
            double tn = Expected(table.Negatives, table.Positives, table.WithoutCondition, table.WithCondition, odds);
            double v = 1 / ((1 / tp) + (1 / fp) + (1 / fn) + (1 / tn));

            // The distance is the same in each cell; the least one keeps most digits.
            double distance = tp <= fp && tp <= fn && tp <= tn ? table.TruePositives - tp
                : fp <= fn && fp <= tn ? fp - table.FalsePositives
                : fn <= tn ? fn - table.FalseNegatives
                : table.TrueNegatives - tn;
            statistic += distance * distance / v;
            gap += distance;
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

        // The rarer outcome is compared, so that shares near 1 keep their digits.
        double all = successes + failures;
        bool rareFailures = failures < successes;
        double share = (rareFailures ? failures : successes) / all;
        double Excess(Proportion p) => ((rareFailures ? p.Failures : p.Successes) / (double)p.Trials) - share;
        return new HomogeneityTest(
            Quantity.Of(filled.Sum(p => p.Trials * Excess(p) * Excess(p)) / (successes / all * (failures / all))), filled.Length - 1, method);
    }

    private static Quantity Few(string what) =>
        Quantity.Undefined(UndefinedCause.TooFewSubjects, $"fewer than two strata have {what} to compare");

    /// <summary>
    /// The expected cell of row m (the other row has r) and column n1 (the other one has n0) at an odds ratio: E (n0 - m + E) = psi (m - E) (n1 - E).
    /// Of the two forms of the root the one that does not cancel; the discriminant is a sum of terms none of which is negative.
    /// </summary>
    private static double Expected(double m, double r, double n1, double n0, double odds)
    {
        double scaled = odds * (m - n1);
        double linear = n0 - m + (odds * (m + n1));
        double root = Math.Sqrt((scaled * scaled) + (2 * odds * ((n0 * n1) + (m * r))) + ((n0 - m) * (n0 - m)));
        return linear >= 0 ? 2 * odds * m * n1 / (linear + root) : (root - linear) / (2 * (1 - odds));
    }
}
