namespace DiagnosticAccuracy.Numerics;

/// <summary>
/// The gamma and beta functions by Stirling's formula and its error, so that the large terms of products and
/// quotients of gamma functions can be cancelled before anything is rounded (Loader, 2000).
/// </summary>
internal static class StirlingSeries
{
    private const double HalfLogTwoPi = 0.9189385332046727;

    /// <summary>The Stirling error of 1, 2, ..., 15.</summary>
    private static readonly double[] OfSmallIntegers =
    [
        0.08106146679532726, 0.0413406959554093, 0.02767792568499834, 0.020790672103765093, 0.016644691189821193,
        0.013876128823070748, 0.01189670994589177, 0.010411265261972096, 0.009255462182712733, 0.00833056343336287,
        0.007573675487951841, 0.00694284010720953, 0.006408994188004207, 0.0059513701127588475, 0.005554733551962801,
    ];

    /// <summary>ln Gamma(x) - ((x - 1/2) ln x - x + ln(2 pi)/2), to a relative 1e-15.</summary>
    /// <param name="x">A positive value.</param>
    /// <returns>The error of Stirling's formula, about 1/(12 x).</returns>
    /// <remarks>
    /// From x = 10 the asymptotic series; below, the recurrence d(x) - d(x+1) = (x + 1/2) ln(1 + 1/x) - 1, all of
    /// whose terms are positive.
    /// </remarks>
    public static double StirlingError(double x)
    {
        double sum = 0.0;
        if (x <= 15.0)
        {
            int k = (int)x;
            if (k == x && k > 0)
            {
                return OfSmallIntegers[k - 1];
            }

            while (x < 10.0)
            {
                sum += RecurrenceStep(x);
                x += 1.0;
            }
        }

        return sum + Asymptotic(x);
    }

    /// <summary>ln Gamma(x), to an absolute 1e-15 of the size of its largest term.</summary>
    /// <param name="x">A positive value.</param>
    /// <returns>The logarithm of the gamma function.</returns>
    public static double LogGamma(double x)
    {
        return x < 0.5
            ? LogGammaRatio(1.0, x) - Math.Log(x)
            : x < 2.5
                ? LogGammaNearOne(x)
                : ((x - 0.5) * Math.Log(x)) - x + HalfLogTwoPi + StirlingError(x);
    }

    /// <summary>ln Gamma(x + step) - ln Gamma(x), relative to <paramref name="step"/> when that is small.</summary>
    /// <param name="x">A positive value.</param>
    /// <param name="step">A value above -x.</param>
    /// <returns>The logarithm of the ratio.</returns>
    /// <remarks>
    /// Gamma(x + h)/Gamma(x) = product of (x + i)/(x + h + i), i &lt; N, times the ratio at x + N, and there
    /// h ln x + x (ln(1 + h/x) - h/x) + (h - 1/2) ln(1 + h/x) + d(x + h) - d(x).
    /// </remarks>
    public static double LogGammaRatio(double x, double step)
    {
        double rest = LogGammaRatioRest(x, step, out double scale);
        return rest + (step * Math.Log(scale));
    }

    /// <summary>ln Gamma(x + step) - ln Gamma(x) - step ln(scale), with a scale near x.</summary>
    /// <param name="x">A positive value.</param>
    /// <param name="step">A value above -x.</param>
    /// <param name="scale">The value whose power is left out: x, or x and an integer.</param>
    /// <returns>What is left of the logarithm of the ratio, relative to <paramref name="step"/>.</returns>
    public static double LogGammaRatioRest(double x, double step, out double scale)
    {
        double sum = 0.0;
        while (x < 12.0)
        {
            sum -= ElementaryFunctions.Log1P(step / x);
            x += 1.0;
        }

        double u = step / x;
        sum += x * ElementaryFunctions.Log1PMinusX(u);
        sum += (step - 0.5) * ElementaryFunctions.Log1P(u);
        sum += AsymptoticDifference(x, step);
        scale = x;
        return sum;
    }

