using DiagnosticAccuracy.Numerics;

namespace DiagnosticAccuracy;

/// <summary>The difference of two areas, first minus second, with its standard error and interval.</summary>
/// <remarks><c>default(AreaDifference)</c> is undefined, with the cause <see cref="UndefinedCause.NotComputed"/>.</remarks>
public readonly record struct AreaDifference : IIntervalQuantity
{
    private const string Name = "Wald with DeLong variance";

    private readonly Quantity _value;

    internal AreaDifference(Quantity value, Quantity standardError)
    {
        _value = value;
        StandardError = standardError;
    }

    /// <inheritdoc/>
    public bool IsDefined => _value.IsDefined;

    /// <summary>Gets the difference, from -1 to 1. Undefined when one of the areas is.</summary>
    public double Value => _value.Value;

    /// <inheritdoc/>
    public UndefinedReason? WhyUndefined => _value.WhyUndefined;

    /// <summary>Gets the standard error of the difference; undefined when a group has fewer than two subjects.</summary>
    public Quantity StandardError { get; }

    /// <summary>The difference plus and minus a multiple of its standard error, cut at -1 and 1.</summary>
    /// <param name="confidence">Level and side; two-sided 95 % unless said.</param>
    /// <returns>The interval; undefined when the standard error is undefined or zero.</returns>
    public ConfidenceInterval Interval(Confidence confidence = default)
    {
        if (!IsDefined)
        {
            return ConfidenceInterval.Undefined(WhyUndefined!, confidence, Name);
        }

        if (!StandardError.IsDefined)
        {
            return ConfidenceInterval.Undefined(StandardError.WhyUndefined!, confidence, Name);
        }

        if (StandardError.Value == 0)
        {
            return ConfidenceInterval.Undefined(ZeroVariance, confidence, Name);
        }

        double margin = StandardNormal.UpperQuantile(confidence.Tail) * StandardError.Value;
        double lower = confidence.HasLower ? Math.Min(1, Math.Max(-1, Value - margin)) : -1;
        double upper = confidence.HasUpper ? Math.Max(-1, Math.Min(1, Value + margin)) : 1;
        return new ConfidenceInterval(lower, upper, confidence, Name);
    }

    /// <summary>The difference to six significant digits in the invariant culture, or "undefined: " and the reason.</summary>
    /// <returns>The text.</returns>
    public override string ToString() => Display.Of(_value);

    internal static readonly UndefinedReason ZeroVariance = new(
        UndefinedCause.ZeroVariance, "the estimated variance of the difference is zero, as when both tests order the subjects alike");
}
