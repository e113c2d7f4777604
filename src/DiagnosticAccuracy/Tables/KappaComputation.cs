namespace DiagnosticAccuracy.Tables;

/// <summary>Coefficients of agreement of two ratings and their standard errors.</summary>
/// <remarks>
/// All are computed from disagreement, not from one minus agreement, so that a category which nearly everybody is in costs no digits.
/// </remarks>
internal static class KappaComputation
{
    // What is left of a variance below this share of its terms is rounding.
    private const double Rounding = 1e-14;

    private static readonly UndefinedReason OnlyChance = new(
        UndefinedCause.ZeroOverZero, "chance alone would agree fully, as when both ratings use one category only");

    public static Kappa Cohen(RatingTable table, KappaWeights weights)
    {
        string method = $"Wald with the standard error of Fleiss, Cohen and Everitt ({weights.Name})";
        weights.CheckCategories(table.Categories, nameof(weights));
        if (table.Total == 0)
        {
            return Undefined(UndefinedReason.NoSubjects, method);
        }

        double n = table.Total;
        return Chance(
            table,
            weights,
            Shares(table.Categories, category => table.FirstTotal(category) / n),
            Shares(table.Categories, category => table.SecondTotal(category) / n),
            method);
    }

    public static Kappa Scott(RatingTable table)
    {
        const string method = "Wald with the delta-method standard error";
        if (table.Total == 0)
        {
            return Undefined(UndefinedReason.NoSubjects, method);
        }

        double[] shares = MeanShares(table);
        return Chance(table, KappaWeights.None, shares, shares, method);
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
    /// AC1 = 1 - q / (1 - pe) with q the observed disagreement and pe = sum pi(c) (1 - pi(c)) / (k - 1), pi(c) the mean share of category c; and its
    /// variance, which is that of the delta method over the cells.
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
        double[] share = MeanShares(table);
        double expected = 0;
        for (int q = 0; q < k; q++)
        {
            expected += share[q] * (1 - share[q]) / (k - 1);
        }

        double loss = table.ObservedAgreement.Failures / n / (1 - expected);

        // The derivative by cell (q, l), times pe - 1: [q differs from l] + (1 - AC1) (1 - pi(q) - pi(l)) / (k - 1), up to a constant.
        double mean = 0;
        double square = 0;
        for (int q = 0; q < k; q++)
        {
            for (int l = 0; l < k; l++)
            {
                double slope = (q == l ? 0 : 1) + (loss * (1 - share[q] - share[l]) / (k - 1));
                double p = table[q, l] / n;
                mean += p * slope;
                square += p * slope * slope;
            }
        }

        return new Kappa(
            Quantity.Of(1 - loss),
            Quantity.Of(Root(square, mean * mean) / Math.Sqrt(n) / (1 - expected)),
            Quantity.Undefined(UndefinedCause.NotPartOfMethod, "this coefficient has no test against chance"),
            method);
    }

    internal static Kappa Undefined(UndefinedReason reason, string method) =>
        new(Quantity.Undefined(reason), Quantity.Undefined(reason), Quantity.Undefined(reason), method);

    /// <summary>
    /// 1 - qo / qe, observed over expected disagreement, each cell with v = 1 - weight. With m(ij) = v(i.) + v(.j) the sum of the mean disagreements of
    /// row and column, n qe^2 times the variance is sum p(ij) (v(ij) - m(ij) qo / qe)^2 - qo^2, and by chance sum p(i.) p(.j) (v(ij) - m(ij))^2 - qe^2.
    /// These are the formulas of Fleiss, Cohen and Everitt with 1 - v in place of the weights.
    /// </summary>
    private static Kappa Chance(RatingTable table, KappaWeights weights, double[] first, double[] second, string method)
    {
        int k = table.Categories;
        double n = table.Total;
        double[] v = new double[k * k];
        double[] rowMean = new double[k];
        double[] columnMean = new double[k];
        double observed = 0;
        double expected = 0;
        for (int i = 0; i < k; i++)
        {
            for (int j = 0; j < k; j++)
            {
                double disagreement = 1 - weights.Of(i, j, k);
                v[(i * k) + j] = disagreement;
                rowMean[i] += disagreement * second[j];
                columnMean[j] += disagreement * first[i];
                observed += disagreement * (table[i, j] / n);
                expected += disagreement * first[i] * second[j];
            }
        }

        if (expected == 0)
        {
            return Undefined(OnlyChance, method);
        }

        double loss = observed / expected;
        double spread = 0;
        double chanceSpread = 0;
        for (int i = 0; i < k; i++)
        {
            for (int j = 0; j < k; j++)
            {
                double mean = rowMean[i] + columnMean[j];
                spread += table[i, j] / n * Square(v[(i * k) + j] - (mean * loss));
                chanceSpread += first[i] * second[j] * Square(v[(i * k) + j] - mean);
            }
        }

        double scale = Math.Sqrt(n) * expected;
        return new Kappa(
            Quantity.Of((expected - observed) / expected),
            Quantity.Of(Root(spread, observed * observed) / scale),
            Quantity.Of(Root(chanceSpread, expected * expected) / scale),
            method,
            weights.LeastKappa);
    }

    // The root of a variance as mean of squares less square of mean.
    private static double Root(double square, double meanSquare) =>
        square - meanSquare <= Rounding * square ? 0 : Math.Sqrt(square - meanSquare);

    private static double[] MeanShares(RatingTable table) =>
        Shares(table.Categories, category => (table.FirstTotal(category) + (double)table.SecondTotal(category)) / (2.0 * table.Total));

    private static double[] Shares(int categories, Func<int, double> share)
    {
        double[] shares = new double[categories];
        for (int i = 0; i < categories; i++)
        {
            shares[i] = share(i);
        }

        return shares;
    }

    private static double Square(double x) => x * x;
}
