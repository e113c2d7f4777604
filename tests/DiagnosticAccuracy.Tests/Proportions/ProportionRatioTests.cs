namespace DiagnosticAccuracy.Tests.Proportions;

public class ProportionRatioTests
{
    public static TheoryData<RatioMethod> Methods() => [.. Enum.GetValues<RatioMethod>()];

    [Theory]
    [MemberData(nameof(Methods))]
    public void Every_small_table_has_limits_that_hold_the_laws(RatioMethod method) =>
        AssertLaws(TwoProportionTables.UpTo(12), method);

    [Theory]
    [MemberData(nameof(Methods))]
    public void Larger_tables_hold_the_laws(RatioMethod method) => AssertLaws(TwoProportionTables.SampleUpTo30(), method);

    private static void AssertLaws(IEnumerable<(Proportion First, Proportion Second)> tables, RatioMethod method)
    {
        foreach ((Proportion first, Proportion second) in tables)
        {
            ProportionRatio ratio = new(first, second);
            Assert.Equal(first.Successes > 0 || second.Successes > 0, ratio.IsDefined);
            ConfidenceInterval wide = ratio.Interval(Confidence.TwoSided(0.99), method);
            Assert.Equal(ratio.IsDefined, wide.IsDefined);
            if (!ratio.IsDefined)
            {
                Assert.Equal(UndefinedCause.ZeroOverZero, wide.WhyUndefined?.Cause);
                Assert.True(double.IsNaN(ratio.Value));
                continue;
            }

            ConfidenceInterval narrow = ratio.Interval(Confidence.TwoSided(0.8), method);
            Assert.True(0 <= wide.Lower && wide.Lower <= narrow.Lower && narrow.Upper <= wide.Upper, $"{ratio} {wide} {narrow}");
            if (method == RatioMethod.LogAddHalf)
            {
                Assert.True(wide.Lower > 0 && !double.IsInfinity(wide.Upper));
            }
            else
            {
                Assert.True(narrow.Contains(ratio.Value), $"{ratio} {narrow}");
                Assert.Equal(first.Successes == 0, wide.Lower == 0);
                Assert.Equal(second.Successes == 0, double.IsPositiveInfinity(wide.Upper));
                Assert.True(wide.Upper > 0 && !double.IsInfinity(wide.Lower));
            }

            ConfidenceInterval inverse = ratio.Inverse.Interval(Confidence.TwoSided(0.99), method);
            Same(1 / wide.Upper, inverse.Lower);
            Same(1 / wide.Lower, inverse.Upper);
            Same(wide.Lower, ratio.Interval(Confidence.LowerBound(0.995), method).Lower);
            Assert.Equal(double.PositiveInfinity, ratio.Interval(Confidence.LowerBound(0.995), method).Upper);
            Same(wide.Upper, ratio.Interval(Confidence.UpperBound(0.995), method).Upper);
            Assert.Equal(0, ratio.Interval(Confidence.UpperBound(0.995), method).Lower);
        }
    }

    [Fact]
    public void An_empty_cell_gives_the_score_limits_and_says_so()
    {
        ProportionRatio infinite = new(new Proportion(5, 10), new Proportion(0, 20));
        ConfidenceInterval interval = infinite.Interval();
        Assert.Equal(double.PositiveInfinity, infinite.Value);
        Assert.Equal(infinite.Interval(default, RatioMethod.Koopman).Lower, interval.Lower);
        Assert.Equal("score (Koopman), since the log method has no limit with an empty cell", interval.Method);

        ProportionRatio full = new(new Proportion(10, 10), new Proportion(20, 20));
        Assert.Equal(1, full.Value);
        Assert.Equal("score (Koopman), since the log method has no width when every trial is a success", full.Interval().Method);
        Assert.Equal("log", new ProportionRatio(new Proportion(10, 10), new Proportion(19, 20)).Interval().Method);
    }

    /// <summary>With nothing but successes the score statistic is n2 (r - 1) for r above 1, so the limits are closed forms (algebra).</summary>
    [Fact]
    public void Only_successes_have_limits_in_closed_form()
    {
        double square = 1.959963984540054 * 1.959963984540054;
        ConfidenceInterval interval = new ProportionRatio(new Proportion(10, 10), new Proportion(20, 20)).Interval();
        Assert.Equal(1 + (square / 20), interval.Upper, 1e-12);
        Assert.Equal(1 / (1 + (square / 10)), interval.Lower, 1e-12);
    }

    [Fact]
    public void One_sided_levels_below_one_half_stay_nested()
    {
        foreach ((Proportion first, Proportion second) in TwoProportionTables.UpTo(5).Where(t => t.First.Successes + t.Second.Successes > 0))
        {
            foreach (RatioMethod method in Enum.GetValues<RatioMethod>())
            {
                double lower = double.PositiveInfinity;
                foreach (double level in new[] { 0.1, 0.4, 0.5, 0.6, 0.99 })
                {
                    double next = new ProportionRatio(first, second).Interval(Confidence.LowerBound(level), method).Lower;
                    Assert.InRange(next, 0, lower);
                    lower = next;
                }
            }
        }
    }

    [Fact]
    public void Equality_text_and_refusal()
    {
        ProportionRatio ratio = new(new Proportion(90, 100), new Proportion(20, 200));
        Assert.Equal(ratio, new ProportionRatio(new Proportion(90, 100), new Proportion(20, 200)));
        Assert.Equal("(90/100) / (20/200) = 9", ratio.ToString());
        Assert.Equal(
            "(0/10) / (0/20) (undefined: both proportions are zero, and zero over zero has no value)",
            new ProportionRatio(new Proportion(0, 10), new Proportion(0, 20)).ToString());
        Assert.Equal("method", Assert.Throws<ArgumentOutOfRangeException>(() => ratio.Interval(default, (RatioMethod)9)).ParamName);
    }

    internal static void Same(double expected, double actual)
    {
        if (double.IsInfinity(expected) || expected == 0)
        {
            Assert.Equal(expected, actual);
        }
        else
        {
            Assert.Equal(expected, actual, 1e-11 * expected);
        }
    }
}
