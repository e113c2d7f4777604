namespace DiagnosticAccuracy;

/// <summary>
/// Predictive values counted in a cohort: among subjects who were enrolled without regard to their status.
/// </summary>
/// <remarks>
/// In a case-control or enriched study these proportions reflect how many subjects of each group were enrolled and predict nothing.
/// <c>default(CohortPredictiveValues)</c> is undefined.
/// </remarks>
/// <param name="Positive">The share with the condition among the positive results; undefined when no result is positive.</param>
/// <param name="Negative">The share without the condition among the negative results; undefined when no result is negative.</param>
public readonly record struct CohortPredictiveValues(Proportion Positive, Proportion Negative)
{
    /// <summary>Both with their counts.</summary>
    /// <returns>The text, in the invariant culture.</returns>
    public override string ToString() => $"positive {Positive}, negative {Negative} (in a cohort)";
}
