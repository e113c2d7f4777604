using DiagnosticAccuracy.Tests.Contracts;
using FsCheck;
using FsCheck.Xunit;

namespace DiagnosticAccuracy.Tests.Tables;

public class ConfusionMatrixTests
{
    private static readonly ConfusionMatrix Example = new(90, 20, 10, 180);

    /// <summary>Computed by hand for this project from the log formulas (grade R, Data/README.md).</summary>
    [Fact]
    public void Measures_of_the_worked_example()
    {
        Assert.Equal(.9, Example.Sensitivity.Value);
        Assert.Equal(.9, Example.Specificity.Value);
        Assert.Equal(.9, Example.Accuracy.Value);
        Assert.Equal(new Proportion(100, 300), Example.SamplePrevalence);
        Assert.Equal(.8, Example.YoudenIndex.Value, 1e-15);
        Check(Example.PositiveLikelihoodRatio, 9.000, 5.908, 13.710, 5e-4);
        Check(Example.NegativeLikelihoodRatio, .1111, .0616, .2004, 5e-5);
        Check(Example.DiagnosticOddsRatio, 81, 36.39, 180.30, 5e-3);
        PredictiveValues at = Example.PredictiveValuesAt(new Prevalence(0.05));
        Check(at.Positive, .3214, .2372, .4191, 5e-5);
        Check(at.Negative, .99419, .98956, .99677, 5e-6);
        Assert.Equal(new Proportion(90, 110), Example.CohortPredictiveValues.Positive);
        Assert.Equal(new Proportion(180, 190), Example.CohortPredictiveValues.Negative);
    }

    [Fact]
    public void Expected_cells_of_the_worked_example()
    {
        ExpectedCells cells = Example.ExpectedFor(1000, new Prevalence(0.05));
        Assert.Equal("of 1000: 50 with the condition (45 positive, 5 negative), 950 without it (95 positive, 855 negative)", cells.ToString());
        Assert.Equal(45, cells.ExactTruePositives.Value, 1e-12);
    }

    [Property(MaxTest = 500)]
    public void Expected_cells_add_up_and_are_within_one_of_the_expectation(
        NonNegativeInt tp, NonNegativeInt fp, NonNegativeInt fn, NonNegativeInt tn, ulong scatter, NonNegativeInt size)
    {
        ConfusionMatrix table = new(tp.Get, fp.Get, fn.Get, tn.Get);
        double prevalence = (scatter % 1_000_003) / 1_000_002.0;
        foreach (long people in new[] { size.Get, 1000L, 999_999_999_999_999L })
        {
            ExpectedCells cells = table.ExpectedFor(people, new Prevalence(prevalence));
            if (!cells.IsDefined)
            {
                Assert.True(table.WithCondition == 0 || table.WithoutCondition == 0);
                Assert.Null(cells.TruePositives);
                Assert.False(cells.ExactTruePositives.IsDefined);
                continue;
            }

            Assert.Equal(people, cells.TruePositives + cells.FalsePositives + cells.FalseNegatives + cells.TrueNegatives);
            double tolerance = 1 + (people * 1e-15);
            Assert.InRange((double)cells.TruePositives! - cells.ExactTruePositives.Value, -tolerance, tolerance);
            Assert.InRange((double)cells.FalsePositives! - cells.ExactFalsePositives.Value, -tolerance, tolerance);
            Assert.InRange((double)cells.FalseNegatives! - cells.ExactFalseNegatives.Value, -tolerance, tolerance);
            Assert.InRange((double)cells.TrueNegatives! - cells.ExactTrueNegatives.Value, -tolerance, tolerance);
        }
    }

