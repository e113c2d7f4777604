using System.Globalization;
using DiagnosticAccuracy.Tests.Data;

namespace DiagnosticAccuracy.Tests.Published;

/// <summary>
/// Newcombe, Improved confidence intervals for the difference between binomial proportions based on paired data, Stat Med 1998;17:2635, Table III
/// (grade S2), and Tango, Stat Med 1998;17:891 (grade S2). The further digits and rows are grade R.
/// </summary>
public class PairedDifferencePublishedTests
{
    private static readonly Dictionary<string, PairedDifferenceMethod> Newcombe = new()
    {
        ["8 (no phi correction)"] = PairedDifferenceMethod.NewcombeHybrid,
        ["10 (phi correction)"] = PairedDifferenceMethod.NewcombeHybridPhiCorrected,
    };

    private static readonly Dictionary<string, PairedDifferenceMethod> Columns = new()
    {
        ["newcombe_method8"] = PairedDifferenceMethod.NewcombeHybrid,
        ["newcombe_method10"] = PairedDifferenceMethod.NewcombeHybridPhiCorrected,
        ["tango"] = PairedDifferenceMethod.TangoScore,
        ["wald"] = PairedDifferenceMethod.Wald,
        ["agresti_min"] = PairedDifferenceMethod.AgrestiMin,
    };

    [Fact]
    public void Every_limit_printed_by_Newcombe_agrees_to_its_digits_but_one()
    {
        List<string> apart = [];
        IReadOnlyList<IReadOnlyDictionary<string, string>> rows = ReferenceData.Csv("differences-paired-newcombe.csv");
        Assert.Equal(72, rows.Count);
        foreach (IReadOnlyDictionary<string, string> row in rows)
        {
            ConfidenceInterval interval = Table(row, "e", "f", "g", "h").Difference.Interval(default, Newcombe[row["method"]]);
            double limit = row["side"] == "lower" ? interval.Lower : interval.Upper;
            Assert.Equal(row.Number("recomputed"), limit, 1e-10);
            if (Math.Abs(row.Number("published") - limit) > 0.5001e-4)
            {
                apart.Add(row["e"] + " " + row["f"] + " " + row["g"] + " " + row["h"] + " " + row["method"] + " " + row["side"]);
            }
        }

        // The print has .8736 for the lower limit of (1, 97, 1, 1) by method 10, where .87367 is computed. Here eh - fg = 1 - 97 is negative, so that the
        // phi correction leaves phi alone and methods 8 and 10 are the same formula; the same table prints .8737 for method 8. A misprint.
        Assert.Equal("1 97 1 1 10 (phi correction) lower", Assert.Single(apart));
        PairedDifference difference = new PairedTable(1, 97, 1, 1).Difference;
        Assert.Equal(
            difference.Interval(default, PairedDifferenceMethod.NewcombeHybrid).Lower,
            difference.Interval(default, PairedDifferenceMethod.NewcombeHybridPhiCorrected).Lower);
    }

    /// <summary>Two intervals attributed to Tango (1998): (43, 0, 1, 0) at 90 % and (4, 9, 3, 16) at 95 %.</summary>
    [Fact]
    public void The_intervals_printed_by_Tango_agree()
    {
        ConfidenceInterval first = new PairedTable(43, 0, 1, 0).Difference.Interval(Confidence.TwoSided(0.9));
        Assert.Equal(-0.096, first.Lower, 0.5e-3);
        Assert.Equal(0.037, first.Upper, 0.5e-3);
        ConfidenceInterval second = new PairedTable(4, 9, 3, 16).Difference.Interval();
        Assert.Equal(-0.027, second.Lower, 0.5e-3);
        Assert.Equal(0.390, second.Upper, 0.5e-3);
    }

    [Fact]
    public void Every_recomputed_limit_and_McNemar_form_agrees()
    {
        IReadOnlyList<IReadOnlyDictionary<string, string>> rows = ReferenceData.Csv("differences-paired.csv");
        Assert.Equal(28, rows.Count);
        foreach (IReadOnlyDictionary<string, string> row in rows)
        {
            PairedTable table = Table(row, "e_pp", "f_pm", "g_mp", "h_mm");
            foreach ((string column, PairedDifferenceMethod method) in Columns)
            {
                ConfidenceInterval interval = table.Difference.Interval(default, method);

                // The file holds limits of the Wald kind outside of -1 to 1; the library cuts them there.
                AssertClose(Math.Clamp(row.Number(column + "_lo"), -1, 1), interval.Lower, $"{table} {interval}");
                AssertClose(Math.Clamp(row.Number(column + "_hi"), -1, 1), interval.Upper, $"{table} {interval}");
            }

            AssertStatistic(row["mcnemar_chi2"], table.McNemar());
            AssertStatistic(row["mcnemar_chi2_cc"], table.McNemar(McNemarMethod.ContinuityCorrected));
            Assert.Equal(1, table.McNemar(McNemarMethod.ExactConditional).PValue.Value / row.Number("mcnemar_exact_p"), 1e-10);
            Assert.Equal(1, table.McNemar(McNemarMethod.MidP).PValue.Value / row.Number("mcnemar_midp"), 1e-10);
        }
    }

    private static void AssertStatistic(string expected, PairedTest test)
    {
        if (expected == "nan")
        {
            Assert.Equal(UndefinedCause.ZeroOverZero, test.Statistic.WhyUndefined?.Cause);
            Assert.Equal(1, test.PValue.Value);
            return;
        }

        Assert.Equal(double.Parse(expected, CultureInfo.InvariantCulture), test.Statistic.Value, 1e-10);
    }

    private static void AssertClose(double expected, double actual, string what) =>
        Assert.True(Math.Abs(expected - actual) <= 1e-10, $"{what}: expected {expected:R}");

    private static PairedTable Table(IReadOnlyDictionary<string, string> row, params string[] columns)
    {
        long[] cells = [.. columns.Select(c => long.Parse(row[c], CultureInfo.InvariantCulture))];
        return new PairedTable(cells[0], cells[1], cells[2], cells[3]);
    }
}
