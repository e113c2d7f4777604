namespace DiagnosticAccuracy;

/// <summary>
/// A margin for a ratio of two proportions: stated first, then tested against the counts.
/// </summary>
/// <remarks>
/// <para>Greater is better for the first proportion, as with sensitivities, unless the margin is made for the opposite, as with false-positive rates.</para>
/// <para><c>default(RatioMargin)</c> is superiority: the ratio has to exceed 1.</para>
/// </remarks>
public readonly record struct RatioMargin
{
    // 0 stands for the default, a bound of 1.
    private readonly double _bound;

    private RatioMargin(double bound, bool isUpper)
    {
        _bound = bound == 1 ? 0 : bound;
        IsUpper = isUpper;
    }

    /// <summary>Gets the ratio that has to be exceeded, or undercut when <see cref="IsUpper"/>.</summary>
    public double Bound => _bound == 0 ? 1 : _bound;

    /// <summary>Gets a value indicating whether the ratio has to lie below the bound; false when it has to lie above.</summary>
    public bool IsUpper { get; }

    /// <summary>Greater is better: the ratio may lie below 1, but has to exceed the margin.</summary>
    /// <param name="margin">The least ratio that is not inferior, above 0 and below 1; 0.9 allows the loss of a tenth.</param>
    /// <returns>The margin.</returns>
    /// <exception cref="ArgumentOutOfRangeException"><paramref name="margin"/> is NaN, or not above 0 and below 1.</exception>
    public static RatioMargin NonInferiority(double margin)
    {
        Guard.InsideUnitInterval(margin);
        return new RatioMargin(margin, isUpper: false);
    }

    /// <summary>Less is better, as with false-positive rates: the ratio may lie above 1, but has to stay below the margin.</summary>
    /// <param name="margin">The greatest ratio that is not inferior, above 1 and finite; 1.1 allows a tenth more.</param>
    /// <returns>The margin.</returns>
    /// <exception cref="ArgumentOutOfRangeException"><paramref name="margin"/> is NaN, infinite, or not above 1.</exception>
    public static RatioMargin NonInferiorityWhereLessIsBetter(double margin)
    {
        if (!(margin > 1) || double.IsInfinity(margin))
        {
            throw Guard.OutOfRange(nameof(margin), margin, "a finite number above 1");
        }

        return new RatioMargin(margin, isUpper: true);
    }

    /// <summary>Greater is better: the ratio has to exceed 1, by a factor above the margin.</summary>
    /// <param name="margin">The ratio that has to be exceeded, from 1 (plain superiority) and finite.</param>
    /// <returns>The margin.</returns>
    /// <exception cref="ArgumentOutOfRangeException"><paramref name="margin"/> is NaN, infinite, or below 1.</exception>
    public static RatioMargin Superiority(double margin = 1)
    {
        if (!(margin >= 1) || double.IsInfinity(margin))
        {
            throw Guard.OutOfRange(nameof(margin), margin, "a finite number, 1 or more");
        }

        return new RatioMargin(margin, isUpper: false);
    }

    /// <summary>For example "ratio above 0.9".</summary>
    /// <returns>The text, in the invariant culture.</returns>
    public override string ToString() => (IsUpper ? "ratio below " : "ratio above ") + Display.Of(Bound);
}
