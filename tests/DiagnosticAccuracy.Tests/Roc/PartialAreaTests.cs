using System.Text.Json;
using DiagnosticAccuracy.Tests.Data;
using FsCheck.Xunit;

namespace DiagnosticAccuracy.Tests.Roc;

[Properties(Arbitrary = [typeof(SampleArbitrary)], MaxTest = 150)]
public class PartialAreaTests
{
    // Ends that no share of up to 12 subjects equals: there the area has a corner, and no derivative.
    private static readonly PartialAreaRange[] Ranges =
    [
        PartialAreaRange.OverFalsePositiveRate(0, 0.137),
        PartialAreaRange.OverFalsePositiveRate(0.061, 0.613),
        PartialAreaRange.OverSensitivity(0.713, 1),
        PartialAreaRange.OverSensitivity(0.213, 0.877),
        PartialAreaRange.Both(0.457, 0.739),
    ];

    /// <summary>Raw and standardised areas by a general-purpose library (grade R), which takes the curve as straight lines too.</summary>
    [Theory]
    [InlineData("pancreatic-markers.csv", "ca199")]
    [InlineData("pancreatic-markers.csv", "ca125")]
    [InlineData("breast-biopsy.csv", "V1")]
    [InlineData("breast-biopsy.csv", "V6")]
    public void Raw_and_standardised_areas_of_the_open_data(string file, string marker)
    {
        PairedScores scores = file.StartsWith("pan", StringComparison.Ordinal) ? MarkerData.Pancreatic() : MarkerData.Biopsy();
        RocCurve curve = RocCurve.Empirical(marker is "ca199" or "V1" ? scores.First : scores.Second);
        JsonElement expected = ReferenceData.Json("markers-expected.json").GetProperty(file).GetProperty("python").GetProperty(marker);
        foreach (JsonProperty entry in expected.GetProperty("pauc_raw").EnumerateObject())
        {
            double to = double.Parse(entry.Name, System.Globalization.CultureInfo.InvariantCulture);
            PartialArea area = curve.PartialArea(PartialAreaRange.OverFalsePositiveRate(0, to));
            Assert.Equal(entry.Value.GetDouble(), area.Value, 1e-13);
            Assert.Equal(expected.GetProperty("pauc_mcclish_std").GetProperty(entry.Name).GetDouble(), area.Standardised.Value, 1e-12);
        }
    }

    [Property]
    public void The_area_is_that_under_the_straight_lines(SampleCase data)
    {
        foreach (PartialAreaRange range in Ranges)
        {
            PartialArea area = RocCurve.Empirical(data.Sample()).PartialArea(range);
            Assert.Equal(Slow(data, range, Ones(data.With), Ones(data.Without)), area.Value, 1e-12);
            Assert.InRange(area.Value, 0, area.LargestPossible);
        }
    }

    [Property]
    public void The_whole_range_is_the_area_with_DeLongs_variance(SampleCase data)
    {
        RocCurve curve = RocCurve.Empirical(data.Sample());
        foreach (PartialAreaRange whole in new[]
        {
            default, PartialAreaRange.OverFalsePositiveRate(0, 1), PartialAreaRange.OverSensitivity(0, 1), PartialAreaRange.Both(0, 1),
        })
        {
            PartialArea area = curve.PartialArea(whole);
            Assert.Equal(curve.Area.Value, area.Value, 1e-14);
            Assert.Equal(curve.Area.Variance.IsDefined, area.Variance.IsDefined);
            Assert.Equal(curve.Area.Variance.Value, area.Variance.Value, 1e-14);
        }
    }

    /// <summary>Contributions by numerical derivatives: one subject's weight a little larger, one subject after the other.</summary>
    [Property]
    public void The_variance_is_that_of_numerical_contributions(SampleCase data)
    {
        if (data.With.Length < 2 || data.Without.Length < 2)
        {
            return;
        }

        foreach (PartialAreaRange range in Ranges)
        {
            double expected = Spread(Contributions(data, range, true)) + Spread(Contributions(data, range, false));
            PartialArea area = RocCurve.Empirical(data.Sample()).PartialArea(range);
            Assert.Equal(expected, area.Variance.Value, 1e-7);
        }
    }

    [Property]
    public void Swapping_the_groups_and_the_direction_turns_sensitivity_into_false_positive_rate(SampleCase data)
    {
        ScoreDirection opposite = data.Direction == ScoreDirection.HigherIsPositive ? ScoreDirection.LowerIsPositive : ScoreDirection.HigherIsPositive;
        PartialArea area = RocCurve.Empirical(data.Sample()).PartialArea(PartialAreaRange.OverSensitivity(0.625, 0.875));
        PartialArea swapped = RocCurve.Empirical(ScoredSample.FromGroups(data.Without, data.With, opposite))
            .PartialArea(PartialAreaRange.OverFalsePositiveRate(0.125, 0.375));
        Assert.Equal(area.Value, swapped.Value, 1e-14);
        Assert.Equal(area.Standardised.Value, swapped.Standardised.Value, 1e-12);
        Assert.Equal(area.Variance.Value, swapped.Variance.Value, 1e-14);
    }