    [Fact]
    public void Every_table_of_up_to_30_subjects_answers_or_says_why_not()
    {
        int tables = 0;
        Confidence wider = Confidence.TwoSided(0.99);
        foreach (ConfusionMatrix table in TablesOf(30))
        {
            tables++;
            IIntervalQuantity[] quantities =
            [
                table.Sensitivity, table.Specificity, table.Accuracy, table.SamplePrevalence, table.YoudenIndex,
                table.PositiveLikelihoodRatio, table.NegativeLikelihoodRatio, table.DiagnosticOddsRatio,
                table.CohortPredictiveValues.Positive, table.CohortPredictiveValues.Negative,
                .. new[] { 0, 0.1, 1 }.SelectMany(p => new IIntervalQuantity[]
                {
                    table.PredictiveValuesAt(new Prevalence(p)).Positive, table.PredictiveValuesAt(new Prevalence(p)).Negative,
                }),
            ];
            foreach (IIntervalQuantity quantity in quantities)
            {
                ShapeOfTypesTests.AssertCoherent(quantity);
                ConfidenceInterval interval = quantity.Interval();
                Assert.Equal(quantity.IsDefined, interval.IsDefined);
                if (quantity.IsDefined)
                {
                    MeasureTests.Holds(interval.Contains(quantity.Value), table, quantity, interval);
                    ConfidenceInterval wide = quantity.Interval(wider);
                    MeasureTests.Holds(wide.Lower <= interval.Lower && interval.Upper <= wide.Upper, table, quantity, wide);
                }
            }

            // Swapping the groups together with the results exchanges sensitivity and specificity and leaves the rest.
            ConfusionMatrix mirrored = new(table.TrueNegatives, table.FalseNegatives, table.FalsePositives, table.TruePositives);
            Same(table.Sensitivity, mirrored.Specificity);
            Same(table.YoudenIndex, mirrored.YoudenIndex);
            Same(table.DiagnosticOddsRatio, mirrored.DiagnosticOddsRatio);
            Same(table.BalancedAccuracy, mirrored.BalancedAccuracy);
            Same(table.MatthewsCorrelation, mirrored.MatthewsCorrelation);
            Same(table.PredictiveValuesAt(new Prevalence(0.25)).Positive, mirrored.PredictiveValuesAt(new Prevalence(0.75)).Negative);
            Same(table.PositiveLikelihoodRatio, mirrored.NegativeLikelihoodRatio.Inverse);
            Assert.Equal(table.WithCondition == 0 || table.WithoutCondition == 0 || table.Positives == 0, !table.PositiveLikelihoodRatio.IsDefined);
            Assert.Equal(table.WithCondition == 0 || table.WithoutCondition == 0 || table.Negatives == 0, !table.NegativeLikelihoodRatio.IsDefined);
        }

        Assert.Equal(46376, tables);
    }

    [Fact]
    public void Perfect_specificity_makes_the_positive_ratio_infinite_with_a_finite_lower_limit()
    {
        ConfusionMatrix table = new(30, 0, 10, 60);
        Assert.True(double.IsPositiveInfinity(table.PositiveLikelihoodRatio.Value));
        ConfidenceInterval interval = table.PositiveLikelihoodRatio.Interval();
        Assert.True(double.IsPositiveInfinity(interval.Upper));
        Assert.InRange(interval.Lower, 5, 40);
        Assert.Contains("log method has no limit", interval.Method, StringComparison.Ordinal);

        PredictiveValue positive = table.PredictiveValuesAt(new Prevalence(0.02)).Positive;
        Assert.Equal(1, positive.Value);
        Assert.Equal(1, positive.Interval().Upper);
        Assert.InRange(positive.Interval().Lower, 0.05, 0.6);
        Assert.Contains("since the logit method has no limits here", positive.Interval().Method, StringComparison.Ordinal);
        Assert.Equal(positive.Interval().Lower, positive.Interval(default, PredictiveValueMethod.LikelihoodRatioScore).Lower);
        Assert.InRange(positive.Interval(default, PredictiveValueMethod.AdjustedLogit).Upper, 0.5, 1);
    }

