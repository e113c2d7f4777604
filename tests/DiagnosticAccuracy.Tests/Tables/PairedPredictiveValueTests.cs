using System.Globalization;
using DiagnosticAccuracy.Tests.Data;
using FsCheck.Fluent;
using FsCheck.Xunit;

namespace DiagnosticAccuracy.Tests.Tables;

/// <summary>
/// Predictive values of two tests. paired/predictive.csv is made by make-predictive.py beside it (grade R): the generalised score by a general-purpose
/// marginal regression, the others by formulas over individual calls.
/// </summary>
public class PairedPredictiveValueTests
{
    [Fact]
    public void Every_row_of_the_reference_agrees()
    {
        IReadOnlyList<IReadOnlyDictionary<string, string>> rows = ReferenceData.Csv("paired/predictive.csv");
        Assert.Equal(18, rows.Count);
        foreach (IReadOnlyDictionary<string, string> row in rows)
        {
            PairedConfusionMatrix tables = new(Table(row, "w"), Table(row, "o"));
            PairedPredictiveValue value = row["value"] == "PPV" ? tables.CohortPredictiveValues.Positive : tables.CohortPredictiveValues.Negative;
            Assert.Equal(row.Number("first"), value.First.Value, 1e-14);
            Assert.Equal(row.Number("second"), value.Second.Value, 1e-14);
            Assert.Equal(value.First.Value - value.Second.Value, value.Difference.Value, 1e-15);
            Assert.Equal(row.Number("generalised"), value.Test(PredictiveValueTestMethod.GeneralisedScore).Statistic.Value, 1e-10);
            Assert.Equal(row.Number("weighted"), value.Test().Statistic.Value, 1e-10);
            Assert.Equal(row.Number("relative"), value.Relative.Value, 1e-14);

            // The variance of the reference comes from numerical differences, good to 1e-10.
            ConfidenceInterval interval = value.Relative.Interval();
            double standardError = Math.Log(interval.Upper / interval.Lower) / 2 / 1.959963984540054;
            Assert.Equal(1, standardError * standardError / row.Number("log_variance"), 1e-10);
            Assert.Equal(value.Relative.Value, Math.Sqrt(interval.Upper * interval.Lower), 1e-12);
        }
    }

    [Fact]
    public void Values_are_the_cohort_predictive_values_of_each_test()
    {
        PairedConfusionMatrix tables = new(new PairedTable(43, 9, 4, 2), new PairedTable(5, 4, 12, 321));
        PairedCohortPredictiveValues values = tables.CohortPredictiveValues;
        Assert.Equal(tables.First.CohortPredictiveValues.Positive, values.Positive.First);
        Assert.Equal(tables.Second.CohortPredictiveValues.Positive, values.Positive.Second);
        Assert.Equal(tables.First.CohortPredictiveValues.Negative, values.Negative.First);
        Assert.Equal(tables.Second.CohortPredictiveValues.Negative, values.Negative.Second);
        Assert.Equal("52/61 = 0.852459 against 47/64 = 0.734375", values.Positive.ToString());
    }

    /// <summary>Both statistics written as loops over subjects and the calls of each, as they are defined.</summary>
    [Property(MaxTest = 300)]
    public void Statistics_are_those_of_individual_calls(byte a, byte b, byte c, byte d, byte e, byte f, byte g, byte h)
    {
        PairedConfusionMatrix tables = new(
            new PairedTable(a % 9, b % 9, c % 9, d % 9), new PairedTable(e % 9, f % 9, g % 9, h % 9));
        AssertSlow(tables, positive: true, tables.CohortPredictiveValues.Positive);
        AssertSlow(tables, positive: false, tables.CohortPredictiveValues.Negative);
    }

