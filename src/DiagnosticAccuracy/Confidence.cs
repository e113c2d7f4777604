using System.Globalization;
using DiagnosticAccuracy.Numerics;

namespace DiagnosticAccuracy;

/// <summary>A confidence level together with its side: two-sided, a lower bound alone, or an upper bound alone.</summary>
/// <remarks>
/// <para><c>default(Confidence)</c> is two-sided 95 %, and equals <c>Confidence.TwoSided(0.95)</c>.</para>
/// <para>A level is read as the decimal number it prints as: 0.95 leaves an error probability of exactly 0.05, not of
/// the 0.05000000000000004 that is left after binary rounding. Levels closer to 1 than a double can show are given by
/// their error probability, see <see cref="FromErrorProbability"/>.</para>
/// </remarks>
public readonly record struct Confidence
{
    private const double DefaultErrorProbability = 0.05;

    // 0 stands for the default, so that default(Confidence) is two-sided 95 %.
    private readonly double _errorProbability;

    private Confidence(double errorProbability, IntervalSide side)
    {
        _errorProbability = errorProbability == DefaultErrorProbability ? 0 : errorProbability;
        Side = side;
    }

    /// <summary>Gets the side.</summary>
    public IntervalSide Side { get; }

    /// <summary>Gets the error probability, one minus the level; for a two-sided interval it is the sum of both tails.</summary>
    public double ErrorProbability => _errorProbability == 0 ? DefaultErrorProbability : _errorProbability;

    /// <summary>Gets the level, between 0 and 1 (rounded to the nearest double; 1 where the error probability is below 1e-16).</summary>
    public double Level => 1 - ErrorProbability;

    /// <summary>Gets the probability allowed for the parameter lying below the lower limit; 0 for an upper bound.</summary>
    internal double LowerTail => Side switch
    {
        IntervalSide.TwoSided => ErrorProbability / 2,
        IntervalSide.LowerBound => ErrorProbability,
        _ => 0,
    };

    /// <summary>Gets the probability allowed for the parameter lying above the upper limit; 0 for a lower bound.</summary>
    internal double UpperTail => Side switch
    {
        IntervalSide.TwoSided => ErrorProbability / 2,
        IntervalSide.UpperBound => ErrorProbability,
        _ => 0,
    };

    internal bool HasLower => Side != IntervalSide.UpperBound;

    internal bool HasUpper => Side != IntervalSide.LowerBound;

    /// <summary>Gets the tail probability of each limit that comes from the data.</summary>
    internal double Tail => Side == IntervalSide.TwoSided ? ErrorProbability / 2 : ErrorProbability;

    /// <summary>A two-sided interval with equal tails.</summary>
    /// <param name="level">The level, above 0 and below 1.</param>
    /// <returns>The confidence.</returns>
    /// <exception cref="ArgumentOutOfRangeException"><paramref name="level"/> is NaN, or not above 0 and below 1.</exception>
    public static Confidence TwoSided(double level) => new(ErrorOf(level), IntervalSide.TwoSided);

    /// <summary>A lower bound alone. The lower limit of a two-sided 95 % interval is a lower bound at 0.975.</summary>
    /// <param name="level">The level, above 0 and below 1.</param>
    /// <returns>The confidence.</returns>
    /// <exception cref="ArgumentOutOfRangeException"><paramref name="level"/> is NaN, or not above 0 and below 1.</exception>
    public static Confidence LowerBound(double level) => new(ErrorOf(level), IntervalSide.LowerBound);

    /// <summary>An upper bound alone. The upper limit of a two-sided 95 % interval is an upper bound at 0.975.</summary>
    /// <param name="level">The level, above 0 and below 1.</param>
    /// <returns>The confidence.</returns>
    /// <exception cref="ArgumentOutOfRangeException"><paramref name="level"/> is NaN, or not above 0 and below 1.</exception>
    public static Confidence UpperBound(double level) => new(ErrorOf(level), IntervalSide.UpperBound);

    /// <summary>A confidence stated by what it leaves: the error probability, one minus the level.</summary>
    /// <param name="errorProbability">Above 0 and below 1; for a two-sided interval the sum of both tails.</param>
    /// <param name="side">The side; two-sided unless said.</param>
    /// <returns>The confidence.</returns>
    /// <exception cref="ArgumentOutOfRangeException"><paramref name="errorProbability"/> is NaN, or not above 0 and below 1,
    /// or <paramref name="side"/> is not a value of its type.</exception>
    public static Confidence FromErrorProbability(double errorProbability, IntervalSide side = IntervalSide.TwoSided)
    {
        Guard.InsideUnitInterval(errorProbability);
        if (side is not (IntervalSide.TwoSided or IntervalSide.LowerBound or IntervalSide.UpperBound))
        {
            throw Guard.UnknownOption(side);
        }

        return new Confidence(errorProbability, side);
    }

    /// <summary>The confidence that each of two independent intervals needs for both to hold together with this one.</summary>
    internal Confidence RootOfTwo() =>
        new(-ElementaryFunctions.Expm1(0.5 * ElementaryFunctions.Log1P(-ErrorProbability)), Side);

    /// <summary>For example "95 % two-sided" or "97.5 % lower bound".</summary>
    /// <returns>The text, in the invariant culture.</returns>
    public override string ToString()
    {
        string level = Level < 1 && ErrorProbability >= 1e-12
            ? Display.Percent(Level)
            : "1 - " + Display.Exact(ErrorProbability);
        return Side switch
        {
            IntervalSide.TwoSided => level + " two-sided",
            IntervalSide.LowerBound => level + " lower bound",
            _ => level + " upper bound",
        };
    }

    private static double ErrorOf(double level)
    {
        Guard.InsideUnitInterval(level);

        // The shortest decimal that reads back as this double is what the caller wrote; subtract it in decimal.
        // Below 1e-10 the subtraction in double is exact to the last digit anyway.
        if (level < 1e-10)
        {
            return Math.Min(1 - level, BelowOne);
        }

        decimal written = decimal.Parse(level.ToString("R", CultureInfo.InvariantCulture), NumberStyles.Float, CultureInfo.InvariantCulture);
        string rest = (1m - written).ToString(CultureInfo.InvariantCulture);
        return Math.Min(double.Parse(rest, NumberStyles.Float, CultureInfo.InvariantCulture), BelowOne);
    }

    // The largest double below 1.
    private const double BelowOne = 1 - 1.1102230246251565E-16;
}
