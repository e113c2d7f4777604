namespace DiagnosticAccuracy.Tests.Tables;

public class PairedDifferenceTests
{
    public static TheoryData<PairedDifferenceMethod> Methods() => [.. Enum.GetValues<PairedDifferenceMethod>()];

    [Theory]
    [MemberData(nameof(Methods))]
    public void Every_table_up_to_12_has_limits_that_hold_the_laws(PairedDifferenceMethod method) => AssertLaws(PairedTables.UpTo(12), method);

    [Theory]
    [MemberData(nameof(Methods))]
    public void Larger_tables_hold_the_laws(PairedDifferenceMethod method) => AssertLaws(PairedTables.Sample(1000), method);

    private static void AssertLaws(IEnumerable<PairedTable> tables, PairedDifferenceMethod method)
    {
        bool contains = method is not (PairedDifferenceMethod.BonettPrice or PairedDifferenceMethod.AgrestiMin);
        foreach (PairedTable table in tables)
        {
            PairedDifference difference = table.Difference;
            ConfidenceInterval wide = difference.Interval(Confidence.TwoSided(0.99), method);
            ConfidenceInterval narrow = difference.Interval(Confidence.TwoSided(0.8), method);
            Assert.True(-1 <= wide.Lower && wide.Upper <= 1, $"{table} {wide}");
            Assert.True(!contains || narrow.Contains(difference.Value), $"{table} {narrow}");

            // Nested up to rounding: some limits are -1, 0 or 1 on paper at every level.
            Assert.True(wide.Lower <= narrow.Lower + 1e-15 && narrow.Upper <= wide.Upper + 1e-15, $"{table} {wide} {narrow}");

            // Tests in the other order; negative results counted as positive.
            foreach (PairedTable swapped in new[] { table.Swapped, table.Complement })
            {
                ConfidenceInterval mirrored = swapped.Difference.Interval(Confidence.TwoSided(0.99), method);
                Assert.Equal(-wide.Upper, mirrored.Lower, 1e-13);
                Assert.Equal(-wide.Lower, mirrored.Upper, 1e-13);
            }

            Assert.Equal(wide.Lower, difference.Interval(Confidence.LowerBound(0.995), method).Lower, 1e-15);
            Assert.Equal(wide.Upper, difference.Interval(Confidence.UpperBound(0.995), method).Upper, 1e-15);
            Assert.Equal(1, difference.Interval(Confidence.LowerBound(0.995), method).Upper);
        }
    }

    [Fact]
    public void One_sided_levels_below_one_half_stay_nested()
    {
        foreach (PairedTable table in PairedTables.UpTo(5))
        {
            foreach (PairedDifferenceMethod method in Enum.GetValues<PairedDifferenceMethod>())
            {
                double lower = 1;
                foreach (double level in new[] { 0.1, 0.4, 0.5, 0.6, 0.99 })
                {
                    double next = table.Difference.Interval(Confidence.LowerBound(level), method).Lower;
                    Assert.InRange(next, -1, lower + 1e-15);
                    lower = next;
                }
            }
        }
    }

    /// <summary>The limits are where Nam's statistic is the normal quantile; 1.959963984540054 is that of 0.975.</summary>
    [Fact]
    public void Tango_s_interval_inverts_Nam_s_statistic()
    {
        const double quantile = 1.959963984540054;
        int compared = 0;
        foreach (PairedTable table in PairedTables.UpTo(12).Concat(PairedTables.Sample(300)))
        {
            ConfidenceInterval interval = table.Difference.Interval();
            if (interval.Lower > -1)
            {
                Assert.Equal(quantile, Statistic(table, interval.Lower), 1e-9);
                compared++;
            }

            if (interval.Upper < 1)
            {
                Assert.Equal(-quantile, Statistic(table, interval.Upper), 1e-9);
                compared++;
            }
        }

        Assert.True(compared > 3000, $"{compared}");
    }

    /// <summary>The score statistic from the restricted maximum of the whole likelihood, found by a search that knows no derivative.</summary>
    [Fact]
    public void The_statistic_rests_on_the_maximum_of_the_likelihood()
    {
        foreach (PairedTable table in PairedTables.UpTo(5).Concat(PairedTables.Sample(60)))
        {
            foreach (double bound in new[] { -0.3, -0.05, 0, 0.1, 0.6 })
            {
                double slow = SlowPaired.DifferenceStatistic(table, bound);
                Assert.Equal(slow, Statistic(table, bound), 1e-5 * Math.Max(1, Math.Abs(slow)));
            }
        }
    }

    /// <summary>The p-value is at most the error probability exactly when the lower bound clears the margin.</summary>
    [Fact]
    public void Test_and_interval_agree()
    {
        DifferenceMargin[] margins =
            [DifferenceMargin.NonInferiority(0.1), default, DifferenceMargin.Superiority(0.05), DifferenceMargin.NonInferiority(0.4)];
        int rejected = 0;
        foreach (PairedTable table in PairedTables.UpTo(12))
        {
            foreach (double error in new[] { 0.025, 0.2 })
            {
                Confidence confidence = Confidence.FromErrorProbability(error, IntervalSide.LowerBound);
                double bound = table.Difference.Interval(confidence).Lower;
                foreach (DifferenceMargin margin in margins.Where(m => Math.Abs(bound - m.Bound) > 1e-12))
                {
                    PairedDifferenceTest test = margin.Test(table.Difference);
                    Assert.Equal(bound > margin.Bound, test.PValue.Value <= error);
                    Assert.Equal(bound, test.Interval(confidence).Lower);
                    rejected += bound > margin.Bound ? 1 : 0;
                }
            }
        }

        Assert.InRange(rejected, 1000, 13_000);
    }

