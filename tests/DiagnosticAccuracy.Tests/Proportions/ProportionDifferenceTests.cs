namespace DiagnosticAccuracy.Tests.Proportions;

public class ProportionDifferenceTests
{
    public static TheoryData<DifferenceMethod> Methods() => [.. Enum.GetValues<DifferenceMethod>()];

    [Theory]
    [MemberData(nameof(Methods))]
    public void Every_small_table_has_limits_that_hold_the_laws(DifferenceMethod method) =>
        AssertLaws(TwoProportionTables.UpTo(12), method);

    [Theory]
    [MemberData(nameof(Methods))]
    public void Larger_tables_hold_the_laws(DifferenceMethod method) => AssertLaws(TwoProportionTables.SampleUpTo30(), method);

    private static void AssertLaws(IEnumerable<(Proportion First, Proportion Second)> tables, DifferenceMethod method)
    {
        bool contains = method is not (DifferenceMethod.AgrestiCaffo or DifferenceMethod.Haldane or DifferenceMethod.JeffreysPerks);
        foreach ((Proportion first, Proportion second) in tables)
        {
            ProportionDifference difference = new(first, second);
            ConfidenceInterval wide = difference.Interval(Confidence.TwoSided(0.99), method);
            ConfidenceInterval narrow = difference.Interval(Confidence.TwoSided(0.8), method);
            Assert.True(-1 <= wide.Lower && wide.Upper <= 1, $"{difference} {wide}");
            Assert.True(!contains || narrow.Contains(difference.Value), $"{difference} {narrow}");

            // Nested up to rounding: some limits are -1, 0 or 1 on paper at every level.
            Assert.True(wide.Lower <= narrow.Lower + 1e-15 && narrow.Upper <= wide.Upper + 1e-15, $"{difference} {wide} {narrow}");

            // Groups swapped; outcomes swapped.
            foreach (ProportionDifference swapped in new[] { new ProportionDifference(second, first), new ProportionDifference(first.Complement, second.Complement) })
            {
                ConfidenceInterval mirrored = swapped.Interval(Confidence.TwoSided(0.99), method);
                Assert.Equal(-wide.Upper, mirrored.Lower, 1e-12);
                Assert.Equal(-wide.Lower, mirrored.Upper, 1e-12);
            }

            Assert.Equal(wide.Lower, difference.Interval(Confidence.LowerBound(0.995), method).Lower, 1e-15);
            Assert.Equal(wide.Upper, difference.Interval(Confidence.UpperBound(0.995), method).Upper, 1e-15);
        }
    }

    [Fact]
    public void One_sided_levels_below_one_half_stay_nested()
    {
        foreach ((Proportion first, Proportion second) in TwoProportionTables.UpTo(5))
        {
            foreach (DifferenceMethod method in Enum.GetValues<DifferenceMethod>())
            {
                double lower = 1;
                foreach (double level in new[] { 0.1, 0.4, 0.5, 0.6, 0.99 })
                {
                    double next = new ProportionDifference(first, second).Interval(Confidence.LowerBound(level), method).Lower;
                    Assert.InRange(next, -1, lower + 1e-15);
                    lower = next;
                }
            }
        }
    }

    [Fact]
    public void An_empty_group_leaves_it_undefined()
    {
        ProportionDifference difference = new(new Proportion(3, 5), default);
        Assert.False(difference.IsDefined);
        Assert.True(double.IsNaN(difference.Value));
        Assert.Equal("3/5 - 0/0 (undefined: there are no trials (0 of 0))", difference.ToString());
        foreach (DifferenceMethod method in Enum.GetValues<DifferenceMethod>())
        {
            Assert.Equal(UndefinedCause.NoSubjects, difference.Interval(default, method).WhyUndefined?.Cause);
        }

        DifferenceTest test = DifferenceMargin.NonInferiority(0.1).Test(difference);
        Assert.Equal(UndefinedCause.NoSubjects, test.PValue.WhyUndefined?.Cause);
        Assert.False(test.Statistic.IsDefined);
        Assert.False(test.Interval().IsDefined);
    }

