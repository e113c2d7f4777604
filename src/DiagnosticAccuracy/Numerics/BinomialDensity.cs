namespace DiagnosticAccuracy.Numerics;

/// <summary>
/// The binomial density C(n, x) p^x (1-p)^(n-x), for real x too.
/// </summary>
internal static class BinomialDensity
{
    private const double TwoPi = 6.283185307179586;

    /// <summary>The density at x of n trials with success probability p.</summary>
    /// <param name="x">The number of successes, an integer or not.</param>
    /// <param name="n">The number of trials, not negative.</param>
    /// <param name="p">The success probability.</param>
    /// <returns>C(n, x) p^x (1-p)^(n-x); 0 for x outside of 0 to n.</returns>
    public static double Of(double x, double n, double p) => Of(x, n, UnitPoint.FromX(p));

    /// <summary>The density at x of n trials, the probability given with its complement.</summary>
    /// <param name="x">The number of successes, an integer or not.</param>
    /// <param name="n">The number of trials, not negative.</param>
    /// <param name="p">The success probability.</param>
    /// <param name="q">1 - p; the smaller of the two is taken as exact.</param>
    /// <returns>C(n, x) p^x q^(n-x); 0 for x outside of 0 to n.</returns>
    public static double Of(double x, double n, double p, double q) => Of(x, n, UnitPoint.From(p, q));

    /// <remarks>
    /// sqrt(n / (2 pi x (n-x))) exp(d(n) - d(x) - d(n-x)) exp(E), d the error of Stirling's formula and E the
    /// exponent relative to the largest value, of the deviation n p - x (Loader, 2000).
    /// </remarks>
    private static double Of(double x, double n, UnitPoint point)
    {
        double p = point.X;
        double q = point.Complement;
        if (double.IsNaN(x) || double.IsNaN(n) || double.IsNaN(p))
        {
            return double.NaN;
        }

        if (x < 0.0 || x > n)
        {
            return 0.0;
        }

        if (p <= 0.0 || n == 0.0)
        {
            return x == 0.0 ? 1.0 : 0.0;
        }

        if (q <= 0.0)
        {
            return x == n ? 1.0 : 0.0;
        }

        if (x == 0.0)
        {
            return PowerOfComplement(point, n);
        }

        if (x == n)
        {
            return PowerOfComplement(point.Mirror(), n);
        }

        double rest = n - x;
        DoubleDouble deviation = point.IsLow
            ? DoubleDouble.Product(n, p) - x
            : DoubleDouble.Sum(n, -x) - DoubleDouble.Product(n, q);
        double correction = StirlingSeries.StirlingError(n) - StirlingSeries.StirlingError(x) - StirlingSeries.StirlingError(rest);
        double least = Math.Min(x, rest) * (Math.Max(x, rest) / n);
        return Math.Exp(correction) / Math.Sqrt(TwoPi * least) * BinomialExponent.Exp(x, rest, point, deviation);
    }

    /// <summary>The complement of the point to the power n.</summary>
    private static double PowerOfComplement(UnitPoint point, double n)
    {
        double plain = n * (point.IsLow ? ElementaryFunctions.Log1P(-point.X) : Math.Log(point.Complement));
        if (plain > -4.0)
        {
            return Math.Exp(plain);
        }

        DoubleDouble log = point.IsLow
            ? DoubleDouble.Log1P(new DoubleDouble(-point.X, 0.0))
            : DoubleDouble.Log(new DoubleDouble(point.Complement, 0.0));
        return (log * n).Exp();
    }
}
