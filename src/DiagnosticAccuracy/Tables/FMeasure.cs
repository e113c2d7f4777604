using DiagnosticAccuracy.Numerics;

namespace DiagnosticAccuracy;

/// <summary>
/// The F measure: a weighted harmonic mean of sensitivity and positive predictive value in the sample, from 0 to 1.
/// </summary>
/// <remarks>
/// <para>It does not look at the true negatives, and it changes with the prevalence of the sample: not a property of the test.</para>
/// <para><c>default(FMeasure)</c> is undefined.</para>
/// </remarks>
public readonly record struct FMeasure : IIntervalQuantity
{
    private const string OneName = "Wilson score of TP / (TP + FP + FN), carried to F1";
    private const string LogitName = "logit with delta-method variance";

    private readonly long _truePositives;
    private readonly long _falsePositives;
    private readonly long _falseNegatives;

    internal FMeasure(long truePositives, long falsePositives, long falseNegatives, double beta)
    {
        _truePositives = truePositives;
        _falsePositives = falsePositives;
        _falseNegatives = falseNegatives;
        Beta = beta;
    }

    /// <summary>Gets how many times as much sensitivity weighs as the positive predictive value; 1 for F1.</summary>
    public double Beta { get; }

    /// <inheritdoc/>
    public bool IsDefined => WhyUndefined is null;

    /// <summary>
    /// Gets (1 + beta^2) TP / ((1 + beta^2) TP + beta^2 FN + FP) (van Rijsbergen, Information Retrieval, 1979). Undefined when there are only true
    /// negatives.
    /// </summary>
    public double Value => !IsDefined ? double.NaN
        : _truePositives == 0 ? 0
        : _truePositives / (_truePositives + Unfavourable);

    /// <inheritdoc/>
    public UndefinedReason? WhyUndefined => _truePositives == 0 && _falsePositives == 0 && _falseNegatives == 0
        ? new UndefinedReason(UndefinedCause.ZeroOverZero, "no subject has the condition and no result is positive")
        : null;

    // beta^2 / (1 + beta^2) and 1 / (1 + beta^2), which no weight takes out of the range of a double.
    private double NegativeWeight => 1 / (1 + (1 / (Beta * Beta)));

    private double PositiveWeight => 1 / (1 + (Beta * Beta));

    private double Unfavourable => (NegativeWeight * _falseNegatives) + (PositiveWeight * _falsePositives);

    /// <summary>A confidence interval; it lies within 0 to 1.</summary>
    /// <param name="confidence">Level and side; two-sided 95 % unless said.</param>
    /// <returns>
    /// For F1 the Wilson interval of the proportion TP / (TP + FP + FN), of which F1 is a function. For other weights a logit interval with the
    /// delta-method variance, which is undefined at 0 and 1.
    /// </returns>
    /// <remarks>F1 = 2 q / (1 + q) with q = TP / (TP + FP + FN): Hand, Christen and Kirielle, Mach Learn 2021;110:451.</remarks>
    public ConfidenceInterval Interval(Confidence confidence = default)
    {
        string name = Beta == 1 ? OneName : LogitName;
        if (WhyUndefined is { } reason)
        {
            return ConfidenceInterval.Undefined(reason, confidence, name);
        }

        if (Beta == 1)
        {
            ConfidenceInterval part = new Proportion(_truePositives, checked(_truePositives + _falsePositives + _falseNegatives)).Interval(confidence);
            return new ConfidenceInterval(2 * part.Lower / (1 + part.Lower), 2 * part.Upper / (1 + part.Upper), confidence, name);
        }

        double against = Unfavourable;
        if (_truePositives == 0 || against == 0)
        {
            return ConfidenceInterval.Undefined(
                new UndefinedReason(UndefinedCause.MethodHasNoLimit, "the logit interval has no limits at an F measure of 0 or 1; that of F1 has"),
                confidence,
                name);
        }

        double variance = (1.0 / _truePositives)
            + (NegativeWeight / against * (NegativeWeight / against) * _falseNegatives)
            + (PositiveWeight / against * (PositiveWeight / against) * _falsePositives);
        double factor = Math.Exp(StandardNormal.UpperQuantile(confidence.Tail) * Math.Sqrt(variance));
        return new ConfidenceInterval(
            confidence.HasLower ? _truePositives / (_truePositives + (against * factor)) : 0,
            confidence.HasUpper ? _truePositives / (_truePositives + (against / factor)) : 1,
            confidence,
            name);
    }

    /// <summary>The value to six significant digits in the invariant culture, or "undefined: " and the reason.</summary>
    /// <returns>The text.</returns>
    public override string ToString() => Display.Of((IQuantity)this);
}
