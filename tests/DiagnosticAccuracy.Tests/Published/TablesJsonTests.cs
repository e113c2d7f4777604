using System.Text.Json;
using DiagnosticAccuracy.Tests.Data;

namespace DiagnosticAccuracy.Tests.Published;

/// <summary>
/// Two tables of the literature: the exercise test of Weiner et al., NEJM 1979;301:230 (measures recomputed, grade R), and the liver scan of
/// Altman and Bland, BMJ 1994;308:1552 and 309:102, whose printed .90, .63, .88, .67 are from memory (grade M).
/// </summary>
public class TablesJsonTests
{
    private static readonly JsonElement Tables = ReferenceData.Json("tables.json");

    [Theory]
    [InlineData("weiner1979_EST")]
    [InlineData("altman_bland_1994_liver_scan")]
    public void Measures_agree_with_the_independent_computation(string name)
    {
        JsonElement expected = Tables.GetProperty(name);
        ConfusionMatrix table = Table(expected);
        Close(expected, "sens", table.Sensitivity.Value);
        Close(expected, "spec", table.Specificity.Value);
        Close(expected, "ppv", table.CohortPredictiveValues.Positive.Value);
        Close(expected, "npv", table.CohortPredictiveValues.Negative.Value);
        Close(expected, "prev", table.SamplePrevalence.Value);
        Close(expected, "acc", table.Accuracy.Value);
        Close(expected, "youden", table.YoudenIndex.Value);
        CheckRatio(expected.GetProperty("lr_pos"), table.PositiveLikelihoodRatio);
        CheckRatio(expected.GetProperty("lr_neg"), table.NegativeLikelihoodRatio);
        CheckRatio(expected.GetProperty("dor"), table.DiagnosticOddsRatio);
    }

    [Fact]
    public void The_liver_scan_has_its_printed_measures()
    {
        ConfusionMatrix table = Table(Tables.GetProperty("altman_bland_1994_liver_scan"));
        Assert.Equal(.90, table.Sensitivity.Value, 5e-3);
        Assert.Equal(.63, table.Specificity.Value, 5e-3);
        Assert.Equal(.88, table.CohortPredictiveValues.Positive.Value, 5e-3);
        Assert.Equal(.67, table.CohortPredictiveValues.Negative.Value, 5e-3);
    }

    [Fact]
    public void The_liver_scan_at_a_prevalence_of_25_percent()
    {
        JsonElement expected = Tables.GetProperty("altman_bland_prev25");
        PredictiveValues values = Table(Tables.GetProperty("altman_bland_1994_liver_scan")).PredictiveValuesAt(new Prevalence(0.25));
        Close(expected, "ppv", values.Positive.Value);
        Close(expected, "npv", values.Negative.Value);
    }

    private static ConfusionMatrix Table(JsonElement element)
    {
        JsonElement counts = element.GetProperty("counts");
        return new ConfusionMatrix(
            counts.GetProperty("tp").GetInt64(), counts.GetProperty("fp").GetInt64(), counts.GetProperty("fn").GetInt64(), counts.GetProperty("tn").GetInt64());
    }

    // Value, lower, upper.
    private static void CheckRatio(JsonElement expected, IIntervalQuantity actual)
    {
        ConfidenceInterval interval = actual.Interval();
        Assert.Equal(expected[0].GetDouble(), actual.Value, 1e-10);
        Assert.Equal(expected[1].GetDouble(), interval.Lower, 1e-10);
        Assert.Equal(expected[2].GetDouble(), interval.Upper, 1e-10);
    }

    private static void Close(JsonElement expected, string name, double actual) =>
        Assert.Equal(expected.GetProperty(name).GetDouble(), actual, 1e-12);
}
