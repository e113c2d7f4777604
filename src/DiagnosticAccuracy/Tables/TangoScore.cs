using DiagnosticAccuracy.Numerics;
using DiagnosticAccuracy.Proportions;

namespace DiagnosticAccuracy.Tables;

/// <summary>All differences of two proportions of the same subjects that the score test does not reject.</summary>
/// <remarks>Tango, Stat Med 1998;17:891.</remarks>
internal readonly struct TangoScore(PairedTable table) : INormalLimits
{
    public const string Name = "score (Tango)";

    public static ConfidenceInterval Interval(PairedDifference difference, Confidence confidence) => difference.IsDefined
        ? NormalInterval.Of(new TangoScore(difference.Table), confidence, -1, 1, Name)
        : ConfidenceInterval.Undefined(difference.WhyUndefined!, confidence, Name);

    // The lower limit is the upper one with the tests swapped.
    public double Lower(double z) => -Limit(table.Swapped, z);

    public double Upper(double z) => Limit(table, z);

    // The statistic falls from 0 at the estimate to minus infinity at 1.
    private static double Limit(PairedTable table, double z)
    {
        PairedDifferenceScore score = new(table);
        double low = score.Estimate;
        if (low >= 1 || z == 0)
        {
            return low;
        }

        TangoDistance f = new(score, z);
        double n = table.Total;
        double step = Math.Max(z, 0.1) * (Math.Sqrt(table.Discordant) + 1) / n;
        double high = low;
        do
        {
            low = high;
            high = Math.Min(1, low + step);
            step *= 2;
        }
        while (high < 1 && f.Value(high) > 0);

        return RootFinding.Find(f, low, high, RootFinding.DefaultRelativeAccuracy, 1e-28);
    }

    private readonly struct TangoDistance(PairedDifferenceScore score, double z) : IFunction
    {
        public double Value(double x) => x >= 1 ? double.NegativeInfinity : score.Statistic(x) + z;
    }
}