    [Fact]
    public void Equivalence_and_interval_agree()
    {
        int equivalent = 0;
        foreach (PairedTable table in PairedTables.UpTo(12).Concat(PairedTables.Sample(300)))
        {
            foreach (DifferenceEquivalenceMargins margins in new[] { DifferenceEquivalenceMargins.Within(0.3), DifferenceEquivalenceMargins.Between(-0.2, 0.35) })
            {
                PairedDifferenceEquivalence test = margins.Test(table.Difference);
                ConfidenceInterval interval = test.Interval(Confidence.TwoSided(0.8));
                bool within = interval.Lower > margins.Lower && interval.Upper < margins.Upper;
                Assert.Equal(within, test.PValue.Value <= 0.1);
                Assert.Equal(
                    Math.Max(
                        DifferenceMargin.NonInferiority(-margins.Lower).Test(table.Difference).PValue.Value,
                        DifferenceMargin.NonInferiority(margins.Upper).Test(table.Swapped.Difference).PValue.Value),
                    test.PValue.Value,
                    1e-15);
                equivalent += within ? 1 : 0;
            }
        }

        Assert.True(equivalent > 100, $"{equivalent}");
    }

    [Fact]
    public void The_default_interval_leaves_out_0_exactly_when_McNemar_s_default_rejects()
    {
        int rejected = 0;
        foreach (PairedTable table in PairedTables.UpTo(12).Concat(PairedTables.Sample(300)))
        {
            PairedTest test = table.McNemar();
            Assert.Equal(!table.Difference.Interval().Contains(0), test.PValue.Value < 0.05);
            double oneSided = DifferenceMargin.Superiority().Test(table.Difference).PValue.Value;
            Assert.Equal(test.PValue.Value, 2 * Math.Min(oneSided, 1 - oneSided), 1e-14);
            rejected += test.PValue.Value < 0.05 ? 1 : 0;
        }

        Assert.True(rejected > 200, $"{rejected}");
    }

    [Fact]
    public void Tests_that_agree_on_everyone_still_have_an_interval()
    {
        // Without discordant subjects the limit is z^2 / (n + z^2) on both sides.
        double square = 1.959963984540054 * 1.959963984540054;
        foreach (PairedTable table in new[] { new PairedTable(54, 0, 0, 0), new PairedTable(20, 0, 0, 34), new PairedTable(0, 0, 0, 54) })
        {
            Assert.Equal(0, table.Difference.Value);
            Assert.Equal(square / (54 + square), table.Difference.Interval().Upper, 1e-14);
            Assert.Equal(-square / (54 + square), table.Difference.Interval().Lower, 1e-14);
            Assert.Equal(0, DifferenceMargin.Superiority().Test(table.Difference).Statistic.Value);
            Assert.True(DifferenceMargin.NonInferiority(0.1).Test(table.Difference).PValue.Value < 0.05);
        }
    }

    [Fact]
    public void Without_subjects_it_is_undefined()
    {
        PairedDifference difference = new(default);
        Assert.False(difference.IsDefined);
        Assert.True(double.IsNaN(difference.Value));
        Assert.Equal("0/0 - 0/0 (undefined: there are no subjects)", difference.ToString());
        foreach (PairedDifferenceMethod method in Enum.GetValues<PairedDifferenceMethod>())
        {
            Assert.Equal(UndefinedCause.NoSubjects, difference.Interval(default, method).WhyUndefined?.Cause);
        }

        Assert.Equal(UndefinedCause.NoSubjects, DifferenceMargin.NonInferiority(0.1).Test(difference).PValue.WhyUndefined?.Cause);
        Assert.Equal(UndefinedCause.NoSubjects, DifferenceEquivalenceMargins.Within(0.1).Test(difference).PValue.WhyUndefined?.Cause);
        Assert.False(DifferenceEquivalenceMargins.Within(0.1).Test(difference).Interval().IsDefined);
        Assert.Throws<ArgumentOutOfRangeException>("method", () => difference.Interval(default, (PairedDifferenceMethod)99));
    }

    [Theory]
    [InlineData(double.NaN)]
    [InlineData(0)]
    [InlineData(1)]
    [InlineData(-0.1)]
    [InlineData(double.PositiveInfinity)]
    public void Margins_outside_of_their_range_are_refused(double margin)
    {
        Assert.Throws<ArgumentOutOfRangeException>(nameof(margin), () => DifferenceEquivalenceMargins.Within(margin));
        Assert.Throws<ArgumentOutOfRangeException>("upper", () => DifferenceEquivalenceMargins.Between(-0.1, margin));
        Assert.Throws<ArgumentOutOfRangeException>("lower", () => DifferenceEquivalenceMargins.Between(-margin * 10, 0.1));
    }

    private static double Statistic(PairedTable table, double bound) =>
        (bound < 0 ? DifferenceMargin.NonInferiority(-bound) : DifferenceMargin.Superiority(bound)).Test(table.Difference).Statistic.Value;
}
