namespace DiagnosticAccuracy.Tests.Roc;

public class ScoredSampleTests
{
    private const ScoreDirection Higher = ScoreDirection.HigherIsPositive;

    [Fact]
    public void NaN_is_refused_with_the_index_of_the_first()
    {
        ArgumentException[] errors =
        [
            Assert.Throws<ArgumentException>(() => ScoredSample.Create([1, 2, double.NaN, double.NaN], [true, false, true, false], Higher)),
            Assert.Throws<ArgumentException>(() => AreaUnderCurve.FromScores([1, 2, double.NaN], [true, false, true], Higher)),
            Assert.Throws<ArgumentException>(() => ScoredSample.FromGroups([1], [1, 2, double.NaN], Higher)),
            Assert.Throws<ArgumentException>(() => ScoredSample.FromGroups([1, 2, double.NaN], [1], Higher)),
            Assert.Throws<ArgumentException>(() => ScoredSample.FromCounts([1, 2, double.NaN], [1, 1, 1], [1, 1, 1], Higher)),
            Assert.Throws<ArgumentException>(() => ScoredSample.FromRows([1, 2, double.NaN], x => x, _ => true, Higher)),
            Assert.Throws<ArgumentException>(() => PairedScores.Create([1, 2, 3], Higher, [1, 2, double.NaN], Higher, [true, false, true])),
        ];
        Assert.All(errors, e => Assert.Contains("NaN at index 2", e.Message, StringComparison.Ordinal));
        Assert.Equal(["scores", "scores", "withoutCondition", "withCondition", "levels", "score", "secondScores"], errors.Select(e => e.ParamName));
    }

    [Fact]
    public void Lengths_that_differ_are_refused_with_both_lengths()
    {
        ArgumentException error = Assert.Throws<ArgumentException>(() => ScoredSample.Create([1, 2, 3], [true, false], Higher));
        Assert.Equal("hasCondition", error.ParamName);
        Assert.Contains("hasCondition has 2 elements and scores has 3", error.Message, StringComparison.Ordinal);
        Assert.Equal("withoutCondition", Assert.Throws<ArgumentException>(() => ScoredSample.FromCounts([1, 2], [1, 2], [1], Higher)).ParamName);
        Assert.Equal("secondScores", Assert.Throws<ArgumentException>(() => PairedScores.Create([1, 2], Higher, [1], Higher, [true, false])).ParamName);
    }

    [Fact]
    public void An_empty_sample_is_refused()
    {
        Assert.Contains("at least one subject", Assert.Throws<ArgumentException>(() => ScoredSample.Create([], [], Higher)).Message, StringComparison.Ordinal);
        Assert.Throws<ArgumentException>(() => ScoredSample.FromGroups([], [], Higher));
        Assert.Throws<ArgumentException>(() => ScoredSample.FromCounts([1], [0], [0], Higher));
        Assert.Throws<ArgumentException>(() => ScoredSample.FromRows(Array.Empty<double>(), x => x, _ => true, Higher));
    }

    [Fact]
    public void A_direction_must_be_stated()
    {
        ArgumentOutOfRangeException error = Assert.Throws<ArgumentOutOfRangeException>(() => ScoredSample.Create([1], [true], default));
        Assert.Equal("direction", error.ParamName);
        Assert.Contains("HigherIsPositive or LowerIsPositive", error.Message, StringComparison.Ordinal);
    }

    [Fact]
    public void A_negative_count_is_refused_with_its_place()
    {
        ArgumentOutOfRangeException error = Assert.Throws<ArgumentOutOfRangeException>(() => ScoredSample.FromCounts([1, 2], [1, -3], [1, 1], Higher));
        Assert.Contains("withCondition[1] is -3", error.Message, StringComparison.Ordinal);
    }

    [Fact]
    public void One_group_only_keeps_its_counts_and_has_no_area()
    {
        ScoredSample sample = ScoredSample.Create([1, 2, 2], [true, true, true], Higher);
        Assert.Equal(3, sample.WithCondition);
        Assert.Equal(0, sample.WithoutCondition);
        RocCurve curve = RocCurve.Empirical(sample);
        Assert.Equal(3, curve.Points.Count);
        Assert.Equal(1, curve.Points[^1].Sensitivity.Value);
        Assert.Equal(UndefinedCause.NoSubjectsWithoutCondition, curve.Points[^1].Specificity.WhyUndefined?.Cause);
        Assert.False(curve.Area.IsDefined);
        Assert.True(double.IsNaN(curve.Area.Value));
        Assert.Equal("no subject is without the condition", curve.Area.WhyUndefined?.ToString());
        Assert.Equal(UndefinedCause.NoSubjectsWithoutCondition, curve.Area.Interval().WhyUndefined?.Cause);
        Assert.Equal(UndefinedCause.NoSubjectsWithoutCondition, curve.Area.StandardError.WhyUndefined?.Cause);
    }

