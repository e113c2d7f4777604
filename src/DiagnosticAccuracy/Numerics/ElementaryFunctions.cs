namespace DiagnosticAccuracy.Numerics;

/// <summary>
/// Elementary functions which .NET does not have, accurate to about one unit in the last place.
/// </summary>
internal static class ElementaryFunctions
{
    /// <summary>ln(1 + x) without loss for small x.</summary>
    /// <param name="x">A value of at least -1.</param>
    /// <returns>ln(1 + x); negative infinity at -1, NaN below.</returns>
    /// <remarks>
    /// The logarithm of u = fl(1 + x), and the first-order effect of the rounding of u.
    /// </remarks>
    public static double Log1P(double x)
    {
        if (Math.Abs(x) < 1e-17)
        {
            return x;
        }

        double u = 1.0 + x;
        if (u <= 0.0 || double.IsInfinity(u) || double.IsNaN(u))
        {
            return Math.Log(u);
        }

        double lost = Math.Abs(x) < 1.0 ? x - (u - 1.0) : 1.0 - (u - x);
        return Math.Log(u) + (lost / u);
    }

    /// <summary>exp(x) - 1 without loss for small x.</summary>
    /// <param name="x">Any value.</param>
    /// <returns>exp(x) - 1.</returns>
    public static double Expm1(double x)
    {
        if (!(Math.Abs(x) < 0.5))
        {
            return Math.Exp(x) - 1.0;
        }

        // x + x^2/2 + x^3 (1/3! + x/4! + ... + x^11/14!)
        double tail = 1.0 / 87178291200.0;
        tail = (tail * x) + (1.0 / 6227020800.0);
        tail = (tail * x) + (1.0 / 479001600.0);
        tail = (tail * x) + (1.0 / 39916800.0);
        tail = (tail * x) + (1.0 / 3628800.0);
        tail = (tail * x) + (1.0 / 362880.0);
        tail = (tail * x) + (1.0 / 40320.0);
        tail = (tail * x) + (1.0 / 5040.0);
        tail = (tail * x) + (1.0 / 720.0);
        tail = (tail * x) + (1.0 / 120.0);
        tail = (tail * x) + (1.0 / 24.0);
        tail = (tail * x) + (1.0 / 6.0);
        double square = x * x;
        return x + ((0.5 * square) + (square * x * tail));
    }

    /// <summary>ln(1 + x) - x with full relative accuracy.</summary>
    /// <param name="x">A value above -1.</param>
    /// <returns>ln(1 + x) - x, never positive.</returns>
    /// <remarks>
    /// With s = x / (2 + x): ln(1 + x) = 2 artanh s and 2s - x = -s x, hence
    /// ln(1 + x) - x = -s x + 2 s^3 (1/3 + s^2/5 + s^4/7 + ...).
    /// </remarks>
    public static double Log1PMinusX(double x)
    {
        if (!(x >= -0.5 && x <= 1.0))
        {
            return Log1P(x) - x;
        }

        double s = x / (2.0 + x);
        double w = s * s;
        double tail = 0.0;
        if (w > 0.0036)
        {
            // |s| up to 1/3
            tail = 1.0 / 37.0;
            tail = (tail * w) + (1.0 / 35.0);
            tail = (tail * w) + (1.0 / 33.0);
            tail = (tail * w) + (1.0 / 31.0);
            tail = (tail * w) + (1.0 / 29.0);
            tail = (tail * w) + (1.0 / 27.0);
            tail = (tail * w) + (1.0 / 25.0);
            tail = (tail * w) + (1.0 / 23.0);
            tail = (tail * w) + (1.0 / 21.0);
            tail = (tail * w) + (1.0 / 19.0);
            tail = (tail * w) + (1.0 / 17.0);
        }

        tail = (tail * w) + (1.0 / 15.0);
        tail = (tail * w) + (1.0 / 13.0);
        tail = (tail * w) + (1.0 / 11.0);
        tail = (tail * w) + (1.0 / 9.0);
        tail = (tail * w) + (1.0 / 7.0);
        tail = (tail * w) + (1.0 / 5.0);
        tail = (tail * w) + (1.0 / 3.0);
        return (2.0 * s * w * tail) - (s * x);
    }
}
