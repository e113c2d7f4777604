using DiagnosticAccuracy.Proportions;

namespace DiagnosticAccuracy.Tests.Proportions;

public class OddsRatioTests
{
    public static TheoryData<OddsRatioMethod> Methods() => [.. Enum.GetValues<OddsRatioMethod>()];

    [Theory]
    [MemberData(nameof(Methods))]
    public void Every_small_table_has_limits_that_hold_the_laws(OddsRatioMethod method) =>
        AssertLaws(TwoProportionTables.UpTo(12), method);

    [Theory]
    [MemberData(nameof(Methods))]
    public void Larger_tables_hold_the_laws(OddsRatioMethod method) => AssertLaws(TwoProportionTables.SampleUpTo30(), method);

    private static void AssertLaws(IEnumerable<(Proportion First, Proportion Second)> tables, OddsRatioMethod method)
    {
        foreach ((Proportion first, Proportion second) in tables)
        {
            OddsRatio odds = new(first, second);
            ConfidenceInterval wide = odds.Interval(Confidence.TwoSided(0.99), method);
            double numerator = first.Successes * second.Failures;
            double denominator = first.Failures * second.Successes;
            Assert.Equal(numerator > 0 || denominator > 0, odds.IsDefined);
            Assert.Equal(odds.IsDefined, wide.IsDefined);
            if (!odds.IsDefined)
            {
                Assert.Equal(UndefinedCause.ZeroOverZero, wide.WhyUndefined?.Cause);
                continue;
            }

            Assert.Equal(numerator / denominator, odds.Value);
            ConfidenceInterval narrow = odds.Interval(Confidence.TwoSided(0.8), method);
            Assert.True(0 <= wide.Lower && wide.Lower <= narrow.Lower && narrow.Upper <= wide.Upper, $"{odds} {wide} {narrow}");
            if (method != OddsRatioMethod.LogAddHalf)
            {
                Assert.True(wide.Contains(odds.Value), $"{odds} {wide}");
                Assert.Equal(numerator == 0, wide.Lower == 0);
                Assert.Equal(denominator == 0, double.IsPositiveInfinity(wide.Upper));
                Assert.True(wide.Upper > 0 && !double.IsInfinity(wide.Lower));
            }

            // Groups swapped, and outcomes swapped: both invert.
            foreach (OddsRatio inverted in new[] { new OddsRatio(second, first), new OddsRatio(first.Complement, second.Complement) })
            {
                ConfidenceInterval inverse = inverted.Interval(Confidence.TwoSided(0.99), method);
                ProportionRatioTests.Same(1 / wide.Upper, inverse.Lower);
                ProportionRatioTests.Same(1 / wide.Lower, inverse.Upper);
            }

            ProportionRatioTests.Same(wide.Lower, odds.Interval(Confidence.LowerBound(0.995), method).Lower);
            ProportionRatioTests.Same(wide.Upper, odds.Interval(Confidence.UpperBound(0.995), method).Upper);
        }
    }

    /// <summary>At the limits the tail of the distribution given the margins, summed from binomial coefficients, is the error probability.</summary>
    [Fact]
    public void Conditional_limits_leave_the_error_probability_in_the_tail()
    {
        foreach ((Proportion first, Proportion second) in TwoProportionTables.UpTo(9).Where(t => new OddsRatio(t.First, t.Second).IsDefined))
        {
            OddsRatio odds = new(first, second);
            ConfidenceInterval exact = odds.Interval(default, OddsRatioMethod.ExactConditional);
            ConfidenceInterval midP = odds.Interval(default, OddsRatioMethod.MidPConditional);
            Assert.True(midP.Lower >= exact.Lower && midP.Upper <= exact.Upper);
            if (exact.Lower > 0)
            {
                (double _, double here, double above) = Tails(first, second, exact.Lower);
                Assert.Equal(0.025, here + above, 1e-12);
                (_, here, above) = Tails(first, second, midP.Lower);
                Assert.Equal(0.025, (here / 2) + above, 1e-12);
            }

            if (!double.IsInfinity(exact.Upper))
            {
                (double below, double here, double _) = Tails(first, second, exact.Upper);
                Assert.Equal(0.025, here + below, 1e-12);
                (below, here, _) = Tails(first, second, midP.Upper);
                Assert.Equal(0.025, (here / 2) + below, 1e-12);
            }
        }
    }

