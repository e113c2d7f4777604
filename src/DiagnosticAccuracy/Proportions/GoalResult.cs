namespace DiagnosticAccuracy;

/// <summary>The exact test of a proportion against a performance goal.</summary>
/// <remarks><c>default(GoalResult)</c> is undefined and not met.</remarks>
public readonly record struct GoalResult
{
    internal GoalResult(PerformanceGoal goal, Proportion proportion, double significance, Quantity pValue, ConfidenceInterval bound)
    {
        Goal = goal;
        Proportion = proportion;
        Significance = significance;
        PValue = pValue;
        Bound = bound;
    }

    /// <summary>Gets the goal that was stated.</summary>
    public PerformanceGoal Goal { get; }

    /// <summary>Gets the observed proportion.</summary>
    public Proportion Proportion { get; }

    /// <summary>Gets the one-sided significance level.</summary>
    public double Significance { get; }

    /// <summary>Gets the one-sided exact p-value, from 0 to 1.</summary>
    public Quantity PValue { get; }

    /// <summary>Gets the one-sided Clopper-Pearson bound at one minus the significance, which agrees with the p-value.</summary>
    public ConfidenceInterval Bound { get; }

    /// <summary>Gets a value indicating whether the goal is met: the p-value is at most the significance. False when it is undefined.</summary>
    public bool IsMet => PValue.IsDefined && PValue.Value <= Significance;

    /// <summary>For example "220/231 = 0.952381 above 0.9: p = 0.0031, met".</summary>
    /// <returns>The text, in the invariant culture.</returns>
    public override string ToString() => $"{Proportion} {Goal}: p = {PValue}, {(IsMet ? "met" : "not met")}";
}
