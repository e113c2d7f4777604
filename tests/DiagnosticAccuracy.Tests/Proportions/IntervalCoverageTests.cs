using FsCheck;
using FsCheck.Xunit;

namespace DiagnosticAccuracy.Tests.Proportions;

public class IntervalCoverageTests
{
    /// <summary>Computed independently for this project (grade R), three decimals: n = 20 at 0.95, then n = 100 at 0.99, nominal 95 %.</summary>
    [Theory]
    [InlineData(ProportionMethod.Wald, 0.639, 0.633)]
    [InlineData(ProportionMethod.Wilson, 0.925, 0.921)]
    [InlineData(ProportionMethod.ClopperPearson, 0.984, 0.982)]
    [InlineData(ProportionMethod.MidP, 0.984, 0.982)]
    public void Coverage_near_the_end_of_the_space(ProportionMethod method, double twenty, double hundred)
    {
        Assert.Equal(twenty, IntervalCoverage.At(method, 20, 0.95), 0.5001e-3);
        Assert.Equal(hundred, IntervalCoverage.At(method, 100, 0.99), 0.5001e-3);
    }

    /// <summary>The figure in the documentation of the method.</summary>
    [Fact]
    public void Wald_with_continuity_covers_641_of_1000() =>
        Assert.Equal(0.641, SlowCoverage(ProportionMethod.WaldContinuity, 20, 0.95, default), 0.5001e-3);

    [Property(MaxTest = 400)]
    public void Equals_the_sum_over_every_count(PositiveInt trials, ushort proportion, byte method, byte side)
    {
        long n = (trials.Get % 60) + 1;
        double p = proportion / 65535.0;
        ProportionMethod chosen = (ProportionMethod)(method % Enum.GetValues<ProportionMethod>().Length);
        Confidence confidence = (side % 3) switch
        {
            0 => Confidence.TwoSided(0.9),
            1 => Confidence.LowerBound(0.975),
            _ => Confidence.UpperBound(0.8),
        };
        Assert.Equal(SlowCoverage(chosen, n, p, confidence), IntervalCoverage.At(chosen, n, p, confidence), 1e-12);
    }

    [Fact]
    public void Clopper_Pearson_never_covers_less_than_its_level()
    {
        foreach (Confidence confidence in new[] { default, Confidence.TwoSided(0.5), Confidence.LowerBound(0.975), Confidence.UpperBound(0.9) })
        {
            for (long n = 1; n <= 100; n++)
            {
                CoverageMinimum minimum = IntervalCoverage.Minimum(ProportionMethod.ClopperPearson, n, 0, 1, confidence);
                Assert.True(minimum.Coverage >= confidence.Level - 1e-12, $"n = {n}: {minimum}");
            }
        }
    }

    /// <summary>The one-sided bound of 0 of n misses with the whole error probability: at its limit the coverage is the level.</summary>
    [Fact]
    public void A_one_sided_exact_bound_comes_down_to_its_level()
    {
        CoverageMinimum minimum = IntervalCoverage.Minimum(ProportionMethod.ClopperPearson, 25, 0, 1, Confidence.LowerBound(0.95));
        Assert.Equal(0.95, minimum.Coverage, 1e-12);
        Assert.Equal(CoverageApproach.FromBelow, minimum.Approach);
    }

    public static TheoryData<ProportionMethod, long> MethodsAndTrials()
    {
        TheoryData<ProportionMethod, long> data = [];
        foreach (ProportionMethod method in Enum.GetValues<ProportionMethod>())
        {
            data.Add(method, 7);
            data.Add(method, 30);
        }

        return data;
    }

    [Theory]
    [MemberData(nameof(MethodsAndTrials))]
    public void The_minimum_is_below_any_grid_and_reached_beside_its_place(ProportionMethod method, long n)
    {
        CoverageMinimum minimum = IntervalCoverage.Minimum(method, n, 0.05, 0.95);
        for (int i = 0; i <= 900; i++)
        {
            Assert.True(IntervalCoverage.At(method, n, 0.05 + (i * 0.001)) >= minimum.Coverage - 1e-12);
        }

        double place = minimum.Approach switch
        {
            CoverageApproach.FromAbove => minimum.Proportion * (1 + 1e-11),
            CoverageApproach.FromBelow => minimum.Proportion * (1 - 1e-11),
            _ => minimum.Proportion,
        };
        Assert.InRange(minimum.Proportion, 0.05, 0.95);
        Assert.Equal(SlowCoverage(method, n, place, default), minimum.Coverage, 1e-9);
    }

    /// <summary>Any true proportion near enough to 0 is outside of the one point that 0 of n gives.</summary>
    [Fact]
    public void Wald_comes_down_to_nothing()
    {
        CoverageMinimum minimum = IntervalCoverage.Minimum(ProportionMethod.Wald, 1000);
        Assert.Equal(new CoverageMinimum(0, 0, CoverageApproach.FromAbove), minimum);
        Assert.Equal("0 just above 0", minimum.ToString());
    }

    [Fact]
    public void Huge_numbers_of_trials_have_their_nominal_coverage()
    {
        foreach (ProportionMethod method in Enum.GetValues<ProportionMethod>())
        {
            Assert.Equal(0.95, IntervalCoverage.At(method, 1_000_000_000_000, 0.3), 1e-5);
        }
    }

    [Fact]
    public void Bad_arguments_are_named()
    {
        Assert.Equal("trials", Assert.Throws<ArgumentOutOfRangeException>(() => IntervalCoverage.At(default, 0, 0.5)).ParamName);
        Assert.Equal("proportion", Assert.Throws<ArgumentOutOfRangeException>(() => IntervalCoverage.At(default, 5, double.NaN)).ParamName);
        Assert.Equal("from", Assert.Throws<ArgumentOutOfRangeException>(() => IntervalCoverage.Minimum(default, 5, -0.1, 1)).ParamName);
        Assert.Equal("to", Assert.Throws<ArgumentOutOfRangeException>(() => IntervalCoverage.Minimum(default, 5, 0.5, 0.4)).ParamName);
        Assert.Equal("to", Assert.Throws<ArgumentOutOfRangeException>(() => IntervalCoverage.Minimum(default, 5, 0.5, double.NaN)).ParamName);
        Assert.Equal("method", Assert.Throws<ArgumentOutOfRangeException>(() => IntervalCoverage.At((ProportionMethod)77, 5, 0.5)).ParamName);
    }

    // Every count with its probability, built up factor by factor.
    private static double SlowCoverage(ProportionMethod method, long n, double p, Confidence confidence)
    {
        double sum = 0;
        for (long x = 0; x <= n; x++)
        {
            if (new Proportion(x, n).Interval(confidence, method).Contains(p))
            {
                sum += SlowBinomial.Probability(x, n, p);
            }
        }

        return sum;
    }
}