    /// <summary>The p-value is below the error probability exactly when the lower bound is above the margin: every table up to 12 and 12.</summary>
    [Fact]
    public void Test_and_interval_agree()
    {
        DifferenceMargin[] margins = [DifferenceMargin.NonInferiority(0.1), default, DifferenceMargin.Superiority(0.05), DifferenceMargin.NonInferiority(0.4)];
        int rejected = 0;
        foreach ((Proportion first, Proportion second) in TwoProportionTables.UpTo(12))
        {
            ProportionDifference difference = new(first, second);
            foreach (double error in new[] { 0.025, 0.2 })
            {
                double bound = difference.Interval(Confidence.FromErrorProbability(error, IntervalSide.LowerBound), DifferenceMethod.Mee).Lower;
                foreach (DifferenceMargin margin in margins.Where(m => Math.Abs(bound - m.Bound) > 1e-9))
                {
                    DifferenceTest test = margin.Test(difference);
                    Assert.Equal(bound > margin.Bound, test.PValue.Value < error);
                    Assert.Equal(bound, test.Interval(Confidence.FromErrorProbability(error, IntervalSide.LowerBound)).Lower);
                    rejected += bound > margin.Bound ? 1 : 0;
                }
            }
        }

        Assert.InRange(rejected, 1000, 100_000);
    }

    /// <summary>Against 0 the statistic is that of the pooled test, (p1 - p2) / sqrt(p (1 - p) (1/n1 + 1/n2)).</summary>
    [Fact]
    public void Superiority_is_the_pooled_test()
    {
        foreach ((Proportion first, Proportion second) in TwoProportionTables.UpTo(10))
        {
            double pooled = (first.Successes + second.Successes) / (double)(first.Trials + second.Trials);
            double error = Math.Sqrt(pooled * (1 - pooled) * ((1.0 / first.Trials) + (1.0 / second.Trials)));
            DifferenceTest test = DifferenceMargin.Superiority().Test(new ProportionDifference(first, second));
            double expected = first.Value == second.Value ? 0 : (first.Value - second.Value) / error;
            Assert.Equal(expected, test.Statistic.Value, 1e-12 * Math.Max(1, Math.Abs(expected)));
        }
    }

    /// <summary>The plain subtraction keeps five digits here, and a root sought to 1e-18 in absolute terms kept six.</summary>
    [Fact]
    public void Differences_of_proportions_near_1_keep_their_digits()
    {
        ProportionDifference difference = new(new Proportion(999_999_999_999, 1_000_000_000_000), new Proportion(999_999_999_990, 1_000_000_000_000));
        Assert.Equal(9e-12, difference.Value, 9e-12 * 1e-14);
        ProportionDifference failures = new(new Proportion(10, 1_000_000_000_000), new Proportion(1, 1_000_000_000_000));
        foreach (DifferenceMethod method in new[] { DifferenceMethod.HybridScore, DifferenceMethod.Mee, DifferenceMethod.MiettinenNurminen, DifferenceMethod.Wald })
        {
            Assert.Equal(failures.Interval(default, method).Lower, difference.Interval(default, method).Lower, 1e-12 * 1e-10);
            Assert.Equal(failures.Interval(default, method).Upper, difference.Interval(default, method).Upper, 1e-12 * 1e-10);
        }
    }

    [Fact]
    public void Margins_are_checked_and_show()
    {
        Assert.Equal(-0.05, DifferenceMargin.NonInferiority(0.05).Bound);
        Assert.Equal(DifferenceMargin.Superiority(), default);
        Assert.Equal("difference above -0.05", DifferenceMargin.NonInferiority(0.05).ToString());
        foreach (double bad in new[] { double.NaN, 1, -0.01 })
        {
            Assert.Equal("margin", Assert.Throws<ArgumentOutOfRangeException>(() => DifferenceMargin.NonInferiority(bad)).ParamName);
            Assert.Equal("margin", Assert.Throws<ArgumentOutOfRangeException>(() => DifferenceMargin.Superiority(bad)).ParamName);
        }

        Assert.Throws<ArgumentOutOfRangeException>(() => DifferenceMargin.NonInferiority(0));
        Assert.Equal("method", Assert.Throws<ArgumentOutOfRangeException>(() => default(ProportionDifference).Interval(default, (DifferenceMethod)20)).ParamName);
        Assert.Equal("56/70 - 48/80 = 0.2", new ProportionDifference(new Proportion(56, 70), new Proportion(48, 80)).ToString());
    }
}
