using System.Globalization;
using System.Text.Json;
using System.Text.RegularExpressions;
using DiagnosticAccuracy.Tests.Data;

namespace DiagnosticAccuracy.Tests.Published;

/// <summary>
/// McNemar's test in agreement.json: Agresti's approval ratings 794, 150, 86, 570 (z^2 = 17.36, grade M); the tables of Fagerland, Lydersen and Laake (BMC Med
/// Res Methodol 2013;13:91) and others recomputed (grade R).
/// </summary>
public partial class McNemarPublishedTests
{
    [Fact]
    public void Every_table_agrees()
    {
        int tables = 0;
        foreach (JsonProperty property in ReferenceData.Json("agreement.json").GetProperty("mcnemar").EnumerateObject())
        {
            long[] cells = [.. Cells().Match(property.Name).Groups[1].Value.Split(',').Select(c => long.Parse(c, CultureInfo.InvariantCulture))];
            PairedTable table = new(cells[0], cells[1], cells[2], cells[3]);
            Assert.Equal(property.Value.GetProperty("chi2").GetDouble(), table.McNemar().Statistic.Value, 1e-10);
            AssertRelative(property.Value.GetProperty("p"), table.McNemar());
            Assert.Equal(property.Value.GetProperty("chi2_cc").GetDouble(), table.McNemar(McNemarMethod.ContinuityCorrected).Statistic.Value, 1e-10);
            AssertRelative(property.Value.GetProperty("p_cc"), table.McNemar(McNemarMethod.ContinuityCorrected));
            AssertRelative(property.Value.GetProperty("p_exact"), table.McNemar(McNemarMethod.ExactConditional));
            AssertRelative(property.Value.GetProperty("p_mid"), table.McNemar(McNemarMethod.MidP));
            tables++;
        }

        Assert.Equal(5, tables);
    }

    [Fact]
    public void The_approval_ratings_have_the_printed_statistic() =>
        Assert.Equal(17.36, new PairedTable(794, 150, 86, 570).McNemar().Statistic.Value, 0.005);

    private static void AssertRelative(JsonElement expected, PairedTest test) =>
        Assert.Equal(1, test.PValue.Value / expected.GetDouble(), 1e-10);

    [GeneratedRegex(@"\(([\d,]+)\)")]
    private static partial Regex Cells();
}
