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
    /// <summary>Gets the share without the condition among the positive results, 1 minus the positive predictive value.</summary>
    public Proportion FalseDiscoveryRate => Positive.Complement;

    /// <summary>Gets the share with the condition among the negative results, 1 minus the negative predictive value.</summary>
    public Proportion FalseOmissionRate => Negative.Complement;

    /// <summary>Both with their counts.</summary>
    /// <returns>The text, in the invariant culture.</returns>
    public override string ToString() => $"positive {Positive}, negative {Negative} (in a cohort)";
}
