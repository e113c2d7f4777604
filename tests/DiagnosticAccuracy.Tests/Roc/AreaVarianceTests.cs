using System.Text.Json;
using DiagnosticAccuracy.Tests.Data;
using DiagnosticAccuracy.Tests.Reference;
using FsCheck.Xunit;

namespace DiagnosticAccuracy.Tests.Roc;

[Properties(Arbitrary = [typeof(SampleArbitrary)], MaxTest = 200)]
public class AreaVarianceTests
{
    /// <summary>CT ratings of Hanley and McNeil, Radiology 1982;143:29: SE .032 is the paper's (S2), more digits recomputed (R).</summary>
    [Fact]
    public void Ratings_of_Hanley_and_McNeil()
    {
        JsonElement expected = ReferenceData.Json("rating-data.json").GetProperty("ct_hanley_mcneil_1982");
        long[] with = [.. expected.GetProperty("abnormal").EnumerateArray().Select(e => e.GetInt64())];
        long[] without = [.. expected.GetProperty("normal").EnumerateArray().Select(e => e.GetInt64())];
        AreaUnderCurve area = AreaUnderCurve.Of(ScoredSample.FromCounts([1, 2, 3, 4, 5], with, without, ScoreDirection.HigherIsPositive));
        Assert.Equal(.032, Math.Sqrt(area.VarianceBy(AreaVarianceMethod.HanleyMcNeil).Value), 5e-4);
        Check("se_delong", AreaVarianceMethod.DeLong);
        Check("se_hm_exponential", AreaVarianceMethod.HanleyMcNeilExponential);
        Check("se_hm_empiricalQ", AreaVarianceMethod.HanleyMcNeil);
        Check("se_unbiased", AreaVarianceMethod.Bamber);

        void Check(string name, AreaVarianceMethod method) =>
            Assert.Equal(expected.GetProperty(name).GetDouble(), Math.Sqrt(area.VarianceBy(method).Value), 1e-13);
    }

    /// <summary>Computed by hand for this project (grade R): cases 3, 5, 6, 8, controls 1, 2, 4, 5, 7.</summary>
    [Fact]
    public void Four_cases_and_five_controls()
    {
        AreaUnderCurve area = AreaUnderCurve.Of(ScoredSample.FromGroups([3, 5, 6, 8], [1, 2, 4, 5, 7], ScoreDirection.HigherIsPositive));
        Assert.Equal(.033178, area.VarianceBy(AreaVarianceMethod.HanleyMcNeilExponential).Value, 5e-7);
    }

    [Theory]
    [InlineData("ca199", 0.030156252841454137)]
    [InlineData("ca125", 0.0435628728824257)]
    public void Pancreatic_markers_have_the_exponential_error(string marker, double expected)
    {
        PairedScores scores = MarkerData.Pancreatic();
        AreaUnderCurve area = AreaUnderCurve.Of(marker == "ca199" ? scores.First : scores.Second);
        Assert.Equal(expected, Math.Sqrt(area.VarianceBy(AreaVarianceMethod.HanleyMcNeilExponential).Value), 1e-13);
    }

    [Property]
    public void Bamber_is_the_squared_area_less_the_mean_product_of_pairs_that_share_nobody(SampleCase data)
    {
        if (data.With.Length < 2 || data.Without.Length < 2)
        {
            return;
        }

        double sum = 0;
        int count = 0;
        for (int i = 0; i < data.With.Length; i++)
        {
            for (int k = 0; k < data.With.Length; k++)
            {
                for (int j = 0; j < data.Without.Length; j++)
                {
                    for (int l = 0; l < data.Without.Length; l++)
                    {
                        if (i != k && j != l)
                        {
                            sum += Win(i, j) * Win(k, l);
                            count++;
                        }
                    }
                }
            }
        }

        AreaUnderCurve area = AreaUnderCurve.Of(data.Sample());
        double expected = (area.Value * area.Value) - (sum / count);
        Quantity actual = area.VarianceBy(AreaVarianceMethod.Bamber);
        if (actual.IsDefined)
        {
            Assert.Equal(expected, actual.Value, 1e-13);
        }
        else
        {
            Assert.InRange(expected, double.NegativeInfinity, 1e-15);
        }

        double Win(int i, int j) => SlowRoc.Area([data.With[i]], [data.Without[j]], data.Direction);
    }

