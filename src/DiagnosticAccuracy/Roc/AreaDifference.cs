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
    public ConfidenceInterval Interval(Confidence confidence = default) =>
        Interval(StandardNormal.UpperQuantile(confidence.Tail), confidence, Name);

    /// <summary>The one-sided test of a margin that was stated first: non-inferiority or superiority.</summary>
    /// <param name="margin">The margin that the difference has to exceed.</param>
    /// <returns>
    /// The test; its p-value is at most a significance exactly when the lower bound of <see cref="Interval(Confidence)"/> at one minus the significance does
    /// not lie below the margin's bound.
    /// </returns>
    /// <remarks>Sources: Obuchowski, Acad Radiol 1997;4:439; Liu, Ma, Wu and Tai, Stat Med 2006;25:1219.</remarks>
    public AreaMarginTest Test(DifferenceMargin margin)
    {
        Quantity z = Standardised(Value - margin.Bound);
        return new AreaMarginTest(this, z, z.IsDefined ? Quantity.Of(StandardNormal.Upper(z.Value)) : z);
    }

    /// <summary>Two one-sided tests of margins that were stated first: equivalence.</summary>
    /// <param name="margins">The margins between which the difference has to lie.</param>
    /// <returns>
    /// The test with the less favourable of both statistics; its p-value is at most a significance exactly when the two-sided interval at one minus twice the
    /// significance lies within the margins.
    /// </returns>
    public AreaMarginTest Test(DifferenceEquivalenceMargins margins)
    {
        Quantity z = Standardised(Math.Min(Value - margins.Lower, margins.Upper - Value));
        return new AreaMarginTest(this, z, z.IsDefined ? Quantity.Of(StandardNormal.Upper(z.Value)) : z);
    }

    internal ConfidenceInterval Interval(double critical, Confidence confidence, string name)
    {
        if (WhyNotStandardised is { } reason)
        {
            return ConfidenceInterval.Undefined(reason, confidence, name);
        }

        double margin = critical * StandardError.Value;
        double lower = confidence.HasLower ? Math.Min(1, Math.Max(-1, Value - margin)) : -1;
        double upper = confidence.HasUpper ? Math.Max(-1, Math.Min(1, Value + margin)) : 1;
        return new ConfidenceInterval(lower, upper, confidence, name);
    }

    /// <summary>The difference to six significant digits in the invariant culture, or "undefined: " and the reason.</summary>
    /// <returns>The text.</returns>
    public override string ToString() => Display.Of(_value);

    /// <summary>A distance over the standard error of the difference.</summary>
    internal Quantity Standardised(double distance) => WhyNotStandardised is { } reason
        ? Quantity.Undefined(reason)
        : Quantity.Of(distance / StandardError.Value);

    private UndefinedReason? WhyNotStandardised =>
        WhyUndefined ?? StandardError.WhyUndefined ?? (StandardError.Value == 0 ? ZeroVariance : null);

    internal static readonly UndefinedReason ZeroVariance = new(
        UndefinedCause.ZeroVariance, "the estimated variance of the difference is zero, as when both tests order the subjects alike");
}
