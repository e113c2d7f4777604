using System.Text.Json;
using DiagnosticAccuracy.Tests.Data;
using FsCheck.Xunit;

namespace DiagnosticAccuracy.Tests.Roc;

[Properties(Arbitrary = [typeof(SampleArbitrary)], MaxTest = 150)]
public class PairedAreasTests
{
    private const ScoreDirection Higher = ScoreDirection.HigherIsPositive;

    [Fact]
    public void Two_tests_are_the_comparison_of_two()
    {
        PairedScores scores = MarkerData.Pancreatic();
        PairedAreas areas = PairedAreas.Of(scores);
        AreaComparison comparison = RocComparison.Paired(scores);
        ContrastTest equality = areas.TestOfEquality();
        Assert.Equal(1, equality.DegreesOfFreedom);

        // chi2 and p of the independent program (grade R).
        JsonElement python = ReferenceData.Json("markers-expected.json").GetProperty("pancreatic-markers.csv").GetProperty("python");
        Assert.Equal(python.GetProperty("chi2").GetDouble(), equality.Statistic.Value, 1e-9);
        Assert.Equal(python.GetProperty("p").GetDouble(), equality.PValue.Value, 1e-12);
        Assert.Equal(comparison.Covariance, areas.Covariance(0, 1));
        Assert.Equal(comparison.Z, areas.Compare(0, 1).Z);
        Assert.Equal(-comparison.Z.Value, areas.Compare(1, 0).Z.Value);
        PairwiseAreaDifference only = Assert.Single(areas.SimultaneousDifferences());
        Assert.Equal(comparison.Difference.Interval().Lower, only.SimultaneousInterval.Lower, 1e-14);
        PairwiseAreaDifference scheffe = Assert.Single(areas.SimultaneousDifferences(default, SimultaneousMethod.Scheffe));
        Assert.Equal(comparison.Difference.Interval().Upper, scheffe.SimultaneousInterval.Upper, 1e-12);
    }

    [Fact]
    public void Nine_features_have_one_covariance_matrix_that_every_pair_agrees_with()
    {
        IReadOnlyDictionary<string, string>[] rows = [.. ReferenceData.Csv("breast-biopsy.csv").Where(row => !row.Values.Contains("NA"))];
        bool[] status = [.. rows.Select(row => row["class"] == "malignant")];
        TestScores[] tests = [.. Enumerable.Range(1, 9).Select(i => new TestScores($"V{i}", rows.Select(row => row.Number($"V{i}")).ToArray(), Higher))];
        PairedAreas areas = PairedAreas.Of(PairedScores.Create(tests, status));
        Assert.Equal(["V1", "V2", "V3", "V4", "V5", "V6", "V7", "V8", "V9"], areas.Names);
        ContrastTest equality = areas.TestOfEquality();
        Assert.Equal(8, equality.DegreesOfFreedom);

        // The same statistic from other contrasts that span the same space, and with one of them repeated: rank stays 8.
        double[] successive = new double[8 * 9];
        for (int i = 0; i < 8; i++)
        {
            successive[(i * 9) + i] = -2;
            successive[(i * 9) + i + 1] = 2;
        }

        Assert.Equal(equality.Statistic.Value, areas.TestOfContrasts(successive, 8).Statistic.Value, equality.Statistic.Value * 1e-9);
        ContrastTest repeated = areas.TestOfContrasts([.. successive, .. successive[..9]], 9);
        Assert.Equal(8, repeated.DegreesOfFreedom);
        Assert.Equal(equality.Statistic.Value, repeated.Statistic.Value, equality.Statistic.Value * 1e-8);

        // One contrast: the squared z of the pair.
        double[] pair = [1, 0, 0, 0, 0, -1, 0, 0, 0];
        double z = areas.Compare(0, 5).Z.Value;
        Assert.Equal(z * z, areas.TestOfContrasts(pair, 1).Statistic.Value, 1e-9);
        Assert.Equal(-2.655125084437025, z, 1e-9);

        // 36 pairs: Bonferroni at 95 % is each at 1 - .05 / 36.
        IReadOnlyList<PairwiseAreaDifference> all = areas.SimultaneousDifferences();
        Assert.Equal(36, all.Count);
        Assert.All(all, d => Assert.Equal(
            d.Difference.Interval(Confidence.FromErrorProbability(0.05 / 36)).Lower, d.SimultaneousInterval.Lower, 1e-12));

        // Scheffe: 15.5073 is the 95 % point of chi-squared with 8 degrees of freedom (handbook tables, from memory).
        PairwiseAreaDifference first = areas.SimultaneousDifferences(default, SimultaneousMethod.Scheffe)[0];
        Assert.Equal(Math.Sqrt(15.5073), (first.Difference.Value - first.SimultaneousInterval.Lower) / first.Difference.StandardError.Value, 1e-5);
    }

