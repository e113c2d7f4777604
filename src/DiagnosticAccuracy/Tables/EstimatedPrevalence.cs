using DiagnosticAccuracy.Numerics;

namespace DiagnosticAccuracy;

/// <summary>A prevalence that is not known but estimated: from counts, or as an estimate that was reported with its interval.</summary>
/// <remarks><c>default(EstimatedPrevalence)</c> is undefined: it was estimated from no subjects.</remarks>
public readonly record struct EstimatedPrevalence : IIntervalQuantity
{
    private static readonly UndefinedReason NoSubjects = new(UndefinedCause.NoSubjects, "the prevalence was estimated from no subjects");

    private static readonly UndefinedReason AtTheEnd = new(
        UndefinedCause.MethodHasNoLimit,
        "a reported prevalence of 0 or 1 has no logit, so its interval cannot be carried to another level; give the counts it was estimated from instead");

    private readonly bool _isReported;
    private readonly Proportion _counts;
    private readonly double _value;
    private readonly ConfidenceInterval _interval;

    /// <summary>Initializes a new instance of the <see cref="EstimatedPrevalence"/> struct from counts.</summary>
    /// <param name="counts">How many of how many had the condition; 0 of 0 is allowed and undefined.</param>
    public EstimatedPrevalence(Proportion counts) => _counts = counts;

    /// <summary>Initializes a new instance of the <see cref="EstimatedPrevalence"/> struct from a report, such as a pooled or an adjusted estimate.</summary>
    /// <param name="estimate">The estimate.</param>
    /// <param name="interval">Its interval: defined, two-sided, within 0 to 1, and containing the estimate.</param>
    /// <exception cref="ArgumentException"><paramref name="interval"/> is undefined or one-sided.</exception>
    /// <exception cref="ArgumentOutOfRangeException">A limit is not from 0 to 1, or <paramref name="estimate"/> is not between the limits.</exception>
    public EstimatedPrevalence(Prevalence estimate, ConfidenceInterval interval)
    {
        if (interval.WhyUndefined is { } reason)
        {
            throw new ArgumentException($"{nameof(interval)} is undefined ({reason.Explanation}); allowed is a defined one.", nameof(interval));
        }

        if (interval.Confidence.Side != IntervalSide.TwoSided)
        {
            throw new ArgumentException($"{nameof(interval)} is a {interval.Confidence}; allowed is a two-sided one.", nameof(interval));
        }

        Guard.Probability(interval.Lower, nameof(interval));
        Guard.Probability(interval.Upper, nameof(interval));
        if (!interval.Contains(estimate.Value))
        {
            throw Guard.OutOfRange(
                nameof(estimate), estimate.Value, $"a value between the limits, {Display.Exact(interval.Lower)} to {Display.Exact(interval.Upper)}");
        }

        _isReported = true;
        _value = estimate.Value;
        _interval = interval;
    }

    /// <inheritdoc/>
    public bool IsDefined => WhyUndefined is null;

    /// <summary>Gets the estimate, from 0 to 1. Undefined when it comes from no subjects.</summary>
    public double Value => _isReported ? _value : _counts.Value;

    /// <inheritdoc/>
    public UndefinedReason? WhyUndefined => _isReported || _counts.IsDefined ? null : NoSubjects;

    internal double Against => _isReported ? 1 - _value : _counts.Complement.Value;

    internal EstimatedPrevalence Complement => _isReported
        ? new(new Prevalence(1 - _value), new ConfidenceInterval(1 - _interval.Upper, 1 - _interval.Lower, _interval.Confidence, _interval.Method))
        : new(_counts.Complement);

    /// <summary>The interval of the prevalence; it lies within 0 to 1 and contains the estimate.</summary>
    /// <param name="confidence">Level and side; two-sided 95 % unless said.</param>
    /// <returns>
    /// From counts Wilson's score interval. A reported interval at the level it was reported at; at another level each limit is moved on the logit scale
    /// in proportion to the normal quantiles, and the method says so. Undefined, with the reason, where the estimate is, and at another level than
    /// the reported one for a reported estimate of 0 or 1.
    /// </returns>
    public ConfidenceInterval Interval(Confidence confidence = default)
    {
        if (!_isReported)
        {
            return IsDefined ? _counts.Interval(confidence) : ConfidenceInterval.Undefined(NoSubjects, confidence, Proportions.WilsonScore.Name);
        }

        double scale = StandardNormal.UpperQuantile(confidence.Tail) / StandardNormal.UpperQuantile(_interval.Confidence.Tail);
        string name = scale == 1 ? _interval.Method : _interval.Method + ", carried to another level on the logit scale";
        if (scale != 1 && _value is 0 or 1)
        {
            return ConfidenceInterval.Undefined(AtTheEnd, confidence, name);
        }

        return new ConfidenceInterval(
            confidence.HasLower ? Moved(scale >= 0 ? _interval.Lower : _interval.Upper, Math.Abs(scale)) : 0,
            confidence.HasUpper ? Moved(scale >= 0 ? _interval.Upper : _interval.Lower, Math.Abs(scale)) : 1,
            confidence,
            name);
    }

    /// <summary>The counts or the reported estimate with its interval.</summary>
    /// <returns>The text, in the invariant culture.</returns>
    public override string ToString() => !_isReported ? _counts.ToString()
        : $"{Display.Of(_value)}, {Display.Of(_interval.Lower)} to {Display.Of(_interval.Upper)} ({_interval.Confidence})";

    private double Moved(double limit, double scale)
    {
        if (scale == 1 || limit is 0 or 1)
        {
            return limit;
        }

        double odds = _value / (1 - _value) * Math.Pow(limit / (1 - limit) / (_value / (1 - _value)), scale);
        return double.IsPositiveInfinity(odds) ? 1 : odds / (1 + odds);
    }
}
