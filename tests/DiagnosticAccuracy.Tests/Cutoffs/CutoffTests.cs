namespace DiagnosticAccuracy.Tests.Cutoffs;

public class CutoffTests
{
    [Fact]
    public void A_rule_is_a_value_that_prints_and_compares()
    {
        Assert.Equal(CutoffRule.SensitivityAtLeast(0.99), CutoffRule.SensitivityAtLeast(0.99));
        Assert.NotEqual(CutoffRule.SensitivityAtLeast(0.99), CutoffRule.SensitivityAtLeast(0.98));
        Assert.NotEqual(CutoffRule.SensitivityAtLeast(0.99), CutoffRule.SpecificityAtLeast(0.99));
        Assert.Equal("sensitivity at least 0.99", CutoffRule.SensitivityAtLeast(0.99).ToString());
        Assert.Equal("largest Youden index", CutoffRule.LargestYoudenIndex.ToString());
    }

    [Theory]
    [InlineData(double.NaN)]
    [InlineData(-0.01)]
    [InlineData(1.01)]
    public void A_target_outside_0_to_1_is_refused(double target)
    {
        Assert.Equal("target", Assert.Throws<ArgumentOutOfRangeException>(() => CutoffRule.SensitivityAtLeast(target)).ParamName);
        Assert.Equal("target", Assert.Throws<ArgumentOutOfRangeException>(() => CutoffRule.SpecificityAtLeast(target)).ParamName);
    }

    [Fact]
    public void One_group_only_leaves_the_choice_undefined_with_its_reason()
    {
        RocCurve curve = RocCurve.Empirical(ScoredSample.FromGroups([1, 2], [], ScoreDirection.HigherIsPositive));
        foreach (CutoffRule rule in new[] { CutoffRule.LargestYoudenIndex, CutoffRule.SensitivityAtLeast(0.9), CutoffRule.SpecificityAtLeast(0.9) })
        {
            CutoffChoice choice = rule.Choose(curve);
            Assert.False(choice.IsDefined);
            Assert.Empty(choice.Optima);
            Assert.Equal(UndefinedCause.NoSubjectsWithoutCondition, choice.WhyUndefined?.Cause);
        }
    }

    [Fact]
    public void A_target_out_of_reach_gives_a_trivial_cutoff_that_says_so()
    {
        // The lowest score is of a subject with the condition: only "everybody positive" misses nobody.
        RocCurve curve = RocCurve.Empirical(ScoredSample.FromGroups([0, 5], [1, 2], ScoreDirection.HigherIsPositive));
        Assert.True(CutoffRule.SensitivityAtLeast(1).Choose(curve).IsTrivial);
        Assert.False(CutoffRule.SensitivityAtLeast(0.5).Choose(curve).IsTrivial);
    }

    [Fact]
    public void A_cutoff_prints_and_decides()
    {
        Assert.Equal(">= 12.5", Cutoff.AtOrAbove(12.5).ToString());
        Assert.Equal("<= -Infinity", Cutoff.AtOrBelow(double.NegativeInfinity).ToString());
        Assert.Equal("above every score", Cutoff.AboveEveryScore.ToString());
        Assert.Equal("below every score", Cutoff.BelowEveryScore.ToString());
        Assert.True(Cutoff.AtOrAbove(12.5).IsPositive(12.5));
        Assert.False(Cutoff.AtOrAbove(12.5).IsPositive(12.4));
        Assert.True(Cutoff.AtOrBelow(3).IsPositive(3));
        Assert.False(Cutoff.AboveEveryScore.IsPositive(double.PositiveInfinity));
        Assert.False(default(Cutoff).IsPositive(0));
        Assert.Equal(Cutoff.AtOrAbove(0.0), Cutoff.AtOrAbove(-0.0));
        Assert.Throws<ArgumentOutOfRangeException>(() => Cutoff.AtOrAbove(double.NaN));
        Assert.Throws<ArgumentOutOfRangeException>(() => Cutoff.AtOrBelow(double.NaN));
        Assert.Throws<ArgumentOutOfRangeException>(() => Cutoff.AtOrAbove(1).IsPositive(double.NaN));
    }
}