    [Fact]
    public void Both_zeros_are_one_level_and_infinities_are_levels()
    {
        ScoredSample sample = ScoredSample.FromGroups([0.0, double.PositiveInfinity], [-0.0, double.NegativeInfinity], Higher);
        Assert.Equal(
            [new ScoreLevel(double.NegativeInfinity, 0, 1), new ScoreLevel(0, 1, 1), new ScoreLevel(double.PositiveInfinity, 1, 0)],
            sample.Levels);
        Assert.Equal(0.875, RocCurve.Empirical(sample).Area.Value);
    }

    [Fact]
    public void Separation_has_area_one_and_a_lower_limit_below_it()
    {
        AreaUnderCurve area = RocCurve.Empirical(ScoredSample.FromGroups([3, 4, 5], [0, 1, 2], Higher)).Area;
        Assert.Equal(1, area.Value);
        Assert.Equal(0, area.StandardError.Value);
        ConfidenceInterval interval = area.Interval();
        Assert.Equal(1, interval.Upper);
        Assert.InRange(interval.Lower, 0.3, 0.9);
        Assert.Contains("Newcombe", interval.Method, StringComparison.Ordinal);
        AreaUnderCurve reversed = RocCurve.Empirical(ScoredSample.FromGroups([0, 1, 2], [3, 4, 5], Higher)).Area;
        Assert.Equal(0, reversed.Interval().Lower);
        Assert.Equal(1 - interval.Lower, reversed.Interval().Upper, 1e-15);
    }

    [Fact]
    public void Counts_beyond_32_bits_are_exact()
    {
        // Two levels: the area is a closed form of the four counts, here 1/2 + (.9 - .2) / 2.
        long many = 1_000_000_000_000_000;
        AreaUnderCurve area = RocCurve.Empirical(
            ScoredSample.FromCounts([0, 1], [many / 10, many / 10 * 9], [many / 10 * 8, many / 10 * 2], Higher)).Area;
        Assert.Equal(0.85, area.Value, 1e-15);
        Assert.Equal(System.Numerics.BigInteger.Parse("720000000000000000000000000000", System.Globalization.CultureInfo.InvariantCulture), area.ConcordantPairs);

        // With two levels DeLong's variance is (p q / (n1 - 1) + r s / (n0 - 1)) / 4.
        double expected = ((0.9 * 0.1) + (0.2 * 0.8)) / 4 / many;
        Assert.Equal(expected, area.Variance.Value, expected * 1e-12);
    }

    [Fact]
    public void The_three_ways_of_summing_agree()
    {
        // The same sample small enough for 64-bit sums, scaled by counts into the 128-bit and the unbounded way.
        double[] levels = [1, 2, 3, 4, 5];
        long[] with = [3, 2, 2, 11, 33];
        long[] without = [33, 6, 6, 11, 2];
        double expected = RocCurve.Empirical(ScoredSample.FromCounts(levels, with, without, Higher)).Area.Value;
        foreach (long factor in new[] { 1L, 100_000L, 10_000_000L, 100_000_000L, 10_000_000_000L })
        {
            AreaUnderCurve area = RocCurve.Empirical(ScoredSample.FromCounts(
                levels, [.. with.Select(c => c * factor)], [.. without.Select(c => c * factor)], Higher)).Area;
            Assert.Equal(expected, area.Value);

            // n1 (n1 - 1) Var10 / (n1 - 1) is free of the factor: compare the variance with its limit for one copy.
            double n1 = with.Sum();
            double n0 = without.Sum();
            AreaUnderCurve one = RocCurve.Empirical(ScoredSample.FromCounts(levels, with, without, Higher)).Area;
            double partWith = PartWith(one, n1, n0);
            double partWithout = one.Variance.Value - partWith;
            double rescaled = (partWith * (n1 - 1) / ((n1 * factor) - 1)) + (partWithout * (n0 - 1) / ((n0 * factor) - 1));
            Assert.Equal(rescaled, area.Variance.Value, rescaled * 1e-12);
        }
    }

    [Fact]
    public void A_cutoff_in_the_other_direction_is_refused()
    {
        RocCurve curve = RocCurve.Empirical(ScoredSample.FromGroups([1, 2], [0], Higher));
        ArgumentException error = Assert.Throws<ArgumentException>(() => curve.At(Cutoff.AtOrBelow(1)));
        Assert.Contains("<= 1", error.Message, StringComparison.Ordinal);
    }

    private static double PartWith(AreaUnderCurve area, double n1, double n0)
    {
        double mean = (double)area.Moments.Sum / n1;
        double squares = (double)area.Moments.SumOfSquaresWith - (n1 * mean * mean);
        return squares / (n1 - 1) / (4 * n0 * n0) / n1;
    }
}
