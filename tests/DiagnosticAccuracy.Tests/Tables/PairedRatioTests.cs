namespace DiagnosticAccuracy.Tests.Tables;

public class PairedRatioTests
{
    public static TheoryData<PairedRatioMethod> Methods() => [.. Enum.GetValues<PairedRatioMethod>()];

    [Theory]
    [MemberData(nameof(Methods))]
    public void Every_table_up_to_12_has_limits_that_hold_the_laws(PairedRatioMethod method) => AssertLaws(PairedTables.UpTo(12), method);

    [Theory]
    [MemberData(nameof(Methods))]
    public void Larger_tables_hold_the_laws(PairedRatioMethod method) => AssertLaws(PairedTables.Sample(1000), method);

    private static void AssertLaws(IEnumerable<PairedTable> tables, PairedRatioMethod method)
    {
        foreach (PairedTable table in tables)
        {
            PairedRatio ratio = table.Ratio;
            ConfidenceInterval wide = ratio.Interval(Confidence.TwoSided(0.99), method);
            if (!ratio.IsDefined)
            {
                Assert.Equal(UndefinedCause.NoPositiveResults, wide.WhyUndefined?.Cause);
                continue;
            }

            ConfidenceInterval narrow = ratio.Interval(Confidence.TwoSided(0.8), method);
            Assert.True(wide.Lower >= 0, $"{table} {wide}");
            Assert.True(narrow.Contains(ratio.Value), $"{table} {narrow}");
            Assert.True(wide.Lower <= narrow.Lower && narrow.Upper <= wide.Upper, $"{table} {wide} {narrow}");

            // A ratio of 0 has a finite limit above it, an infinite one a positive limit below it, and the others two.
            Assert.Equal(ratio.Value == 0, wide.Lower == 0);
            Assert.Equal(double.IsPositiveInfinity(ratio.Value), double.IsPositiveInfinity(wide.Upper));
            Assert.True(wide.Width > 0, $"{table} {wide}");

            ConfidenceInterval inverted = ratio.Inverse.Interval(Confidence.TwoSided(0.99), method);
            AssertRelative(1 / wide.Upper, inverted.Lower);
            AssertRelative(1 / wide.Lower, inverted.Upper);
            Assert.Equal(wide.Lower, ratio.Interval(Confidence.LowerBound(0.995), method).Lower, 1e-15);
            Assert.True(double.IsPositiveInfinity(ratio.Interval(Confidence.LowerBound(0.995), method).Upper));

            // Subjects negative on both tests do not matter.
            PairedTable more = new(table.BothPositive, table.FirstOnly, table.SecondOnly, table.BothNegative + 1000);
            Assert.Equal(wide, more.Ratio.Interval(Confidence.TwoSided(0.99), method));
        }
    }

    [Fact]
    public void The_score_interval_inverts_the_statistic()
    {
        const double quantile = 1.959963984540054;
        int compared = 0;
        foreach (PairedTable table in PairedTables.UpTo(12).Concat(PairedTables.Sample(300)).Where(t => t.Ratio.IsDefined))
        {
            ConfidenceInterval interval = table.Ratio.Interval();
            if (interval.Lower > 0)
            {
                Assert.Equal(quantile, Statistic(table, interval.Lower), 1e-9);
                compared++;
            }

            if (!double.IsPositiveInfinity(interval.Upper))
            {
                Assert.Equal(-quantile, Statistic(table, interval.Upper), 1e-9);
                compared++;
            }
        }

        Assert.True(compared > 3000, $"{compared}");
    }

    [Fact]
    public void The_statistic_falls_as_the_ratio_rises()
    {
        foreach (PairedTable table in PairedTables.UpTo(10).Where(t => t.Ratio.IsDefined))
        {
            double last = double.PositiveInfinity;
            for (double x = -4; x <= 4; x += 0.05)
            {
                double z = Statistic(table, Math.Exp(x));
                Assert.True(z < last, $"{table} at {Math.Exp(x)}");
                last = z;
            }
        }
    }

    /// <summary>The score statistic from the restricted maximum of the whole likelihood, found by a search that knows no derivative.</summary>
    [Fact]
    public void The_statistic_rests_on_the_maximum_of_the_likelihood()
    {
        foreach (PairedTable table in PairedTables.UpTo(4).Concat(PairedTables.Sample(40)).Where(t => t.Ratio.IsDefined))
        {
            foreach (double ratio in new[] { 0.5, 0.9, 1, 1.2, 3 })
            {
                double slow = SlowPaired.RatioStatistic(table, ratio);
                Assert.Equal(slow, Statistic(table, ratio), 1e-5 * Math.Max(1, Math.Abs(slow)));
            }
        }
    }

