using DiagnosticAccuracy.Proportions;

namespace DiagnosticAccuracy.Tables;

/// <summary>
/// The interval of a difference of two proportions of the same subjects that combines the Wilson score interval of each with their correlation.
/// </summary>
/// <remarks>
/// <para>Newcombe, Stat Med 1998;17:2635, methods 8 and, with the corrected correlation, 10.</para>
/// <para>With phi = (ad - bc)/D, D the root of the product of the four margins, D^2 - (ad - bc)^2 = n (abc + abd + acd + bcd), which gives 1 - phi without
/// a difference; near a correlation of 1 the limits live on it. The distances from p to its Wilson limits are z (s + z |1 - 2p|/2)/(n + z^2) on the
/// side of one half and z p q/(s + z |1 - 2p|/2) on the other, s^2 = n p q + z^2/4.</para>
/// </remarks>
internal readonly struct NewcombePaired(PairedDifference difference, double oneLessPhi) : INormalLimits
{
    public const string Name = "hybrid score (Newcombe)";
    public const string CorrectedName = "hybrid score with phi correction (Newcombe)";

    public static ConfidenceInterval Interval(PairedDifference difference, Confidence confidence, bool correctPhi)
    {
        string name = correctPhi ? CorrectedName : Name;
        return difference.IsDefined
            ? NormalInterval.Of(new NewcombePaired(difference, OneLessPhi(difference.Table, correctPhi)), confidence, -1, 1, name)
            : ConfidenceInterval.Undefined(difference.WhyUndefined!, confidence, name);
    }

    public double Lower(double z) => difference.Value - Reach(difference.First, difference.Second, z);

    public double Upper(double z) => difference.Value + Reach(difference.Second, difference.First, z);

    /// <summary>One less the correlation of both tests; 1 where a test has one result only.</summary>
    private static double OneLessPhi(PairedTable table, bool correct)
    {
        double a = table.BothPositive;
        double b = table.FirstOnly;
        double c = table.SecondOnly;
        double d = table.BothNegative;
        double n = table.Total;
        double root = Math.Sqrt((a + b) * (c + d)) * Math.Sqrt((a + c) * (b + d));
        if (root == 0)
        {
            return 1;
        }

        double numerator = (a * d) - (b * c);
        if (numerator <= 0)
        {
            return Math.Min(2, 1 - (numerator / root));
        }

        if (correct && numerator <= n / 2)
        {
            return 1;
        }

        double triples = (a * b * (c + d)) + (c * d * (a + b));
        double one = n * (triples / root / (root + numerator));
        return Math.Min(1, correct ? one + (n / 2 / root) : one);
    }

    // The root of down^2 - 2 phi down up + up^2.
    private double Reach(Proportion below, Proportion above, double z)
    {
        double down = Distance(below, z, downward: true);
        double up = Distance(above, z, downward: false);
        double gap = down - up;
        return Math.Sqrt((gap * gap) + (2 * oneLessPhi * down * up));
    }

    private static double Distance(Proportion proportion, double z, bool downward)
    {
        if (z == 0)
        {
            return 0;
        }

        double n = proportion.Trials;
        double q = proportion.Failures / n;
        double spread = Math.Sqrt((proportion.Successes * q) + (z * z / 4));
        double skew = z * Math.Abs(proportion.Failures - proportion.Successes) / n / 2;
        return downward == (proportion.Successes > proportion.Failures)
            ? z * (spread + skew) / (n + (z * z))
            : z * proportion.Value * q / (spread + skew);
    }
}
