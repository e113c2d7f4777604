using DiagnosticAccuracy.Proportions;

namespace DiagnosticAccuracy.Tables;

/// <summary>
/// The difference of two proportions of the same subjects plus and minus a multiple of its estimated standard error, from the counts as they
/// are or with something added to them.
/// </summary>
/// <remarks>
/// Wald: (b - c)/n, variance (b + c - (b - c)^2/n)/n^2. One half to each of the four cells: Agresti and Min, Stat Med 2005;24:729. One to each
/// discordant cell: Bonett and Price, J Educ Behav Stat 2012;37:479.
/// </remarks>
internal readonly struct PairedWald(double centre, double standardError) : INormalLimits
{
    public const string Name = "Wald";
    public const string BonettPriceName = "adjusted Wald (Bonett-Price)";
    public const string AgrestiMinName = "adjusted Wald (Agresti-Min)";

    public static ConfidenceInterval Interval(PairedDifference difference, Confidence confidence) =>
        Of(difference, confidence, 0, 0, Name);

    public static ConfidenceInterval BonettPrice(PairedDifference difference, Confidence confidence) =>
        Of(difference, confidence, 1, 0, BonettPriceName);

    public static ConfidenceInterval AgrestiMin(PairedDifference difference, Confidence confidence) =>
        Of(difference, confidence, 0.5, 0.5, AgrestiMinName);

    public double Lower(double z) => centre - (z * standardError);

    public double Upper(double z) => centre + (z * standardError);

    private static ConfidenceInterval Of(
        PairedDifference difference, Confidence confidence, double toDiscordant, double toConcordant, string name)
    {
        if (!difference.IsDefined)
        {
            return ConfidenceInterval.Undefined(difference.WhyUndefined!, confidence, name);
        }

        PairedTable table = difference.Table;
        double b = table.FirstOnly + toDiscordant;
        double c = table.SecondOnly + toDiscordant;
        double concordant = table.BothPositive + table.BothNegative + (2 * toConcordant);
        double n = b + c + concordant;
        double centre = (table.FirstOnly - table.SecondOnly) / n;

        // b + c - (b - c)^2/n = (4 b c + (b + c) (n - b - c)) / n, without a difference of what is nearly equal.
        double variance = ((4 * b * c / n) + ((b + c) / n * concordant)) / n / n;
        return NormalInterval.Of(new PairedWald(centre, Math.Sqrt(variance)), confidence, -1, 1, name);
    }
}