    /// <summary>The p-value is at most the error probability exactly when the bound clears the margin, on both sides.</summary>
    [Fact]
    public void Test_and_interval_agree()
    {
        RatioMargin[] margins =
        [
            RatioMargin.NonInferiority(0.9), default, RatioMargin.Superiority(1.1), RatioMargin.NonInferiority(0.5),
            RatioMargin.NonInferiorityWhereLessIsBetter(1.25), RatioMargin.NonInferiorityWhereLessIsBetter(3),
        ];
        int rejected = 0;
        foreach (PairedTable table in PairedTables.UpTo(12).Where(t => t.Ratio.IsDefined))
        {
            foreach (double error in new[] { 0.025, 0.2 })
            {
                foreach (RatioMargin margin in margins)
                {
                    PairedRatioTest test = margin.Test(table.Ratio);
                    ConfidenceInterval interval = test.Interval(
                        Confidence.FromErrorProbability(error, margin.IsUpper ? IntervalSide.UpperBound : IntervalSide.LowerBound));
                    double bound = margin.IsUpper ? interval.Upper : interval.Lower;
                    if (Math.Abs(bound - margin.Bound) < 1e-12)
                    {
                        continue;
                    }

                    bool clears = margin.IsUpper ? bound < margin.Bound : bound > margin.Bound;
                    Assert.Equal(clears, test.PValue.Value <= error);
                    rejected += clears ? 1 : 0;
                }
            }
        }

        Assert.InRange(rejected, 1000, 15_000);
    }

    [Fact]
    public void Equivalence_and_interval_agree()
    {
        int equivalent = 0;
        foreach (PairedTable table in PairedTables.UpTo(12).Concat(PairedTables.Sample(300)).Where(t => t.Ratio.IsDefined))
        {
            foreach (RatioEquivalenceMargins margins in new[] { RatioEquivalenceMargins.Within(0.7), RatioEquivalenceMargins.Between(0.6, 1.5) })
            {
                PairedRatioEquivalence test = margins.Test(table.Ratio);
                ConfidenceInterval interval = test.Interval(Confidence.TwoSided(0.8));
                bool within = interval.Lower > margins.Lower && interval.Upper < margins.Upper;
                Assert.Equal(within, test.PValue.Value <= 0.1);
                Assert.Equal(
                    Math.Max(
                        RatioMargin.NonInferiority(margins.Lower).Test(table.Ratio).PValue.Value,
                        RatioMargin.NonInferiorityWhereLessIsBetter(margins.Upper).Test(table.Ratio).PValue.Value),
                    test.PValue.Value);
                equivalent += within ? 1 : 0;
            }
        }

        Assert.True(equivalent > 100, $"{equivalent}");
    }

    /// <summary>
    /// Table (1, 1, 7, 12) of Fagerland, Lydersen and Laake (Stat Med 2014;33:2850): ratio .25 with intervals by Wald (.063, 1.00), the score (.065, .907) and Bonett and
    /// Price (.068, .923). From memory, written down before computing; the computed limits agree with what is asserted (grade M).
    /// </summary>
    [Fact]
    public void The_airway_example_of_Fagerland_agrees()
    {
        PairedRatio ratio = new PairedTable(1, 1, 7, 12).Ratio;
        Assert.Equal(0.25, ratio.Value);
        ConfidenceInterval wald = ratio.Interval(default, PairedRatioMethod.WaldLog);
        Assert.Equal(0.063, wald.Lower, 0.5001e-3);
        Assert.Equal(1.00, wald.Upper, 0.5e-2);
        ConfidenceInterval score = ratio.Interval();
        Assert.Equal(0.065, score.Lower, 0.5e-3);
        Assert.Equal(0.907, score.Upper, 0.5e-3);
        ConfidenceInterval hybrid = ratio.Interval(default, PairedRatioMethod.BonettPriceHybrid);
        Assert.Equal(0.068, hybrid.Lower, 0.5e-3);
        Assert.Equal(0.923, hybrid.Upper, 0.5e-3);
    }

