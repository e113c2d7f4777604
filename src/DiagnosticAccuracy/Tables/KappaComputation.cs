namespace DiagnosticAccuracy.Tables;

/// <summary>Coefficients of agreement of two ratings and their standard errors.</summary>
internal static class KappaComputation
{
    private static readonly UndefinedReason OnlyChance = new(
        UndefinedCause.ZeroOverZero, "chance alone would agree fully, as when both ratings use one category only");

    /// <summary>
    /// kappa = (po - pe) / (1 - pe), po and pe weighted. With m(ij) = w(i.) + w(.j) the sum of the mean weights of row and column, n (1 - pe)^2 times the
    /// variance is sum p(ij) (w(ij) - m(ij) (1 - kappa))^2 - (kappa - pe (1 - kappa))^2, and by chance sum p(i.) p(.j) (w(ij) - m(ij))^2 - pe^2.
    /// </summary>
    public static Kappa Cohen(RatingTable table, KappaWeights weights)
    {
        string method = $"Wald with the standard error of Fleiss, Cohen and Everitt ({weights.Name})";
        int k = table.Categories;
        weights.CheckCategories(k);
        double[][] w = new double[k][];
        for (int i = 0; i < k; i++)
        {
            w[i] = new double[k];
            for (int j = 0; j < k; j++)
            {
                w[i][j] = weights.Of(i, j, k);
            }
        }

        if (table.Total == 0)
        {
            return Undefined(UndefinedReason.NoSubjects, method);
        }

        double n = table.Total;
        double[] first = Shares(k, table.FirstTotal, n);
        double[] second = Shares(k, table.SecondTotal, n);
        double[] rowMean = new double[k];
        double[] columnMean = new double[k];
        double observed = 0;
        double expected = 0;
        for (int i = 0; i < k; i++)
        {
            for (int j = 0; j < k; j++)
            {
                rowMean[i] += w[i][j] * second[j];
                columnMean[j] += w[i][j] * first[i];
                observed += w[i][j] * (table[i, j] / n);
                expected += w[i][j] * first[i] * second[j];
            }
        }

        if (IsOneCategory(table) || 1 - expected <= 0)
        {
            return Undefined(OnlyChance, method);
        }

        double kappa = (observed - expected) / (1 - expected);
        double spread = 0;
        double chanceSpread = 0;
        for (int i = 0; i < k; i++)
        {
            for (int j = 0; j < k; j++)
            {
                double mean = rowMean[i] + columnMean[j];
                spread += table[i, j] / n * Square(w[i][j] - (mean * (1 - kappa)));
                chanceSpread += first[i] * second[j] * Square(w[i][j] - mean);
            }
        }

        spread -= Square(kappa - (expected * (1 - kappa)));
        chanceSpread -= expected * expected;
        double scale = Math.Sqrt(n) * (1 - expected);
        return new Kappa(
            Quantity.Of(kappa),
            Quantity.Of(table.ObservedAgreement.Failures == 0 ? 0 : Math.Sqrt(Math.Max(0, spread)) / scale),
            Quantity.Of(Math.Sqrt(Math.Max(0, chanceSpread)) / scale),
            method);
    }

    public static Kappa PrevalenceAndBiasAdjusted(RatingTable table)
    {
        const string method = "Wald on the observed agreement";
        if (table.Total == 0)
        {
            return Undefined(UndefinedReason.NoSubjects, method);
        }

        double n = table.Total;
        double k = table.Categories;
        double agreement = table.ObservedAgreement.Value;
        double scale = k / (k - 1);
        return new Kappa(
            Quantity.Of(((k * agreement) - 1) / (k - 1)),
            Quantity.Of(scale * Math.Sqrt(agreement * (table.ObservedAgreement.Failures / n) / n)),
            Quantity.Of(scale * Math.Sqrt((1 / k) * (1 - (1 / k)) / n)),
            method);
    }

    /// <summary>
    /// AC1 = (pa - pe) / (1 - pe) with pe = sum pi(q) (1 - pi(q)) / (k - 1), pi(q) the mean share of category q; and its variance, which is that of
    /// the delta method over the cells.
    /// </summary>
    public static Kappa FirstOrderAgreement(RatingTable table)
    {
        const string method = "Wald with the standard error of Gwet";
        if (table.Total == 0)
        {
            return Undefined(UndefinedReason.NoSubjects, method);
        }

        double n = table.Total;
        int k = table.Categories;
        double[] share = new double[k];
        double expected = 0;
        for (int q = 0; q < k; q++)
        {
            share[q] = (table.FirstTotal(q) + (double)table.SecondTotal(q)) / (2 * n);
            expected += share[q] * (1 - share[q]) / (k - 1);
        }

        double agreement = table.ObservedAgreement.Value;
        double coefficient = (agreement - expected) / (1 - expected);

        // The derivative by cell (q, l), times 1 - pe: [q = l] - (1 - AC1) (1 - pi(q) + 1 - pi(l) - 1) / (k - 1), up to a constant.
        double mean = 0;
        double square = 0;
        for (int q = 0; q < k; q++)
        {
            for (int l = 0; l < k; l++)
            {
                double slope = (q == l ? 1 : 0) - ((1 - coefficient) * (1 - share[q] - share[l]) / (k - 1));
                double p = table[q, l] / n;
                mean += p * slope;
                square += p * slope * slope;
            }
        }

        double variance = table.ObservedAgreement.Failures == 0 && IsOneCategory(table) ? 0 : Math.Max(0, square - (mean * mean)) / n;
        return new Kappa(
            Quantity.Of(coefficient),
            Quantity.Of(Math.Sqrt(variance) / (1 - expected)),
            Quantity.Undefined(UndefinedCause.NotPartOfMethod, "this coefficient has no test against chance"),
            method);
    }

    internal static Kappa Undefined(UndefinedReason reason, string method) =>
        new(Quantity.Undefined(reason), Quantity.Undefined(reason), Quantity.Undefined(reason), method);

    private static bool IsOneCategory(RatingTable table)
    {
        for (int q = 0; q < table.Categories; q++)
        {
            if (table[q, q] == table.Total)
            {
                return true;
            }
        }

        return false;
    }

    private static double[] Shares(int categories, Func<int, long> total, double n)
    {
        double[] shares = new double[categories];
        for (int i = 0; i < categories; i++)
        {
            shares[i] = total(i) / n;
        }

        return shares;
    }

    private static double Square(double x) => x * x;
}
