using System.Numerics;

namespace DiagnosticAccuracy.Numerics;

/// <summary>Doubles from 0 to 1 as exact fractions over one power of two.</summary>
internal static class BinaryFraction
{
    private const int Bits = 1074;

    /// <summary>The denominator of every double: 2^1074.</summary>
    public static BigInteger Denominator { get; } = BigInteger.One << Bits;

    /// <summary>The numerator over <see cref="Denominator"/>.</summary>
    /// <param name="value">A number from 0 to 1.</param>
    public static BigInteger Numerator(double value)
    {
        long bits = BitConverter.DoubleToInt64Bits(value);
        int exponent = (int)((bits >> 52) & 0x7FF);
        long fraction = bits & 0xF_FFFF_FFFF_FFFF;
        return exponent == 0 ? fraction : (BigInteger)(fraction | 0x10_0000_0000_0000) << (exponent - 1);
    }
}