    /// <summary>Where no subject is called by both tests the weighted statistic is the pooled chi-square of two independent proportions.</summary>
    [Fact]
    public void Without_overlap_the_weighted_statistic_is_the_pooled_test()
    {
        PairedPredictiveValue value = new PairedConfusionMatrix(new PairedTable(0, 12, 9, 7), new PairedTable(0, 4, 11, 20)).CohortPredictiveValues.Positive;
        DifferenceTest pooled = DifferenceMargin.Superiority().Test(new ProportionDifference(value.First, value.Second));
        Assert.Equal(pooled.Statistic.Value * pooled.Statistic.Value, value.Test().Statistic.Value, 1e-12);
    }

    [Fact]
    public void Every_small_cohort_is_defined_or_says_why()
    {
        foreach (PairedTable with in PairedTables.UpTo(3).Append(default))
        {
            foreach (PairedTable without in PairedTables.UpTo(3).Append(default))
            {
                PairedConfusionMatrix tables = new(with, without);
                AssertCoherent(tables.CohortPredictiveValues.Positive, tables.Swapped.CohortPredictiveValues.Positive, UndefinedCause.NoPositiveResults);
                AssertCoherent(tables.CohortPredictiveValues.Negative, tables.Swapped.CohortPredictiveValues.Negative, UndefinedCause.NoNegativeResults);
            }
        }
    }

    [Fact]
    public void Tests_that_call_the_same_subjects_have_p_1_and_no_interval()
    {
        PairedPredictiveValue value = new PairedConfusionMatrix(new PairedTable(7, 0, 0, 3), new PairedTable(2, 0, 0, 30)).CohortPredictiveValues.Positive;
        foreach (PredictiveValueTestMethod method in Enum.GetValues<PredictiveValueTestMethod>())
        {
            Assert.Equal(1, value.Test(method).PValue.Value);
            Assert.Equal(UndefinedCause.ZeroOverZero, value.Test(method).Statistic.WhyUndefined?.Cause);
        }

        Assert.Equal(1, value.Relative.Value);
        Assert.Equal(UndefinedCause.ZeroVariance, value.Relative.Interval().WhyUndefined?.Cause);
        Assert.Throws<ArgumentOutOfRangeException>("method", () => value.Test((PredictiveValueTestMethod)5));
    }

    [Fact]
    public void A_predictive_value_of_zero_has_no_limit_on_the_logarithm_and_says_what_has_an_answer()
    {
        PairedPredictiveValue value = new PairedConfusionMatrix(new PairedTable(0, 0, 3, 3), new PairedTable(2, 1, 4, 30)).CohortPredictiveValues.Positive;
        Assert.Equal(0, value.Relative.Value);
        Assert.Equal(UndefinedCause.MethodHasNoLimit, value.Relative.Interval().WhyUndefined?.Cause);
        Assert.InRange(value.Test().PValue.Value, 0.05, 0.3);
    }

    [Fact]
    public void Counts_of_1e12_give_the_statistic_of_the_small_ones_multiplied()
    {
        // Chi-square grows with the number of subjects at fixed shares.
        const long factor = 1_000_000_000_000;
        PairedPredictiveValue small = new PairedConfusionMatrix(new PairedTable(40, 8, 4, 6), new PairedTable(10, 6, 9, 117)).CohortPredictiveValues.Negative;
        PairedPredictiveValue large = new PairedConfusionMatrix(
            new PairedTable(40 * factor, 8 * factor, 4 * factor, 6 * factor),
            new PairedTable(10 * factor, 6 * factor, 9 * factor, 117 * factor)).CohortPredictiveValues.Negative;
        foreach (PredictiveValueTestMethod method in Enum.GetValues<PredictiveValueTestMethod>())
        {
            Assert.Equal(1, large.Test(method).Statistic.Value / small.Test(method).Statistic.Value / factor, 1e-12);
        }

        Assert.Equal(
            Math.Log(small.Relative.Interval().Upper / small.Relative.Value) / Math.Sqrt(factor), Math.Log(large.Relative.Interval().Upper / large.Relative.Value), 1e-13);
    }

