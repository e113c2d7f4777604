using DiagnosticAccuracy.Proportions;

namespace DiagnosticAccuracy;

/// <summary>
/// The ratio of two independent proportions: a relative risk, a likelihood ratio.
/// </summary>
/// <remarks>
/// <para>The two proportions must come from different subjects; for proportions of the same subjects the intervals do not hold.</para>
/// <para><c>default(ProportionRatio)</c> is undefined: neither proportion has trials.</para>
/// </remarks>
public readonly record struct ProportionRatio : IIntervalQuantity
{
    private static readonly UndefinedReason ZeroOverZero =
        new(UndefinedCause.ZeroOverZero, "both proportions are zero, and zero over zero has no value");

    private readonly UndefinedReason? _zeroReason;

    /// <summary>Initializes a new instance of the <see cref="ProportionRatio"/> struct.</summary>
    /// <param name="numerator">The proportion that is divided.</param>
    /// <param name="denominator">The proportion it is divided by, of other subjects.</param>
    public ProportionRatio(Proportion numerator, Proportion denominator)
        : this(numerator, denominator, ZeroOverZero)
    {
    }

    /// <summary>Initializes a new instance of the <see cref="ProportionRatio"/> struct with a reason of its own for zero over zero.</summary>
    internal ProportionRatio(Proportion numerator, Proportion denominator, UndefinedReason zeroReason)
    {
        Numerator = numerator;
        Denominator = denominator;
        _zeroReason = zeroReason;
    }

    /// <summary>Gets the proportion that is divided.</summary>
    public Proportion Numerator { get; }

    /// <summary>Gets the proportion it is divided by.</summary>
    public Proportion Denominator { get; }

    /// <summary>Gets the ratio of the denominator to the numerator.</summary>
    public ProportionRatio Inverse => new(Denominator, Numerator, _zeroReason ?? ZeroOverZero);

    /// <inheritdoc/>
    public bool IsDefined => WhyUndefined is null;

    /// <summary>
    /// Gets the numerator over the denominator, 0 or more; positive infinity when only the denominator is zero, NaN exactly when
    /// a proportion has no trials or both are zero.
    /// </summary>
    public double Value => IsDefined ? Numerator.Value / Denominator.Value : double.NaN;

    /// <inheritdoc/>
    public UndefinedReason? WhyUndefined
    {
        get
        {
            UndefinedReason? reason = Numerator.WhyUndefined ?? Denominator.WhyUndefined;
            return reason ?? (Numerator.Successes == 0 && Denominator.Successes == 0 ? _zeroReason ?? ZeroOverZero : null);
        }
    }

    /// <inheritdoc/>
    ConfidenceInterval IIntervalQuantity.Interval(Confidence confidence) => Interval(confidence);

    /// <summary>A confidence interval; it lies within 0 to infinity.</summary>
    /// <param name="confidence">Level and side; two-sided 95 % unless said.</param>
    /// <param name="method">The method; normal on the logarithm unless said.</param>
    /// <returns>The interval; undefined, with the reason, where the ratio is.</returns>
    /// <exception cref="ArgumentOutOfRangeException"><paramref name="method"/> is not a value of its type.</exception>
    /// <remarks>
    /// An empty cell gives a ratio of zero or infinity, with a finite limit on the other side; nothing is added to the counts unless asked
    /// for by <see cref="RatioMethod.LogAddHalf"/>. All other methods contain the ratio at every level above one half. Sources: Katz, Baptista,
    /// Azen and Pike, Biometrics 1978;34:469; Simel, Samsa and Matchar, J Clin Epidemiol 1991;44:763; Koopman, Biometrics 1984;40:513;
    /// Miettinen and Nurminen, Stat Med 1985;4:213.
    /// </remarks>
    public ConfidenceInterval Interval(Confidence confidence = default, RatioMethod method = RatioMethod.Log) => method switch
    {
        RatioMethod.Log => LogRatio.Interval(this, confidence),
        RatioMethod.Koopman => ScoreRatio.Koopman(this, confidence),
        RatioMethod.MiettinenNurminen => ScoreRatio.MiettinenNurminen(this, confidence),
        RatioMethod.LogAddHalf => LogRatio.AddHalf(this, confidence),
        _ => throw Guard.UnknownOption(method),
    };

    /// <summary>Whether the counts of both proportions are equal.</summary>
    /// <param name="other">The other ratio.</param>
    /// <returns>True when they are.</returns>
    public bool Equals(ProportionRatio other) => Numerator == other.Numerator && Denominator == other.Denominator;

    /// <inheritdoc/>
    public override int GetHashCode() => (Numerator, Denominator).GetHashCode();

    /// <summary>For example "(90/100) / (20/200) = 9", or "(0/10) / (0/20) (undefined: ...)".</summary>
    /// <returns>The text, in the invariant culture.</returns>
    public override string ToString()
    {
        string counts = $"({Numerator.Counts}) / ({Denominator.Counts})";
        return IsDefined ? $"{counts} = {Display.Of(Value)}" : $"{counts} ({Display.Undefined(WhyUndefined!)})";
    }
}
