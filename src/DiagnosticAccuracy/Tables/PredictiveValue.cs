using DiagnosticAccuracy.Numerics;
using DiagnosticAccuracy.Proportions;

namespace DiagnosticAccuracy;

/// <summary>
/// The probability that a result is right, at a known prevalence: of the condition after a positive result, or of no condition after a negative one.
/// </summary>
/// <remarks>
/// <para>In odds it is the prior odds of what the result speaks for times the likelihood ratio of the result, so everything it does follows
/// from that ratio. It changes with the prevalence by its very meaning.</para>
/// <para><c>default(PredictiveValue)</c> is undefined.</para>
/// </remarks>
public readonly record struct PredictiveValue : IIntervalQuantity
{
    private const string LogitName = "logit at a known prevalence";
    private const string AdjustedName = "adjusted logit at a known prevalence";
    private const string ScoreName = "score (Koopman) of the likelihood ratio at a known prevalence";

    // How likely the result is when it is right, over how likely it is when it is wrong; and the prior probabilities of being right and wrong,
    // both kept, since one minus a tiny one is 1.
    private readonly ProportionRatio _ratio;
    private readonly double _prior;
    private readonly double _against;

    internal PredictiveValue(ProportionRatio ratio, double prior, double against)
    {
        _ratio = ratio;
        _prior = prior;
        _against = against;
    }

    /// <inheritdoc/>
    public bool IsDefined => WhyUndefined is null;

    /// <summary>
    /// Gets the predictive value, from 0 to 1. Undefined when a group is empty, when no such result was observed, or when at the stated prevalence
    /// (0 or 1) no such result would be.
    /// </summary>
    public double Value => IsDefined ? Favourable / (Favourable + Unfavourable) : double.NaN;

    /// <inheritdoc/>
    public UndefinedReason? WhyUndefined
    {
        get
        {
            if (_ratio.WhyUndefined is { } reason)
            {
                return reason;
            }

            return Favourable + Unfavourable == 0
                ? new UndefinedReason(UndefinedCause.ZeroOverZero, "at this prevalence nobody would have such a result")
                : null;
        }
    }

    private double Favourable => _prior * _ratio.Numerator.Value;

    private double Unfavourable => _against * _ratio.Denominator.Value;

    /// <inheritdoc/>
    ConfidenceInterval IIntervalQuantity.Interval(Confidence confidence) => Interval(confidence);

    /// <summary>A confidence interval; it lies within 0 to 1. At a prevalence of 0 or 1 the value does not depend on the data, and both limits equal it.</summary>
    /// <param name="confidence">Level and side; two-sided 95 % unless said.</param>
    /// <param name="method">The method; logit unless said.</param>
    /// <returns>The interval; undefined, with the reason, where the value is.</returns>
    /// <exception cref="ArgumentOutOfRangeException"><paramref name="method"/> is not a value of its type.</exception>
    /// <remarks>Source: Mercaldo, Lau and Zhou, Stat Med 2007;26:2170.</remarks>
    public ConfidenceInterval Interval(Confidence confidence = default, PredictiveValueMethod method = PredictiveValueMethod.Logit)
    {
        string name = method switch
        {
            PredictiveValueMethod.Logit => LogitName,
            PredictiveValueMethod.AdjustedLogit => AdjustedName,
            PredictiveValueMethod.LikelihoodRatioScore => ScoreName,
            _ => throw Guard.UnknownOption(method),
        };
        if (WhyUndefined is { } reason)
        {
            return ConfidenceInterval.Undefined(reason, confidence, name);
        }

        return method switch
        {
            PredictiveValueMethod.AdjustedLogit => AdjustedLogit(confidence),
            PredictiveValueMethod.LikelihoodRatioScore => Carried(_ratio.Interval(confidence, RatioMethod.Koopman), name),
            _ => Carried(_ratio.Interval(confidence, RatioMethod.Log), name),
        };
    }

    /// <summary>The value to six significant digits in the invariant culture, or "undefined: " and the reason.</summary>
    /// <returns>The text.</returns>
    public override string ToString() => Display.Of((IQuantity)this);

    private ConfidenceInterval Carried(ConfidenceInterval ratio, string name)
    {
        // The log method of a ratio names another one where it has no limits; so does this.
        bool replaced = name == LogitName && ratio.Method != LogRatio.Name;
        return new ConfidenceInterval(
            ratio.Confidence.HasLower ? AtRatio(ratio.Lower) : 0,
            ratio.Confidence.HasUpper ? AtRatio(ratio.Upper) : 1,
            ratio.Confidence,
            replaced ? $"{ScoreName}, since the logit method has no limits here" : name);
    }

    private double AtRatio(double ratio)
    {
        if (_prior == 0 || _against == 0)
        {
            return _prior;
        }

        return double.IsPositiveInfinity(ratio) ? 1 : _prior * ratio / ((_prior * ratio) + _against);
    }

    private ConfidenceInterval AdjustedLogit(Confidence confidence)
    {
        double z = StandardNormal.UpperQuantile(confidence.Tail);
        double right = Adjusted(_ratio.Numerator, z);
        double wrong = Adjusted(_ratio.Denominator, z);
        double variance = (Adjusted(_ratio.Numerator.Complement, z) / (right * (_ratio.Numerator.Trials + (z * z))))
            + (Adjusted(_ratio.Denominator.Complement, z) / (wrong * (_ratio.Denominator.Trials + (z * z))));
        double factor = Math.Exp(z * Math.Sqrt(variance));
        double ratio = right / wrong;
        return new ConfidenceInterval(
            confidence.HasLower ? AtRatio(ratio / factor) : 0,
            confidence.HasUpper ? AtRatio(ratio * factor) : 1,
            confidence,
            AdjustedName);
    }

    private static double Adjusted(Proportion proportion, double z) =>
        (proportion.Successes + (z * z / 2)) / (proportion.Trials + (z * z));
}
