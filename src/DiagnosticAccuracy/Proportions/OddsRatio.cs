using DiagnosticAccuracy.Proportions;

namespace DiagnosticAccuracy;

/// <summary>
/// The ratio of the odds of two independent proportions; the diagnostic odds ratio when the first one is the sensitivity and the second
/// one the share of false positives.
/// </summary>
/// <remarks>
/// <para>The two proportions must come from different subjects.</para>
/// <para><c>default(OddsRatio)</c> is undefined: all four cells are empty.</para>
/// </remarks>
public readonly record struct OddsRatio : IIntervalQuantity
{
    private static readonly UndefinedReason ZeroOverZero =
        new(UndefinedCause.ZeroOverZero, "the products of both diagonals are zero, and zero over zero has no value");

    private readonly UndefinedReason? _zeroReason;

    /// <summary>Initializes a new instance of the <see cref="OddsRatio"/> struct from two proportions.</summary>
    /// <param name="first">The proportion whose odds are divided.</param>
    /// <param name="second">The proportion by whose odds they are divided, of other subjects.</param>
    public OddsRatio(Proportion first, Proportion second)
        : this(first, second, ZeroOverZero)
    {
    }

    /// <summary>Initializes a new instance of the <see cref="OddsRatio"/> struct from four cells.</summary>
    /// <param name="firstSuccesses">Successes of the first group, 0 or more.</param>
    /// <param name="firstFailures">Failures of the first group, 0 or more.</param>
    /// <param name="secondSuccesses">Successes of the second group, 0 or more.</param>
    /// <param name="secondFailures">Failures of the second group, 0 or more.</param>
    /// <exception cref="ArgumentOutOfRangeException">A cell is negative.</exception>
    /// <exception cref="OverflowException">The cells of a group add up to more than <see cref="long.MaxValue"/>.</exception>
    public OddsRatio(long firstSuccesses, long firstFailures, long secondSuccesses, long secondFailures)
        : this(
            Group(firstSuccesses, firstFailures, nameof(firstSuccesses), nameof(firstFailures)),
            Group(secondSuccesses, secondFailures, nameof(secondSuccesses), nameof(secondFailures)),
            ZeroOverZero)
    {
    }

    /// <summary>Initializes a new instance of the <see cref="OddsRatio"/> struct with a reason of its own for zero over zero.</summary>
    internal OddsRatio(Proportion first, Proportion second, UndefinedReason zeroReason)
    {
        First = first;
        Second = second;
        _zeroReason = zeroReason;
    }

    /// <summary>Gets the proportion whose odds are divided.</summary>
    public Proportion First { get; }

    /// <summary>Gets the proportion by whose odds they are divided.</summary>
    public Proportion Second { get; }

    /// <inheritdoc/>
    public bool IsDefined => WhyUndefined is null;

    /// <summary>
    /// Gets the odds of the first over the odds of the second, 0 or more; positive infinity when a count that divides is zero, NaN exactly
    /// when a proportion has no trials or the products of both diagonals are zero.
    /// </summary>
    public double Value => IsDefined
        ? (double)First.Successes * Second.Failures / ((double)First.Failures * Second.Successes)
        : double.NaN;

    /// <inheritdoc/>
    public UndefinedReason? WhyUndefined
    {
        get
        {
            UndefinedReason? reason = First.WhyUndefined ?? Second.WhyUndefined;
            bool numeratorIsZero = First.Successes == 0 || Second.Failures == 0;
            bool denominatorIsZero = First.Failures == 0 || Second.Successes == 0;
            return reason ?? (numeratorIsZero && denominatorIsZero ? _zeroReason ?? ZeroOverZero : null);
        }
    }

    internal bool HasEmptyCell => First.Successes == 0 || First.Failures == 0 || Second.Successes == 0 || Second.Failures == 0;

    /// <inheritdoc/>
    ConfidenceInterval IIntervalQuantity.Interval(Confidence confidence) => Interval(confidence);

    /// <summary>A confidence interval; it lies within 0 to infinity.</summary>
    /// <param name="confidence">Level and side; two-sided 95 % unless said.</param>
    /// <param name="method">The method; normal on the logarithm unless said.</param>
    /// <returns>The interval; undefined, with the reason, where the odds ratio is.</returns>
    /// <exception cref="ArgumentOutOfRangeException"><paramref name="method"/> is not a value of its type.</exception>
    /// <remarks>
    /// An empty cell gives an odds ratio of zero or infinity, with a finite limit on the other side; nothing is added to the counts
    /// unless asked for by <see cref="OddsRatioMethod.LogAddHalf"/>. Sources: Woolf, Ann Hum Genet 1955;19:251; Cornfield, Proc Third Berkeley Symp 1956;4:135.
    /// </remarks>
    public ConfidenceInterval Interval(Confidence confidence = default, OddsRatioMethod method = OddsRatioMethod.Log) => method switch
    {
        OddsRatioMethod.Log => LogOddsRatio.Interval(this, confidence),
        OddsRatioMethod.ExactConditional => ConditionalOddsRatio.Exact(this, confidence),
        OddsRatioMethod.MidPConditional => ConditionalOddsRatio.MidP(this, confidence),
        OddsRatioMethod.LogAddHalf => LogOddsRatio.AddHalf(this, confidence),
        _ => throw Guard.UnknownOption(method),
    };

    /// <summary>Whether all four cells are equal.</summary>
    /// <param name="other">The other odds ratio.</param>
    /// <returns>True when they are.</returns>
    public bool Equals(OddsRatio other) => First == other.First && Second == other.Second;

    /// <inheritdoc/>
    public override int GetHashCode() => (First, Second).GetHashCode();

    /// <summary>For example "odds of 90/100 over odds of 20/200 = 81".</summary>
    /// <returns>The text, in the invariant culture.</returns>
    public override string ToString()
    {
        string counts = $"odds of {First.Counts} over odds of {Second.Counts}";
        return IsDefined ? $"{counts} = {Display.Of(Value)}" : $"{counts} ({Display.Undefined(WhyUndefined!)})";
    }

    private static Proportion Group(long successes, long failures, string successesName, string failuresName)
    {
        Guard.Count(successes, successesName);
        Guard.Count(failures, failuresName);
        return new Proportion(successes, checked(successes + failures));
    }
}