    [Property]
    public void Ranges_next_to_each_other_add_up(SampleCase data)
    {
        RocCurve curve = RocCurve.Empirical(data.Sample());
        double sum = curve.PartialArea(PartialAreaRange.OverFalsePositiveRate(0, 0.3)).Value
            + curve.PartialArea(PartialAreaRange.OverFalsePositiveRate(0.3, 0.8)).Value
            + curve.PartialArea(PartialAreaRange.OverFalsePositiveRate(0.8, 1)).Value;
        Assert.Equal(curve.Area.Value, sum, 1e-14);
    }

    [Property]
    public void Intervals_stay_inside_contain_the_area_and_nest(SampleCase data)
    {
        foreach (PartialAreaRange range in Ranges)
        {
            PartialArea area = RocCurve.Empirical(data.Sample()).PartialArea(range);
            foreach (PartialAreaMethod method in Enum.GetValues<PartialAreaMethod>())
            {
                ConfidenceInterval narrow = area.Interval(Confidence.TwoSided(0.8), method);
                ConfidenceInterval wide = area.Interval(Confidence.TwoSided(0.99), method);
                Assert.Equal(area.Variance.IsDefined && area.Variance.Value > 0, narrow.IsDefined);
                if (narrow.IsDefined)
                {
                    Assert.True(narrow.Contains(area.Value), $"{area} {narrow}");
                    Assert.True(wide.Lower <= narrow.Lower && narrow.Upper <= wide.Upper);
                    Assert.InRange(wide.Lower, 0, area.LargestPossible);
                    Assert.InRange(wide.Upper, 0, area.LargestPossible);
                }
            }
        }
    }

    [Property]
    public void The_paired_difference_has_the_variance_of_the_differences_of_contributions(SampleCase data, int seed)
    {
        if (data.With.Length < 2 || data.Without.Length < 2)
        {
            return;
        }

        Random random = new(seed);
        SampleCase other = new(
            [.. data.With.Select(_ => random.Next(5) / 4.0)], [.. data.Without.Select(_ => random.Next(5) / 4.0)], ScoreDirection.LowerIsPositive);
        bool[] status = [.. data.With.Select(_ => true), .. data.Without.Select(_ => false)];
        PairedScores scores = PairedScores.Create(
            [.. data.With, .. data.Without], data.Direction, [.. other.With, .. other.Without], other.Direction, status);
        foreach (PartialAreaRange range in Ranges)
        {
            double expected =
                Spread([.. Contributions(data, range, true).Zip(Contributions(other, range, true), (a, b) => a - b)])
                + Spread([.. Contributions(data, range, false).Zip(Contributions(other, range, false), (a, b) => a - b)]);
            PartialAreaComparison comparison = PartialAreaComparison.Paired(scores, range);
            Assert.Equal(expected, Math.Pow(comparison.Difference.StandardError.Value, 2), 1e-7);
            Assert.Equal(comparison.First.Value - comparison.Second.Value, comparison.Difference.Value, 1e-15);
        }
    }

    [Fact]
    public void The_interval_covers_in_simulation()
    {
        // Equal-SD binormal, a = 1.5: the partial area to .2 is in binormal-partial-areas.csv. 3,000 seeded samples of 80 + 80: a Monte-Carlo error
        // of .4 points; three of them below 93.5 and above 96.5.
        double truth = ReferenceData.Csv("binormal-partial-areas.csv")
            .Single(row => row.Number("a") == 1.5 && row.Number("b") == 1 && row.Number("fpr_max") == 0.2).Number("pAUC");
        Random random = new(11);
        double Normal() => Math.Sqrt(-2 * Math.Log(1 - random.NextDouble())) * Math.Cos(2 * Math.PI * random.NextDouble());
        int covered = 0;
        for (int i = 0; i < 3000; i++)
        {
            double[] with = [.. Enumerable.Range(0, 80).Select(_ => 1.5 + Normal())];
            double[] without = [.. Enumerable.Range(0, 80).Select(_ => Normal())];
            covered += RocCurve.Empirical(ScoredSample.FromGroups(with, without, ScoreDirection.HigherIsPositive))
                .PartialArea(PartialAreaRange.OverFalsePositiveRate(0, 0.2)).Interval().Contains(truth) ? 1 : 0;
        }

        Assert.InRange(covered / 3000.0, 0.923, 0.977);
    }