    [Fact]
    public void Where_the_logarithm_has_no_limit_or_no_width_the_score_interval_says_that_it_stands_in()
    {
        foreach (PairedTable table in new[] { new PairedTable(0, 0, 4, 9), new PairedTable(0, 4, 0, 9), new PairedTable(6, 0, 0, 1) })
        {
            ConfidenceInterval interval = table.Ratio.Interval(default, PairedRatioMethod.WaldLog);
            ConfidenceInterval score = table.Ratio.Interval();
            Assert.StartsWith("score (Nam-Blackwelder), since the logarithm has no", interval.Method, StringComparison.Ordinal);
            Assert.Equal(score.Lower, interval.Lower);
            Assert.Equal(score.Upper, interval.Upper);
        }
    }

    [Fact]
    public void Zero_over_zero_says_which_zero()
    {
        PairedConfusionMatrix tables = new(default, new PairedTable(0, 0, 0, 8));
        Assert.Equal(UndefinedCause.NoSubjectsWithCondition, tables.RelativeSensitivity.WhyUndefined?.Cause);
        Assert.Equal(UndefinedCause.NoPositiveResults, tables.RelativeFalsePositiveRate.WhyUndefined?.Cause);
        Assert.Equal("(0/8) / (0/8) (undefined: no result is positive)", tables.RelativeFalsePositiveRate.ToString());
        Assert.True(double.IsNaN(tables.RelativeSensitivity.Value));
        Assert.Equal(UndefinedCause.NoPositiveResults, RatioMargin.NonInferiority(0.9).Test(tables.RelativeFalsePositiveRate).PValue.WhyUndefined?.Cause);
        Assert.Equal(UndefinedCause.NoPositiveResults, RatioEquivalenceMargins.Within(0.9).Test(tables.RelativeFalsePositiveRate).PValue.WhyUndefined?.Cause);
        Assert.Throws<ArgumentOutOfRangeException>("method", () => tables.RelativeSensitivity.Interval(default, (PairedRatioMethod)99));
    }

    [Theory]
    [InlineData(double.NaN)]
    [InlineData(0)]
    [InlineData(-0.1)]
    [InlineData(double.PositiveInfinity)]
    public void Margins_outside_of_their_range_are_refused(double margin)
    {
        Assert.Throws<ArgumentOutOfRangeException>(nameof(margin), () => RatioMargin.NonInferiority(margin));
        Assert.Throws<ArgumentOutOfRangeException>(nameof(margin), () => RatioMargin.NonInferiorityWhereLessIsBetter(margin));
        Assert.Throws<ArgumentOutOfRangeException>(nameof(margin), () => RatioMargin.Superiority(margin));
        Assert.Throws<ArgumentOutOfRangeException>(nameof(margin), () => RatioEquivalenceMargins.Within(margin));
        Assert.Throws<ArgumentOutOfRangeException>("lower", () => RatioEquivalenceMargins.Between(margin, 1.1));
        Assert.Throws<ArgumentOutOfRangeException>("upper", () => RatioEquivalenceMargins.Between(0.9, margin));
    }

    [Fact]
    public void The_defaults_of_the_margins_are_what_they_say()
    {
        Assert.Equal(RatioMargin.Superiority(), default);
        Assert.Equal(1, default(RatioMargin).Bound);
        Assert.Equal("ratio above 1", default(RatioMargin).ToString());
        Assert.Equal("ratio below 1.1", RatioMargin.NonInferiorityWhereLessIsBetter(1.1).ToString());
        Assert.Equal("ratio above 0.9 and below 1.11111", RatioEquivalenceMargins.Within(0.9).ToString());

        // No difference and no ratio is within no room.
        PairedTable table = new(40, 5, 5, 50);
        Assert.True(default(RatioEquivalenceMargins).Test(table.Ratio).PValue.Value >= 0.5);
        Assert.True(default(DifferenceEquivalenceMargins).Test(table.Difference).PValue.Value >= 0.5);
    }

    private static void AssertRelative(double expected, double actual) =>
        Assert.True(expected == actual || Math.Abs(expected - actual) <= 1e-12 * Math.Abs(expected), $"{expected:R} {actual:R}");

    private static double Statistic(PairedTable table, double ratio) =>
        (ratio < 1 ? RatioMargin.NonInferiority(ratio) : RatioMargin.Superiority(ratio)).Test(table.Ratio).Statistic.Value;
}