    /// <summary>ln B(a, b).</summary>
    /// <param name="a">The first shape.</param>
    /// <param name="b">The second shape.</param>
    /// <returns>The logarithm of the beta function.</returns>
    /// <remarks>
    /// d(a) + d(b) - d(a+b) + ln(2 pi (a+b)/(a b))/2 + a ln(a/(a+b)) + b ln(b/(a+b)): the last three terms have
    /// one sign for large shapes.
    /// </remarks>
    public static double LogBeta(double a, double b)
    {
        double small = Math.Min(a, b);
        double large = Math.Max(a, b);
        if (small == 1.0)
        {
            return -Math.Log(large);
        }

        if (small < 1.0)
        {
            // Gamma(s) Gamma(l) / Gamma(s + l) with Gamma(s) = Gamma(1 + s)/s
            return LogGammaRatio(1.0, small) - Math.Log(small) - LogGammaRatio(large, small);
        }

        double sum = small + large;
        return StirlingError(small) + StirlingError(large) - StirlingError(sum)
            + HalfLogTwoPi - (0.5 * Math.Log(small * (large / sum)))
            + (small * Math.Log(small / sum)) - (large * ElementaryFunctions.Log1P(small / large));
    }

    private static double LogGammaNearOne(double x)
    {
        // ln Gamma(1 + h) and ln Gamma(2 + h): relative to h, so that the zeros at 1 and 2 are kept.
        return x < 1.5 ? LogGammaRatio(1.0, x - 1.0) : LogGammaRatio(2.0, x - 2.0);
    }

    /// <summary>(x + 1/2) ln(1 + 1/x) - 1.</summary>
    private static double RecurrenceStep(double x)
    {
        if (x < 0.25)
        {
            return ((x + 0.5) * ElementaryFunctions.Log1P(1.0 / x)) - 1.0;
        }

        // artanh(t)/t - 1 = t^2/3 + t^4/5 + ..., t = 1/(2x + 1)
        double t = 1.0 / ((2.0 * x) + 1.0);
        double square = t * t;
        double power = square;
        double sum = 0.0;
        double term;
        double k = 3.0;
        do
        {
            term = power / k;
            sum += term;
            power *= square;
            k += 2.0;
        }
        while (term > 1e-17 * sum);

        return sum;
    }

    /// <summary>d(x + step) - d(x) for x from 12, relative to the step.</summary>
    /// <remarks>(x + h)^-m - x^-m = x^-m (exp(-m ln(1 + h/x)) - 1) in each term of the series.</remarks>
    private static double AsymptoticDifference(double x, double step)
    {
        if (Math.Abs(step) > 0.01 * x)
        {
            return Asymptotic(x + step) - Asymptotic(x);
        }

        double log = -ElementaryFunctions.Log1P(step / x);
        double r = 1.0 / x;
        double w = r * r;
        double sum = (1.0 / 156.0) * ElementaryFunctions.Expm1(13.0 * log);
        sum = (sum * w) - (691.0 / 360360.0 * ElementaryFunctions.Expm1(11.0 * log));
        sum = (sum * w) + (1.0 / 1188.0 * ElementaryFunctions.Expm1(9.0 * log));
        sum = (sum * w) - (1.0 / 1680.0 * ElementaryFunctions.Expm1(7.0 * log));
        sum = (sum * w) + (1.0 / 1260.0 * ElementaryFunctions.Expm1(5.0 * log));
        sum = (sum * w) - (1.0 / 360.0 * ElementaryFunctions.Expm1(3.0 * log));
        sum = (sum * w) + (1.0 / 12.0 * ElementaryFunctions.Expm1(log));
        return sum * r;
    }

    /// <summary>The asymptotic series of B(2k) / (2k (2k-1) x^(2k-1)), for x from 10.</summary>
    private static double Asymptotic(double x)
    {
        double r = 1.0 / x;
        double w = r * r;
        if (x > 1e6)
        {
            return r * ((1.0 / 12.0) - (w / 360.0));
        }

        double sum = 0.0;
        if (x < 60.0)
        {
            sum = -236364091.0 / 1506960.0;
            sum = (sum * w) + (854513.0 / 63756.0);
            sum = (sum * w) - (174611.0 / 125400.0);
            sum = (sum * w) + (43867.0 / 244188.0);
            sum = (sum * w) - (3617.0 / 122400.0);
            sum = (sum * w) + (1.0 / 156.0);
        }

        sum = (sum * w) - (691.0 / 360360.0);
        sum = (sum * w) + (1.0 / 1188.0);
        sum = (sum * w) - (1.0 / 1680.0);
        sum = (sum * w) + (1.0 / 1260.0);
        sum = (sum * w) - (1.0 / 360.0);
        sum = (sum * w) + (1.0 / 12.0);
        return sum * r;
    }
}
