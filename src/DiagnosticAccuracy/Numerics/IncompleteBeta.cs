namespace DiagnosticAccuracy.Numerics;

/// <summary>
/// The regularised incomplete beta function I_x(a, b), the distribution function of the beta distribution, and its
/// inverse. Each tail keeps its own relative accuracy: a small one is never computed as 1 minus a value near 1.
/// </summary>
internal static partial class IncompleteBeta
{
    /// <summary>The lower tail, I_x(a, b).</summary>
    /// <param name="a">The first shape, positive.</param>
    /// <param name="b">The second shape, positive.</param>
    /// <param name="x">The point.</param>
    /// <returns>The probability below x.</returns>
    public static double Lower(double a, double b, double x) => Tails(a, b, x).Lower;

    /// <summary>The lower tail, I_x(a, b), of a point given with its complement.</summary>
    /// <param name="a">The first shape, positive.</param>
    /// <param name="b">The second shape, positive.</param>
    /// <param name="x">The point.</param>
    /// <param name="complement">1 - x; the smaller of the two is taken as exact.</param>
    /// <returns>The probability below x.</returns>
    public static double Lower(double a, double b, double x, double complement) => Tails(a, b, x, complement).Lower;

    /// <summary>The upper tail, 1 - I_x(a, b).</summary>
    /// <param name="a">The first shape, positive.</param>
    /// <param name="b">The second shape, positive.</param>
    /// <param name="x">The point.</param>
    /// <returns>The probability above x.</returns>
    public static double Upper(double a, double b, double x) => Tails(a, b, x).Upper;

    /// <summary>The upper tail, 1 - I_x(a, b), of a point given with its complement.</summary>
    /// <param name="a">The first shape, positive.</param>
    /// <param name="b">The second shape, positive.</param>
    /// <param name="x">The point.</param>
    /// <param name="complement">1 - x; the smaller of the two is taken as exact.</param>
    /// <returns>The probability above x.</returns>
    public static double Upper(double a, double b, double x, double complement) => Tails(a, b, x, complement).Upper;

    /// <summary>Both tails at a point.</summary>
    /// <param name="a">The first shape, positive.</param>
    /// <param name="b">The second shape, positive.</param>
    /// <param name="x">The point.</param>
    /// <returns>The probabilities below and above x; NaN when x is NaN.</returns>
    public static BetaTails Tails(double a, double b, double x)
    {
        return Tails(a, b, UnitPoint.FromX(x));
    }

    /// <summary>Both tails at a point given with its complement.</summary>
    /// <param name="a">The first shape, positive.</param>
    /// <param name="b">The second shape, positive.</param>
    /// <param name="x">The point.</param>
    /// <param name="complement">1 - x; the smaller of the two is taken as exact.</param>
    /// <returns>The probabilities below and above x; NaN when a coordinate is NaN.</returns>
    public static BetaTails Tails(double a, double b, double x, double complement)
    {
        return Tails(a, b, UnitPoint.From(x, complement));
    }

    /// <summary>Both tails at a point.</summary>
    /// <param name="a">The first shape, positive.</param>
    /// <param name="b">The second shape, positive.</param>
    /// <param name="point">The point, such as a quantile.</param>
    /// <returns>The probabilities below and above the point; NaN when a coordinate is NaN.</returns>
    public static BetaTails Tails(double a, double b, UnitPoint point)
    {
        CheckShapes(a, b);
        if (double.IsNaN(point.X) || double.IsNaN(point.Complement))
        {
            return new BetaTails(double.NaN, double.NaN);
        }

        if (point.X <= 0.0)
        {
            return new BetaTails(0.0, 1.0);
        }

        if (point.Complement <= 0.0)
        {
            return new BetaTails(1.0, 0.0);
        }

        BetaEvaluation e = new BetaKernel(a, b).Evaluate(point);
        return new BetaTails(e.Lower, e.Upper);
    }

    private static void CheckShapes(double a, double b)
    {
        if (!(a > 0.0 && a <= double.MaxValue))
        {
            throw new ArgumentOutOfRangeException(nameof(a), a, "A shape of the beta distribution must be positive and finite.");
        }

        if (!(b > 0.0 && b <= double.MaxValue))
        {
            throw new ArgumentOutOfRangeException(nameof(b), b, "A shape of the beta distribution must be positive and finite.");
        }
    }
}
