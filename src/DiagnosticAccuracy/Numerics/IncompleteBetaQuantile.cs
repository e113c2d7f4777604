namespace DiagnosticAccuracy.Numerics;

/// <content>
/// The quantiles: the inverse of I_x(a, b) in x.
/// </content>
internal static partial class IncompleteBeta
{
    /// <summary>Beyond this logit x or 1 - x is below the smallest normal double.</summary>
    private const double LargestLogit = 708.3;

    /// <summary>The x whose lower tail is given: I_x(a, b) = p.</summary>
    /// <param name="a">The first shape, positive.</param>
    /// <param name="b">The second shape, positive.</param>
    /// <param name="p">The lower tail, from 0 to 1.</param>
    /// <returns>x and 1 - x, each with its own relative accuracy.</returns>
    public static UnitPoint LowerQuantile(double a, double b, double p)
    {
        CheckShapes(a, b);
        if (!(p >= 0.0 && p <= 1.0))
        {
            throw new ArgumentOutOfRangeException(nameof(p), p, "A probability must be from 0 to 1.");
        }

        return Quantile(a, b, p);
    }

    /// <summary>The x whose upper tail is given: 1 - I_x(a, b) = q.</summary>
    /// <param name="a">The first shape, positive.</param>
    /// <param name="b">The second shape, positive.</param>
    /// <param name="q">The upper tail, from 0 to 1.</param>
    /// <returns>x and 1 - x, each with its own relative accuracy.</returns>
    public static UnitPoint UpperQuantile(double a, double b, double q)
    {
        CheckShapes(a, b);
        if (!(q >= 0.0 && q <= 1.0))
        {
            throw new ArgumentOutOfRangeException(nameof(q), q, "A probability must be from 0 to 1.");
        }

        return Quantile(b, a, q).Mirror();
    }

    private static UnitPoint Quantile(double a, double b, double p)
    {
        if (p == 0.0)
        {
            return UnitPoint.FromX(0.0);
        }

        // 1 - p is exact for p from 1/2 on, so that the tail searched for is the smaller one.
        return p <= 0.5 ? SmallTailQuantile(a, b, p)
            : p < 1.0 ? SmallTailQuantile(b, a, 1.0 - p).Mirror()
            : UnitPoint.FromX(1.0);
    }

    /// <summary>The lower quantile for a tail of at most one half.</summary>
    private static UnitPoint SmallTailQuantile(double a, double b, double p)
    {
        if (b == 1.0)
        {
            // I_x(a,1) = x^a
            return PointOfLogX(DoubleDouble.Log(new DoubleDouble(p, 0.0)) / a);
        }

        if (a == 1.0)
        {
            // I_x(1,b) = 1 - (1-x)^b
            return PointOfLogX(DoubleDouble.Log1P(new DoubleDouble(-p, 0.0)) / b).Mirror();
        }

        return Search(new BetaKernel(a, b), p);
    }

    /// <summary>The point of x = exp(logX).</summary>
    private static UnitPoint PointOfLogX(DoubleDouble logX)
    {
        if (logX.High < -0.6931471805599453)
        {
            return UnitPoint.FromX(logX.Exp());
        }

        return UnitPoint.FromComplement(-ElementaryFunctions.Expm1(logX.High) - (Math.Exp(logX.High) * logX.Low));
    }

