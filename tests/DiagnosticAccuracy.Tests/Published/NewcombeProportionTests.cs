using System.Globalization;
using DiagnosticAccuracy.Tests.Data;

namespace DiagnosticAccuracy.Tests.Published;

/// <summary>
/// Newcombe, Two-sided confidence intervals for the single proportion, Stat Med 1998;17:857, Table I. Grades S2 and M (from memory and
/// confirmed by recomputation); the further digits and rows are grade R, recomputed with general-purpose routines.
/// </summary>
public class NewcombeProportionTests
{
    private static readonly Dictionary<string, ProportionMethod> Methods = new()
    {
        ["wilson"] = ProportionMethod.Wilson,
        ["wilson_cc"] = ProportionMethod.WilsonContinuity,
        ["clopper_pearson"] = ProportionMethod.ClopperPearson,
        ["mid_p"] = ProportionMethod.MidP,
        ["likelihood_ratio"] = ProportionMethod.LikelihoodRatio,
        ["agresti_coull"] = ProportionMethod.AgrestiCoull,
        ["jeffreys_equal_tailed"] = ProportionMethod.Jeffreys,
        ["wald"] = ProportionMethod.Wald,
        ["wald_cc"] = ProportionMethod.WaldContinuity,
    };

    [Fact]
    public void Every_printed_limit_agrees_to_its_digits()
    {
        int compared = 0;
        foreach (IReadOnlyDictionary<string, string> row in ReferenceData.Csv("proportions.csv").Where(r => r["published_lower"].Length > 0))
        {
            ConfidenceInterval interval = Interval(row);
            Assert.Equal(row.Number("published_lower"), interval.Lower, 0.5001e-4);
            Assert.Equal(row.Number("published_upper"), interval.Upper, 0.5001e-4);
            compared++;
        }

        Assert.Equal(28, compared);
    }

    [Fact]
    public void Every_recomputed_limit_agrees_to_ten_digits()
    {
        IReadOnlyList<IReadOnlyDictionary<string, string>> rows = ReferenceData.Csv("proportions.csv");
        Assert.Equal(126, rows.Count);
        Assert.Equal(Enum.GetValues<ProportionMethod>().Length, rows.Select(r => r["method"]).Distinct().Count());
        foreach (IReadOnlyDictionary<string, string> row in rows)
        {
            // The file holds Wald and Agresti-Coull limits outside of 0 to 1; the library cuts them there.
            ConfidenceInterval interval = Interval(row);
            Assert.Equal(Math.Clamp(row.Number("lower"), 0, 1), interval.Lower, 1e-10);
            Assert.Equal(Math.Clamp(row.Number("upper"), 0, 1), interval.Upper, 1e-10);
        }
    }

    private static ConfidenceInterval Interval(IReadOnlyDictionary<string, string> row) =>
        new Proportion(long.Parse(row["x"], CultureInfo.InvariantCulture), long.Parse(row["n"], CultureInfo.InvariantCulture))
            .Interval(Confidence.TwoSided(row.Number("level")), Methods[row["method"]]);
}
