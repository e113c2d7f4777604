using DiagnosticAccuracy.Tests.Data;

namespace DiagnosticAccuracy.Tests.Published;

/// <summary>Small examples computed by hand for this project, and the ratings of Hanley and McNeil (grade R and S2, see Data/README.md).</summary>
public class HandComputedAreasTests
{
    [Fact]
    public void Four_cases_and_five_controls()
    {
        AreaUnderCurve area = RocCurve.Empirical(
            ScoredSample.FromGroups([3, 5, 6, 8], [1, 2, 4, 5, 7], ScoreDirection.HigherIsPositive)).Area;
        Assert.Equal(.725, area.Value);
        Assert.Equal(.035, area.Variance.Value, 1e-15);
        Assert.Equal(14, area.ConcordantPairs);
        Assert.Equal(1, area.TiedPairs);
        Assert.Equal(20, area.Pairs);
    }

    [Fact]
    public void Eight_cases_and_ten_controls_with_two_tests()
    {
        AreaComparison comparison = RocComparison.Paired(PairedScores.Create(
            [4.1, 5.0, 3.3, 6.2, 5.0, 7.1, 2.9, 4.8, 2.0, 3.3, 1.5, 2.9, 4.0, 2.2, 3.1, 1.9, 2.5, 5.0],
            ScoreDirection.HigherIsPositive,
            [3.0, 5.5, 2.2, 4.1, 4.9, 6.0, 3.1, 2.8, 2.1, 2.8, 1.0, 3.1, 3.5, 2.2, 4.0, 1.7, 2.6, 3.9],
            ScoreDirection.HigherIsPositive,
            [true, true, true, true, true, true, true, true, false, false, false, false, false, false, false, false, false, false]));
        Assert.Equal(.87500, comparison.First.Value);
        Assert.Equal(.76875, comparison.Second.Value);
        Assert.Equal(.0068527, comparison.First.Variance.Value, 5e-8);
        Assert.Equal(.0136917, comparison.Second.Variance.Value, 5e-8);
        Assert.Equal(.0061409, comparison.Covariance.Value, 5e-8);
        Assert.Equal(1.16888, comparison.Z.Value, 5e-6);
        Assert.Equal(.24245, comparison.PValue.Value, 5e-6);
        Assert.Equal(ComparisonDesign.Paired, comparison.Design);
    }

    /// <summary>
    /// CT ratings of Hanley and McNeil, Radiology 1982;143:29: W = .893 is the paper's (S2); the DeLong error is recomputed (R).
    /// </summary>
    [Fact]
    public void Ratings_of_Hanley_and_McNeil()
    {
        System.Text.Json.JsonElement ratings = ReferenceData.Json("rating-data.json").GetProperty("ct_hanley_mcneil_1982");
        long[] without = [.. ratings.GetProperty("normal").EnumerateArray().Select(e => e.GetInt64())];
        long[] with = [.. ratings.GetProperty("abnormal").EnumerateArray().Select(e => e.GetInt64())];
        ScoredSample sample = ScoredSample.FromCounts([1, 2, 3, 4, 5], with, without, ScoreDirection.HigherIsPositive);
        AreaUnderCurve area = RocCurve.Empirical(sample).Area;
        Assert.Equal(.893, area.Value, 5e-4);
        Assert.Equal(ratings.GetProperty("auc").GetDouble(), area.Value, 1e-15);
        Assert.Equal(ratings.GetProperty("se_delong").GetDouble(), area.StandardError.Value, 1e-14);

        // The group sizes of the file; its other errors are in AreaVarianceTests.
        double n1 = with.Sum();
        double n0 = without.Sum();
        Assert.Equal(n1, ratings.GetProperty("M").GetDouble());
        Assert.Equal(n0, ratings.GetProperty("N").GetDouble());
    }
}
