using DiagnosticAccuracy.Numerics;

namespace DiagnosticAccuracy.Tables;

/// <summary>Cochran's Q: whether k tests are positive in the same share of the same subjects.</summary>
/// <remarks>
/// Q = (k - 1) (k sum C^2 - N^2) / (k N - sum R^2), C the positives of each test, R those of each subject, N all. By pairs of tests the numerator is the
/// sum of (b - c)^2 and the denominator that of b + c, which leaves nothing to cancel. Cochran, Biometrika 1950;37:256.
/// </remarks>
internal static class CochranQ
{
    public const string Name = "Cochran's Q";

    private static readonly UndefinedReason NoDiscordant =
        new(UndefinedCause.ZeroOverZero, "all tests agree on every subject, so the statistic is zero over zero");

    public static PairedTest Test(IEnumerable<PairedTable> pairs, int tests)
    {
        double squares = 0;
        double discordant = 0;
        long subjects = 0;
        foreach (PairedTable pair in pairs)
        {
            double difference = pair.FirstOnly - pair.SecondOnly;
            squares += difference * difference;
            discordant += pair.Discordant;
            subjects = pair.Total;
        }

        if (subjects == 0)
        {
            return PairedTest.Undefined(UndefinedReason.NoSubjects, Name);
        }

        if (discordant == 0)
        {
            return new PairedTest(Quantity.Undefined(NoDiscordant), Quantity.Of(1), Name, tests - 1);
        }

        double q = (tests - 1) * squares / discordant;
        return new PairedTest(Quantity.Of(q), Quantity.Of(Math.Min(1, ChiSquared.Upper(q, tests - 1))), Name, tests - 1);
    }
}