    /// <summary>
    /// R 4.2.2, fisher.test(matrix(c(3, 1, 0, 4), 2))$conf.int and fisher.test(matrix(c(90, 20, 10, 180), 2))$conf.int, grade R; its root finder stops
    /// early (it gives 197.28 for 198.393 of the term-by-term sum on 110 digits in fixtures.csv), which the tolerance of 1 % allows for.
    /// </summary>
    [Theory]
    [InlineData(3, 0, 1, 4, 0.532866089, double.PositiveInfinity)]
    [InlineData(90, 10, 20, 180, 34.4114867, 197.2832512)]
    public void Agrees_with_the_exact_test_of_a_general_purpose_package(long a, long b, long c, long d, double lower, double upper)
    {
        ConfidenceInterval interval = new OddsRatio(a, b, c, d).Interval(default, OddsRatioMethod.ExactConditional);
        Assert.Equal(lower, interval.Lower, 0.01 * lower);
        if (double.IsInfinity(upper))
        {
            Assert.Equal(upper, interval.Upper);
        }
        else
        {
            Assert.Equal(upper, interval.Upper, 0.01 * upper);
        }
    }

    [Fact]
    public void An_empty_cell_gives_the_conditional_limits_and_says_so()
    {
        ConfidenceInterval interval = new OddsRatio(3, 0, 1, 4).Interval();
        Assert.Equal(new OddsRatio(3, 0, 1, 4).Interval(default, OddsRatioMethod.ExactConditional).Lower, interval.Lower);
        Assert.Equal(double.PositiveInfinity, interval.Upper);
        Assert.Equal("exact conditional (Cornfield), since the log method has no limit with an empty cell", interval.Method);
    }

    /// <summary>Where the expansion takes over, both ways give the same limit.</summary>
    [Theory]
    [InlineData(0.025)]
    [InlineData(1e-7)]
    [InlineData(0.4)]
    public void Expansion_and_summation_meet(double tail)
    {
        double z = DiagnosticAccuracy.Numerics.StandardNormal.UpperQuantile(tail);
        double target = Math.Log(tail / (1 - tail));
        foreach (FourCells cells in new[] { new FourCells(16e9, 9e9, 11e9, 17e9), new FourCells(5e9, 40e9, 6e9, 900e9), new FourCells(90e9, 12e9, 3e9, 20e9) })
        {
            Assert.InRange(cells.Deviation, 4e4, 7e4);
            foreach (double share in new[] { 1, 0.5 })
            {
                double summed = ConditionalOddsRatio.BySummation(cells, z, target, share);
                double expanded = Math.Log(ConditionalOddsRatio.ByExpansion(cells, z, share));
                Assert.Equal(summed, expanded, 1e-12);
            }
        }
    }

    [Fact]
    public void Huge_cells_are_near_the_log_interval()
    {
        foreach (long n in new[] { 10_000_000L, 1_000_000_000_000L, 1_000_000_000_000_000_000L })
        {
            OddsRatio odds = new(n, n / 2, n / 3, n);
            ConfidenceInterval log = odds.Interval();
            ConfidenceInterval exact = odds.Interval(default, OddsRatioMethod.ExactConditional);
            Assert.Equal(log.Lower, exact.Lower, log.Lower * ((20.0 / n) + 1e-15));
            Assert.Equal(log.Upper, exact.Upper, log.Upper * ((20.0 / n) + 1e-15));
        }
    }

    [Fact]
    public void Arguments_equality_and_text()
    {
        Assert.Equal("firstSuccesses", Assert.Throws<ArgumentOutOfRangeException>(() => new OddsRatio(-1, 0, 0, 0)).ParamName);
        Assert.Equal("secondFailures", Assert.Throws<ArgumentOutOfRangeException>(() => new OddsRatio(1, 0, 0, -3)).ParamName);
        Assert.Throws<OverflowException>(() => new OddsRatio(long.MaxValue, 1, 0, 0));
        Assert.Equal("method", Assert.Throws<ArgumentOutOfRangeException>(() => new OddsRatio(1, 2, 3, 4).Interval(default, (OddsRatioMethod)9)).ParamName);
        Assert.Equal(new OddsRatio(1, 2, 3, 4), new OddsRatio(new Proportion(1, 3), new Proportion(3, 7)));
        Assert.Equal("odds of 90/100 over odds of 20/200 = 81", new OddsRatio(90, 10, 20, 180).ToString());
        Assert.Equal(UndefinedCause.NoSubjects, default(OddsRatio).WhyUndefined?.Cause);
    }

    // Below, at and above the first count, given the margins and the odds ratio.
    private static (double Below, double Here, double Above) Tails(Proportion first, Proportion second, double odds)
    {
        long sum = first.Successes + second.Successes;
        double below = 0;
        double here = 0;
        double above = 0;
        for (long k = Math.Max(0, sum - second.Trials); k <= Math.Min(first.Trials, sum); k++)
        {
            double term = Choose(first.Trials, k) * Choose(second.Trials, sum - k) * Math.Pow(odds, k - first.Successes);
            below += k < first.Successes ? term : 0;
            here += k == first.Successes ? term : 0;
            above += k > first.Successes ? term : 0;
        }

        double total = below + here + above;
        return (below / total, here / total, above / total);
    }

    private static double Choose(long n, long k)
    {
        double product = 1;
        for (long i = 1; i <= k; i++)
        {
            product = product * (n - k + i) / i;
        }

        return product;
    }
}