    /// <summary>
    /// Solves ln I_x = ln p for the logit of x. The density of the logit is log-concave, hence so is the
    /// distribution function: from a point too low, Newton's steps rise to the root and cannot pass it.
    /// </summary>
    /// <remarks>
    /// The step is Householder's of the third order, whose error is the fourth power of the step; with w the logit,
    /// g = ln I, r = g' = (x^a y^b / B)/I, h2 = g''/g' = lambda - r, h3 = g'''/g' = h2^2 - (a+b) x y - r h2.
    /// </remarks>
    private static UnitPoint Search(BetaKernel kernel, double p)
    {
        const int MostSteps = 200;
        double a = kernel.A;
        double b = kernel.B;
        double logit = Start(kernel, p);
        if (Math.Abs(logit) > LargestLogit)
        {
            // The leading power is all there is, and too small a double has no digits for a step.
            return PointOfLogit(logit);
        }

        UnitPoint point = PointOfLogit(logit);
        double least = double.NegativeInfinity;
        double most = double.PositiveInfinity;
        for (int i = 0; i < MostSteps; i++)
        {
            BetaEvaluation e = kernel.Evaluate(point);
            double x = point.X;
            double y = point.Complement;
            double difference = Math.Log(e.Lower / p);
            if (difference == 0.0)
            {
                break;
            }

            logit = Math.Log(x / y);
            if (difference > 0.0)
            {
                most = logit;
            }
            else
            {
                least = logit;
            }

            double slope = e.Slope / e.Lower;
            double variance = (a + b) * x * y;
            double h2 = e.Lambda - slope;
            double newton = -difference / slope;
            double t2 = h2 * newton;
            double t3 = ((h2 * h2) - variance - (slope * h2)) * newton * newton;
            double step = Math.Abs(t2) < 1.0 && Math.Abs(t3) < 2.0
                ? newton * (1.0 + (0.5 * t2)) / (1.0 + t2 + (t3 / 6.0))
                : newton;
            double next = logit + step;
            if (!(next >= least && next <= most && Math.Abs(next) <= LargestLogit))
            {
                // Outside of the bracket, or not a number: halve the bracket.
                double from = Math.Max(least, -LargestLogit);
                double to = Math.Min(most, LargestLogit);
                if (to - from <= 1e-13 * Math.Max(Math.Abs(from), Math.Abs(to)))
                {
                    break;
                }

                next = 0.5 * (from + to);
                point = PointOfLogit(next);
                continue;
            }

            point = Move(point, step);
            double unit = Math.Max(Math.Max(1.0, Math.Sqrt(variance)), Math.Max(slope, Math.Abs(h2)));
            if (Math.Abs(step) * unit < 1e-4)
            {
                break;
            }
        }

        return point;
    }

    /// <summary>The point whose odds are those of the given one times exp(step).</summary>
    private static UnitPoint Move(UnitPoint point, double step)
    {
        double x = point.X;
        double y = point.Complement;
        if (Math.Abs(step) > 0.1)
        {
            double factor = Math.Exp(step);
            double whole = y + (x * factor);
            return UnitPoint.From(x * factor / whole, y / whole);
        }

        double growth = ElementaryFunctions.Expm1(step);
        double change = x * (y * growth / (1.0 + (x * growth)));
        return UnitPoint.From(x + change, y - change);
    }

    private static UnitPoint PointOfLogit(double logit)
    {
        double small = Math.Exp(-Math.Abs(logit));
        small /= 1.0 + small;
        return logit < 0.0 ? UnitPoint.FromX(small) : UnitPoint.FromComplement(small);
    }

    /// <summary>A logit to start from.</summary>
    private static double Start(BetaKernel kernel, double p)
    {
        double a = kernel.A;
        double b = kernel.B;
        if (a < 1.0 || b < 1.0)
        {
            // I_x is near x^a / (a B) for small x, 1 - I_x near y^b / (b B) for small y.
            double logX = (Math.Log(p) + kernel.LogLeadingDivisor) / a;
            if (logX < -1.0)
            {
                return logX;
            }

            double y = -ElementaryFunctions.Expm1(logX);
            if (a * y > 1.0)
            {
                // b is below 1 here, and I_x between x^a / (a B) and x^a y^(b-1) / (a B).
                logX += (1.0 - b) * Math.Log(y) / a;
                return logX - Math.Log(-ElementaryFunctions.Expm1(logX));
            }

            double logY = (ElementaryFunctions.Log1P(-p) + new BetaKernel(b, a).LogLeadingDivisor) / b;
            return logY < -1.0 ? -logY : 0.0;
        }

        double power = double.NegativeInfinity;
        if (a < 50.0 && (p < 0.001 || a < 10.0))
        {
            // I_x = x^a / (a B) (1 - a (b-1)/(a+1) x + ...)
            double logX = (Math.Log(p) + kernel.LogLeadingDivisor) / a;
            double first = (b - 1.0) / (a + 1.0) * Math.Exp(Math.Min(logX, 0.0));
            power = logX;
            if (first < 0.1)
            {
                return logX + first + Math.Exp(logX);
            }
        }

        // Abramowitz and Stegun (1964), 26.5.22 and 26.2.23
        double t = Math.Sqrt(-2.0 * Math.Log(p));
        double z = t - ((2.515517 + (t * (0.802853 + (t * 0.010328))))
            / (1.0 + (t * (1.432788 + (t * (0.189269 + (t * 0.001308)))))));
        double curve = ((z * z) - 3.0) / 6.0;
        double inverseA = 1.0 / ((2.0 * a) - 1.0);
        double inverseB = 1.0 / ((2.0 * b) - 1.0);
        double h = 2.0 / (inverseA + inverseB);
        double w = (z * Math.Sqrt(h + curve) / h) - ((inverseB - inverseA) * (curve + (5.0 / 6.0) - (2.0 / (3.0 * h))));
        return Math.Max(Math.Log(a / b) - (2.0 * w), power);
    }
}
