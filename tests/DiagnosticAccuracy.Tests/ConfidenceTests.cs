namespace DiagnosticAccuracy.Tests;

public class ConfidenceTests
{
    [Fact]
    public void The_default_is_two_sided_95_percent()
    {
        Assert.Equal(Confidence.TwoSided(0.95), default);
        Assert.Equal(0.05, default(Confidence).ErrorProbability);
        Assert.Equal(IntervalSide.TwoSided, default(Confidence).Side);
        Assert.Equal("95 % two-sided", default(Confidence).ToString());
        Assert.Equal(Confidence.FromErrorProbability(0.05), default);
    }

    [Theory]
    [InlineData(0.95, 0.05)]
    [InlineData(0.9, 0.1)]
    [InlineData(0.99, 0.01)]
    [InlineData(0.999999999999, 1e-12)]
    [InlineData(0.5, 0.5)]
    public void A_level_is_read_as_the_decimal_it_prints_as(double level, double error)
    {
        Assert.Equal(error, Confidence.TwoSided(level).ErrorProbability);
        Assert.Equal(level, Confidence.TwoSided(level).Level);
    }

    [Theory]
    [InlineData(double.Epsilon)]
    [InlineData(1e-20)]
    [InlineData(1e-9)]
    [InlineData(0.99999999999999989)]
    public void Extreme_levels_leave_an_error_inside_the_unit_interval(double level)
    {
        Assert.InRange(Confidence.TwoSided(level).ErrorProbability, double.Epsilon, 1 - 1e-16);
    }

    [Theory]
    [InlineData(0)]
    [InlineData(1)]
    [InlineData(-0.1)]
    [InlineData(95)]
    [InlineData(double.NaN)]
    public void A_level_outside_the_unit_interval_is_refused_by_name_and_value(double level)
    {
        foreach (Func<double, Confidence> make in new[] { Confidence.TwoSided, Confidence.LowerBound, Confidence.UpperBound })
        {
            ArgumentOutOfRangeException error = Assert.Throws<ArgumentOutOfRangeException>(() => make(level));
            Assert.Equal("level", error.ParamName);
            Assert.Contains(level.ToString(System.Globalization.CultureInfo.InvariantCulture), error.Message, StringComparison.Ordinal);
            Assert.Contains("above 0 and below 1", error.Message, StringComparison.Ordinal);
        }
    }
}