    /// <summary>Unbiased means: averaged over all samples from a population the estimate is the true variance.</summary>
    [Fact]
    public void Bamber_is_unbiased_over_resampled_populations()
    {
        // Two small populations, all samples of 2 + 2 drawn from them with replacement: the mean estimate is the true variance.
        double[] cases = [1, 2, 2, 4];
        double[] controls = [0, 1, 2, 3];
        List<double> areas = [];
        double estimates = 0;
        for (int sample = 0; sample < 256; sample++)
        {
            double[] with = [cases[sample & 3], cases[(sample >> 2) & 3]];
            double[] without = [controls[(sample >> 4) & 3], controls[(sample >> 6) & 3]];
            AreaUnderCurve area = AreaUnderCurve.Of(ScoredSample.FromGroups(with, without, ScoreDirection.HigherIsPositive));
            areas.Add(area.Value);

            // The signed estimate, from the definition: an undefined (negative) one must be averaged in as well.
            double product = 0;
            product += 0.5 * Win(with[0], without[0]) * Win(with[1], without[1]);
            product += 0.5 * Win(with[0], without[1]) * Win(with[1], without[0]);
            double signed = (area.Value * area.Value) - product;
            Quantity estimate = area.VarianceBy(AreaVarianceMethod.Bamber);
            Assert.Equal(signed > -1e-15, estimate.IsDefined);
            estimates += estimate.IsDefined ? estimate.Value : signed;
        }

        double mean = areas.Average();
        Assert.Equal(areas.Average(a => (a - mean) * (a - mean)), estimates / 256, 1e-13);

        static double Win(double x, double y) => x > y ? 1 : x == y ? 0.5 : 0;
    }

    [Property]
    public void Hanley_and_McNeil_from_the_data_counts_triples(SampleCase data)
    {
        double Triple(double[] doubled, double[] single, bool doubledWins)
        {
            double sum = 0;
            foreach (double y in single)
            {
                foreach (double x1 in doubled)
                {
                    foreach (double x2 in doubled)
                    {
                        double a = doubledWins ? SlowRoc.Area([x1], [y], data.Direction) : SlowRoc.Area([y], [x1], data.Direction);
                        double b = doubledWins ? SlowRoc.Area([x2], [y], data.Direction) : SlowRoc.Area([y], [x2], data.Direction);
                        sum += a == 0.5 && b == 0.5 ? 1 / 3.0 : a * b;
                    }
                }
            }

            return sum / single.Length / doubled.Length / doubled.Length;
        }

        AreaUnderCurve area = AreaUnderCurve.Of(data.Sample());
        double q1 = Triple(data.With, data.Without, true);
        double q2 = Triple(data.Without, data.With, false);
        double square = area.Value * area.Value;
        double expected = ((area.Value * (1 - area.Value)) + ((data.With.Length - 1) * (q1 - square)) + ((data.Without.Length - 1) * (q2 - square)))
            / data.With.Length / data.Without.Length;
        Assert.Equal(Math.Max(0, expected), area.VarianceBy(AreaVarianceMethod.HanleyMcNeil).Value, 1e-13);
    }

    [Property]
    public void The_exact_test_is_the_enumeration_of_all_deals(SampleCase data)
    {
        if (data.With.Length + data.Without.Length > 14)
        {
            return;
        }

        RocCurve curve = RocCurve.Empirical(data.Sample());
        double[] all = [.. data.With, .. data.Without];
        List<double> areas = [];
        for (int deal = 0; deal < 1 << all.Length; deal++)
        {
            if (System.Numerics.BitOperations.PopCount((uint)deal) == data.With.Length)
            {
                double[] with = [.. all.Where((_, i) => (deal >> i & 1) == 1)];
                double[] without = [.. all.Where((_, i) => (deal >> i & 1) == 0)];
                areas.Add(AreaUnderCurve.Of(ScoredSample.FromGroups(with, without, data.Direction)).Value);
            }
        }

        double observed = curve.Area.Value;
        Assert.Equal(areas.Count(a => a >= observed - 1e-12) / (double)areas.Count, P(Alternative.Greater), 1e-12);
        Assert.Equal(areas.Count(a => a <= observed + 1e-12) / (double)areas.Count, P(Alternative.Less), 1e-12);
        Assert.Equal(areas.Count(a => Math.Abs(a - 0.5) >= Math.Abs(observed - 0.5) - 1e-12) / (double)areas.Count, P(Alternative.TwoSided), 1e-12);

        double P(Alternative alternative) => curve.TestOfChance(ChanceTestMethod.Exact, alternative).PValue.Value;
    }

