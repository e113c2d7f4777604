using System.Numerics;
using DiagnosticAccuracy.Numerics;
using FsCheck.Xunit;

namespace DiagnosticAccuracy.Tests.Numerics;

public class DecimalFractionTests
{
    [Theory]
    [InlineData(0, 0, 1)]
    [InlineData(1, 1, 1)]
    [InlineData(0.15, 15, 100)]
    [InlineData(0.5, 5, 10)]
    [InlineData(1.5e-7, 15, 100_000_000)]
    [InlineData(2e-5, 2, 100_000)]
    public void A_double_is_the_decimal_it_prints_as(double value, long numerator, long denominator)
    {
        DecimalFraction fraction = DecimalFraction.Of(value);
        Assert.Equal(numerator, fraction.Numerator);
        Assert.Equal(denominator, fraction.Denominator);
    }

    /// <summary>The fraction, rounded once, is the double again.</summary>
    [Property(MaxTest = 2000)]
    public void The_nearest_double_of_the_fraction_is_the_double(ulong bits, byte shift)
    {
        double value = (bits >> 11) / 9007199254740992.0 * Math.Pow(2, -shift);
        DecimalFraction fraction = DecimalFraction.Of(value);
        Assert.Equal(value, ExactRatio.ToDouble(fraction.Numerator, fraction.Denominator));
        Assert.True(BigInteger.Remainder(BigInteger.Pow(10, 400), fraction.Denominator).IsZero);
    }
}
