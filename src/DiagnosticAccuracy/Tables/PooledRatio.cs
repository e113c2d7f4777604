using DiagnosticAccuracy.Numerics;

namespace DiagnosticAccuracy;

/// <summary>A ratio pooled over strata by Mantel and Haenszel, with its log interval.</summary>
/// <remarks><c>default(PooledRatio)</c> is undefined.</remarks>
public readonly record struct PooledRatio : IIntervalQuantity
{
    private readonly Quantity _value;
    private readonly string? _method;

    internal PooledRatio(Quantity value, Quantity logStandardError, string method)
    {
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

    /// <summary>The log interval; it lies within 0 to infinity.</summary>
    /// <param name="confidence">Level and side; two-sided 95 % unless said.</param>
    /// <returns>The interval; undefined, with the reason, where the ratio is, and at a ratio of 0 or infinity.</returns>
    public ConfidenceInterval Interval(Confidence confidence = default)
    {
        string name = _method ?? "none";
        if ((WhyUndefined ?? LogStandardError.WhyUndefined) is { } reason)
        {
            return ConfidenceInterval.Undefined(reason, confidence, name);
        }

        double factor = Math.Exp(StandardNormal.UpperQuantile(confidence.Tail) * LogStandardError.Value);
        return new ConfidenceInterval(
            confidence.HasLower ? Value / factor : 0, confidence.HasUpper ? Value * factor : double.PositiveInfinity, confidence, name);
    }

    /// <summary>The value to six significant digits in the invariant culture, or "undefined: " and the reason.</summary>
    /// <returns>The text.</returns>
    public override string ToString() => Display.Of(_value);
}