    /// <summary>The logit interval of the predictive value, from the formula of its variance, not by way of the likelihood ratio.</summary>
    [Property(MaxTest = 200)]
    public void Logit_limits_are_those_of_the_variance_formula(PositiveInt tp, PositiveInt fp, PositiveInt fn, PositiveInt tn, ulong scatter)
    {
        ConfusionMatrix table = new(tp.Get, fp.Get, fn.Get, tn.Get);
        double p = ((scatter % 997) + 1) / 999.0;
        double sensitivity = table.Sensitivity.Value;
        double specificity = table.Specificity.Value;
        double value = sensitivity * p / ((sensitivity * p) + ((1 - specificity) * (1 - p)));
        double variance = ((1 - sensitivity) / (sensitivity * table.WithCondition)) + (specificity / ((1 - specificity) * table.WithoutCondition));
        double logit = Math.Log(value / (1 - value)) - (1.959963984540054 * Math.Sqrt(variance));
        ConfidenceInterval interval = table.PredictiveValuesAt(new Prevalence(p)).Positive.Interval();
        Assert.Equal(1 / (1 + Math.Exp(-logit)), interval.Lower, 1e-12);
        value = specificity * (1 - p) / ((specificity * (1 - p)) + ((1 - sensitivity) * p));
        variance = ((1 - specificity) / (specificity * table.WithoutCondition)) + (sensitivity / ((1 - sensitivity) * table.WithCondition));
        logit = Math.Log(value / (1 - value)) + (1.959963984540054 * Math.Sqrt(variance));
        interval = table.PredictiveValuesAt(new Prevalence(p)).Negative.Interval();
        Assert.Equal(1 / (1 + Math.Exp(-logit)), interval.Upper, 1e-12);
    }

    [Fact]
    public void Negative_cells_are_refused_by_name()
    {
        Assert.Equal("truePositives", Assert.Throws<ArgumentOutOfRangeException>(() => new ConfusionMatrix(-1, 0, 0, 0)).ParamName);
        Assert.Equal("falsePositives", Assert.Throws<ArgumentOutOfRangeException>(() => new ConfusionMatrix(0, -1, 0, 0)).ParamName);
        Assert.Equal("falseNegatives", Assert.Throws<ArgumentOutOfRangeException>(() => new ConfusionMatrix(0, 0, -1, 0)).ParamName);
        Assert.Equal("trueNegatives", Assert.Throws<ArgumentOutOfRangeException>(() => new ConfusionMatrix(0, 0, 0, -1)).ParamName);
        Assert.Throws<OverflowException>(() => new ConfusionMatrix(long.MaxValue, 1, 0, 0));
        Assert.Equal("people", Assert.Throws<ArgumentOutOfRangeException>(() => Example.ExpectedFor(-1, default)).ParamName);
    }

    [Theory]
    [InlineData(double.NaN)]
    [InlineData(-0.1)]
    [InlineData(1.1)]
    [InlineData(5)]
    public void A_prevalence_outside_0_to_1_is_refused_by_name_and_value(double value)
    {
        ArgumentOutOfRangeException error = Assert.Throws<ArgumentOutOfRangeException>(() => new Prevalence(value));
        Assert.Equal("value", error.ParamName);
        Assert.Contains("a probability from 0 to 1", error.Message, StringComparison.Ordinal);
    }

    // Equal to 1e-9 relative: limits found as roots are.
    private static void Same(IIntervalQuantity first, IIntervalQuantity second)
    {
        Assert.Equal(first.IsDefined, second.IsDefined);
        Close(first.Value, second.Value);
        Close(first.Interval().Lower, second.Interval().Lower);
        Close(first.Interval().Upper, second.Interval().Upper);
    }

    private static void Close(double first, double second)
    {
        if (!first.Equals(second) && !(Math.Abs(first - second) <= 1e-9 * Math.Max(Math.Abs(first), 1e-6)))
        {
            Assert.Fail($"{first:R} {second:R}");
        }
    }

    internal static IEnumerable<ConfusionMatrix> TablesOf(int total) =>
        from tp in Enumerable.Range(0, total + 1)
        from fp in Enumerable.Range(0, total + 1 - tp)
        from fn in Enumerable.Range(0, total + 1 - tp - fp)
        from tn in Enumerable.Range(0, total + 1 - tp - fp - fn)
        select new ConfusionMatrix(tp, fp, fn, tn);

    private static void Check(IIntervalQuantity quantity, double value, double lower, double upper, double tolerance)
    {
        Assert.Equal(value, quantity.Value, tolerance);
        Assert.Equal(lower, quantity.Interval().Lower, tolerance);
        Assert.Equal(upper, quantity.Interval().Upper, tolerance);
    }
}
