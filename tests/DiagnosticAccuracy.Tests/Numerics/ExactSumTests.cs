using System.Numerics;
using DiagnosticAccuracy.Numerics;
using FsCheck.Xunit;

namespace DiagnosticAccuracy.Tests.Numerics;

public class ExactSumTests
{
    [Property(MaxTest = 500)]
    public void A_wide_sum_is_the_sum_of_products(ulong[] left, ulong right)
    {
        WideSum sum = default;
        BigInteger expected = 0;
        foreach (ulong value in left.Take(8))
        {
            // Top bits set, so that carries happen; three bits of room for eight terms.
            ulong big = ~value >> 2;
            sum.AddProduct(big, ~right >> 2);
            sum.Add(value);
            expected += ((BigInteger)big * (~right >> 2)) + value;
        }

        Assert.Equal(expected, sum.ToBigInteger());
    }

    [Property(MaxTest = 500)]
    public void A_ratio_of_small_integers_is_the_correctly_rounded_division(int numerator, int denominator)
    {
        long d = Math.Abs((long)denominator) + 1;
        Assert.Equal((double)numerator / d, ExactRatio.ToDouble(numerator, d));

        // Blown up by a common factor it must round to the same double, now by the long way.
        BigInteger factor = BigInteger.Pow(3, 80);
        Assert.Equal((double)numerator / d, ExactRatio.ToDouble(numerator * factor, d * factor));
    }

    [Fact]
    public void A_compensated_sum_keeps_what_a_plain_one_loses()
    {
        CompensatedSum sum = default;
        foreach (double value in new[] { 1, 1e100, 1, -1e100 })
        {
            sum.Add(value);
        }

        Assert.Equal(2, sum.Value);
    }
}
