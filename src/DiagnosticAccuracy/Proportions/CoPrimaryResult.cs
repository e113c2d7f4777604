namespace DiagnosticAccuracy;

/// <summary>The exact tests of two performance goals that must both be met.</summary>
/// <remarks><c>default(CoPrimaryResult)</c> is undefined and not met.</remarks>
public readonly record struct CoPrimaryResult
{
    internal CoPrimaryResult(GoalResult first, GoalResult second)
    {
        First = first;
        Second = second;
    }

    /// <summary>Gets the result of the first goal.</summary>
    public GoalResult First { get; }

    /// <summary>Gets the result of the second goal.</summary>
    public GoalResult Second { get; }

    /// <summary>Gets the p-value of "not both goals hold": the larger of the two. Undefined when one of them is.</summary>
    public Quantity PValue
    {
        get
        {
            UndefinedReason? reason = First.PValue.WhyUndefined ?? Second.PValue.WhyUndefined;
            return reason is null ? Quantity.Of(Math.Max(First.PValue.Value, Second.PValue.Value)) : Quantity.Undefined(reason);
        }
    }

    /// <summary>Gets a value indicating whether both goals are met.</summary>
    public bool IsMet => First.IsMet && Second.IsMet;

    /// <summary>Both results, and whether both goals are met.</summary>
    /// <returns>The text, in the invariant culture.</returns>
    public override string ToString() => $"{First}; {Second}; {(IsMet ? "both met" : "not both met")}";
}
