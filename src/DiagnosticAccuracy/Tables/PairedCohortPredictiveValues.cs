namespace DiagnosticAccuracy;

/// <summary>
/// The predictive values of two tests on the same subjects of a cohort: subjects who were enrolled without regard to their status.
/// </summary>
/// <remarks>
/// In a case-control or enriched study the predictive values reflect how many subjects of each group were enrolled, and their comparison holds for
/// that mixture alone. <c>default(PairedCohortPredictiveValues)</c> is undefined.
/// </remarks>
/// <param name="Positive">The positive predictive values.</param>
/// <param name="Negative">The negative predictive values.</param>
public readonly record struct PairedCohortPredictiveValues(PairedPredictiveValue Positive, PairedPredictiveValue Negative)
{
    /// <summary>Both with their counts.</summary>
    /// <returns>The text, in the invariant culture.</returns>
    public override string ToString() => $"positive {Positive}, negative {Negative} (in a cohort)";
}
