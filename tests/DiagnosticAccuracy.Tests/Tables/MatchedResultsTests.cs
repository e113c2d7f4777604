using System.Globalization;
using DiagnosticAccuracy.Tests.Data;
using FsCheck.Fluent;
using FsCheck.Xunit;

namespace DiagnosticAccuracy.Tests.Tables;

/// <summary>Several tests on the same subjects; paired/cochran.csv is made by make-cochran.py beside it with general-purpose routines (grade R).</summary>
public class MatchedResultsTests
{
    [Fact]
    public void Every_row_of_the_reference_agrees()
    {
        IReadOnlyList<IReadOnlyDictionary<string, string>> rows = ReferenceData.Csv("paired/cochran.csv");
        Assert.Equal(5, rows.Count);
        foreach (IReadOnlyDictionary<string, string> row in rows)
        {
            MatchedResults results = Of(row["results"].Split(' '));
            PairedTest test = results.CochranQ();
            Assert.Equal(row.Number("q"), test.Statistic.Value, 1e-10);
            Assert.Equal(1, test.PValue.Value / row.Number("p"), 1e-10);
            Assert.Equal(results.Tests - 1, test.DegreesOfFreedom);
            double[] pairs = Numbers(row["pairs"]);
            double[] holm = Numbers(row["holm"]);
            IReadOnlyList<PairwiseComparison> comparisons = results.PairwiseMcNemar();
            Assert.Equal(pairs.Length, comparisons.Count);
            for (int i = 0; i < pairs.Length; i++)
            {
                Assert.Equal(pairs[i], comparisons[i].Test.PValue.Value, 1e-12);
                Assert.Equal(holm[i], comparisons[i].AdjustedPValue.Value, 1e-12);
            }
        }
    }

    /// <summary>Q by Cochran's own formula, from the positives of each test and of each subject.</summary>
    [Property(MaxTest = 200)]
    public void Q_is_Cochran_s_formula(byte[] patterns)
    {
        const int k = 4;
        string[] words = [.. patterns.Select(p => Convert.ToString(p % 16, 2).PadLeft(k, '0'))];
        if (words.Length == 0)
        {
            return;
        }

        MatchedResults results = Of(words);
        double squaresOfTests = Enumerable.Range(0, k).Sum(j => Math.Pow(words.Count(w => w[j] == '1'), 2));
        double all = words.Sum(w => w.Count(c => c == '1'));
        double squaresOfSubjects = words.Sum(w => Math.Pow(w.Count(c => c == '1'), 2));
        double below = (k * all) - squaresOfSubjects;
        PairedTest test = results.CochranQ();
        if (below == 0)
        {
            Assert.Equal(UndefinedCause.ZeroOverZero, test.Statistic.WhyUndefined?.Cause);
            Assert.Equal(1, test.PValue.Value);
            return;
        }

        Assert.Equal((k - 1) * ((k * squaresOfTests) - (all * all)) / below, test.Statistic.Value, 1e-10);
        for (int i = 0; i < k; i++)
        {
            Assert.Equal(words.Count(w => w[i] == '1'), results.Positive(i).Successes);
            for (int j = 0; j < k; j++)
            {
                if (i != j)
                {
                    Assert.Equal(words.Count(w => w[i] == '1' && w[j] == '0'), results.Pair(i, j).FirstOnly);
                    Assert.Equal(words.Count(w => w[i] == '0' && w[j] == '1'), results.Pair(i, j).SecondOnly);
                    Assert.Equal(words.Length, results.Pair(i, j).Total);
                }
            }
        }
    }

    [Fact]
    public void Of_two_tests_it_is_McNemar_s()
    {
        MatchedResults results = Of(["10", "10", "10", "01", "11", "00", "10"]);
        PairedTest mcnemar = results.Pair(0, 1).McNemar();
        Assert.Equal(mcnemar.Statistic.Value, results.CochranQ().Statistic.Value, 1e-14);
        Assert.Equal(mcnemar.PValue.Value, results.CochranQ().PValue.Value, 1e-14);
        PairwiseComparison only = Assert.Single(results.PairwiseMcNemar());
        Assert.Equal(only.Test.PValue, only.AdjustedPValue);
        Assert.Equal("test 0 against test 1: p = 0.179712, adjusted 0.179712", only.ToString());
    }

    [Fact]
    public void Bad_input_is_named_and_no_subjects_are_undefined()
    {
        Assert.Throws<ArgumentException>("tests", () => MatchedResults.FromRows<string>([], [w => w[0] == '1']));
        Assert.Throws<ArgumentNullException>("rows", () => MatchedResults.FromRows<string>(null!, []));
        MatchedResults none = MatchedResults.FromRows<string>([], [w => w[0] == '1', w => w[1] == '1', w => w[2] == '1']);
        Assert.Equal("3 tests on 0 subjects", none.ToString());
        Assert.Equal(UndefinedCause.NoSubjects, none.CochranQ().PValue.WhyUndefined?.Cause);
        Assert.All(none.PairwiseMcNemar(), c => Assert.Equal(UndefinedCause.NoSubjects, c.AdjustedPValue.WhyUndefined?.Cause));
        Assert.Throws<ArgumentOutOfRangeException>("test", () => none.Positive(3));
        Assert.Throws<ArgumentOutOfRangeException>("second", () => none.Pair(1, 1));
        Assert.Throws<ArgumentOutOfRangeException>("first", () => none.Pair(-1, 1));
    }

    private static MatchedResults Of(string[] words) => MatchedResults.FromRows<string>(
        words, [.. Enumerable.Range(0, words[0].Length).Select<int, Func<string, bool>>(j => w => w[j] == '1')]);

    private static double[] Numbers(string field) => [.. field.Split(' ').Select(n => double.Parse(n, CultureInfo.InvariantCulture))];
}
