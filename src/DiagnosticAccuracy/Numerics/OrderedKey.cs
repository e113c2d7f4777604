using System.Runtime.CompilerServices;

namespace DiagnosticAccuracy.Numerics;

/// <summary>Maps doubles to unsigned integers of the same order, so that they can be sorted digit by digit.</summary>
/// <remarks>-0.0 maps to the key of 0.0; NaN is refused before it comes here. No number maps to <see cref="ulong.MaxValue"/>.</remarks>
internal static class OrderedKey
{
    private const ulong SignBit = 0x8000_0000_0000_0000;

    /// <summary>The key; smaller numbers have smaller keys.</summary>
    [MethodImpl(MethodImplOptions.AggressiveInlining)]
    public static ulong Of(double value)
    {
        // Adding 0.0 turns -0.0 into 0.0 and leaves every other number alone.
        long bits = BitConverter.DoubleToInt64Bits(value + 0.0);
        return (ulong)bits ^ ((ulong)(bits >> 63) | SignBit);
    }

    /// <summary>The number whose key this is.</summary>
    [MethodImpl(MethodImplOptions.AggressiveInlining)]
    public static double ToDouble(ulong key)
    {
        ulong mask = (ulong)((long)~key >> 63) | SignBit;
        return BitConverter.Int64BitsToDouble((long)(key ^ mask));
    }
}
