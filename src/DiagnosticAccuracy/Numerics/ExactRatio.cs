using System.Numerics;

namespace DiagnosticAccuracy.Numerics;

/// <summary>Ratios of integers of any size, rounded once.</summary>
internal static class ExactRatio
{
    /// <summary>The double nearest to numerator / denominator.</summary>
    /// <param name="numerator">Any integer.</param>
    /// <param name="denominator">A positive integer.</param>
    public static double ToDouble(BigInteger numerator, BigInteger denominator)
    {
        if (BigInteger.Abs(numerator) <= MaxExact && denominator <= MaxExact)
        {
            return (double)numerator / (double)denominator;
        }

        // Scale so that the integer quotient has at least 66 bits, keep whether anything was cut off, and round once:
        // the quotient with its sticky last bit converts to the nearest double.
        bool negative = numerator.Sign < 0;
        BigInteger magnitude = BigInteger.Abs(numerator);
        int shift = Math.Max(0, 66 - (BitLength(magnitude) - BitLength(denominator)));
        BigInteger quotient = BigInteger.DivRem(magnitude << shift, denominator, out BigInteger remainder);
        int excess = Math.Max(0, BitLength(quotient) - 62);
        bool sticky = !remainder.IsZero || !(quotient & ((BigInteger.One << excess) - 1)).IsZero;
        long top = (long)(quotient >> excess) | (sticky ? 1L : 0L);
        double value = top * PowerOfTwo(excess - shift);
        return negative ? -value : value;
    }

    private static readonly BigInteger MaxExact = BigInteger.One << 53;

    private static int BitLength(BigInteger value)
    {
        byte[] bytes = value.ToByteArray();
        int last = bytes.Length - 1;
        int bits = last * 8;
        for (int top = bytes[last]; top != 0; top >>= 1)
        {
            bits++;
        }

        return bits;
    }

    private static double PowerOfTwo(int exponent) => Math.Pow(2, exponent);
}
