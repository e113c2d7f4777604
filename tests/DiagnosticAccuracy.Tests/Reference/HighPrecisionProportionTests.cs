using System.Globalization;
using DiagnosticAccuracy.Tests.Data;

namespace DiagnosticAccuracy.Tests.Reference;

/// <summary>
/// proportions/fixtures.csv, made by make-fixtures.py beside it from definitions with 110 digits (grade R): one proportion, ratios, differences, their
/// score test, and odds ratios.
/// </summary>
public class HighPrecisionProportionTests
{
    // Limits are roots found to about 1e-14; what is lost is the last digits of tails and of exp. Odds ratios of large cells sum millions of terms.
    private const double Relative = 1e-11;

    [Theory]
    [InlineData("proportion", 141)]
    [InlineData("ratio", 78)]
    [InlineData("difference", 120)]
    [InlineData("odds", 76)]
    public void Every_limit_agrees(string kind, int rows)
    {
        IReadOnlyDictionary<string, string>[] chosen = [.. ReferenceData.Csv("proportions/fixtures.csv").Where(r => r["kind"] == kind)];
        List<string> wrong = [];
        foreach (IReadOnlyDictionary<string, string> row in chosen)
        {
            ConfidenceInterval interval = Interval(row);
            if (!(Agrees(row["lower"], interval.Lower) && Agrees(row["upper"], interval.Upper)))
            {
                wrong.Add(string.Join(' ', row.Values) + " but " + interval.Lower.ToString("R", CultureInfo.InvariantCulture) + " " + interval.Upper.ToString("R", CultureInfo.InvariantCulture));
            }
        }

        Assert.True(wrong.Count == 0, string.Join("\n", wrong));
        Assert.Equal(rows, chosen.Length);
    }

    [Fact]
    public void Every_score_test_agrees()
    {
        int rows = 0;
        foreach (IReadOnlyDictionary<string, string> row in ReferenceData.Csv("proportions/fixtures.csv").Where(r => r["kind"] == "test"))
        {
            double bound = row.Number("error");
            DifferenceMargin margin = bound < 0 ? DifferenceMargin.NonInferiority(-bound) : DifferenceMargin.Superiority(bound);
            DifferenceTest test = margin.Test(new ProportionDifference(Group(row, "1"), Group(row, "2")));
            Assert.Equal(row.Number("lower"), test.Statistic.Value, 1e-11 * Math.Max(1, Math.Abs(row.Number("lower"))));
            Assert.Equal(row.Number("upper"), test.PValue.Value, 1e-11);
            rows++;
        }

        Assert.True(rows > 30, $"{rows} rows");
    }

    private static bool Agrees(string expected, double actual)
    {
        if (expected == "inf")
        {
            return double.IsPositiveInfinity(actual);
        }

        double value = double.Parse(expected, CultureInfo.InvariantCulture);
        return Math.Abs(value - actual) <= Relative * Math.Abs(value);
    }

    private static ConfidenceInterval Interval(IReadOnlyDictionary<string, string> row)
    {
        Confidence confidence = Confidence.FromErrorProbability(row.Number("error"));
        string method = row["method"];
        return row["kind"] switch
        {
            "proportion" => Group(row, "1").Interval(confidence, Enum.Parse<ProportionMethod>(method)),
            "ratio" => new ProportionRatio(Group(row, "1"), Group(row, "2")).Interval(confidence, Enum.Parse<RatioMethod>(method)),
            "difference" => new ProportionDifference(Group(row, "1"), Group(row, "2")).Interval(confidence, Enum.Parse<DifferenceMethod>(method)),
            _ => new OddsRatio(Group(row, "1"), Group(row, "2")).Interval(confidence, Enum.Parse<OddsRatioMethod>(method)),
        };
    }

    private static Proportion Group(IReadOnlyDictionary<string, string> row, string which) =>
        new(long.Parse(row["x" + which], CultureInfo.InvariantCulture), long.Parse(row["n" + which], CultureInfo.InvariantCulture));
}
