namespace DiagnosticAccuracy;

/// <summary>A confidence interval: its limits, its level and side, and the name of the method that made it.</summary>
/// <remarks>
/// <para>A one-sided interval has the end of the parameter space on its other side. Limits may be infinite.</para>
/// <para><c>default(ConfidenceInterval)</c> is undefined, with the cause <see cref="UndefinedCause.NotComputed"/>.</para>
/// </remarks>
public readonly record struct ConfidenceInterval
{
    private readonly bool _defined;
    private readonly double _lower;
    private readonly double _upper;
    private readonly string? _method;
    private readonly UndefinedReason? _reason;

    /// <summary>Initializes a new instance of the <see cref="ConfidenceInterval"/> struct.</summary>
    /// <param name="lower">The lower limit.</param>
    /// <param name="upper">The upper limit, not below the lower one.</param>
    /// <param name="confidence">Level and side.</param>
    /// <param name="method">The name of the method, as the field knows it.</param>
    /// <exception cref="ArgumentOutOfRangeException">A limit is NaN, or <paramref name="upper"/> is below <paramref name="lower"/>.</exception>
    /// <exception cref="ArgumentNullException"><paramref name="method"/> is null.</exception>
    public ConfidenceInterval(double lower, double upper, Confidence confidence, string method)
    {
        Guard.NotNaN(lower);
        Guard.NotNaN(upper);
        Guard.NotNull(method);
        if (upper < lower)
        {
            throw Guard.OutOfRange(nameof(upper), upper, $"at least the lower limit, {Display.Exact(lower)}");
        }

        _defined = true;
        _lower = lower;
        _upper = upper;
        Confidence = confidence;
        _method = method;
        _reason = null;
    }

    private ConfidenceInterval(UndefinedReason reason, Confidence confidence, string method)
    {
        _defined = false;
        _lower = 0;
        _upper = 0;
        Confidence = confidence;
        _method = method;
        _reason = reason;
    }

    /// <summary>Gets a value indicating whether the data define this interval.</summary>
    public bool IsDefined => _defined;

    /// <summary>Gets the lower limit; NaN exactly when undefined.</summary>
    public double Lower => _defined ? _lower : double.NaN;

    /// <summary>Gets the upper limit; NaN exactly when undefined.</summary>
    public double Upper => _defined ? _upper : double.NaN;

    /// <summary>Gets the level and the side.</summary>
    public Confidence Confidence { get; }

    /// <summary>Gets the name of the method, for example "Wilson score".</summary>
    public string Method => _method ?? "none";

    /// <summary>Gets why the interval is undefined; null exactly when it is defined.</summary>
    public UndefinedReason? WhyUndefined => _defined ? null : _reason ?? UndefinedReason.NotComputed;

    /// <summary>Gets the distance between the limits; NaN when undefined, infinite where a limit is.</summary>
    public double Width => double.IsInfinity(_lower) || double.IsInfinity(_upper)
        ? double.PositiveInfinity
        : Upper - Lower;

    /// <summary>An interval that the data do not define.</summary>
    /// <param name="reason">Why.</param>
    /// <param name="confidence">The level and side that were asked for.</param>
    /// <param name="method">The name of the method that was asked for.</param>
    /// <returns>The undefined interval.</returns>
    /// <exception cref="ArgumentNullException"><paramref name="reason"/> or <paramref name="method"/> is null.</exception>
    public static ConfidenceInterval Undefined(UndefinedReason reason, Confidence confidence, string method)
    {
        Guard.NotNull(reason);
        Guard.NotNull(method);
        return new ConfidenceInterval(reason, confidence, method);
    }

    /// <summary>Whether a value lies between the limits, the limits included; false when the interval is undefined.</summary>
    /// <param name="value">The value.</param>
    /// <returns>True when it does.</returns>
    /// <exception cref="ArgumentOutOfRangeException"><paramref name="value"/> is NaN.</exception>
    public bool Contains(double value)
    {
        Guard.NotNaN(value);
        return _defined && value >= _lower && value <= _upper;
    }

    /// <summary>For example "0.255289 to 0.36621 (95 % two-sided, Wilson score)".</summary>
    /// <returns>The text, in the invariant culture.</returns>
    public override string ToString() => _defined
        ? $"{Display.Of(_lower)} to {Display.Of(_upper)} ({Confidence}, {Method})"
        : Display.Undefined(WhyUndefined!);
}
