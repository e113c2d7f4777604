using System.Text.Json;
using DiagnosticAccuracy.Tests.Data;

namespace DiagnosticAccuracy.Tests.Published;

/// <summary>
/// Nine ordinal features of breast biopsies, heavy with ties, some missing. Data: Wolberg and Mangasarian, PNAS 1990;87:9193
/// (grade S). Results: markers-expected.json (grade R).
/// </summary>
public class BreastBiopsyTests
{
    private static readonly JsonElement Expected = ReferenceData.Json("markers-expected.json").GetProperty("breast-biopsy.csv");

    [Theory]
    [InlineData("V1")]
    [InlineData("V2")]
    [InlineData("V3")]
    [InlineData("V4")]
    [InlineData("V5")]
    [InlineData("V6")]
    [InlineData("V7")]
    [InlineData("V8")]
    [InlineData("V9")]
    public void Every_feature_has_its_rank_sum_pairs_and_ties(string feature)
    {
        AreaUnderCurve area = RocCurve.Empirical(MarkerData.BiopsyFeature(feature)).Area;
        JsonElement expected = Expected.GetProperty("r").GetProperty("single").GetProperty(feature);
        Assert.Equal(expected.GetProperty("n1").GetInt64(), area.WithCondition);
        Assert.Equal(expected.GetProperty("n0").GetInt64(), area.WithoutCondition);
        Assert.Equal(expected.GetProperty("W").GetDouble(), (double)area.ConcordantPairs + ((double)area.TiedPairs / 2));
        JsonElement counts = expected.GetProperty("counts");
        Assert.Equal(counts.GetProperty("concordant").GetInt64(), area.ConcordantPairs);
        Assert.Equal(counts.GetProperty("discordant").GetInt64(), area.DiscordantPairs);
        Assert.Equal(counts.GetProperty("tied.x").GetInt64(), area.TiedPairs);

        // The concordance variance of R is DeLong's with (m - 1) / m and (n - 1) / n in place of 1, so it lies below it by a
        // factor between the two.
        double concordance = expected.GetProperty("concordance_var").GetDouble();
        double n1 = area.WithCondition;
        double n0 = area.WithoutCondition;
        Assert.InRange(concordance / area.Variance.Value, (n1 - 1) / n1, (n0 - 1) / n0);
    }

    [Fact]
    public void Two_features_are_compared_on_the_complete_pairs()
    {
        PairedScores paired = MarkerData.Biopsy();
        Assert.Equal(16, paired.IncompleteSubjects);
        AreaComparison comparison = RocComparison.Paired(paired);
        JsonElement python = Expected.GetProperty("python");
        JsonElement covariance = python.GetProperty("delong").GetProperty("cov");
        Close(python.GetProperty("V1").GetProperty("auc").GetDouble(), comparison.First.Value);
        Close(python.GetProperty("V6").GetProperty("auc").GetDouble(), comparison.Second.Value);
        Close(covariance[0][0].GetDouble(), comparison.First.Variance.Value);
        Close(covariance[0][1].GetDouble(), comparison.Covariance.Value);
        Close(covariance[1][1].GetDouble(), comparison.Second.Variance.Value);
        Close(python.GetProperty("diff").GetDouble(), comparison.Difference.Value);
        Close(python.GetProperty("se_diff").GetDouble(), comparison.Difference.StandardError.Value);
        Close(python.GetProperty("z").GetDouble(), comparison.Z.Value);
        Close(python.GetProperty("p").GetDouble(), comparison.PValue.Value);
    }

    // Closed forms: 1e-12 relative, times ten for the reference's own rounding in differences of areas.
    private static void Close(double expected, double actual) => Assert.Equal(expected, actual, Math.Abs(expected) * 1e-11);
}
