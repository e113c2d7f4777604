using DiagnosticAccuracy.Tests.Contracts;

namespace DiagnosticAccuracy.Tests.Tables;

public class EstimatedPrevalenceTests
{
    private static readonly ConfusionMatrix Example = new(90, 20, 10, 180);
    private static readonly ConfidenceInterval Reported = new(.02, .11, Confidence.TwoSided(.95), "as reported");

    /// <summary>Variance recovery written out on the log odds: an independent computation from the limits of both parts.</summary>
    [Fact]
    public void A_reported_interval_and_the_counts_behind_it_give_the_same_predictive_values()
    {
        Proportion counts = new(5, 100);
        EstimatedPrevalence reported = new(new Prevalence(.05), counts.Interval());
        EstimatedPredictiveValues fromReport = Example.PredictiveValuesAtEstimated(reported);
        EstimatedPredictiveValues fromCounts = Example.PredictiveValuesAtEstimated(counts);
        Assert.Equal(fromCounts.Positive.Value, fromReport.Positive.Value, 1e-15);
        Assert.Equal(fromCounts.Positive.Interval().Lower, fromReport.Positive.Interval().Lower, 1e-13);
        Assert.Equal(fromCounts.Positive.Interval().Upper, fromReport.Positive.Interval().Upper, 1e-13);
        Assert.Equal(fromCounts.Negative.Interval().Lower, fromReport.Negative.Interval().Lower, 1e-13);
        Assert.Equal(fromCounts.Negative.Interval().Upper, fromReport.Negative.Interval().Upper, 1e-13);

        ConfidenceInterval ratio = Example.PositiveLikelihoodRatio.Interval();
        ConfidenceInterval prevalence = counts.Interval();
        double center = Math.Log(9) + Logit(.05);
        double below = Math.Sqrt(Square(Math.Log(9 / ratio.Lower)) + Square(Logit(.05) - Logit(prevalence.Lower)));
        double above = Math.Sqrt(Square(Math.Log(ratio.Upper / 9)) + Square(Logit(prevalence.Upper) - Logit(.05)));
        Assert.Equal(1 / (1 + Math.Exp(below - center)), fromReport.Positive.Interval().Lower, 1e-12);
        Assert.Equal(1 / (1 + Math.Exp(-above - center)), fromReport.Positive.Interval().Upper, 1e-12);
    }

    [Fact]
    public void A_reported_interval_is_itself_at_its_level_and_moves_on_the_logit_scale_at_another()
    {
        EstimatedPrevalence prevalence = new(new Prevalence(.05), Reported);
        Assert.Equal(Reported, prevalence.Interval());
        ConfidenceInterval bound = prevalence.Interval(Confidence.LowerBound(.975));
        Assert.Equal(.02, bound.Lower);
        Assert.Equal(1, bound.Upper);
        Assert.Equal("as reported", bound.Method);

        const double z = 2.5758293035489004 / 1.959963984540054;
        ConfidenceInterval wide = prevalence.Interval(Confidence.TwoSided(.99));
        Assert.Equal(Logit(.05) - (z * (Logit(.05) - Logit(.02))), Logit(wide.Lower), 1e-12);
        Assert.Equal(Logit(.05) + (z * (Logit(.11) - Logit(.05))), Logit(wide.Upper), 1e-12);
        Assert.Equal("as reported, carried to another level on the logit scale", wide.Method);

        // Below one half a bound lies on the other side of the estimate.
        Assert.InRange(prevalence.Interval(Confidence.LowerBound(.4)).Lower, .05, .11);
    }

    [Fact]
    public void A_reported_prevalence_at_an_end_holds_at_its_own_level_only()
    {
        EstimatedPrevalence none = new(new Prevalence(0), new ConfidenceInterval(0, .03, Confidence.TwoSided(.95), "as reported"));
        Assert.Equal(.03, none.Interval().Upper);
        Assert.Equal(UndefinedCause.MethodHasNoLimit, none.Interval(Confidence.TwoSided(.9)).WhyUndefined?.Cause);
        EstimatedPredictiveValue positive = Example.PredictiveValuesAtEstimated(none).Positive;
        Assert.Equal(0, positive.Value);
        Assert.Contains("give the counts", positive.Interval().WhyUndefined?.Explanation, StringComparison.Ordinal);

        // A limit at an end stays there.
        EstimatedPrevalence low = new(new Prevalence(.01), new ConfidenceInterval(0, .03, Confidence.TwoSided(.95), "as reported"));
        Assert.Equal(0, low.Interval(Confidence.TwoSided(.99)).Lower);
        Assert.Equal(0, Example.PredictiveValuesAtEstimated(low).Positive.Interval().Lower);
        Assert.Equal(1, Example.PredictiveValuesAtEstimated(low).Negative.Interval().Upper);
    }

    [Fact]
    public void A_wider_report_gives_a_wider_predictive_value()
    {
        ConfidenceInterval known = Example.PredictiveValuesAt(new Prevalence(.05)).Positive.Interval();
        ConfidenceInterval estimated = Example.PredictiveValuesAtEstimated(new EstimatedPrevalence(new Prevalence(.05), Reported)).Positive.Interval();
        ConfidenceInterval certain = Example.PredictiveValuesAtEstimated(
            new EstimatedPrevalence(new Prevalence(.05), new ConfidenceInterval(.05, .05, default, "certain"))).Positive.Interval();
        Assert.True(estimated.Lower < known.Lower && known.Upper < estimated.Upper);
        Assert.Equal(known.Lower, certain.Lower, 1e-13);
        Assert.Equal(known.Upper, certain.Upper, 1e-13);
    }

    [Fact]
    public void No_subjects_leave_it_undefined()
    {
        Assert.Equal(UndefinedCause.NoSubjects, default(EstimatedPrevalence).WhyUndefined?.Cause);
        ShapeOfTypesTests.AssertCoherent(default(EstimatedPrevalence));
        EstimatedPredictiveValue value = Example.PredictiveValuesAtEstimated(default(EstimatedPrevalence)).Positive;
        Assert.Equal("the prevalence was estimated from no subjects", value.WhyUndefined?.Explanation);
        Assert.False(value.Interval().IsDefined);
        Assert.Equal("0.05, 0.02 to 0.11 (95 % two-sided)", new EstimatedPrevalence(new Prevalence(.05), Reported).ToString());
    }

    [Fact]
    public void Reports_that_are_none_are_refused()
    {
        static ArgumentException Refused(double estimate, ConfidenceInterval interval) =>
            Assert.ThrowsAny<ArgumentException>(() => new EstimatedPrevalence(new Prevalence(estimate), interval));

        Assert.Contains("interval is undefined", Refused(.1, default).Message, StringComparison.Ordinal);
        Assert.Contains("allowed is a two-sided one", Refused(.1, new(0, .2, Confidence.UpperBound(.95), "bound")).Message, StringComparison.Ordinal);
        Assert.Equal("interval", Refused(.1, new(-.01, .2, default, "Wald")).ParamName);
        Assert.Equal("interval", Refused(.1, new(.01, 1.2, default, "Wald")).ParamName);
        Assert.Contains("estimate is 0.3; allowed is a value between the limits, 0.02 to 0.11", Refused(.3, Reported).Message, StringComparison.Ordinal);
    }

    private static double Logit(double p) => Math.Log(p / (1 - p));

    private static double Square(double x) => x * x;
}
