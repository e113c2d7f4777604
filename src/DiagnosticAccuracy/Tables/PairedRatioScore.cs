using DiagnosticAccuracy.Numerics;

namespace DiagnosticAccuracy.Tables;

/// <summary>
/// The score statistic of "the first proportion is r times the second one" on the same subjects, with the variance at the maximum of the
/// likelihood under that hypothesis.
/// </summary>
/// <remarks>
/// <para>With a positive on both and b, c on one test only, m = a + b + c and e = r - 1 of 0 or more, z = (b - c - e (a + c)) / sqrt(m (e + (1 + r) q)), where
/// q, the share of "second only" among the m at the maximum, is the root in 0 to 1/(1 + r) of
/// (1 + r) m q^2 + ((a + c) (1 + r) e - b - c) q - c e = 0. Below r = 1 the tests are swapped and r inverted. At 1 it is McNemar's
/// (b - c) / sqrt(b + c). Subjects negative on both tests do not matter.</para>
/// <para>Nam and Blackwelder, Stat Med 2002;21:689; Tang, Tang and Chan, Stat Med 2003;22:1217.</para>
/// </remarks>
internal readonly struct PairedRatioScore(PairedTable table)
{
    /// <summary>The statistic at a ratio, positive and finite; 0 where the observed ratio is r, whatever the variance.</summary>
    public double Statistic(double ratio) => ratio < 1
        ? -Of(table.BothPositive, table.SecondOnly, table.FirstOnly, (1 - ratio) / ratio)
        : Of(table.BothPositive, table.FirstOnly, table.SecondOnly, ratio - 1);

    /// <summary>The statistic at the ratio with this logarithm.</summary>
    public double StatisticAtLog(double logRatio) => logRatio < 0
        ? -Of(table.BothPositive, table.SecondOnly, table.FirstOnly, ElementaryFunctions.Expm1(-logRatio))
        : Of(table.BothPositive, table.FirstOnly, table.SecondOnly, ElementaryFunctions.Expm1(logRatio));

    /// <summary>The share of "second only" among those with a positive result, at the maximum of the likelihood under r = 1 + e of 1 or more.</summary>
    public static double SecondOnly(double a, double b, double c, double e)
    {
        double onePlusRatio = 2 + e;
        double square = onePlusRatio * (a + b + c);
        double linear = ((a + c) * onePlusRatio * e) - (b + c);
        double root = Math.Sqrt((linear * linear) + (4 * square * c * e));
        return linear > 0 ? 2 * c * e / (linear + root) : (root - linear) / (2 * square);
    }

    private static double Of(long a, long b, long c, double e)
    {
        double excess = (b - c) - (e * ((double)a + c));
        if (excess == 0)
        {
            return 0;
        }

        double positive = (double)a + b + c;
        double variance = positive * (e + ((2 + e) * SecondOnly(a, b, c, e)));
        return excess / Math.Sqrt(variance);
    }
}
