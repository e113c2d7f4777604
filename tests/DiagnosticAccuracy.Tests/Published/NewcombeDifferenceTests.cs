using System.Globalization;
using DiagnosticAccuracy.Tests.Data;

namespace DiagnosticAccuracy.Tests.Published;

/// <summary>
/// Newcombe, Interval estimation for the difference between independent proportions, Stat Med 1998;17:873, Table II. Grades S2 (methods 5, 6,
/// 10) and M (1, 2, 3, 4, 11: from memory and confirmed by recomputation); the further digits and rows are grade R.
/// </summary>
public class NewcombeDifferenceTests
{
    private static readonly Dictionary<string, DifferenceMethod> Methods = new()
    {
        ["wald(1)"] = DifferenceMethod.Wald,
        ["wald_cc(2)"] = DifferenceMethod.WaldContinuity,
        ["haldane(3)"] = DifferenceMethod.Haldane,
        ["jeffreys_perks(4)"] = DifferenceMethod.JeffreysPerks,
        ["mee(5)"] = DifferenceMethod.Mee,
        ["miettinen_nurminen(6)"] = DifferenceMethod.MiettinenNurminen,
        ["newcombe_wilson(10)"] = DifferenceMethod.HybridScore,
        ["newcombe_wilson_cc(11)"] = DifferenceMethod.HybridScoreContinuity,
        ["agresti_caffo"] = DifferenceMethod.AgrestiCaffo,
    };

    [Fact]
    public void Every_printed_limit_agrees_to_its_digits()
    {
        int compared = 0;
        foreach (IReadOnlyDictionary<string, string> row in ReferenceData.Csv("differences-independent.csv").Where(r => r["published_lower"].Length > 0))
        {
            ConfidenceInterval interval = Interval(row);
            Assert.Equal(row.Number("published_lower"), interval.Lower, 0.5001e-4);
            Assert.Equal(row.Number("published_upper"), interval.Upper, 0.5001e-4);
            compared++;
        }

        Assert.Equal(39, compared);
    }

    [Fact]
    public void Every_recomputed_limit_agrees_as_far_as_it_is_good()
    {
        IReadOnlyList<IReadOnlyDictionary<string, string>> rows = ReferenceData.Csv("differences-independent.csv");
        Assert.Equal(72, rows.Count);
        foreach (IReadOnlyDictionary<string, string> row in rows)
        {
            // The file holds limits of the Wald kind outside of -1 to 1; the library cuts them there. Its own score limits are good to 8.4e-10
            // only: 9/10 - 3/10 has .17002501671 for the Miettinen-Nurminen limit that is .170025016424398 on 110 digits. The same pairs
            // at full accuracy are in proportions/fixtures.csv.
            double tolerance = row["method(Newcombe number)"] is "mee(5)" or "miettinen_nurminen(6)" ? 9e-10 : 1e-10;
            ConfidenceInterval interval = Interval(row);
            Assert.Equal(Math.Clamp(row.Number("lower"), -1, 1), interval.Lower, tolerance);
            Assert.Equal(Math.Clamp(row.Number("upper"), -1, 1), interval.Upper, tolerance);
        }
    }

    private static ConfidenceInterval Interval(IReadOnlyDictionary<string, string> row) =>
        new ProportionDifference(Group(row, "1"), Group(row, "2")).Interval(default, Methods[row["method(Newcombe number)"]]);

    private static Proportion Group(IReadOnlyDictionary<string, string> row, string which) =>
        new(long.Parse(row["x" + which], CultureInfo.InvariantCulture), long.Parse(row["n" + which], CultureInfo.InvariantCulture));
}
