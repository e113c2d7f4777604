namespace DiagnosticAccuracy.Numerics;

/// <summary>
/// The beta distribution of two shapes: what does not depend on the point is computed once.
/// </summary>
internal readonly struct BetaKernel
{
    private const double TwoPi = 6.283185307179586;

    /// <summary>Gauss-Legendre panels are used from this value of a b/(a+b) on.</summary>
    private const double PanelVariance = 150.0;

    /// <summary>Gauss-Legendre panels are used up to this many standard deviations, the continued fraction beyond.</summary>
    private const double PanelDeviations = 3.5;

    /// <summary>The finite sum of an integer shape is used up to this number of terms.</summary>
    private const double FiniteSumLargest = 100.0;

    private readonly double _a;
    private readonly double _b;
    private readonly double _scale;

    /// <summary>Initializes the distribution.</summary>
    /// <param name="a">The first shape, positive.</param>
    /// <param name="b">The second shape, positive.</param>
    /// <remarks>
    /// x0^a y0^b / B(a,b) = sqrt(a b / (2 pi (a+b))) exp(d(a+b) - d(a) - d(b)), d the error of Stirling's formula.
    /// </remarks>
    public BetaKernel(double a, double b)
    {
        _a = a;
        _b = b;
        double n = a + b;
        double least = Math.Min(a, b) * (Math.Max(a, b) / n);
        _scale = Math.Sqrt(least / TwoPi)
            * Math.Exp(StirlingSeries.StirlingError(n) - StirlingSeries.StirlingError(a) - StirlingSeries.StirlingError(b));
    }

    /// <summary>Gets the first shape.</summary>
    public double A => _a;

    /// <summary>Gets the second shape.</summary>
    public double B => _b;

    /// <summary>Gets ln(a B(a,b)), the logarithm of the divisor of x^a in the leading term of the lower tail.</summary>
    public double LogLeadingDivisor
    {
        get
        {
            double n = _a + _b;
            double logX0 = _a < _b ? Math.Log(_a / n) : -ElementaryFunctions.Log1P(_b / _a);
            double logY0 = _b < _a ? Math.Log(_b / n) : -ElementaryFunctions.Log1P(_a / _b);
            return (_a * logX0) + (_b * logY0) - Math.Log(_scale / _a);
        }
    }

    /// <summary>Both tails at a point inside the unit interval.</summary>
    /// <param name="point">The point.</param>
    /// <returns>The tails, the slope and its logarithmic derivative.</returns>
    public BetaEvaluation Evaluate(UnitPoint point)
    {
        DoubleDouble deviation = BinomialExponent.Deviation(_a, _b, point);
        double slope = _scale * BinomialExponent.Exp(_a, _b, point, deviation);
        double lambda = -deviation.High;

        if (_a < 1.0 && _b < 1.0)
        {
            BetaTails tails = point.IsLow ? SeriesTails(_a, _b, point.X) : Swap(SeriesTails(_b, _a, point.Complement));
            return new BetaEvaluation(tails.Lower, tails.Upper, slope, lambda);
        }

        bool fromBelow;
        if (_a < 1.0)
        {
            if (point.IsLow && _b * point.X <= 1.0)
            {
                BetaTails tails = SeriesTails(_a, _b, point.X);
                return new BetaEvaluation(tails.Lower, tails.Upper, slope, lambda);
            }

            fromBelow = false;
        }
        else if (_b < 1.0)
        {
            if (!point.IsLow && _a * point.Complement <= 1.0)
            {
                BetaTails tails = Swap(SeriesTails(_b, _a, point.Complement));
                return new BetaEvaluation(tails.Lower, tails.Upper, slope, lambda);
            }

            fromBelow = true;
        }
        else
        {
            // Both tails are between 1/e and 1 - 1/e at the mean: the one beyond it never needs a complement.
            fromBelow = lambda >= 0.0;
        }

        if (fromBelow)
        {
            double lower = slope * TailOverSlope(_a, _b, point.X, point.Complement, lambda);
            return new BetaEvaluation(lower, 1.0 - lower, slope, lambda);
        }

        double upper = slope * TailOverSlope(_b, _a, point.Complement, point.X, -lambda);
        return new BetaEvaluation(1.0 - upper, upper, slope, lambda);
    }

    private static BetaTails Swap(BetaTails tails) => new(tails.Upper, tails.Lower);

    private static double TailOverSlope(double a, double b, double x, double y, double lambda)
    {
        if (a > PanelVariance && b > PanelVariance)
        {
            double variance = (a + b) * x * y;
            if (variance > PanelVariance && lambda * lambda < PanelDeviations * PanelDeviations * variance)
            {
                return BetaPanel.TailOverSlope(variance, x, y, lambda);
            }
        }

        return b <= FiniteSumLargest && b == Math.Floor(b)
            ? FiniteSum(a, (int)b, x, y)
            : ContinuedFraction(a, b, x, y, lambda);
    }

    /// <summary>I_x(a,b) / (x^a y^b / B(a,b)) for an integer b and x not far above the mean.</summary>
    /// <remarks>
    /// 1/(a y) times the sum over j from 0 to b-1 of (b-1)...(b-j) / ((a+1)...(a+j)) (x/y)^j (Abramowitz and Stegun,
    /// 1964, 26.5.6): all the terms are positive, and falling below the mean.
    /// </remarks>
    private static double FiniteSum(double a, int b, double x, double y)
    {
        double odds = x / y;
        double term = 1.0;
        double sum = 1.0;
        for (int j = 1; j < b; j++)
        {
            term *= odds * ((b - j) / (a + j));
            sum += term;
            if (term < 1e-17 * sum)
            {
                break;
            }
        }

        return sum / (a * y);
    }

    /// <summary>I_x(a,b) / (x^a y^b / B(a,b)) by a continued fraction.</summary>
    /// <remarks>
    /// The even part of Gauss' continued fraction (DiDonato and Morris, 1992, equation 9), evaluated by the modified
    /// Lentz method (Thompson and Barnett, 1986).
    /// </remarks>
    private static double ContinuedFraction(double a, double b, double x, double y, double lambda)
    {
        const double Tiny = 1e-300;
        const int MostTerms = 100000;
        double lambda1 = lambda + 1.0;
        double beta = a / (a + 1.0) * lambda1;
        double c = beta == 0.0 ? Tiny : beta;
        double d = 0.0;
        double f = c;
        for (int n = 1; n < MostTerms; n++)
        {
            double step = a + (2.0 * n);
            double before = 1.0 / (step - 1.0);
            double nb = n * (b - n) * x * before;
            double alpha = (a + (n - 1.0)) * (a + b + (n - 1.0)) * x * before * nb;
            beta = n + nb + ((a + n) / (step + 1.0) * (lambda1 + (n * (1.0 + y))));
            d = beta + (alpha * d);
            c = beta + (alpha / c);
            d = 1.0 / (d == 0.0 ? Tiny : d);
            double change = c * d;
            f *= change;
            if (Math.Abs(change - 1.0) <= 2.3e-16)
            {
                break;
            }
        }

        return 1.0 / f;
    }

    /// <summary>Both tails for a shape a below 1 and a small x, by the power series in x.</summary>
    /// <remarks>
    /// I_x(a,b) = x^a Gamma(a+b) / (Gamma(a+1) Gamma(b)) (1 + a S), S the sum of (1-b)_n x^n / (n! (a+n)) over n
    /// from 1 (Abramowitz and Stegun, 1964, 6.6.8 and 15.1.1). When this is near 1 the upper tail is -expm1 of its
    /// logarithm, whose parts are each proportional to a.
    /// </remarks>
    private static BetaTails SeriesTails(double a, double b, double x)
    {
        double term = 1.0;
        double sum = 0.0;
        for (int n = 1; n < 2000; n++)
        {
            term *= (n - b) * x / n;
            double part = term / (a + n);
            sum += part;
            if (Math.Abs(part) <= 1e-18 * Math.Abs(sum))
            {
                break;
            }
        }

        double rest = StirlingSeries.LogGammaRatioRest(b, a, out double multiple) - StirlingSeries.LogGammaRatio(1.0, a);
        double argument = x * multiple;
        double lower = Math.Pow(argument, a) * Math.Exp(rest) * (1.0 + (a * sum));
        if (lower < 0.5)
        {
            return new BetaTails(lower, 1.0 - lower);
        }

        double logLower = (a * Math.Log(argument)) + rest + ElementaryFunctions.Log1P(a * sum);
        return new BetaTails(lower, -ElementaryFunctions.Expm1(logLower));
    }
}
