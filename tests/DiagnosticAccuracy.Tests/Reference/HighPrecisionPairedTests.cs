using System.Globalization;
using DiagnosticAccuracy.Tests.Data;

namespace DiagnosticAccuracy.Tests.Reference;

/// <summary>
/// paired/fixtures.csv, made by make-fixtures.py beside it from definitions with 60 digits (grade R): differences and ratios of proportions of the same
/// subjects, their score tests, and exact forms of McNemar's test; cells of up to 1e12.
/// </summary>
public class HighPrecisionPairedTests
{
    // Limits are roots found to about 1e-14; what is lost is the last digits of tails, square roots and exp.
    private const double Relative = 1e-11;

    [Fact]
    public void Every_limit_of_a_difference_agrees() => Assert.Equal(522, Compare(
        "difference",
        (row, table) => table.Difference.Interval(Error(row), Parse<PairedDifferenceMethod>(row["method"]))));

    [Fact]
    public void Every_limit_of_a_ratio_agrees() => Assert.Equal(216, Compare(
        "ratio",
        (row, table) => table.Ratio.Interval(Error(row), Parse<PairedRatioMethod>(row["method"]))));

    [Fact]
    public void Every_score_test_agrees()
    {
        List<string> wrong = [];
        foreach (IReadOnlyDictionary<string, string> row in Rows("difference-test"))
        {
            double bound = row.Number("parameter");
            DifferenceMargin margin = bound < 0 ? DifferenceMargin.NonInferiority(-bound) : DifferenceMargin.Superiority(bound);
            PairedDifferenceTest test = margin.Test(Table(row).Difference);
            Add(wrong, row, test.Statistic.Value, test.PValue.Value);
        }

        foreach (IReadOnlyDictionary<string, string> row in Rows("ratio-test"))
        {
            double bound = row.Number("parameter");
            RatioMargin margin = bound < 1 ? RatioMargin.NonInferiority(bound) : RatioMargin.Superiority(bound);
            PairedRatioTest test = margin.Test(Table(row).Ratio);
            Add(wrong, row, test.Statistic.Value, test.PValue.Value);
            if (bound > 1)
            {
                PairedRatioTest less = RatioMargin.NonInferiorityWhereLessIsBetter(bound).Test(Table(row).Ratio);
                Assert.Equal(test.Statistic, less.Statistic);
                Assert.Equal(1, test.PValue.Value + less.PValue.Value, 1e-15);
            }
        }

        Assert.True(wrong.Count == 0, string.Join("\n", wrong));
    }

    [Fact]
    public void Every_exact_form_of_McNemar_agrees()
    {
        foreach (IReadOnlyDictionary<string, string> row in Rows("mcnemar"))
        {
            double p = Table(row).McNemar(Parse<McNemarMethod>(row["method"])).PValue.Value;
            Assert.True(Math.Abs((p / row.Number("lower")) - 1) < 1e-12, string.Join(' ', row.Values) + " but " + p.ToString("R", CultureInfo.InvariantCulture));
        }
    }

    private static int Compare(string kind, Func<IReadOnlyDictionary<string, string>, PairedTable, ConfidenceInterval> interval)
    {
        List<string> wrong = [];
        IReadOnlyDictionary<string, string>[] rows = Rows(kind);
        foreach (IReadOnlyDictionary<string, string> row in rows)
        {
            ConfidenceInterval actual = interval(row, Table(row));
            Add(wrong, row, actual.Lower, actual.Upper);
        }

        Assert.True(wrong.Count == 0, string.Join("\n", wrong));
        return rows.Length;
    }

    private static void Add(List<string> wrong, IReadOnlyDictionary<string, string> row, double lower, double upper)
    {
        if (!(Agrees(row["lower"], lower) && Agrees(row["upper"], upper)))
        {
            wrong.Add(string.Join(' ', row.Values) + " but " + lower.ToString("R", CultureInfo.InvariantCulture) + " " + upper.ToString("R", CultureInfo.InvariantCulture));
        }
    }

    private static bool Agrees(string expected, double actual)
    {
        if (expected == "inf")
        {
            return double.IsPositiveInfinity(actual);
        }

        double value = double.Parse(expected, CultureInfo.InvariantCulture);
        return Math.Abs(actual - value) <= Relative * Math.Abs(value);
    }

    private static Confidence Error(IReadOnlyDictionary<string, string> row) => Confidence.FromErrorProbability(row.Number("parameter"));

    private static T Parse<T>(string name)
        where T : struct, Enum => Enum.Parse<T>(name);

    private static IReadOnlyDictionary<string, string>[] Rows(string kind) =>
        [.. ReferenceData.Csv("paired/fixtures.csv").Where(r => r["kind"] == kind)];

    private static PairedTable Table(IReadOnlyDictionary<string, string> row)
    {
        long[] cells = [.. new[] { "a", "b", "c", "d" }.Select(c => long.Parse(row[c], CultureInfo.InvariantCulture))];
        return new PairedTable(cells[0], cells[1], cells[2], cells[3]);
    }
}
