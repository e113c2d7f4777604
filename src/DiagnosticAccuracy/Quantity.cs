using System.Globalization;

namespace DiagnosticAccuracy;

/// <summary>
/// A plain number that may be undefined: a standard error, a test statistic, a p-value, a correlation.
/// </summary>
/// <remarks><c>default(Quantity)</c> is undefined, with the cause <see cref="UndefinedCause.NotComputed"/>.</remarks>
public readonly record struct Quantity : IQuantity
{
    private readonly bool _defined;
    private readonly double _value;
    private readonly UndefinedReason? _reason;

    private Quantity(double value)
    {
        _defined = true;
        _value = value;
        _reason = null;
    }

    private Quantity(UndefinedReason reason)
    {
        _defined = false;
        _value = 0;
        _reason = reason;
    }

    /// <inheritdoc/>
    public bool IsDefined => _defined;

    /// <inheritdoc/>
    public double Value => _defined ? _value : double.NaN;

    /// <inheritdoc/>
    public UndefinedReason? WhyUndefined => _defined ? null : _reason ?? UndefinedReason.NotComputed;

    /// <summary>A defined quantity.</summary>
    /// <param name="value">Any number, infinities included.</param>
    /// <returns>The quantity.</returns>
    /// <exception cref="ArgumentOutOfRangeException"><paramref name="value"/> is NaN.</exception>
    public static Quantity Of(double value)
    {
        Guard.NotNaN(value);
        return new Quantity(value);
    }

    /// <summary>An undefined quantity.</summary>
    /// <param name="reason">Why the data do not define it.</param>
    /// <returns>The quantity.</returns>
    /// <exception cref="ArgumentNullException"><paramref name="reason"/> is null.</exception>
    public static Quantity Undefined(UndefinedReason reason)
    {
        Guard.NotNull(reason);
        return new Quantity(reason);
    }

    /// <summary>Gets the value where there is one.</summary>
    /// <param name="value">The value, or NaN.</param>
    /// <returns><see cref="IsDefined"/>.</returns>
    public bool TryGetValue(out double value)
    {
        value = Value;
        return _defined;
    }

    /// <summary>The value to six significant digits in the invariant culture, or "undefined: " and the reason.</summary>
    /// <returns>The text.</returns>
    public override string ToString() => Display.Of(this);

    internal static Quantity Undefined(UndefinedCause cause, string explanation) =>
        new(new UndefinedReason(cause, explanation));
}
