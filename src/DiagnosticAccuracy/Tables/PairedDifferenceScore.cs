namespace DiagnosticAccuracy.Tables;

/// <summary>
/// The score statistic of "the first proportion is the second one plus d" on the same subjects, with the variance at the maximum of the
/// likelihood under that hypothesis.
/// </summary>
/// <remarks>
/// <para>With b and c the discordant counts of n, z = (b - c - n d) / sqrt(n (2 q + d (1 - d))), where q, the probability of "second only" at the
/// maximum, is the root in 0 to (1 - d)/2 of 2 n q^2 + (d (2 n + c - b) - b - c) q - c d (1 - d) = 0, for d of 0 or more. Below 0 the tests are
/// swapped. At 0 it is McNemar's (b - c) / sqrt(b + c).</para>
/// <para>Nam, Biometrics 1997;53:1422; Tango, Stat Med 1998;17:891.</para>
/// </remarks>
internal readonly struct PairedDifferenceScore(PairedTable table)
{
    public double Estimate => (double)(table.FirstOnly - table.SecondOnly) / table.Total;

    /// <summary>The statistic; 0 where the observed difference is d, whatever the variance.</summary>
    public double Statistic(double difference) => difference < 0
        ? -Of(table.SecondOnly, table.FirstOnly, table.Total, -difference)
        : Of(table.FirstOnly, table.SecondOnly, table.Total, difference);

    /// <summary>The probability of "second only" at the maximum of the likelihood under a difference of 0 or more.</summary>
    public static double SecondOnly(double b, double c, double n, double d)
    {
        double linear = (d * (n + (n - b) + c)) - (b + c);
        double constant = c * d * (1 - d);
        double root = Math.Sqrt((linear * linear) + (8 * n * constant));
        return linear > 0 ? 2 * constant / (linear + root) : (root - linear) / (4 * n);
    }

    private static double Of(long b, long c, long n, double d)
    {
        double excess = (b - c) - (n * d);
        if (excess == 0)
        {
            return 0;
        }

        // What remains is above 0: at d = 0 without discordant subjects, and at d = 1 with all of them "first only", nothing is in excess.
        double variance = n * ((2 * SecondOnly(b, c, n, d)) + (d * (1 - d)));
        return excess / Math.Sqrt(variance);
    }
}
