using System.Runtime.CompilerServices;

namespace DiagnosticAccuracy.Numerics;

/// <summary>
/// An unevaluated sum of two doubles, about 32 significant digits.
/// </summary>
/// <remarks>
/// Error-free transformations of Dekker (1971) and Knuth (1969). No fused multiply-add is used, so that every
/// target framework gives the same bits. Products and sums must be rounded to double each, as every 64-bit runtime
/// does.
/// </remarks>
internal readonly struct DoubleDouble
{
    /// <summary>ln 2 to 32 digits.</summary>
    private static readonly DoubleDouble Ln2 = new(0.6931471805599453, 2.3190468138462996e-17);

    private static readonly DoubleDouble Third = new(0.3333333333333333, 1.850371707708594e-17);
    private static readonly DoubleDouble Fifth = new(0.2, -1.1102230246251566e-17);
    private static readonly DoubleDouble Seventh = new(0.14285714285714285, 7.93016446160826e-18);

    /// <summary>Initializes a new value from its leading part and the part below it.</summary>
    /// <param name="high">The leading part: the sum rounded to a double.</param>
    /// <param name="low">The rest, at most half a unit in the last place of <paramref name="high"/>.</param>
    public DoubleDouble(double high, double low)
    {
        High = high;
        Low = low;
    }

    /// <summary>Gets the value rounded to a double.</summary>
    public double High { get; }

    /// <summary>Gets what the rounding left.</summary>
    public double Low { get; }

    /// <summary>The exact sum of two doubles (Knuth, 1969).</summary>
    [MethodImpl(MethodImplOptions.AggressiveInlining)]
    public static DoubleDouble Sum(double a, double b)
    {
        double s = a + b;
        double t = s - a;
        return new DoubleDouble(s, (a - (s - t)) + (b - t));
    }

    /// <summary>The exact product of two doubles (Dekker, 1971); the operands must be below 1e300.</summary>
    [MethodImpl(MethodImplOptions.AggressiveInlining)]
    public static DoubleDouble Product(double a, double b)
    {
        const double Splitter = 134217729.0; // 2^27 + 1
        double p = a * b;
        double ta = Splitter * a;
        double ah = ta - (ta - a);
        double al = a - ah;
        double tb = Splitter * b;
        double bh = tb - (tb - b);
        double bl = b - bh;
        return new DoubleDouble(p, (((ah * bh) - p) + (ah * bl) + (al * bh)) + (al * bl));
    }

    public static DoubleDouble operator +(DoubleDouble a, DoubleDouble b)
    {
        DoubleDouble s = Sum(a.High, b.High);
        DoubleDouble t = Sum(a.Low, b.Low);
        DoubleDouble u = FastSum(s.High, s.Low + t.High);
        return FastSum(u.High, u.Low + t.Low);
    }

    [MethodImpl(MethodImplOptions.AggressiveInlining)]
    public static DoubleDouble operator +(DoubleDouble a, double b)
    {
        DoubleDouble s = Sum(a.High, b);
        return FastSum(s.High, s.Low + a.Low);
    }

    [MethodImpl(MethodImplOptions.AggressiveInlining)]
    public static DoubleDouble operator -(DoubleDouble a) => new(-a.High, -a.Low);

    public static DoubleDouble operator -(DoubleDouble a, DoubleDouble b) => a + (-b);

    public static DoubleDouble operator -(DoubleDouble a, double b) => a + (-b);

    public static DoubleDouble operator *(DoubleDouble a, DoubleDouble b)
    {
        DoubleDouble p = Product(a.High, b.High);
        return FastSum(p.High, p.Low + ((a.High * b.Low) + (a.Low * b.High)));
    }

    public static DoubleDouble operator *(DoubleDouble a, double b)
    {
        DoubleDouble p = Product(a.High, b);
        return FastSum(p.High, p.Low + (a.Low * b));
    }

    public static DoubleDouble operator /(DoubleDouble a, double b) => a / new DoubleDouble(b, 0.0);

    public static DoubleDouble operator /(DoubleDouble a, DoubleDouble b)
    {
        double q = a.High / b.High;
        DoubleDouble r = a - (b * q);
        double q2 = r.High / b.High;
        r -= b * q2;
        return FastSum(q, q2) + (r.High / b.High);
    }

    /// <summary>The natural logarithm of a positive value.</summary>
    /// <remarks>
    /// z = 2^k m with m in [0.7, 1.42), ln m = 2 artanh((m - 1) / (m + 1)).
    /// </remarks>
    public static DoubleDouble Log(DoubleDouble z)
    {
        int k = 0;
        if (z.High < 2.2250738585072014e-308)
        {
            z = new DoubleDouble(z.High * 18014398509481984.0, z.Low * 18014398509481984.0); // 2^54
            k = -54;
        }

        int exponent = (int)((BitConverter.DoubleToInt64Bits(z.High) >> 52) & 0x7FF) - 1023;

        // In two steps, because 2^1023 has no inverse among the normal doubles.
        int half = exponent / 2;
        double scale1 = PowerOfTwo(-half);
        double scale2 = PowerOfTwo(half - exponent);
        DoubleDouble m = new(z.High * scale1 * scale2, z.Low * scale1 * scale2);
        k += exponent;
        if (m.High > 1.4142135623730951)
        {
            m = new DoubleDouble(0.5 * m.High, 0.5 * m.Low);
            k++;
        }

        DoubleDouble s = (m - 1.0) / (m + 1.0);
        DoubleDouble log = (s + ArTanhTail(s)) * 2.0;
        return k == 0 ? log : log + (Ln2 * k);
    }

    /// <summary>ln(1 + u) - u with full relative accuracy; u above -1.</summary>
    /// <remarks>
    /// With s = u / (2 + u): ln(1 + u) = 2 artanh s and 2s - u = -s u, hence
    /// ln(1 + u) - u = -s u + 2 (s^3/3 + s^5/5 + ...).
    /// </remarks>
    public static DoubleDouble Log1PMinusX(DoubleDouble u)
    {
        if (Math.Abs(u.High) > 0.4)
        {
            return Log(u + 1.0) - u;
        }

        DoubleDouble s = u / (u + 2.0);
        return (ArTanhTail(s) * 2.0) - (s * u);
    }

    /// <summary>ln(1 + u) with full relative accuracy; u above -1.</summary>
    public static DoubleDouble Log1P(DoubleDouble u)
    {
        if (Math.Abs(u.High) > 0.4)
        {
            return Log(u + 1.0);
        }

        DoubleDouble s = u / (u + 2.0);
        return (s + ArTanhTail(s)) * 2.0;
    }

    /// <summary>exp of this value, rounded to a double.</summary>
    public double Exp()
    {
        if (High < -600.0)
        {
            // The square of the half keeps the digits of a result near the smallest normal double.
            double h = Math.Exp(0.5 * High);
            return h * (h * (1.0 + Low));
        }

        return Math.Exp(High) * (1.0 + Low);
    }

    /// <summary>artanh(s) - s = s^3/3 + s^5/5 + ... for |s| up to 0.26.</summary>
    private static DoubleDouble ArTanhTail(DoubleDouble s)
    {
        DoubleDouble s2 = s * s;
        double w = s2.High;

        // The terms from s^9 on are at most 1e-4 of the result: doubles are enough for 1e-20.
        double tail = 0.0;
        for (int k = w > 0.005 ? 33 : 19; k >= 9; k -= 2)
        {
            tail = (tail * w) + (1.0 / k);
        }

        DoubleDouble sum = Seventh + (s2 * tail);
        sum = Fifth + (s2 * sum);
        sum = Third + (s2 * sum);
        return s * s2 * sum;
    }

    [MethodImpl(MethodImplOptions.AggressiveInlining)]
    private static DoubleDouble FastSum(double a, double b)
    {
        double s = a + b;
        return new DoubleDouble(s, b - (s - a));
    }

    private static double PowerOfTwo(int exponent) => BitConverter.Int64BitsToDouble((long)(exponent + 1023) << 52);
}