    /// <summary>Rank sum tests of R, without and with continuity correction (grade R).</summary>
    [Theory]
    [InlineData("ca199")]
    [InlineData("ca125")]
    public void The_normal_test_is_that_of_the_reference(string marker)
    {
        PairedScores scores = MarkerData.Pancreatic();
        RocCurve curve = RocCurve.Empirical(marker == "ca199" ? scores.First : scores.Second);
        JsonElement expected = ReferenceData.Json("markers-expected.json").GetProperty("pancreatic-markers.csv").GetProperty("r").GetProperty("single").GetProperty(marker);
        double plain = expected.GetProperty("wilcox_p_nocorrect").GetDouble();
        double corrected = expected.GetProperty("wilcox_p_correct").GetDouble();
        Assert.Equal(plain, curve.TestOfChance().PValue.Value, plain * 1e-10);
        Assert.Equal(corrected, curve.TestOfChance(ChanceTestMethod.NormalWithContinuity).PValue.Value, corrected * 1e-10);
    }

    [Theory]
    [InlineData(3, 0.05)]
    [InlineData(5, 1 / 252.0)]
    [InlineData(30, 1 / 118264581564861424.0)]
    public void Separation_has_probability_one_in_all_deals(int n, double expected)
    {
        // 1 / C(2 n, n).
        RocCurve curve = RocCurve.Empirical(ScoredSample.FromGroups(
            [.. Enumerable.Range(n, n).Select(i => (double)i)], [.. Enumerable.Range(0, n).Select(i => (double)i)], ScoreDirection.HigherIsPositive));
        Assert.Equal(expected, curve.TestOfChance(ChanceTestMethod.Exact, Alternative.Greater).PValue.Value, expected * 1e-12);
        Assert.Equal(1, curve.TestOfChance(ChanceTestMethod.Exact, Alternative.Less).PValue.Value, 1e-12);
    }

    [Fact]
    public void Limits_of_the_test_of_chance()
    {
        RocCurve equal = RocCurve.Empirical(ScoredSample.FromGroups([1, 1], [1, 1, 1], ScoreDirection.HigherIsPositive));
        Assert.Equal(1, equal.TestOfChance(ChanceTestMethod.Exact).PValue.Value);
        Assert.Equal(UndefinedCause.ZeroVariance, equal.TestOfChance().PValue.WhyUndefined?.Cause);
        RocCurve one = RocCurve.Empirical(ScoredSample.FromGroups([1, 2], [], ScoreDirection.HigherIsPositive));
        Assert.Equal(UndefinedCause.NoSubjectsWithoutCondition, one.TestOfChance(ChanceTestMethod.Exact).PValue.WhyUndefined?.Cause);
        RocCurve large = RocCurve.Empirical(ScoredSample.FromGroups(
            [.. Enumerable.Range(0, 2000).Select(i => (double)i)], [.. Enumerable.Range(0, 2000).Select(i => i + 0.5)], ScoreDirection.HigherIsPositive));
        Assert.Contains("too large", large.TestOfChance(ChanceTestMethod.Exact).PValue.WhyUndefined?.Explanation, StringComparison.Ordinal);
        Assert.Throws<ArgumentOutOfRangeException>(() => large.TestOfChance((ChanceTestMethod)7));
        Assert.Throws<ArgumentOutOfRangeException>(() => large.TestOfChance(alternative: (Alternative)7));
        Assert.Throws<ArgumentOutOfRangeException>(() => large.Area.VarianceBy((AreaVarianceMethod)7));
    }
}
