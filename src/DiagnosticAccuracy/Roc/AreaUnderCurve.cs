using System.Numerics;
using DiagnosticAccuracy.Numerics;
using DiagnosticAccuracy.Roc;

namespace DiagnosticAccuracy;

/// <summary>
/// The area under an empirical ROC curve: the probability that a subject with the condition scores more towards it than one without,
/// ties counting one half (Bamber, J Math Psychol 1975;12:387).
/// </summary>
/// <remarks>
/// The area is a ratio of integers (the Mann-Whitney count of pairs over all pairs), and so is its DeLong variance (DeLong, DeLong
/// and Clarke-Pearson, Biometrics 1988;44:837); each is rounded once. The area does not depend on the prevalence.
/// </remarks>
public sealed class AreaUnderCurve : IIntervalQuantity
{
    private readonly PlacementMoments _moments;

    internal AreaUnderCurve(PlacementMoments moments)
    {
        _moments = moments;
        WhyUndefined = moments.WithCondition == 0 ? UndefinedReason.NoSubjectsWithCondition
            : moments.WithoutCondition == 0 ? UndefinedReason.NoSubjectsWithoutCondition
            : null;
        Pairs = (BigInteger)moments.WithCondition * moments.WithoutCondition;
        Value = WhyUndefined is null ? ExactRatio.ToDouble(moments.Sum, 2 * Pairs) : double.NaN;
        Complement = WhyUndefined is null ? ExactRatio.ToDouble((2 * Pairs) - moments.Sum, 2 * Pairs) : double.NaN;
        Variance = AreaVariances.Of(this, AreaVarianceMethod.DeLong);
    }

    /// <inheritdoc/>
    public bool IsDefined => WhyUndefined is null;

    /// <summary>Gets the area, from 0 to 1; 0.5 is chance. Undefined when a group is empty.</summary>
    public double Value { get; }

    /// <inheritdoc/>
    public UndefinedReason? WhyUndefined { get; }

    /// <summary>Gets the number of subjects with the condition.</summary>
    public long WithCondition => _moments.WithCondition;

    /// <summary>Gets the number of subjects without the condition.</summary>
    public long WithoutCondition => _moments.WithoutCondition;

    /// <summary>Gets the number of pairs of one subject with the condition and one without.</summary>
    public BigInteger Pairs { get; }

    /// <summary>Gets the number of pairs in which the subject with the condition scores more towards it.</summary>
    public BigInteger ConcordantPairs => (_moments.Sum - _moments.TiedPairs) / 2;

    /// <summary>Gets the number of pairs with equal scores.</summary>
    public BigInteger TiedPairs => _moments.TiedPairs;

    /// <summary>Gets the number of pairs in which the subject without the condition scores more towards it.</summary>
    public BigInteger DiscordantPairs => Pairs - ConcordantPairs - TiedPairs;

    /// <summary>
    /// Gets the DeLong variance of the area. Zero when all placements agree, as at an area of 0 or 1. Undefined when a group has fewer than two
    /// subjects.
    /// </summary>
    public Quantity Variance { get; }

    /// <summary>Gets the DeLong standard error of the area, the square root of <see cref="Variance"/>.</summary>
    public Quantity StandardError => Variance.IsDefined ? Quantity.Of(Math.Sqrt(Variance.Value)) : Variance;

    // 1 - area, rounded once, so that it keeps its digits near an area of 1.
    internal double Complement { get; }

    internal PlacementMoments Moments => _moments;

    /// <summary>The area of a sample, without the points of its curve.</summary>
    /// <param name="sample">The sample.</param>
    /// <returns>The area; the same as that of <see cref="RocCurve.Empirical"/>.</returns>
    /// <exception cref="ArgumentNullException"><paramref name="sample"/> is null.</exception>
    public static AreaUnderCurve Of(ScoredSample sample)
    {
        Guard.NotNull(sample);
        return new AreaUnderCurve(PlacementMoments.Of(sample));
    }

    /// <summary>The area straight from scores and status, for when neither the sample nor the curve is wanted.</summary>
    /// <param name="scores">The scores; no NaN, infinities allowed.</param>
    /// <param name="hasCondition">For each score, whether the reference standard says that the subject has the condition.</param>
    /// <param name="direction">Which end of the scale speaks for the condition.</param>
    /// <returns>The area; the same as that of <see cref="ScoredSample.Create"/>, in less time and with no memory kept.</returns>
    /// <exception cref="ArgumentException">The lengths differ, there are no subjects, or a score is NaN (the message has the index of
    /// the first).</exception>
    /// <exception cref="ArgumentOutOfRangeException"><paramref name="direction"/> is not stated.</exception>
    public static AreaUnderCurve FromScores(ReadOnlySpan<double> scores, ReadOnlySpan<bool> hasCondition, ScoreDirection direction)
    {
        Guard.Direction(direction);
        Guard.SameLength(hasCondition.Length, scores.Length, nameof(hasCondition), nameof(scores));
        Guard.NotEmpty(scores.Length, nameof(scores));
        return new AreaUnderCurve(SampleBuilder.MomentsOf(scores, hasCondition, direction));
    }

    /// <inheritdoc/>
    ConfidenceInterval IIntervalQuantity.Interval(Confidence confidence) => Interval(confidence);

    /// <summary>A confidence interval of the area; it lies within 0 to 1.</summary>
    /// <param name="confidence">Level and side; two-sided 95 % unless said.</param>
    /// <param name="method">The method; logit unless said.</param>
    /// <returns>
    /// The interval. Where the DeLong variance is zero or undefined, the limits are those of <see cref="AreaMethod.NewcombeScore"/>,
    /// and the interval's method says so. Undefined when a group is empty.
    /// </returns>
    /// <exception cref="ArgumentOutOfRangeException"><paramref name="method"/> is not a value of its type.</exception>
    public ConfidenceInterval Interval(Confidence confidence = default, AreaMethod method = AreaMethod.Logit) =>
        AreaIntervals.Interval(this, confidence, method);

    /// <summary>The variance of the area by a stated method.</summary>
    /// <param name="method">The method.</param>
    /// <returns>The variance, 0 or more; undefined, with the reason, when a group is too small for the method.</returns>
    /// <exception cref="ArgumentOutOfRangeException"><paramref name="method"/> is not a value of its type.</exception>
    public Quantity VarianceBy(AreaVarianceMethod method) => AreaVariances.Of(this, method);

    /// <summary>For example "0.861438 (90 with, 51 without the condition)".</summary>
    /// <returns>The text, in the invariant culture.</returns>
    public override string ToString() =>
        $"{Display.Of(this)} ({Display.Of(WithCondition)} with, {Display.Of(WithoutCondition)} without the condition)";
}
