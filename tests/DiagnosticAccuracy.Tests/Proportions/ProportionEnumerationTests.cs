namespace DiagnosticAccuracy.Tests.Proportions;

/// <summary>The laws of an interval, for every count of every number of trials up to 30 and every method.</summary>
public class ProportionEnumerationTests
{
    private static readonly double[] Levels = [0.5, 0.8, 0.95, 0.999, 1 - 1e-9];

    public static TheoryData<ProportionMethod> Methods() => [.. Enum.GetValues<ProportionMethod>()];

    [Theory]
    [MemberData(nameof(Methods))]
    public void Within_the_space_around_the_value_nested_and_mirrored(ProportionMethod method)
    {
        foreach (Proportion proportion in All())
        {
            ConfidenceInterval inner = new(proportion.Value, proportion.Value, default, "the value itself");
            foreach (double level in Levels)
            {
                ConfidenceInterval interval = proportion.Interval(Confidence.TwoSided(level), method);
                Assert.InRange(interval.Lower, 0, inner.Lower);
                Assert.InRange(interval.Upper, inner.Upper, 1);
                Assert.True(interval.Contains(proportion.Value));

                ConfidenceInterval mirrored = proportion.Complement.Interval(Confidence.TwoSided(level), method);
                Assert.Equal(1 - interval.Upper, mirrored.Lower, 1e-14);
                Assert.Equal(1 - interval.Lower, mirrored.Upper, 1e-14);
                inner = interval;
            }
        }
    }

    [Theory]
    [MemberData(nameof(Methods))]
    public void One_sided_bounds_move_outward_with_the_level_and_have_the_end_of_the_space_opposite(ProportionMethod method)
    {
        foreach (Proportion proportion in All().Where(p => p.Trials % 3 == 0))
        {
            double lower = 1;
            double upper = 0;
            foreach (double level in new[] { 0.05, 0.3, 0.5, 0.7, 0.975 })
            {
                ConfidenceInterval below = proportion.Interval(Confidence.LowerBound(level), method);
                ConfidenceInterval above = proportion.Interval(Confidence.UpperBound(level), method);
                Assert.InRange(below.Lower, 0, lower);
                Assert.InRange(above.Upper, upper, 1);
                Assert.Equal(1, below.Upper);
                Assert.Equal(0, above.Lower);
                lower = below.Lower;
                upper = above.Upper;
            }

            ConfidenceInterval twoSided = proportion.Interval(Confidence.TwoSided(0.95), method);
            Assert.Equal(lower, twoSided.Lower);
            Assert.Equal(upper, twoSided.Upper);
        }
    }

    [Theory]
    [MemberData(nameof(Methods))]
    public void Limits_rise_with_the_count(ProportionMethod method)
    {
        for (long n = 1; n <= 30; n++)
        {
            ConfidenceInterval previous = new Proportion(0, n).Interval(default, method);
            for (long x = 1; x <= n; x++)
            {
                ConfidenceInterval interval = new Proportion(x, n).Interval(default, method);
                Assert.True(interval.Lower >= previous.Lower && interval.Upper >= previous.Upper, $"{method} {x} of {n}");
                previous = interval;
            }
        }
    }

    [Theory]
    [MemberData(nameof(Methods))]
    public void Huge_and_extreme_counts_have_limits_that_order(ProportionMethod method)
    {
        foreach (long n in new[] { 1_000_000_000L, 1_000_000_000_000_000L })
        {
            foreach (long x in new[] { 0, 1, 1000, n / 3, n / 2, n - 1, n })
            {
                ConfidenceInterval interval = new Proportion(x, n).Interval(Confidence.FromErrorProbability(1e-9), method);
                Assert.True(interval.Lower <= (double)x / n && interval.Upper >= (double)x / n, $"{method} {x} of {n}: {interval}");
                Assert.True(interval.Width < 2e-3 || x == n / 2 || x == n / 3, $"{method} {x} of {n}: {interval}");
            }
        }
    }

    private static IEnumerable<Proportion> All()
    {
        for (long n = 1; n <= 30; n++)
        {
            for (long x = 0; x <= n; x++)
            {
                yield return new Proportion(x, n);
            }
        }
    }
}
