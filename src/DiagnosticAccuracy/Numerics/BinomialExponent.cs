namespace DiagnosticAccuracy.Numerics;

/// <summary>
/// The exponent of the binomial and beta densities relative to their largest value.
/// </summary>
internal static class BinomialExponent
{
    /// <summary>Below this exponent a double logarithm is not accurate enough.</summary>
    private const double SafeExponent = -25.0;

    /// <summary>
    /// exp(E) with E = a ln(x/x0) + b ln(y/y0), where y = 1 - x, x0 = a/(a+b), y0 = b/(a+b): x^a y^b relative to
    /// its largest value.
    /// </summary>
    /// <param name="a">The first shape, positive.</param>
    /// <param name="b">The second shape, positive.</param>
    /// <param name="point">x and y.</param>
    /// <param name="deviation">(a+b) x - a.</param>
    /// <returns>exp(E), at most 1.</returns>
    /// <remarks>
    /// x/x0 = 1 + u with u = deviation/a and y/y0 = 1 + v with v = -deviation/b. The linear terms a u + b v are
    /// zero, which leaves E = a (ln(1+u) - u) + b (ln(1+v) - v), two terms of one sign (Loader, 2000; Temme, 1992).
    /// A relative error e of E is a relative error |E| e of the result: far out the logarithms are double-double.
    /// </remarks>
    public static double Exp(double a, double b, UnitPoint point, DoubleDouble deviation)
    {
        double u = deviation.High / a;
        double v = -deviation.High / b;
        double exponent = (a * Term(u, point.X, a, b)) + (b * Term(v, point.Complement, b, a));
        if (exponent > -4.0 || (exponent > SafeExponent && u > -0.5 && v > -0.5))
        {
            return Math.Exp(exponent);
        }

        if (exponent < -760.0)
        {
            return 0.0;
        }

        DoubleDouble precise = (PreciseTerm(deviation / a, point.X, a, b) * a) + (PreciseTerm((-deviation) / b, point.Complement, b, a) * b);
        return precise.Exp();
    }

    /// <summary>(a + b) x - a, to double-double accuracy in absolute terms of a.</summary>
    /// <param name="a">The first shape.</param>
    /// <param name="b">The second shape.</param>
    /// <param name="point">x and 1 - x.</param>
    /// <returns>The deviation.</returns>
    public static DoubleDouble Deviation(double a, double b, UnitPoint point)
    {
        if (point.IsLow)
        {
            return DoubleDouble.Product(b, point.X) + (DoubleDouble.Product(a, point.X) - a);
        }

        return -(DoubleDouble.Product(a, point.Complement) + (DoubleDouble.Product(b, point.Complement) - b));
    }

    private static double Term(double u, double x, double a, double b)
    {
        return u > -0.5 ? ElementaryFunctions.Log1PMinusX(u) : Math.Log(x * ((a + b) / a)) - u;
    }

    private static DoubleDouble PreciseTerm(DoubleDouble u, double x, double a, double b)
    {
        if (u.High > -0.999999)
        {
            return DoubleDouble.Log1PMinusX(u);
        }

        // Here x is small, hence exact; 1 + u would have cancelled.
        return DoubleDouble.Log(DoubleDouble.Sum(a, b) * x / a) - u;
    }
}
