using FsCheck.Xunit;

namespace DiagnosticAccuracy.Tests.Roc;

[Properties(Arbitrary = [typeof(SampleArbitrary)], MaxTest = 150)]
public class FixedPointTests
{
    private static readonly double[] Fixed = [0, 0.05, 0.25, 1 / 3.0, 0.5, 0.613, 0.75, 0.9, 0.95, 1];

    /// <summary>Every line of the curve is tried, and the greatest value on any of them taken.</summary>
    [Property]
    public void The_value_is_the_greatest_on_the_lines_of_the_curve(SampleCase data)
    {
        RocCurve curve = RocCurve.Empirical(data.Sample());
        foreach (double at in Fixed)
        {
            Assert.Equal(Greatest(curve, at, p => p.Specificity.Value, p => p.Sensitivity.Value), curve.SensitivityAtSpecificity(at).Value, 1e-13);
            Assert.Equal(Greatest(curve, at, p => p.Sensitivity.Value, p => p.Specificity.Value), curve.SpecificityAtSensitivity(at).Value, 1e-13);
        }
    }

    [Property]
    public void The_points_around_it_are_neighbours_and_the_first_one_reaches_it(SampleCase data)
    {
        RocCurve curve = RocCurve.Empirical(data.Sample());
        foreach (double at in Fixed)
        {
            FixedPoint point = curve.SensitivityAtSpecificity(at);
            Assert.True(point.Reaching!.Value.Specificity.Value >= at);
            Assert.Equal(point.Reaching.Value.Specificity.Value == at || at == 0, point.Beyond is null);
            if (point.Beyond is { } beyond)
            {
                Assert.True(beyond.Specificity.Value < at);
                Assert.InRange(point.Value, point.Reaching.Value.Sensitivity.Value, beyond.Sensitivity.Value);
            }
        }
    }

    [Property]
    public void Swapping_the_groups_and_the_direction_swaps_the_axes(SampleCase data)
    {
        ScoreDirection opposite = data.Direction == ScoreDirection.HigherIsPositive ? ScoreDirection.LowerIsPositive : ScoreDirection.HigherIsPositive;
        RocCurve curve = RocCurve.Empirical(data.Sample());
        RocCurve swapped = RocCurve.Empirical(ScoredSample.FromGroups(data.Without, data.With, opposite));
        foreach (double at in Fixed)
        {
            FixedPoint one = curve.SensitivityAtSpecificity(at);
            FixedPoint other = swapped.SpecificityAtSensitivity(at);
            Assert.Equal(one.Value, other.Value);
            Assert.Equal(one.Variance.Value, other.Variance.Value);
        }
    }

    [Property]
    public void Intervals_stay_inside_contain_the_value_and_nest(SampleCase data)
    {
        RocCurve curve = RocCurve.Empirical(data.Sample());
        foreach (double at in Fixed)
        {
            FixedPoint point = curve.SensitivityAtSpecificity(at);
            foreach (FixedPointMethod method in Enum.GetValues<FixedPointMethod>())
            {
                ConfidenceInterval narrow = point.Interval(Confidence.TwoSided(0.8), method);
                ConfidenceInterval wide = point.Interval(Confidence.TwoSided(0.99), method);
                Assert.Equal(at is not (0 or 1) && (method != FixedPointMethod.Wald || point.Variance.Value > 0), narrow.IsDefined);
                if (narrow.IsDefined)
                {
                    Assert.InRange(point.Value, narrow.Lower - 1e-15, narrow.Upper + 1e-15);
                    Assert.True(wide.Lower <= narrow.Lower + 1e-15 && narrow.Upper <= wide.Upper + 1e-15);
                    Assert.InRange(wide.Lower, 0, 1);
                    Assert.InRange(wide.Upper, 0, 1);
                }
            }
        }
    }

    /// <summary>By hand: specificities 1, .75, .5 at sensitivities .5, .75, 1.</summary>
    [Fact]
    public void A_case_by_hand()
    {
        RocCurve curve = RocCurve.Empirical(ScoredSample.FromGroups([9, 8, 6, 4], [7, 5, 2, 1], ScoreDirection.HigherIsPositive));
        FixedPoint point = curve.SensitivityAtSpecificity(0.75);
        Assert.Equal(0.75, point.Value);
        Assert.Null(point.Beyond);

        // h = sqrt(.75 .25 / 4) = .2165: the curve is read at .5335 (on the flat line at .75) and at .9665 (flat at .5).
        double h = Math.Sqrt(0.75 * 0.25 / 4);
        Assert.Equal(0.25 / (2 * h), point.Slope.Value, 1e-13);
        Assert.Equal((0.75 * 0.25 / 4) + (0.125 * 0.125), point.Variance.Value, 1e-13);
        Assert.Equal("sensitivity 0.75 at specificity 0.75", point.ToString());
    }

