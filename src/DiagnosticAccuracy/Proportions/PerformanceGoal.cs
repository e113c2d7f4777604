using DiagnosticAccuracy.Numerics;

namespace DiagnosticAccuracy;

/// <summary>
/// A performance goal: a value that a proportion has to be shown to lie above (or below), stated first and then tested exactly.
/// </summary>
/// <remarks><c>default(PerformanceGoal)</c> is "above 0".</remarks>
public readonly record struct PerformanceGoal
{
    private PerformanceGoal(double value, bool isUpper)
    {
        Value = value;
        IsUpper = isUpper;
    }

    /// <summary>Gets the goal, from 0 to 1.</summary>
    public double Value { get; }

    /// <summary>Gets a value indicating whether the proportion has to lie below the goal; false when it has to lie above.</summary>
    public bool IsUpper { get; }

    /// <summary>The proportion has to be shown to lie above the goal, as a sensitivity.</summary>
    /// <param name="goal">The goal, above 0 and below 1.</param>
    /// <returns>The goal.</returns>
    /// <exception cref="ArgumentOutOfRangeException"><paramref name="goal"/> is NaN, or not above 0 and below 1.</exception>
    public static PerformanceGoal Above(double goal)
    {
        Guard.InsideUnitInterval(goal);
        return new PerformanceGoal(goal, isUpper: false);
    }

    /// <summary>The proportion has to be shown to lie below the goal, as a share of invalid results.</summary>
    /// <param name="goal">The goal, above 0 and below 1.</param>
    /// <returns>The goal.</returns>
    /// <exception cref="ArgumentOutOfRangeException"><paramref name="goal"/> is NaN, or not above 0 and below 1.</exception>
    public static PerformanceGoal Below(double goal)
    {
        Guard.InsideUnitInterval(goal);
        return new PerformanceGoal(goal, isUpper: true);
    }

    /// <summary>The exact one-sided binomial test of the goal, with the Clopper-Pearson bound that agrees with it.</summary>
    /// <param name="proportion">The observed proportion.</param>
    /// <param name="significance">The one-sided significance level, above 0 and below 1; 0.025 unless said.</param>
    /// <returns>The p-value, the bound, and whether the goal is met; undefined and not met, with the reason, for 0 of 0.</returns>
    /// <exception cref="ArgumentOutOfRangeException"><paramref name="significance"/> is NaN, or not above 0 and below 1.</exception>
    /// <remarks>
    /// The p-value is the binomial tail under the goal itself. It is at most the significance exactly when the one-sided bound of Clopper and Pearson
    /// (Biometrika 1934;26:404) at the complementary level is not on the wrong side of the goal.
    /// </remarks>
    public GoalResult Test(Proportion proportion, double significance = 0.025)
    {
        Guard.InsideUnitInterval(significance);
        Confidence confidence = Confidence.FromErrorProbability(significance, IsUpper ? IntervalSide.UpperBound : IntervalSide.LowerBound);
        ConfidenceInterval bound = proportion.Interval(confidence, ProportionMethod.ClopperPearson);
        Quantity pValue = proportion.IsDefined ? Quantity.Of(Tail(proportion)) : Quantity.Undefined(proportion.WhyUndefined!);
        return new GoalResult(this, proportion, significance, pValue, bound);
    }

    /// <summary>
    /// The count at which the goal begins to be met: the least number of successes for a goal to lie above, the greatest for one to lie
    /// below.
    /// </summary>
    /// <param name="trials">The number of trials, 1 or more.</param>
    /// <param name="significance">The one-sided significance level, above 0 and below 1; 0.025 unless said.</param>
    /// <returns>The count; null when no count of so few trials meets the goal.</returns>
    /// <exception cref="ArgumentOutOfRangeException">An argument is outside of its range.</exception>
    public long? CriticalCount(long trials, double significance = 0.025)
    {
        Guard.AtLeast(trials, 1);
        Guard.InsideUnitInterval(significance);

        // Counted from the best result: how many trials may go the wrong way.
        long allowed = -1;
        for (long tooMany = trials + 1; tooMany - allowed > 1;)
        {
            long middle = allowed + ((tooMany - allowed) / 2);
            if (Tail(new Proportion(IsUpper ? middle : trials - middle, trials)) <= significance)
            {
                allowed = middle;
            }
            else
            {
                tooMany = middle;
            }
        }

        return allowed < 0 ? null : IsUpper ? allowed : trials - allowed;
    }

    /// <summary>For example "above 0.9".</summary>
    /// <returns>The text, in the invariant culture.</returns>
    public override string ToString() => (IsUpper ? "below " : "above ") + Display.Of(Value);

    // The probability under the goal of a result as far on the right side as the observed one.
    private double Tail(Proportion proportion)
    {
        double x = proportion.Successes;
        double misses = proportion.Failures;
        if (IsUpper)
        {
            return misses == 0 ? 1 : IncompleteBeta.Upper(x + 1, misses, Value);
        }

        return x == 0 ? 1 : IncompleteBeta.Lower(x, misses + 1, Value);
    }
}
