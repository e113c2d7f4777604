using DiagnosticAccuracy.Proportions;

namespace DiagnosticAccuracy;

/// <summary>
/// So many of so many: a proportion that keeps its counts, with its confidence intervals.
/// </summary>
/// <remarks>
/// <c>default(Proportion)</c> is 0 of 0, which is undefined. Two proportions are equal when both counts are equal.
/// </remarks>
public readonly record struct Proportion : IIntervalQuantity
{
    private readonly UndefinedReason? _emptyReason;

    /// <summary>Initializes a new instance of the <see cref="Proportion"/> struct.</summary>
    /// <param name="successes">How many, 0 or more.</param>
    /// <param name="trials">Of how many, not fewer than <paramref name="successes"/>; 0 of 0 is allowed and undefined.</param>
    /// <exception cref="ArgumentOutOfRangeException"><paramref name="successes"/> is negative, or <paramref name="trials"/> is
    /// below <paramref name="successes"/>.</exception>
    public Proportion(long successes, long trials)
        : this(successes, trials, UndefinedReason.NoTrials)
    {
    }

    internal Proportion(long successes, long trials, UndefinedReason emptyReason)
    {
        Guard.Count(successes);
        if (trials < successes)
        {
            throw Guard.OutOfRange(nameof(trials), trials, $"not fewer than the successes, {Display.Of(successes)}");
        }

        Successes = successes;
        Trials = trials;
        _emptyReason = emptyReason;
    }

    /// <summary>Gets the numerator.</summary>
    public long Successes { get; }

    /// <summary>Gets the denominator.</summary>
    public long Trials { get; }

    /// <summary>Gets the trials that were no success.</summary>
    public long Failures => Trials - Successes;

    /// <inheritdoc/>
    public bool IsDefined => Trials > 0;

    /// <summary>Gets successes over trials, from 0 to 1; NaN exactly for 0 of 0.</summary>
    public double Value => Trials > 0 ? (double)Successes / Trials : double.NaN;

    /// <inheritdoc/>
    public UndefinedReason? WhyUndefined => Trials > 0 ? null : _emptyReason ?? UndefinedReason.NoTrials;

    /// <summary>Gets the proportion of the failures: 1 minus this one, with its counts.</summary>
    public Proportion Complement => new(Failures, Trials, _emptyReason ?? UndefinedReason.NoTrials);

    internal string Counts => Display.Of(Successes) + "/" + Display.Of(Trials);

    /// <inheritdoc/>
    ConfidenceInterval IIntervalQuantity.Interval(Confidence confidence) => Interval(confidence);

    /// <summary>A confidence interval; it lies within 0 to 1, and at every two-sided level from one half on contains the value.</summary>
    /// <param name="confidence">Level and side; two-sided 95 % unless said.</param>
    /// <param name="method">The method; Wilson's score interval unless said.</param>
    /// <returns>The interval; undefined, with the reason, for 0 of 0.</returns>
    /// <exception cref="ArgumentOutOfRangeException"><paramref name="method"/> is not a value of its type.</exception>
    /// <remarks>
    /// A one-sided interval uses the same limit at the whole error probability and has 0 or 1 on its other side. Sources: Wilson, J Am Stat Assoc
    /// 1927;22:209; Clopper and Pearson, Biometrika 1934;26:404; Agresti and Coull, Am Stat 1998;52:119; Brown, Cai and DasGupta, Stat
    /// Sci 2001;16:101; compared by Newcombe, Stat Med 1998;17:857.
    /// </remarks>
    public ConfidenceInterval Interval(Confidence confidence = default, ProportionMethod method = ProportionMethod.Wilson) => method switch
    {
        ProportionMethod.Wilson => WilsonScore.Interval(this, confidence),
        ProportionMethod.ClopperPearson => ClopperPearson.Interval(this, confidence),
        ProportionMethod.MidP => MidP.Interval(this, confidence),
        ProportionMethod.Jeffreys => Jeffreys.Interval(this, confidence),
        ProportionMethod.AgrestiCoull => AgrestiCoull.Interval(this, confidence),
        ProportionMethod.LikelihoodRatio => LikelihoodRatioInterval.Interval(this, confidence),
        ProportionMethod.WilsonContinuity => WilsonScore.WithContinuity(this, confidence),
        ProportionMethod.Wald => Wald.Interval(this, confidence),
        ProportionMethod.WaldContinuity => Wald.WithContinuity(this, confidence),
        _ => throw Guard.UnknownOption(method),
    };

    /// <summary>Whether both counts are equal.</summary>
    /// <param name="other">The other proportion.</param>
    /// <returns>True when they are.</returns>
    public bool Equals(Proportion other) => Successes == other.Successes && Trials == other.Trials;

    /// <inheritdoc/>
    public override int GetHashCode() => (Successes, Trials).GetHashCode();

    /// <summary>For example "81/263 = 0.307985", or "0/0 (undefined: ...)".</summary>
    /// <returns>The text, in the invariant culture.</returns>
    public override string ToString() => IsDefined
        ? $"{Counts} = {Display.Of(Value)}"
        : $"0/0 ({Display.Undefined(WhyUndefined!)})";
}