    /// <summary>
    /// Equal-SD binormal, separation 1.5 and specificity .9: the true sensitivity is Phi(1.5 - 1.2816) = .58645. Sizes and samples that are not in
    /// docs/evidence/fixed-point-coverage.md; the bounds are the ends of its ranges, three Monte-Carlo errors (.4 points, 3,000 samples) further out. The
    /// binomial interval at the estimated cutoff is shown to be too short by the same samples.
    /// </summary>
    [Theory]
    [InlineData(80, 120, FixedPointMethod.Logit, 0.917 - 0.012, 0.981 + 0.012)]
    [InlineData(150, 60, FixedPointMethod.Logit, 0.917 - 0.012, 0.981 + 0.012)]
    [InlineData(80, 120, FixedPointMethod.Adjusted, 0.915 - 0.012, 0.986 + 0.012)]
    [InlineData(80, 120, FixedPointMethod.Wald, 0.849 - 0.012, 0.968 + 0.012)]
    public void The_interval_covers_what_is_documented(int nWith, int nWithout, FixedPointMethod method, double least, double most)
    {
        const double Truth = 0.5864488;
        Random random = new(20261);
        double Normal() => Math.Sqrt(-2 * Math.Log(1 - random.NextDouble())) * Math.Cos(2 * Math.PI * random.NextDouble());
        int covered = 0;
        int binomial = 0;
        for (int i = 0; i < 3000; i++)
        {
            double[] with = [.. Enumerable.Range(0, nWith).Select(_ => 1.5 + Normal())];
            double[] without = [.. Enumerable.Range(0, nWithout).Select(_ => Normal())];
            FixedPoint point = RocCurve.Empirical(ScoredSample.FromGroups(with, without, ScoreDirection.HigherIsPositive)).SensitivityAtSpecificity(0.9);
            covered += point.Interval(default, method).Contains(Truth) ? 1 : 0;
            binomial += point.Reaching!.Value.Sensitivity.Interval().Contains(Truth) ? 1 : 0;
        }

        Assert.InRange(covered / 3000.0, least, most);
        Assert.True(binomial < 2700, $"{binomial}");
    }

    [Fact]
    public void Limits_and_bad_input()
    {
        RocCurve curve = RocCurve.Empirical(ScoredSample.FromGroups([3, 4], [1, 2], ScoreDirection.HigherIsPositive));
        Assert.Equal("specificity", Assert.Throws<ArgumentOutOfRangeException>(() => curve.SensitivityAtSpecificity(double.NaN)).ParamName);
        Assert.Equal("sensitivity", Assert.Throws<ArgumentOutOfRangeException>(() => curve.SpecificityAtSensitivity(1.01)).ParamName);
        Assert.Equal(1, curve.SensitivityAtSpecificity(1).Value);
        Assert.Equal(UndefinedCause.MethodHasNoLimit, curve.SensitivityAtSpecificity(1).Interval().WhyUndefined?.Cause);
        Assert.Equal(UndefinedCause.ZeroVariance, curve.SensitivityAtSpecificity(0.5).Interval(default, FixedPointMethod.Wald).WhyUndefined?.Cause);
        ConfidenceInterval perfect = curve.SensitivityAtSpecificity(0.5).Interval();
        Assert.True(perfect.Lower is > 0 and < 1 && perfect.Upper == 1);
        Assert.EndsWith("infinite", curve.SensitivityAtSpecificity(0.5).Interval(default, FixedPointMethod.Logit).Method, StringComparison.Ordinal);
        Assert.Throws<ArgumentOutOfRangeException>(() => curve.SensitivityAtSpecificity(0.5).Interval(default, (FixedPointMethod)9));
        FixedPoint undefined = RocCurve.Empirical(ScoredSample.FromGroups([1], [], ScoreDirection.HigherIsPositive)).SensitivityAtSpecificity(0.5);
        Assert.Equal(UndefinedCause.NoSubjectsWithoutCondition, undefined.Interval().WhyUndefined?.Cause);
        Assert.False(default(FixedPoint).IsDefined);
    }

    private static double Greatest(RocCurve curve, double at, Func<OperatingPoint, double> held, Func<OperatingPoint, double> read)
    {
        double greatest = 0;
        for (int i = 1; i < curve.Points.Count; i++)
        {
            ((double p, double v), (double q, double w)) =
                ((held(curve.Points[i - 1]), read(curve.Points[i - 1])), (held(curve.Points[i]), read(curve.Points[i])));
            if (Math.Min(p, q) <= at && at <= Math.Max(p, q))
            {
                greatest = Math.Max(greatest, p == q ? Math.Max(v, w) : v + ((w - v) * ((at - p) / (q - p))));
            }
        }

        return greatest;
    }
}
