using DiagnosticAccuracy.Proportions;

namespace DiagnosticAccuracy;

/// <summary>A predictive value at a prevalence that was estimated, with an interval that carries both uncertainties.</summary>
/// <remarks><c>default(EstimatedPredictiveValue)</c> is undefined.</remarks>
public readonly record struct EstimatedPredictiveValue : IIntervalQuantity
{
    private const string Start = "variance recovery (MOVER) on the log odds, from the ";
    private const string End = " interval of the ratio and the interval of the prevalence";
    private const string Name = Start + LogRatio.Name + End;
    private const string FullName = Start + ScoreRatio.KoopmanName + End + ", since the log method of the ratio has no width when every result is alike";
    private const string RectangleName =
        "rectangle of the " + ScoreRatio.KoopmanName + End + ", since the log odds are infinite";

    private readonly ProportionRatio _ratio;
    private readonly EstimatedPrevalence _prior;

    internal EstimatedPredictiveValue(ProportionRatio ratio, EstimatedPrevalence prior)
    {
        _ratio = ratio;
        _prior = prior;
    }

    /// <inheritdoc/>
    public bool IsDefined => WhyUndefined is null;

    /// <summary>Gets the predictive value at the estimated prevalence, from 0 to 1.</summary>
    public double Value => _prior.IsDefined ? AtKnown.Value : double.NaN;

    /// <inheritdoc/>
    public UndefinedReason? WhyUndefined => _prior.WhyUndefined ?? AtKnown.WhyUndefined;

    private PredictiveValue AtKnown => new(_ratio, _prior.Value, _prior.Against);

    /// <summary>
    /// A confidence interval; it lies within 0 to 1 and contains the value. The log odds of the predictive value are those of the prevalence plus the
    /// log of the likelihood ratio; their limits are recovered from the limits of the two parts.
    /// </summary>
    /// <param name="confidence">Level and side; two-sided 95 % unless said.</param>
    /// <returns>
    /// The interval. Where one of the parts is 0 or infinite on the log scale, the limits are the predictive values at the corners of a rectangle, each
    /// side at the square root of the level, which is conservative; the method says so. Undefined, with the reason, where the value is, and where
    /// the interval of a reported prevalence is.
    /// </returns>
    /// <remarks>Source: Zou and Donner, Stat Med 2008;27:1693, for the recovery of variances; its use for this product is this library's.</remarks>
    public ConfidenceInterval Interval(Confidence confidence = default)
    {
        if (WhyUndefined is { } reason)
        {
            return ConfidenceInterval.Undefined(reason, confidence, Name);
        }

        return _ratio.Numerator.Successes == 0 || _ratio.Denominator.Successes == 0 || _prior.Value == 0 || _prior.Against == 0
            ? Rectangle(confidence)
            : Recovered(confidence);
    }

    /// <summary>The value to six significant digits in the invariant culture, or "undefined: " and the reason.</summary>
    /// <returns>The text.</returns>
    public override string ToString() => Display.Of((IQuantity)this);

    private ConfidenceInterval Recovered(Confidence confidence)
    {
        ConfidenceInterval ratio = _ratio.Interval(confidence);
        ConfidenceInterval prior = _prior.Interval(confidence);
        double logRatio = Math.Log(_ratio.Value);
        double logit = Logit(_prior.Value);
        double lower = 0;
        double upper = 1;
        if (confidence.HasLower)
        {
            lower = FromLogit(logRatio + logit - Hypotenuse(logRatio - Math.Log(ratio.Lower), logit - Logit(prior.Lower)));
        }

        if (confidence.HasUpper)
        {
            upper = FromLogit(logRatio + logit + Hypotenuse(Math.Log(ratio.Upper) - logRatio, Logit(prior.Upper) - logit));
        }

        return new ConfidenceInterval(
            Math.Min(lower, Value), Math.Max(upper, Value), confidence, ratio.Method == LogRatio.Name ? Name : FullName);
    }

    private ConfidenceInterval Rectangle(Confidence confidence)
    {
        Confidence side = confidence.RootOfTwo();
        ConfidenceInterval ratio = _ratio.Interval(side, RatioMethod.Koopman);
        ConfidenceInterval prior = _prior.Interval(side);
        if (prior.WhyUndefined is { } reason)
        {
            return ConfidenceInterval.Undefined(reason, confidence, RectangleName);
        }

        return new ConfidenceInterval(
            confidence.HasLower ? At(ratio.Lower, prior.Lower, 0) : 0,
            confidence.HasUpper ? At(ratio.Upper, prior.Upper, 1) : 1,
            confidence,
            RectangleName);
    }

    // At a corner where 0 meets infinity the end of the space stands.
    private static double At(double ratio, double prior, double end)
    {
        double odds = prior / (1 - prior) * ratio;
        return double.IsNaN(odds) ? end : double.IsPositiveInfinity(odds) ? 1 : odds / (1 + odds);
    }

    private static double Logit(double p) => Math.Log(p / (1 - p));

    private static double FromLogit(double x) => x >= 0 ? 1 / (1 + Math.Exp(-x)) : Math.Exp(x) / (1 + Math.Exp(x));

    private static double Hypotenuse(double x, double y) => Math.Sqrt((x * x) + (y * y));
}
