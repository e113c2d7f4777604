using DiagnosticAccuracy.Numerics;

namespace DiagnosticAccuracy;

/// <summary>A chance-corrected coefficient of agreement with its standard error: 1 for perfect agreement, 0 for what chance gives.</summary>
/// <remarks><c>default(Kappa)</c> is undefined, with the cause <see cref="UndefinedCause.NotComputed"/>.</remarks>
public readonly record struct Kappa : IIntervalQuantity
{
    private readonly Quantity _value;
    private readonly double _least;
    private readonly string? _method;

    internal Kappa(Quantity value, Quantity standardError, Quantity nullStandardError, string method, double least = -1)
    {
        _value = value;
        _least = least;
        StandardError = standardError;
        NullStandardError = nullStandardError;
        _method = method;
    }

    /// <inheritdoc/>
    public bool IsDefined => _value.IsDefined;

    /// <summary>Gets the coefficient, from -1 to 1; with weights of one's own it may be less than -1.</summary>
    public double Value => _value.Value;

    /// <inheritdoc/>
    public UndefinedReason? WhyUndefined => _value.WhyUndefined;

    /// <summary>Gets the large-sample standard error, for intervals.</summary>
    public Quantity StandardError { get; }

    /// <summary>Gets the large-sample standard error when agreement is by chance, for the test of zero; undefined where the coefficient has none.</summary>
    public Quantity NullStandardError { get; }

    /// <summary>Gets the coefficient over its null standard error.</summary>
    public Quantity Z => !NullStandardError.IsDefined ? NullStandardError
        : NullStandardError.Value == 0 ? Quantity.Undefined(UndefinedCause.ZeroVariance, "the null standard error is zero")
        : Quantity.Of(Value / NullStandardError.Value);

    /// <summary>Gets the two-sided p-value of "agreement is by chance".</summary>
    public Quantity PValue => Z.IsDefined ? Quantity.Of(StandardNormal.TwoSided(Z.Value)) : Z;

    /// <summary>
    /// The coefficient plus and minus a multiple of its standard error, cut at -1 and 1; with weights of one's own at 1 only, since the coefficient
    /// has no least value then.
    /// </summary>
    /// <param name="confidence">Level and side; two-sided 95 % unless said.</param>
    /// <returns>The interval; undefined where the coefficient is, and where its standard error is zero.</returns>
    public ConfidenceInterval Interval(Confidence confidence = default)
    {
        string name = _method ?? "none";
        if (!IsDefined)
        {
            return ConfidenceInterval.Undefined(WhyUndefined!, confidence, name);
        }

        if (!StandardError.IsDefined || StandardError.Value == 0)
        {
            return ConfidenceInterval.Undefined(
                StandardError.WhyUndefined ?? new UndefinedReason(UndefinedCause.ZeroVariance, "the estimated variance of the coefficient is zero"),
                confidence,
                name);
        }

        double margin = StandardNormal.UpperQuantile(confidence.Tail) * StandardError.Value;
        return new ConfidenceInterval(
            confidence.HasLower ? Math.Min(1, Math.Max(_least, Value - margin)) : _least,
            confidence.HasUpper ? Math.Max(_least, Math.Min(1, Value + margin)) : 1,
            confidence,
            name);
    }

    /// <summary>The value to six significant digits in the invariant culture, or "undefined: " and the reason.</summary>
    /// <returns>The text.</returns>
    public override string ToString() => Display.Of(_value);
}
