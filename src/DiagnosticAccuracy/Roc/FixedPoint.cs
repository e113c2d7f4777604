using DiagnosticAccuracy.Numerics;

namespace DiagnosticAccuracy;

/// <summary>The sensitivity of a test at a stated specificity, or the specificity at a stated sensitivity, read off the empirical curve.</summary>
/// <remarks>
/// <para>The cutoff that gives the stated value is estimated from the same data, and the variance knows it: a binomial interval of the value read
/// would be too short (Linnet, Clin Chem 1987;33:15; Platt, Hanley and Yang, Stat Med 2000;19:313; Zhou and Qin, Stat Med 2005;24:465; from
/// memory). For a cutoff fixed before the data were seen the binomial interval is right: take <see cref="RocCurve.At(Cutoff)"/> and ask its sensitivity.</para>
/// <para>It does not depend on the prevalence. <c>default(FixedPoint)</c> is undefined.</para>
/// </remarks>
public readonly record struct FixedPoint : IIntervalQuantity
{
    private readonly Quantity _value;
    private readonly Quantity _cutoffVariance;
    private readonly long _size;

    internal FixedPoint(
        FixedPointKind kind, double at, Quantity value, Quantity slope, Quantity cutoffVariance, long size, OperatingPoint? reaching, OperatingPoint? beyond)
    {
        Kind = kind;
        At = at;
        _value = value;
        Slope = slope;
        _cutoffVariance = cutoffVariance;
        _size = size;
        Reaching = reaching;
        Beyond = beyond;
    }

    /// <summary>Gets what is held fixed and what is read.</summary>
    public FixedPointKind Kind { get; }

    /// <summary>Gets the specificity or sensitivity that is held fixed.</summary>
    public double At { get; }

    /// <inheritdoc/>
    public bool IsDefined => _value.IsDefined;

    /// <summary>Gets the value on the curve, from 0 to 1, interpolated along a straight line between two points. Undefined when a group is empty.</summary>
    public double Value => _value.Value;

    /// <inheritdoc/>
    public UndefinedReason? WhyUndefined => _value.WhyUndefined;

    /// <summary>Gets the best point of the curve that reaches the fixed value; null when undefined. This one can be used as a cutoff.</summary>
    public OperatingPoint? Reaching { get; }

    /// <summary>Gets the next point, which misses the fixed value; null when <see cref="Reaching"/> has exactly the fixed value.</summary>
    public OperatingPoint? Beyond { get; }

    /// <summary>
    /// Gets how much of the value read is lost for one unit more of the value held, 0 or more: the difference of the curve over one standard error of
    /// the fixed value to both sides. Undefined where the fixed value is 0 or 1.
    /// </summary>
    public Quantity Slope { get; }

    /// <summary>Gets the variance of the value: binomial, plus that of the estimated cutoff. Undefined where the fixed value is 0 or 1.</summary>
    public Quantity Variance => _cutoffVariance.IsDefined
        ? Quantity.Of((Value * (1 - Value) / _size) + _cutoffVariance.Value)
        : _cutoffVariance;

    /// <summary>Gets the standard error of the value.</summary>
    public Quantity StandardError => Variance.IsDefined ? Quantity.Of(Math.Sqrt(Variance.Value)) : Variance;

    /// <inheritdoc/>
    ConfidenceInterval IIntervalQuantity.Interval(Confidence confidence) => Interval(confidence);

    /// <summary>A confidence interval of the value that knows that the cutoff was estimated; it lies within 0 and 1 and contains the value.</summary>
    /// <param name="confidence">Level and side; two-sided 95 % unless said.</param>
    /// <param name="method">The method; logit unless said.</param>
    /// <returns>The interval; undefined, with the reason, where the variance is, and by <see cref="FixedPointMethod.Wald"/> where it is zero.</returns>
    /// <exception cref="ArgumentOutOfRangeException"><paramref name="method"/> is not a value of its type.</exception>
    public ConfidenceInterval Interval(Confidence confidence = default, FixedPointMethod method = FixedPointMethod.Logit)
    {
        string name = method switch
        {
            FixedPointMethod.Adjusted => "pseudo counts, cutoff estimated",
            FixedPointMethod.Logit => "logit, cutoff estimated",
            FixedPointMethod.Wald => "Wald, cutoff estimated",
            _ => throw Guard.UnknownOption(method),
        };
        UndefinedReason? reason = WhyUndefined ?? Variance.WhyUndefined
            ?? (method == FixedPointMethod.Wald && Variance.Value == 0
                ? new UndefinedReason(UndefinedCause.ZeroVariance, "the estimated variance is zero") : null);
        if (reason is not null)
        {
            return ConfidenceInterval.Undefined(reason, confidence, name);
        }

        double z = StandardNormal.UpperQuantile(confidence.Tail);
        double lower;
        double upper;
        if (method == FixedPointMethod.Logit && Value > 0 && Value < 1)
        {
            double factor = Math.Exp(z * Math.Sqrt(Variance.Value) / (Value * (1 - Value)));
            lower = Value / (Value + ((1 - Value) * factor));
            upper = Value / (Value + ((1 - Value) / factor));
        }
        else
        {
            double added = method == FixedPointMethod.Wald ? 0 : z * z;
            double middle = ((Value * _size) + (added / 2)) / (_size + added);
            double margin = z * Math.Sqrt((middle * (1 - middle) / (_size + added)) + _cutoffVariance.Value);
            lower = middle - margin;
            upper = middle + margin;
            name = method == FixedPointMethod.Logit ? "pseudo counts, cutoff estimated, since the logit is infinite" : name;
        }

        // Below one half a one-sided level has a negative z, and its limit lies on the other side of the value.
        return new ConfidenceInterval(
            confidence.HasLower ? Math.Min(1, Math.Max(0, lower)) : 0, confidence.HasUpper ? Math.Max(0, Math.Min(1, upper)) : 1, confidence, name);
    }

    /// <summary>For example "sensitivity 0.8 at specificity 0.95".</summary>
    /// <returns>The text, in the invariant culture.</returns>
    public override string ToString() => Kind == FixedPointKind.SensitivityAtSpecificity
        ? $"sensitivity {Display.Of(_value)} at specificity {Display.Of(At)}"
        : $"specificity {Display.Of(_value)} at sensitivity {Display.Of(At)}";
}
