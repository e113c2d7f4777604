using System.Numerics;

namespace DiagnosticAccuracy.Numerics;

/// <summary>An exact running sum of unsigned integers, 128 bits wide.</summary>
internal struct WideSum
{
    private ulong _high;
    private ulong _low;

    /// <summary>Adds a number.</summary>
    public void Add(ulong value)
    {
        _low += value;
        if (_low < value)
        {
            _high++;
        }
    }

    /// <summary>Adds a product of two numbers.</summary>
    public void AddProduct(ulong left, ulong right)
    {
        ulong high = MultiplyHigh(left, right, out ulong low);
        Add(low);
        _high += high;
    }

    /// <summary>The sum so far.</summary>
    public readonly BigInteger ToBigInteger() => (new BigInteger(_high) << 64) + _low;

    private static ulong MultiplyHigh(ulong left, ulong right, out ulong low)
    {
#if NET
        return Math.BigMul(left, right, out low);
#else
        ulong leftLow = (uint)left;
        ulong leftHigh = left >> 32;
        ulong rightLow = (uint)right;
        ulong rightHigh = right >> 32;
        ulong lowLow = leftLow * rightLow;
        ulong middle = (leftHigh * rightLow) + (lowLow >> 32);
        ulong otherMiddle = (leftLow * rightHigh) + (uint)middle;
        low = (otherMiddle << 32) | (uint)lowLow;
        return (leftHigh * rightHigh) + (middle >> 32) + (otherMiddle >> 32);
#endif
    }
}
