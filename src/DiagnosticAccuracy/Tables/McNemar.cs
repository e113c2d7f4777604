using DiagnosticAccuracy.Numerics;

namespace DiagnosticAccuracy.Tables;

/// <summary>McNemar's test in its four forms. Given b + c discordant subjects, b is binomial with one half when there is no difference.</summary>
/// <remarks>
/// McNemar, Psychometrika 1947;12:153; continuity correction: Edwards, Psychometrika 1948;13:185; mid-P: Fagerland, Lydersen and Laake, BMC Med Res
/// Methodol 2013;13:91. The mid-P value at b = c, 1 less half of the probability, is the one that makes its mean one half.
/// </remarks>
internal static class McNemar
{
    public const string AsymptoticName = "McNemar, asymptotic";
    public const string ContinuityName = "McNemar, asymptotic with continuity correction";
    public const string ExactName = "McNemar, exact conditional";
    public const string MidPName = "McNemar, mid-P";

    private static readonly UndefinedReason NoDiscordant =
        new(UndefinedCause.ZeroOverZero, "the tests agree on every subject, so the statistic is zero over zero");

    private static readonly UndefinedReason NoStatistic =
        new(UndefinedCause.NotPartOfMethod, "an exact form has a p-value and no statistic");

    public static PairedTest Asymptotic(PairedTable table) => ChiSquare(table, 0, AsymptoticName);

    public static PairedTest ContinuityCorrected(PairedTable table) => ChiSquare(table, 1, ContinuityName);

    public static PairedTest ExactConditional(PairedTable table)
    {
        if (table.Total == 0)
        {
            return PairedTest.Undefined(UndefinedReason.NoSubjects, ExactName);
        }

        double larger = Math.Max(table.FirstOnly, table.SecondOnly);
        double smaller = Math.Min(table.FirstOnly, table.SecondOnly);
        double p = larger == smaller ? 1 : Math.Min(1, 2 * AtMost(smaller, larger));
        return new PairedTest(Quantity.Undefined(NoStatistic), Quantity.Of(p), ExactName);
    }

    public static PairedTest MidP(PairedTable table)
    {
        if (table.Total == 0)
        {
            return PairedTest.Undefined(UndefinedReason.NoSubjects, MidPName);
        }

        double larger = Math.Max(table.FirstOnly, table.SecondOnly);
        double smaller = Math.Min(table.FirstOnly, table.SecondOnly);
        double p = 1;
        if (larger > 0)
        {
            double observed = BinomialDensity.Of(smaller, smaller + larger, 0.5);
            double fewer = smaller == 0 ? 0 : AtMost(smaller - 1, larger + 1);
            p = larger == smaller ? 1 - (observed / 2) : Math.Min(1, (2 * fewer) + observed);
        }

        return new PairedTest(Quantity.Undefined(NoStatistic), Quantity.Of(p), MidPName);
    }

    // P(X <= successes) for one half, failures being the other trials.
    private static double AtMost(double successes, double failures) => IncompleteBeta.Lower(failures, successes + 1, 0.5);

    private static PairedTest ChiSquare(PairedTable table, double correction, string name)
    {
        if (table.Total == 0)
        {
            return PairedTest.Undefined(UndefinedReason.NoSubjects, name);
        }

        if (table.Discordant == 0)
        {
            return new PairedTest(Quantity.Undefined(NoDiscordant), Quantity.Of(1), name);
        }

        double z = Math.Max(0, Math.Abs((double)(table.FirstOnly - table.SecondOnly)) - correction) / Math.Sqrt(table.Discordant);
        return new PairedTest(Quantity.Of(z * z), Quantity.Of(StandardNormal.TwoSided(z)), name);
    }
}
