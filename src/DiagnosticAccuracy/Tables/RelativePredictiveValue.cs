using DiagnosticAccuracy.Tables;

namespace DiagnosticAccuracy;

/// <summary>The predictive value of one test over that of another on the same subjects of a cohort.</summary>
/// <remarks>
/// It depends on the prevalence, and holds for a cohort only. <c>default(RelativePredictiveValue)</c> is undefined: there are no results.
/// </remarks>
public readonly record struct RelativePredictiveValue : IIntervalQuantity
{
    private readonly PairedPredictiveValue _values;

    internal RelativePredictiveValue(PairedPredictiveValue values) => _values = values;

    /// <summary>Gets the predictive value of the first test.</summary>
    public Proportion First => _values.First;

    /// <summary>Gets the predictive value of the second test.</summary>
    public Proportion Second => _values.Second;

    /// <inheritdoc/>
    public bool IsDefined => WhyUndefined is null;

    /// <summary>Gets the first over the second, 0 or more; positive infinity when only the second is zero, NaN exactly when undefined.</summary>
    public double Value => IsDefined ? First.Value / Second.Value : double.NaN;

    /// <inheritdoc/>
    public UndefinedReason? WhyUndefined =>
        First.WhyUndefined ?? Second.WhyUndefined ?? (First.Successes == 0 && Second.Successes == 0 ? BothZero : null);

    private static readonly UndefinedReason BothZero =
        new(UndefinedCause.ZeroOverZero, "both predictive values are zero, and zero over zero has no value");

    /// <summary>The interval that is normal on the logarithm; it lies within 0 to infinity and contains the ratio at every level above one half.</summary>
    /// <param name="confidence">Level and side; two-sided 95 % unless said.</param>
    /// <returns>
    /// The interval; undefined, with the reason, where the ratio is, where it is zero or infinite, and where no subject speaks about it (the tests
    /// call the same subjects, or every call is right).
    /// </returns>
    /// <remarks>The variance is that of the delta method for eight multinomial cells. Source: Moskowitz and Pepe, Clin Trials 2006;3:272.</remarks>
    public ConfidenceInterval Interval(Confidence confidence = default) => LogPredictiveRatio.Interval(this, _values.Cells, confidence);

    /// <summary>The ratio to six significant digits in the invariant culture, or "undefined: " and the reason.</summary>
    /// <returns>The text.</returns>
    public override string ToString() => Display.Of(this);
}
