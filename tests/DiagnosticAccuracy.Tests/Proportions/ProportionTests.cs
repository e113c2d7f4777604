using System.Numerics;
using FsCheck;
using FsCheck.Fluent;
using FsCheck.Xunit;

namespace DiagnosticAccuracy.Tests.Proportions;

public class ProportionTests
{
    /// <summary>Newcombe, Stat Med 1998;17:857, Table I: four printed digits (grades S2 and M, see Data/README.md).</summary>
    [Fact]
    public void Eighty_one_of_263_as_printed()
    {
        ConfidenceInterval wilson = new Proportion(81, 263).Interval();
        Assert.Equal(.2553, wilson.Lower, 5e-5);
        Assert.Equal(.3662, wilson.Upper, 5e-5);
        Assert.Equal("Wilson score", wilson.Method);
        ConfidenceInterval exact = new Proportion(81, 263).Interval(default, ProportionMethod.ClopperPearson);
        Assert.Equal(.2527, exact.Lower, 5e-5);
        Assert.Equal(.3676, exact.Upper, 5e-5);
    }

    /// <summary>The closed form 1 - (alpha / 2)^(1 / n), computed with 50 digits by mpmath: 1 - mpf('5e-13')**(mpf(1)/500).</summary>
    [Fact]
    public void Zero_of_500_at_a_level_twelve_nines_long()
    {
        ConfidenceInterval interval = new Proportion(0, 500).Interval(Confidence.TwoSided(1 - 1e-12), ProportionMethod.ClopperPearson);
        Assert.Equal(0, interval.Lower);
        Assert.Equal(0.055073693050313175, interval.Upper, 0.055 * 1e-12);
    }

    [Property(MaxTest = 500)]
    public void Intervals_hold_the_laws(PositiveInt trials, NonNegativeInt successes, PositiveInt scale)
    {
        long factor = scale.Get % 3 == 0 ? 1_000_000_000 : 1;
        long n = (trials.Get + 1L) * factor;
        long x = successes.Get * factor % (n + 1);
        Proportion proportion = new(x, n);
        foreach (ProportionMethod method in new[] { ProportionMethod.Wilson, ProportionMethod.ClopperPearson })
        {
            ConfidenceInterval narrow = proportion.Interval(Confidence.TwoSided(0.9), method);
            ConfidenceInterval wide = proportion.Interval(Confidence.TwoSided(0.99), method);
            Assert.InRange(wide.Lower, 0, narrow.Lower);
            Assert.InRange(wide.Upper, narrow.Upper, 1);
            Assert.True(narrow.Contains(proportion.Value), $"{proportion} {narrow}");
            Assert.Equal(x == 0, wide.Lower == 0);
            Assert.Equal(x == n, wide.Upper == 1);

            ConfidenceInterval mirrored = proportion.Complement.Interval(Confidence.TwoSided(0.9), method);
            Assert.Equal(1 - narrow.Upper, mirrored.Lower, 1e-15);
            Assert.Equal(1 - narrow.Lower, mirrored.Upper, 1e-15);

            Assert.Equal(narrow.Lower, proportion.Interval(Confidence.LowerBound(0.95), method).Lower);
            Assert.Equal(1, proportion.Interval(Confidence.LowerBound(0.95), method).Upper);
            Assert.Equal(narrow.Upper, proportion.Interval(Confidence.UpperBound(0.95), method).Upper);
            Assert.Equal(0, proportion.Interval(Confidence.UpperBound(0.95), method).Lower);
        }
    }

    /// <summary>The limit is where the score test just does not reject: checked against the test itself.</summary>
    [Theory]
    [InlineData(3, 12)]
    [InlineData(0, 7)]
    [InlineData(1, 1_000_000_000_000_000)]
    [InlineData(999_999_999_999_999, 1_000_000_000_000_000)]
    [InlineData(12, 12)]
    public void Wilson_limits_are_where_the_score_test_turns(long x, long n)
    {
        ConfidenceInterval interval = new Proportion(x, n).Interval();
        foreach (double limit in new[] { interval.Lower, interval.Upper }.Where(p => p > 0 && p < 1))
        {
            // The statistic crosses z within a few units in the last place of the limit (of its complement near 1).
            double step = Math.Max(limit * 1e-15, limit > 0.5 ? 2.3e-16 : 0);
            Assert.NotEqual(ScoreTestSign(x, n, limit - step), ScoreTestSign(x, n, limit + step));
        }
    }

    // The sign of (x - n p)^2 - z^2 n p (1 - p) in exact integer arithmetic.
    private static int ScoreTestSign(BigInteger x, BigInteger n, double p)
    {
        BigInteger one = BigInteger.One << 200;
        BigInteger scaled = Scaled(p);
        BigInteger z = Scaled(1.959963984540054);
        BigInteger difference = (x * one) - (n * scaled);
        return ((difference * difference * one * one) - (z * z * n * scaled * (one - scaled))).Sign;
    }

    private static BigInteger Scaled(double value)
    {
        long bits = BitConverter.DoubleToInt64Bits(value);
        int exponent = (int)((bits >> 52) & 0x7FF) - 1075;
        BigInteger mantissa = (bits & 0xFFFFFFFFFFFFF) | 0x10000000000000;
        return mantissa << (200 + exponent);
    }

    [Fact]
    public void Nothing_of_nothing_is_undefined_with_its_reason()
    {
        Proportion nothing = new(0, 0);
        Assert.Equal(default, nothing);
        Assert.False(nothing.IsDefined);
        Assert.True(double.IsNaN(nothing.Value));
        Assert.Equal(UndefinedCause.NoSubjects, nothing.WhyUndefined?.Cause);
        Assert.Equal("0/0 (undefined: there are no trials (0 of 0))", nothing.ToString());
        foreach (ProportionMethod method in Enum.GetValues<ProportionMethod>())
        {
            ConfidenceInterval interval = nothing.Interval(default, method);
            Assert.False(interval.IsDefined);
            Assert.True(double.IsNaN(interval.Lower));
            Assert.Equal(UndefinedCause.NoSubjects, interval.WhyUndefined?.Cause);
        }
    }

    [Theory]
    [InlineData(-1, 5, "successes")]
    [InlineData(6, 5, "trials")]
    [InlineData(0, -1, "trials")]
    public void Counts_that_cannot_be_are_refused(long successes, long trials, string name)
    {
        ArgumentOutOfRangeException error = Assert.Throws<ArgumentOutOfRangeException>(() => new Proportion(successes, trials));
        Assert.Equal(name, error.ParamName);
    }

    [Fact]
    public void An_unknown_method_is_refused()
    {
        Assert.Equal("method", Assert.Throws<ArgumentOutOfRangeException>(() => new Proportion(1, 2).Interval(default, (ProportionMethod)99)).ParamName);
    }
}
