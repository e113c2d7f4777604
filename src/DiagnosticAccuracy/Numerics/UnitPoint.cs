namespace DiagnosticAccuracy.Numerics;

/// <summary>
/// A point x of the unit interval with its complement 1 - x, each with its own relative accuracy.
/// </summary>
/// <remarks>
/// The smaller of the two is the exact coordinate; the other is 1 minus it, rounded.
/// </remarks>
internal readonly struct UnitPoint
{
    private UnitPoint(double x, double complement)
    {
        X = x;
        Complement = complement;
    }

    /// <summary>Gets x.</summary>
    public double X { get; }

    /// <summary>Gets 1 - x.</summary>
    public double Complement { get; }

    /// <summary>Gets a value indicating whether x is the smaller and hence the exact coordinate.</summary>
    public bool IsLow => X <= Complement;

    /// <summary>The point whose x is given exactly.</summary>
    /// <param name="x">A value from 0 to 1.</param>
    /// <returns>The point.</returns>
    public static UnitPoint FromX(double x) => new(x, 1.0 - x);

    /// <summary>The point whose complement is given exactly.</summary>
    /// <param name="complement">A value from 0 to 1.</param>
    /// <returns>The point.</returns>
    public static UnitPoint FromComplement(double complement) => new(1.0 - complement, complement);

    /// <summary>The point of both coordinates, of which the smaller is taken as exact.</summary>
    /// <param name="x">x, from 0 to 1.</param>
    /// <param name="complement">1 - x, from 0 to 1.</param>
    /// <returns>The point.</returns>
    public static UnitPoint From(double x, double complement) => x <= complement ? FromX(x) : FromComplement(complement);

    /// <summary>The point mirrored at one half.</summary>
    /// <returns>The point with the coordinates exchanged.</returns>
    public UnitPoint Mirror() => new(Complement, X);
}
