using DiagnosticAccuracy.Numerics;
using DiagnosticAccuracy.Proportions;

namespace DiagnosticAccuracy.Tables;

/// <summary>All ratios of two proportions of the same subjects that the score test does not reject.</summary>
/// <remarks>Nam and Blackwelder, Stat Med 2002;21:689; Tang, Tang and Chan, Stat Med 2003;22:1217.</remarks>
internal readonly struct NamBlackwelder(PairedTable table) : INormalLimits
{
    public const string Name = "score (Nam-Blackwelder)";

    public static ConfidenceInterval Interval(PairedRatio ratio, Confidence confidence, string name) => ratio.IsDefined
        ? NormalInterval.Of(new NamBlackwelder(ratio.Table), confidence, 0, double.PositiveInfinity, name)
        : ConfidenceInterval.Undefined(ratio.WhyUndefined!, confidence, name);

    public double Lower(double z)
    {
        double estimate = (double)table.FirstPositives / table.SecondPositives;
        if (z == 0 || table.FirstPositives == 0)
        {
            return estimate;
        }

        // Without a positive result of the second test the statistic is sqrt(b / r).
        return table.SecondPositives == 0 ? table.FirstOnly / (z * z) : Math.Min(estimate, Math.Exp(Solve(z)));
    }

    public double Upper(double z)
    {
        double estimate = (double)table.FirstPositives / table.SecondPositives;
        if (z == 0 || table.SecondPositives == 0)
        {
            return estimate;
        }

        return table.FirstPositives == 0 ? z * z / table.SecondOnly : Math.Max(estimate, Math.Exp(Solve(-z)));
    }

    // The statistic falls from infinity to minus infinity as the logarithm of the ratio rises.
    private double Solve(double z)
    {
        double x1 = table.FirstPositives;
        double x2 = table.SecondPositives;
        double spread = Math.Sqrt((table.Discordant + 0.5) / x1 / x2);
        double start = ElementaryFunctions.Log1P((table.FirstOnly - table.SecondOnly) / x2);
        return FallingRoot.Find(new PairedScoreOfLogarithm(new PairedRatioScore(table), z), start, Math.Max(0.5, Math.Abs(z)) * spread);
    }

    private readonly struct PairedScoreOfLogarithm(PairedRatioScore score, double target) : IFunction
    {
        public double Value(double x) => score.StatisticAtLog(x) - target;
    }
}
