using DiagnosticAccuracy.Proportions;

namespace DiagnosticAccuracy.Tables;

/// <summary>The interval of a ratio of two proportions of the same subjects that is normal on the logarithm.</summary>
/// <remarks>The variance by the delta method is (b + c) / (x1 x2), x1 and x2 the positives of each test; Fagerland, Lydersen and Laake, Stat Med 2014;33:2850.</remarks>
internal readonly struct PairedLogRatio(double value, double standardError) : INormalLimits
{
    public const string Name = "Wald on the logarithm";
    public const string EmptyName = NamBlackwelder.Name + ", since the logarithm has no limit with a proportion of zero";
    public const string AgreeName = NamBlackwelder.Name + ", since the logarithm has no width when the tests agree on every subject";

    public static ConfidenceInterval Interval(PairedRatio ratio, Confidence confidence)
    {
        if (!ratio.IsDefined)
        {
            return ConfidenceInterval.Undefined(ratio.WhyUndefined!, confidence, Name);
        }

        PairedTable table = ratio.Table;
        double x1 = table.FirstPositives;
        double x2 = table.SecondPositives;
        if (x1 == 0 || x2 == 0)
        {
            return NamBlackwelder.Interval(ratio, confidence, EmptyName);
        }

        return table.Discordant == 0
            ? NamBlackwelder.Interval(ratio, confidence, AgreeName)
            : NormalInterval.Of(new PairedLogRatio(ratio.Value, Math.Sqrt(table.Discordant / x1 / x2)), confidence, 0, double.PositiveInfinity, Name);
    }

    public double Lower(double z) => value * Math.Exp(-z * standardError);

    public double Upper(double z) => value * Math.Exp(z * standardError);
}