    [Fact]
    public void Limits_and_bad_input()
    {
        Assert.Equal("to", Assert.Throws<ArgumentOutOfRangeException>(() => PartialAreaRange.OverFalsePositiveRate(0.2, 0.2)).ParamName);
        Assert.Equal("from", Assert.Throws<ArgumentOutOfRangeException>(() => PartialAreaRange.OverSensitivity(double.NaN, 1)).ParamName);
        Assert.Equal("to", Assert.Throws<ArgumentOutOfRangeException>(() => PartialAreaRange.OverSensitivity(0, 1.5)).ParamName);
        Assert.Equal("leastSensitivity", Assert.Throws<ArgumentOutOfRangeException>(() => PartialAreaRange.Both(1, 0.5)).ParamName);
        Assert.Equal("greatestFalsePositiveRate", Assert.Throws<ArgumentOutOfRangeException>(() => PartialAreaRange.Both(0.5, 0)).ParamName);
        PartialArea undefined = RocCurve.Empirical(ScoredSample.FromGroups([1], [], ScoreDirection.HigherIsPositive)).PartialArea(default);
        Assert.Equal(UndefinedCause.NoSubjectsWithoutCondition, undefined.WhyUndefined?.Cause);
        Assert.False(undefined.Standardised.IsDefined);
        PartialArea perfect = RocCurve.Empirical(ScoredSample.FromGroups([3, 4], [1, 2], ScoreDirection.HigherIsPositive))
            .PartialArea(PartialAreaRange.OverFalsePositiveRate(0, 0.1));
        Assert.Equal(1, perfect.Standardised.Value);
        Assert.Equal(UndefinedCause.ZeroVariance, perfect.Interval().WhyUndefined?.Cause);
        Assert.Throws<ArgumentOutOfRangeException>(() => perfect.Interval(default, (PartialAreaMethod)4));
        Assert.Equal("false-positive rate from 0 to 1", default(PartialAreaRange).ToString());
    }

    private static double[] Ones(double[] group) => [.. group.Select(_ => 1.0)];

    private static double[] Contributions(SampleCase data, PartialAreaRange range, bool ofWith)
    {
        int n = ofWith ? data.With.Length : data.Without.Length;
        double[] contributions = new double[n];
        for (int i = 0; i < n; i++)
        {
            // The derivative of the statistic in the direction of subject i, by central differences.
            contributions[i] = (At(1e-5) - At(-1e-5)) / 2e-5;

            double At(double step)
            {
                double[] with = Ones(data.With);
                double[] without = Ones(data.Without);
                (ofWith ? with : without)[i] += step * n;
                return Slow(data, range, with, without);
            }
        }

        return contributions;
    }

    private static double Spread(double[] contributions)
    {
        double mean = contributions.Average();
        return contributions.Sum(c => (c - mean) * (c - mean)) / (contributions.Length - 1) / contributions.Length;
    }

    // The partial area of a weighted sample, line by line.
    private static double Slow(SampleCase data, PartialAreaRange range, double[] withWeights, double[] withoutWeights)
    {
        double sign = data.Direction == ScoreDirection.HigherIsPositive ? 1 : -1;
        double[] levels = [.. data.With.Concat(data.Without).Select(x => sign * (x + 0.0)).Distinct().OrderByDescending(x => x)];
        List<(double X, double Y)> points = [(0, 0)];
        foreach (double level in levels)
        {
            points.Add((
                data.Without.Select((x, i) => sign * x >= level ? withoutWeights[i] : 0).Sum() / withoutWeights.Sum(),
                data.With.Select((x, i) => sign * x >= level ? withWeights[i] : 0).Sum() / withWeights.Sum()));
        }

        double area = 0;
        for (int i = 1; i < points.Count; i++)
        {
            ((double x0, double y0), (double x1, double y1)) = (points[i - 1], points[i]);
            area += range.Kind switch
            {
                // Fine steps along the line are avoided by cutting it exactly.
                PartialAreaKind.OverFalsePositiveRate => Cut(x0, y0, x1, y1, range.From, range.To, (_, y) => y),
                PartialAreaKind.OverSensitivity => Cut(y0, x0, y1, x1, range.From, range.To, (_, x) => 1 - x),
                _ => Above(x0, y0, x1, y1, range.To, range.From),
            };
        }

        return area;
    }

    // The integral along the first coordinate of a linear height, between two bounds.
    private static double Cut(double x0, double y0, double x1, double y1, double from, double to, Func<double, double, double> height)
    {
        double a = Math.Max(x0, from);
        double b = Math.Min(x1, to);
        if (b <= a)
        {
            return 0;
        }

        double At(double x) => y0 + ((y1 - y0) * ((x - x0) / (x1 - x0)));
        return (b - a) * (height(a, At(a)) + height(b, At(b))) / 2;
    }

    private static double Above(double x0, double y0, double x1, double y1, double to, double least)
    {
        double b = Math.Min(x1, to);
        if (b <= x0)
        {
            return 0;
        }

        double yb = y0 + ((y1 - y0) * ((b - x0) / (x1 - x0)));
        if (yb <= least)
        {
            return 0;
        }

        double a = y0 >= least ? x0 : x0 + ((b - x0) * ((least - y0) / (yb - y0)));
        return (b - a) * (Math.Max(0, y0 - least) + (yb - least)) / 2;
    }
}
