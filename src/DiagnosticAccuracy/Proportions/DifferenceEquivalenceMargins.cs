namespace DiagnosticAccuracy;

/// <summary>
/// The two margins between which a difference of two proportions (or of two areas under ROC curves) has to lie to be called equivalent: stated first, then tested against the counts.
/// </summary>
/// <remarks><c>default(DifferenceEquivalenceMargins)</c> leaves no room: both bounds are 0, and no difference lies between them.</remarks>
public readonly record struct DifferenceEquivalenceMargins
{
    private DifferenceEquivalenceMargins(double lower, double upper)
    {
        Lower = lower;
        Upper = upper;
    }

    /// <summary>Gets the difference that has to be exceeded, -1 to 0.</summary>
    public double Lower { get; }

    /// <summary>Gets the difference that has to be undercut, 0 to 1.</summary>
    public double Upper { get; }

    /// <summary>The difference has to lie between minus the margin and plus the margin.</summary>
    /// <param name="margin">The margin, above 0 and below 1.</param>
    /// <returns>The margins.</returns>
    /// <exception cref="ArgumentOutOfRangeException"><paramref name="margin"/> is NaN, or not above 0 and below 1.</exception>
    public static DifferenceEquivalenceMargins Within(double margin)
    {
        Guard.InsideUnitInterval(margin);
        return new DifferenceEquivalenceMargins(-margin, margin);
    }

    /// <summary>The difference has to lie between two bounds that need not be equally far from 0.</summary>
    /// <param name="lower">The lower bound, above -1 and below 0.</param>
    /// <param name="upper">The upper bound, above 0 and below 1.</param>
    /// <returns>The margins.</returns>
    /// <exception cref="ArgumentOutOfRangeException">A bound is NaN or outside of its range.</exception>
    public static DifferenceEquivalenceMargins Between(double lower, double upper)
    {
        if (!(lower > -1 && lower < 0))
        {
            throw Guard.OutOfRange(nameof(lower), lower, "above -1 and below 0");
        }

        Guard.InsideUnitInterval(upper);
        return new DifferenceEquivalenceMargins(lower, upper);
    }

    /// <summary>For example "difference above -0.05 and below 0.05".</summary>
    /// <returns>The text, in the invariant culture.</returns>
    public override string ToString() => $"difference above {Display.Of(Lower)} and below {Display.Of(Upper)}";
}