    private static void AssertCoherent(PairedPredictiveValue value, PairedPredictiveValue swapped, UndefinedCause empty)
    {
        foreach (PredictiveValueTestMethod method in Enum.GetValues<PredictiveValueTestMethod>())
        {
            PairedTest test = value.Test(method);
            bool defined = value.First.IsDefined && value.Second.IsDefined;
            Assert.Equal(defined, test.PValue.IsDefined);
            Assert.Equal(defined, value.Difference.IsDefined);
            if (!defined)
            {
                Assert.Equal(empty, test.PValue.WhyUndefined?.Cause);
                continue;
            }

            Assert.InRange(test.PValue.Value, 0, 1);
            Assert.Equal(test.PValue.Value, swapped.Test(method).PValue.Value, 1e-14);
            Assert.Equal(-value.Difference.Value, swapped.Difference.Value);
            Assert.Equal(value.Difference.Value == 0, test.PValue.Value == 1);
        }

        ConfidenceInterval interval = value.Relative.Interval();
        if (interval.IsDefined)
        {
            Assert.True(interval.Contains(value.Relative.Value));
            Assert.Equal(1, interval.Lower * swapped.Relative.Interval().Upper, 1e-13);
        }
        else
        {
            Assert.NotNull(interval.WhyUndefined);
        }
    }

    private static void AssertSlow(PairedConfusionMatrix tables, bool positive, PairedPredictiveValue value)
    {
        List<(int Subject, int Test, int Right)> calls = Calls(tables, positive);
        if (!value.First.IsDefined || !value.Second.IsDefined || value.Difference.Value == 0)
        {
            return;
        }

        double meanRight = calls.Average(call => call.Right);
        double meanTest = calls.Average(call => call.Test);
        double top = calls.Sum(call => call.Right * (call.Test - meanTest));
        double bottom = calls.GroupBy(call => call.Subject)
            .Sum(subject => Math.Pow(subject.Sum(call => (call.Right - meanRight) * (call.Test - meanTest)), 2));
        double generalised = top * top / bottom;
        Assert.Equal(1, value.Test(PredictiveValueTestMethod.GeneralisedScore).Statistic.Value / generalised, 1e-11);

        double covariance = calls.GroupBy(call => call.Subject).Where(subject => subject.Count() == 2)
            .Sum(subject => Math.Pow(subject.First().Right - meanRight, 2)) / calls.Count;
        double spread = ((meanRight * (1 - meanRight)) - (2 * covariance)) * ((1.0 / value.First.Trials) + (1.0 / value.Second.Trials));
        double weighted = Math.Pow(value.First.Value - value.Second.Value, 2) / spread;
        Assert.Equal(1, value.Test().Statistic.Value / weighted, 1e-10);
    }

    private static List<(int Subject, int Test, int Right)> Calls(PairedConfusionMatrix tables, bool positive)
    {
        List<(int, int, int)> calls = [];
        int subject = 0;
        foreach ((PairedTable table, bool hasCondition) in new[] { (tables.WithCondition, true), (tables.WithoutCondition, false) })
        {
            foreach ((long count, bool first, bool second) in new[]
            {
                (table.BothPositive, true, true), (table.FirstOnly, true, false), (table.SecondOnly, false, true), (table.BothNegative, false, false),
            })
            {
                for (long i = 0; i < count; i++, subject++)
                {
                    if (first == positive)
                    {
                        calls.Add((subject, 0, hasCondition == positive ? 1 : 0));
                    }

                    if (second == positive)
                    {
                        calls.Add((subject, 1, hasCondition == positive ? 1 : 0));
                    }
                }
            }
        }

        return calls;
    }

    private static PairedTable Table(IReadOnlyDictionary<string, string> row, string prefix)
    {
        long[] cells = [.. new[] { "_both", "_first", "_second", "_neither" }.Select(c => long.Parse(row[prefix + c], CultureInfo.InvariantCulture))];
        return new PairedTable(cells[0], cells[1], cells[2], cells[3]);
    }
}
