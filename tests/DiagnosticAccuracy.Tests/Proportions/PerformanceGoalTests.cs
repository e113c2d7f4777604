namespace DiagnosticAccuracy.Tests.Proportions;

public class PerformanceGoalTests
{
    /// <summary>
    /// Sensitivity 0.95 against a goal of 0.90, one-sided 0.025, power 0.80, computed independently for this project (grade R): the first number
    /// of subjects is 231 with at least 217 positive (power 0.816), and every number from 255 on has the power.
    /// </summary>
    [Fact]
    public void The_first_number_of_subjects_with_the_power_is_231()
    {
        PerformanceGoal goal = PerformanceGoal.Above(0.90);
        long? first = null;
        long lastShort = 0;
        for (long n = 1; n <= 600; n++)
        {
            long? critical = goal.CriticalCount(n);
            double power = critical is long x ? SlowBinomial.AtLeast(x, n, 0.95) : 0;
            if (power >= 0.80)
            {
                first ??= n;
            }
            else
            {
                lastShort = n;
            }
        }

        Assert.Equal(231, first);
        Assert.Equal(254, lastShort);
        Assert.Equal(217, goal.CriticalCount(231));
        Assert.Equal(0.816, SlowBinomial.AtLeast(217, 231, 0.95), 0.5e-3);
    }

    /// <summary>The least n without a failure whose one-sided 95 % lower bound reaches the goal (grade R; n is ln 0.05 / ln goal, rounded up).</summary>
    [Theory]
    [InlineData(0.90, 29)]
    [InlineData(0.95, 59)]
    [InlineData(0.98, 149)]
    [InlineData(0.99, 299)]
    public void Zero_failures(double goal, long n)
    {
        GoalResult enough = PerformanceGoal.Above(goal).Test(new Proportion(n, n), 0.05);
        GoalResult tooFew = PerformanceGoal.Above(goal).Test(new Proportion(n - 1, n - 1), 0.05);
        Assert.True(enough.IsMet);
        Assert.True(enough.Bound.Lower >= goal);
        Assert.False(tooFew.IsMet);
        Assert.True(tooFew.Bound.Lower < goal);
        Assert.Equal(Math.Pow(goal, n), enough.PValue.Value, 1e-13);
    }

    [Fact]
    public void The_p_value_is_the_binomial_tail_and_agrees_with_the_bound()
    {
        foreach (double value in new[] { 0.1, 0.5, 0.85 })
        {
            PerformanceGoal above = PerformanceGoal.Above(value);
            PerformanceGoal below = PerformanceGoal.Below(value);
            for (long n = 1; n <= 30; n++)
            {
                for (long x = 0; x <= n; x++)
                {
                    Proportion proportion = new(x, n);
                    GoalResult up = above.Test(proportion, 0.05);
                    GoalResult down = below.Test(proportion, 0.05);
                    Assert.Equal(SlowBinomial.AtLeast(x, n, value), up.PValue.Value, 1e-13);
                    Assert.Equal(SlowBinomial.AtLeast(n - x, n, 1 - value), down.PValue.Value, 1e-13);
                    Assert.Equal(up.IsMet, up.Bound.Lower >= value);
                    Assert.Equal(down.IsMet, down.Bound.Upper <= value);
                    Assert.Equal(IntervalSide.LowerBound, up.Bound.Confidence.Side);
                    Assert.Equal(1, up.Bound.Upper);
                    Assert.Equal(0, down.Bound.Lower);
                    Assert.Equal(up.IsMet, above.CriticalCount(n, 0.05) <= x);
                    Assert.Equal(down.IsMet, below.CriticalCount(n, 0.05) >= x);
                }
            }
        }
    }

    /// <summary>Enumeration of every pair of counts: the size of the test of both is that of one when the other holds for certain.</summary>
    [Fact]
    public void Both_goals_at_the_whole_level_keep_the_level()
    {
        CoPrimaryGoals goals = new(PerformanceGoal.Above(0.8), PerformanceGoal.Above(0.7));
        const long n = 24;
        double sizeOfFirst = 0;
        double sizeAtBoth = 0;
        double worst = 0;
        for (long x = 0; x <= n; x++)
        {
            for (long y = 0; y <= n; y++)
            {
                CoPrimaryResult result = goals.Test(new Proportion(x, n), new Proportion(y, n), 0.05);
                Assert.Equal(result.First.IsMet && result.Second.IsMet, result.IsMet);
                Assert.Equal(result.IsMet, result.PValue.Value <= 0.05);
                if (result.IsMet)
                {
                    sizeAtBoth += SlowBinomial.Probability(x, n, 0.8) * SlowBinomial.Probability(y, n, 0.7);
                    worst += SlowBinomial.Probability(x, n, 0.8) * SlowBinomial.Probability(y, n, 0.999999999);
                }
            }

            if (goals.First.Test(new Proportion(x, n), 0.05).IsMet)
            {
                sizeOfFirst += SlowBinomial.Probability(x, n, 0.8);
            }
        }

        Assert.InRange(worst, 0.01, 0.05);
        Assert.Equal(sizeOfFirst, worst, 1e-6);
        Assert.True(sizeAtBoth < worst * 0.05);
    }

    [Fact]
    public void Nothing_observed_is_undefined_and_not_met()
    {
        GoalResult result = PerformanceGoal.Above(0.9).Test(default);
        Assert.False(result.IsMet);
        Assert.Equal(UndefinedCause.NoSubjects, result.PValue.WhyUndefined?.Cause);
        Assert.False(result.Bound.IsDefined);
        CoPrimaryResult both = new CoPrimaryGoals(PerformanceGoal.Above(0.9), PerformanceGoal.Above(0.9)).Test(new Proportion(50, 50), default);
        Assert.True(both.First.IsMet);
        Assert.False(both.IsMet);
        Assert.False(both.PValue.IsDefined);
        Assert.Null(PerformanceGoal.Above(0.9).CriticalCount(5));
    }

    [Fact]
    public void Text()
    {
        Assert.Equal("217/231 = 0.939394 above 0.9: p = 0.0238964, met", PerformanceGoal.Above(0.9).Test(new Proportion(217, 231)).ToString());
        Assert.Equal("above 0.9 and below 0.05", new CoPrimaryGoals(PerformanceGoal.Above(0.9), PerformanceGoal.Below(0.05)).ToString());
    }

    [Theory]
    [InlineData(0)]
    [InlineData(1)]
    [InlineData(double.NaN)]
    public void Bad_arguments_are_named(double bad)
    {
        Assert.Equal("goal", Assert.Throws<ArgumentOutOfRangeException>(() => PerformanceGoal.Above(bad)).ParamName);
        Assert.Equal("goal", Assert.Throws<ArgumentOutOfRangeException>(() => PerformanceGoal.Below(bad)).ParamName);
        Assert.Equal("significance", Assert.Throws<ArgumentOutOfRangeException>(() => PerformanceGoal.Above(0.9).Test(new Proportion(1, 2), bad)).ParamName);
        Assert.Equal("significance", Assert.Throws<ArgumentOutOfRangeException>(() => PerformanceGoal.Above(0.9).CriticalCount(5, bad)).ParamName);
        Assert.Equal("trials", Assert.Throws<ArgumentOutOfRangeException>(() => PerformanceGoal.Above(0.9).CriticalCount(0)).ParamName);
    }
}
