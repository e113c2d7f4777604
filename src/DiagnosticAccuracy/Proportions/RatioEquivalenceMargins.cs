namespace DiagnosticAccuracy;

/// <summary>
/// The two margins between which a ratio of two proportions has to lie to be called equivalent: stated first, then tested against the counts.
/// </summary>
/// <remarks><c>default(RatioEquivalenceMargins)</c> leaves no room: both bounds are 1, and no ratio lies between them.</remarks>
public readonly record struct RatioEquivalenceMargins
{
    // 0 stands for the default, a bound of 1.
    private readonly double _lower;
    private readonly double _upper;

    private RatioEquivalenceMargins(double lower, double upper)
    {
        _lower = lower;
        _upper = upper;
    }

    /// <summary>Gets the ratio that has to be exceeded, 0 to 1.</summary>
    public double Lower => _lower == 0 ? 1 : _lower;

    /// <summary>Gets the ratio that has to be undercut, 1 or more.</summary>
    public double Upper => _upper == 0 ? 1 : _upper;

    /// <summary>The ratio has to lie between the margin and one over the margin, which treats both tests alike.</summary>
    /// <param name="margin">The lower bound, above 0 and below 1; 0.9 gives 0.9 to 1.111.</param>
    /// <returns>The margins.</returns>
    /// <exception cref="ArgumentOutOfRangeException"><paramref name="margin"/> is NaN, or not above 0 and below 1, or so small that one over it is infinite.</exception>
    public static RatioEquivalenceMargins Within(double margin)
    {
        Guard.InsideUnitInterval(margin);
        return Between(margin, 1 / margin);
    }

    /// <summary>The ratio has to lie between two bounds.</summary>
    /// <param name="lower">The lower bound, above 0 and below 1.</param>
    /// <param name="upper">The upper bound, above 1 and finite.</param>
    /// <returns>The margins.</returns>
    /// <exception cref="ArgumentOutOfRangeException">A bound is NaN or outside of its range.</exception>
    public static RatioEquivalenceMargins Between(double lower, double upper)
    {
        Guard.InsideUnitInterval(lower);
        if (!(upper > 1) || double.IsInfinity(upper))
        {
            throw Guard.OutOfRange(nameof(upper), upper, "a finite number above 1");
        }

        return new RatioEquivalenceMargins(lower, upper);
    }

    /// <summary>For example "ratio above 0.9 and below 1.11111".</summary>
    /// <returns>The text, in the invariant culture.</returns>
    public override string ToString() => $"ratio above {Display.Of(Lower)} and below {Display.Of(Upper)}";
}
