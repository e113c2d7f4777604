namespace DiagnosticAccuracy.Tests;

/// <summary>
/// Score statistics whose restricted maximum is searched for in the whole likelihood of four cells by golden sections in two dimensions, without a
/// derivative and without a closed form.
/// </summary>
internal static class SlowPaired
{
    public static double DifferenceStatistic(PairedTable table, double bound)
    {
        double n = table.Total;
        double estimate = (table.FirstOnly - table.SecondOnly) / n;
        if (Math.Abs(estimate - bound) < 1e-14)
        {
            return 0;
        }

        // Free: "second only" from 0 to its largest value, and the share "both" of what is concordant.
        double low = Math.Max(0, -bound);
        double high = (1 - bound) / 2;
        double Best(double q) => Maximum(0, 1 - bound - (2 * q), both => LogLikelihood(table, both, q + bound, q, 1 - bound - (2 * q) - both)).Value;
        double secondOnly = Maximum(low, high, Best).At;
        double variance = ((2 * secondOnly) + bound - (bound * bound)) / n;
        return (estimate - bound) / Math.Sqrt(variance);
    }

    public static double RatioStatistic(PairedTable table, double ratio)
    {
        double n = table.Total;
        double p1 = table.FirstPositive.Value;
        double p2 = table.SecondPositive.Value;
        if (Math.Abs(p1 - (ratio * p2)) < 1e-14)
        {
            return 0;
        }

        // Free: the second proportion s (the first is r s), and "both" from its least to its largest value.
        double Best(double s) => Maximum(
            Math.Max(0, s + (ratio * s) - 1), Math.Min(s, ratio * s), both => LogLikelihood(table, both, (ratio * s) - both, s - both, 1 - (ratio * s) - s + both)).Value;
        double second = Maximum(0, Math.Min(1, 1 / ratio), Best).At;
        double atBoth = Maximum(
            Math.Max(0, second + (ratio * second) - 1),
            Math.Min(second, ratio * second),
            both => LogLikelihood(table, both, (ratio * second) - both, second - both, 1 - (ratio * second) - second + both)).At;
        double firstOnly = (ratio * second) - atBoth;
        double secondOnly = second - atBoth;
        double variance = ratio * (firstOnly + secondOnly) / n;
        return (p1 - (ratio * p2)) / Math.Sqrt(variance);
    }

    private static double LogLikelihood(PairedTable table, double both, double first, double second, double neither) =>
        Term(table.BothPositive, both) + Term(table.FirstOnly, first) + Term(table.SecondOnly, second) + Term(table.BothNegative, neither);

    private static double Term(long count, double probability) => count == 0 ? 0 : count * Math.Log(Math.Max(probability, 1e-300));

    private static (double At, double Value) Maximum(double low, double high, Func<double, double> f)
    {
        double golden = (Math.Sqrt(5) - 1) / 2;
        double left = high - (golden * (high - low));
        double right = low + (golden * (high - low));
        double atLeft = f(left);
        double atRight = f(right);
        for (int i = 0; i < 75; i++)
        {
            if (atLeft < atRight)
            {
                low = left;
                left = right;
                atLeft = atRight;
                right = low + (golden * (high - low));
                atRight = f(right);
            }
            else
            {
                high = right;
                right = left;
                atRight = atLeft;
                left = high - (golden * (high - low));
                atLeft = f(left);
            }
        }

        double middle = (low + high) / 2;
        return (middle, f(middle));
    }
}
