using System.Text.Json;
using DiagnosticAccuracy.Tests.Data;

namespace DiagnosticAccuracy.Tests.Published;

/// <summary>
/// CA 19-9 and CA 125 in 90 cases and 51 controls. Data: Wieand, Gail, James and James, Biometrika 1989;76:585 (grade S).
/// Results: markers-expected.json, recomputed with general-purpose routines (grade R): rank sums and concordance by R, the DeLong
/// covariance and the curve's points by an independent Python program.
/// </summary>
public class PancreaticMarkersTests
{
    private static readonly JsonElement Expected = ReferenceData.Json("markers-expected.json").GetProperty("pancreatic-markers.csv");
    private readonly AreaComparison _comparison = RocComparison.Paired(MarkerData.Pancreatic());

    [Fact]
    public void Areas_are_the_Mann_Whitney_counts_over_all_pairs()
    {
        JsonElement single = Expected.GetProperty("r").GetProperty("single");
        foreach ((string marker, AreaUnderCurve area) in new[] { ("ca199", _comparison.First), ("ca125", _comparison.Second) })
        {
            JsonElement expected = single.GetProperty(marker);
            Assert.Equal(expected.GetProperty("n1").GetInt64(), area.WithCondition);
            Assert.Equal(expected.GetProperty("n0").GetInt64(), area.WithoutCondition);
            double w = expected.GetProperty("W").GetDouble();
            Assert.Equal(w, (double)area.ConcordantPairs + ((double)area.TiedPairs / 2));
            Assert.Equal(w / (90 * 51), area.Value);
            JsonElement counts = expected.GetProperty("counts");
            Assert.Equal(counts.GetProperty("concordant").GetInt64(), area.ConcordantPairs);
            Assert.Equal(counts.GetProperty("discordant").GetInt64(), area.DiscordantPairs);
        }
    }

    [Fact]
    public void Covariance_of_the_areas_is_DeLongs()
    {
        JsonElement covariance = Expected.GetProperty("python").GetProperty("delong").GetProperty("cov");
        Close(covariance[0][0].GetDouble(), _comparison.First.Variance.Value);
        Close(covariance[1][1].GetDouble(), _comparison.Second.Variance.Value);
        Close(covariance[0][1].GetDouble(), _comparison.Covariance.Value);
    }

    [Fact]
    public void Concordance_variance_is_DeLongs_with_group_sizes_less_one()
    {
        // An independent check of the two parts: the concordance variance of R's survival package has (m - 1) / m and
        // (n - 1) / n in place of 1.
        JsonElement python = Expected.GetProperty("python").GetProperty("delong");
        double s10 = python.GetProperty("S10")[0][0].GetDouble();
        double s01 = python.GetProperty("S01")[0][0].GetDouble();
        double concordance = Expected.GetProperty("r").GetProperty("single").GetProperty("ca199").GetProperty("concordance_var").GetDouble();
        Close(concordance, (s10 / 90 * 89 / 90) + (s01 / 51 * 50 / 51));
        Close((s10 / 90) + (s01 / 51), _comparison.First.Variance.Value);
    }

    [Fact]
    public void The_comparison_has_its_z_and_p()
    {
        JsonElement python = Expected.GetProperty("python");
        Close(python.GetProperty("diff").GetDouble(), _comparison.Difference.Value);
        Close(python.GetProperty("se_diff").GetDouble(), _comparison.Difference.StandardError.Value);
        Close(python.GetProperty("z").GetDouble(), _comparison.Z.Value);
        Assert.Equal(python.GetProperty("p").GetDouble(), _comparison.PValue.Value, 1e-12);
        double expectedCorrelation = -7.541314258112896e-05 / (0.030588836284077874 * 0.04682859030613735);
        Close(expectedCorrelation, _comparison.Correlation.Value);
    }

    [Theory]
    [InlineData("ca199")]
    [InlineData("ca125")]
    public void The_curve_goes_through_every_corner_of_the_reference_curve(string marker)
    {
        // The reference leaves out points on a straight line; ours keeps them, so each of its points must be found by its cutoff.
        RocCurve curve = RocCurve.Empirical(marker == "ca199" ? MarkerData.Pancreatic().First : MarkerData.Pancreatic().Second);
        JsonElement points = Expected.GetProperty("python").GetProperty(marker).GetProperty("roc_points");
        int count = points.GetProperty("thr").GetArrayLength();
        Assert.Equal(curve.Points.Count, count);
        for (int i = 0; i < count; i++)
        {
            JsonElement threshold = points.GetProperty("thr")[i];
            OperatingPoint point = curve.Points[i];
            Assert.Equal(threshold.ValueKind == JsonValueKind.String ? null : threshold.GetDouble(), point.Cutoff.Score);
            Assert.Equal(points.GetProperty("tpr")[i].GetDouble(), point.Sensitivity.Value, 1e-15);
            Assert.Equal(points.GetProperty("fpr")[i].GetDouble(), 1 - point.Specificity.Value, 1e-15);
        }
    }

    [Theory]
    [InlineData("ca199")]
    [InlineData("ca125")]
    public void The_largest_Youden_index_is_where_the_reference_finds_it(string marker)
    {
        RocCurve curve = RocCurve.Empirical(marker == "ca199" ? MarkerData.Pancreatic().First : MarkerData.Pancreatic().Second);
        JsonElement youden = Expected.GetProperty("python").GetProperty(marker).GetProperty("youden");
        CutoffChoice choice = CutoffRule.LargestYoudenIndex.Choose(curve);
        Assert.Equal(FigureBasis.ChosenOnTheSameData, choice.Basis);
        Assert.Equal(youden.GetProperty("thresholds").EnumerateArray().Select(e => (double?)e.GetDouble()), choice.Optima.Select(o => o.Cutoff.Score));
        OperatingPoint best = choice.Optima[0];
        Assert.Equal(youden.GetProperty("J").GetDouble(), best.Sensitivity.Value + best.Specificity.Value - 1, 1e-14);
        Assert.Equal(youden.GetProperty("sens")[0].GetDouble(), best.Sensitivity.Value, 1e-15);
        Assert.Equal(youden.GetProperty("spec")[0].GetDouble(), best.Specificity.Value, 1e-15);
    }

    // Closed forms: 1e-12 relative.
    private static void Close(double expected, double actual) => Assert.Equal(expected, actual, Math.Abs(expected) * 1e-12);
}
