using System.Globalization;

namespace DiagnosticAccuracy.Numerics;

/// <summary>
/// Roots of continuous functions within a bracket.
/// </summary>
internal static class RootFinding
{
    /// <summary>The relative accuracy when none is given.</summary>
    public const double DefaultRelativeAccuracy = 1e-14;

    private const int MostSteps = 2200;

    /// <summary>A root of a function within a bracket.</summary>
    /// <param name="f">The function, continuous between the ends.</param>
    /// <param name="lower">The lower end.</param>
    /// <param name="upper">The upper end.</param>
    /// <param name="relativeAccuracy">The accuracy of the root relative to the root.</param>
    /// <param name="absoluteAccuracy">The accuracy of the root in absolute terms; the larger of the two counts.</param>
    /// <returns>A point at which the function is zero or within the accuracy changes its sign.</returns>
    /// <exception cref="InvalidOperationException">The function has one sign at both ends, or is not a number.</exception>
    public static double Find(
        Func<double, double> f,
        double lower,
        double upper,
        double relativeAccuracy = DefaultRelativeAccuracy,
        double absoluteAccuracy = 0.0)
    {
        return Find(new DelegateFunction(f), lower, upper, relativeAccuracy, absoluteAccuracy);
    }

    /// <summary>A root of a function within a bracket, without a delegate.</summary>
    /// <typeparam name="TFunction">The function.</typeparam>
    /// <param name="f">The function, continuous between the ends.</param>
    /// <param name="lower">The lower end.</param>
    /// <param name="upper">The upper end.</param>
    /// <param name="relativeAccuracy">The accuracy of the root relative to the root.</param>
    /// <param name="absoluteAccuracy">The accuracy of the root in absolute terms; the larger of the two counts.</param>
    /// <returns>A point at which the function is zero or within the accuracy changes its sign.</returns>
    /// <exception cref="InvalidOperationException">The function has one sign at both ends, or is not a number.</exception>
    /// <remarks>
    /// Inverse quadratic interpolation where it is safe and bisection elsewhere (Chandrupatla, 1997).
    /// </remarks>
    public static double Find<TFunction>(
        TFunction f,
        double lower,
        double upper,
        double relativeAccuracy = DefaultRelativeAccuracy,
        double absoluteAccuracy = 0.0)
        where TFunction : struct, IFunction
    {
        double a = lower;
        double b = upper;
        double fa = f.Value(a);
        double fb = f.Value(b);
        if (fa == 0.0)
        {
            return a;
        }

        if (fb == 0.0)
        {
            return b;
        }

        if (!((fa < 0.0 && fb > 0.0) || (fa > 0.0 && fb < 0.0)))
        {
            throw new InvalidOperationException(string.Format(
                CultureInfo.InvariantCulture,
                "The function does not change its sign between the ends of the bracket: it is {0:R} at {1:R} and {2:R} at {3:R}.",
                fa,
                a,
                fb,
                b));
        }

        double fraction = 0.5;
        for (int i = 0; i < MostSteps; i++)
        {
            double x = a + (fraction * (b - a));
            double fx = f.Value(x);
            if (fx == 0.0)
            {
                return x;
            }

            if (double.IsNaN(fx))
            {
                throw new InvalidOperationException(string.Format(
                    CultureInfo.InvariantCulture, "The function is not a number at {0:R}, within the bracket.", x));
            }

            // a becomes the newest point, b the other end of the bracket, c the point left out.
            double c;
            double fc;
            if ((fx > 0.0) == (fa > 0.0))
            {
                c = a;
                fc = fa;
            }
            else
            {
                c = b;
                fc = fb;
                b = a;
                fb = fa;
            }

            a = x;
            fa = fx;
            double best = Math.Abs(fa) < Math.Abs(fb) ? a : b;
            double width = Math.Abs(b - a);
            double tolerance = Math.Max(Math.Max(relativeAccuracy, 2.3e-16) * Math.Abs(best), Math.Max(absoluteAccuracy, double.Epsilon));
            if (width <= tolerance)
            {
                return best;
            }

            double xi = (a - b) / (c - b);
            double phi = (fa - fb) / (fc - fb);
            if (phi * phi < xi && (1.0 - phi) * (1.0 - phi) < 1.0 - xi)
            {
                fraction = (fa / (fb - fa) * (fc / (fb - fc)))
                    + ((c - a) / (b - a) * (fa / (fc - fa)) * (fb / (fc - fb)));
            }
            else
            {
                fraction = 0.5;
            }

            // Never nearer to an end than half of the tolerance, so that the bracket closes from both sides.
            double margin = 0.5 * tolerance / width;
            fraction = Math.Min(1.0 - margin, Math.Max(margin, fraction));
        }

        return Math.Abs(fa) < Math.Abs(fb) ? a : b;
    }

    private readonly struct DelegateFunction : IFunction
    {
        private readonly Func<double, double> _function;

        public DelegateFunction(Func<double, double> function) => _function = function;

        public double Value(double x) => _function(x);
    }
}