    [Property]
    public void A_test_given_twice_takes_a_degree_of_freedom_away(SampleCase data, int seed)
    {
        if (data.With.Length < 3 || data.Without.Length < 3)
        {
            return;
        }

        double[] scores = [.. data.With, .. data.Without];
        bool[] status = [.. data.With.Select(_ => true), .. data.Without.Select(_ => false)];
        Random random = new(seed);
        double[] other = [.. scores.Select(_ => random.NextDouble())];
        PairedAreas two = PairedAreas.Of(PairedScores.Create([new("a", scores, data.Direction), new("b", other, Higher)], status));
        PairedAreas three = PairedAreas.Of(PairedScores.Create(
            [new("a", scores, data.Direction), new("b", other, Higher), new("a again", scores, data.Direction)], status));
        ContrastTest expected = two.TestOfEquality();
        ContrastTest actual = three.TestOfEquality();
        Assert.Equal(expected.Statistic.IsDefined, actual.Statistic.IsDefined);
        if (expected.Statistic.IsDefined)
        {
            Assert.Equal(1, actual.DegreesOfFreedom);
            Assert.Equal(expected.Statistic.Value, actual.Statistic.Value, 1e-6 * Math.Max(1, expected.Statistic.Value));
        }
    }

    [Fact]
    public void Margins_agree_with_the_interval()
    {
        AreaDifference difference = RocComparison.Paired(MarkerData.Pancreatic()).Difference;
        foreach (double margin in new[] { 0.01, 0.05, 0.2 })
        {
            AreaMarginTest test = difference.Test(DifferenceMargin.NonInferiority(margin));
            double z = (difference.Value + margin) / difference.StandardError.Value;
            Assert.Equal(z, test.Z.Value, 1e-12);

            // The bound at the level of the p-value touches the margin.
            Assert.Equal(-margin, difference.Interval(Confidence.FromErrorProbability(test.PValue.Value, IntervalSide.LowerBound)).Lower, 1e-9);
        }

        AreaMarginTest superiority = difference.Test(DifferenceMargin.Superiority());
        Assert.Equal(RocComparison.Paired(MarkerData.Pancreatic()).PValue.Value / 2, superiority.PValue.Value, 1e-14);
        AreaMarginTest equivalence = difference.Test(DifferenceEquivalenceMargins.Within(0.3));
        ConfidenceInterval touching = difference.Interval(Confidence.FromErrorProbability(2 * equivalence.PValue.Value));
        Assert.Equal(0.3, touching.Upper, 1e-9);
        Assert.True(touching.Lower > -0.3);
        AreaDifference same = RocComparison.Paired(PairedScores.Create([1, 2, 3, 4], Higher, [1, 2, 3, 4], Higher, [false, true, false, true])).Difference;
        Assert.Equal(UndefinedCause.ZeroVariance, same.Test(DifferenceMargin.NonInferiority(0.1)).PValue.WhyUndefined?.Cause);
        Assert.False(default(AreaMarginTest).PValue.IsDefined);
    }

    [Fact]
    public void Bad_input_is_refused_by_name()
    {
        bool[] status = [true, false, true];
        TestScores a = new("a", new double[] { 1, 2, 3 }, Higher);
        Assert.Equal("tests", Assert.Throws<ArgumentException>(() => PairedScores.Create([a], status)).ParamName);
        Assert.Contains("tests[1]", Assert.Throws<ArgumentException>(() => PairedScores.Create([a, new("b", new double[] { 1 }, Higher)], status)).Message, StringComparison.Ordinal);
        Assert.Contains(
            "tests[1] is NaN at index 2",
            Assert.Throws<ArgumentException>(() => PairedScores.Create([a, new("b", new double[] { 1, 2, double.NaN }, Higher)], status)).Message,
            StringComparison.Ordinal);
        Assert.Throws<ArgumentNullException>(() => new TestScores(null!, default, Higher));
        Assert.Throws<ArgumentOutOfRangeException>(() => new TestScores("a", default, default));
        PairedAreas areas = PairedAreas.Of(PairedScores.Create([a, a], status));
        Assert.Throws<ArgumentOutOfRangeException>(() => areas.Compare(0, 2));
        Assert.Throws<ArgumentOutOfRangeException>(() => areas.Covariance(-1, 0));
        Assert.Throws<ArgumentException>(() => areas.TestOfContrasts([1, 1], 1));
        Assert.Throws<ArgumentException>(() => areas.TestOfContrasts([0, 0], 1));
        Assert.Throws<ArgumentException>(() => areas.TestOfContrasts([1, -1, 0], 1));
        Assert.Throws<ArgumentOutOfRangeException>(() => areas.TestOfContrasts([double.NaN, 1], 1));
        Assert.Throws<ArgumentOutOfRangeException>(() => areas.TestOfContrasts([1, -1], 0));
        Assert.Throws<ArgumentOutOfRangeException>(() => areas.SimultaneousDifferences(default, (SimultaneousMethod)5));

        // One subject without the condition: areas, but no variances.
        Assert.Equal(UndefinedCause.TooFewSubjects, areas.WhyUndefined?.Cause);
        Assert.Equal(UndefinedCause.TooFewSubjects, areas.TestOfEquality().PValue.WhyUndefined?.Cause);
        Assert.False(areas.SimultaneousDifferences()[0].SimultaneousInterval.IsDefined);
    }
}
