using DiagnosticAccuracy.Numerics;
using DiagnosticAccuracy.Tables;

namespace DiagnosticAccuracy;

/// <summary>A ratio pooled over strata by Mantel and Haenszel, with its interval.</summary>
/// <remarks><c>default(PooledRatio)</c> is undefined.</remarks>
public readonly record struct PooledRatio : IIntervalQuantity
{
    private readonly IReadOnlyList<ConfusionMatrix>? _strata;
    private readonly PooledKind _kind;
    private readonly Quantity _value;
    private readonly string? _method;

    internal PooledRatio(IReadOnlyList<ConfusionMatrix> strata, PooledKind kind, Quantity value, Quantity logStandardError, string method)
    {
        _strata = strata;
        _kind = kind;
        _value = value;
        LogStandardError = logStandardError;
        _method = method;
    }

    /// <inheritdoc/>
    public bool IsDefined => _value.IsDefined;

    /// <summary>Gets the pooled ratio, 0 or more; it may be infinite.</summary>
    public double Value => _value.Value;

    /// <inheritdoc/>
    public UndefinedReason? WhyUndefined => _value.WhyUndefined;

    /// <summary>Gets the standard error of the logarithm; undefined at a ratio of 0 or infinity.</summary>
    public Quantity LogStandardError { get; }

    /// <summary>The log interval; it lies within 0 to infinity and contains the ratio.</summary>
    /// <param name="confidence">Level and side; two-sided 95 % unless said.</param>
    /// <returns>
    /// The interval; undefined, with the reason, where the ratio is. Where the log method has no limits (a ratio of 0 or infinity) or no width (every
    /// result alike in every stratum), the limits are for a likelihood ratio those of the stratified score test, for the odds ratio the exact
    /// conditional one, and the method says so.
    /// </returns>
    /// <remarks>Sources: see <see cref="StratifiedTables"/>; Miettinen and Nurminen, Stat Med 1985;4:213; Gart, Biometrika 1970;57:471.</remarks>
    public ConfidenceInterval Interval(Confidence confidence = default)
    {
        string name = _method ?? "none";
        if (WhyUndefined is { } reason)
        {
            return ConfidenceInterval.Undefined(reason, confidence, name);
        }

        if (!LogStandardError.IsDefined || LogStandardError.Value == 0)
        {
            string why = LogStandardError.IsDefined
                ? ", since the log method has no width when every result is alike"
                : ", since the log method has no limits at a ratio of zero or infinity";
            return _kind == PooledKind.OddsRatio
                ? PooledExactOdds.Interval(_strata!, double.IsPositiveInfinity(Value), confidence, PooledExactOdds.Name + why)
                : StratifiedRatioScore.Interval(_strata!, _kind, Value, confidence, StratifiedRatioScore.Name + why);
        }

        double factor = Math.Exp(StandardNormal.UpperQuantile(confidence.Tail) * LogStandardError.Value);
        return new ConfidenceInterval(
            confidence.HasLower ? Value / factor : 0, confidence.HasUpper ? Value * factor : double.PositiveInfinity, confidence, name);
    }

    /// <summary>Whether the same ratio is pooled over equal strata in the same order.</summary>
    /// <param name="other">The other ratio.</param>
    /// <returns>True when it is.</returns>
    public bool Equals(PooledRatio other) =>
        _kind == other._kind && (_strata is null) == (other._strata is null) && (_strata ?? []).SequenceEqual(other._strata ?? []);

    /// <inheritdoc/>
    public override int GetHashCode() => (_kind, _value).GetHashCode();

    /// <summary>The value to six significant digits in the invariant culture, or "undefined: " and the reason.</summary>
    /// <returns>The text.</returns>
    public override string ToString() => Display.Of(_value);
}
