namespace DiagnosticAccuracy;

/// <summary>One distinct score, and how many subjects of each group have it.</summary>
/// <param name="Score">The score; infinities are ordinary scores (below or above the measuring range).</param>
/// <param name="WithCondition">How many subjects with the condition have this score.</param>
/// <param name="WithoutCondition">How many subjects without the condition have this score.</param>
public readonly record struct ScoreLevel(double Score, long WithCondition, long WithoutCondition)
{
    /// <summary>Gets the number of subjects of both groups with this score.</summary>
    public long Total => WithCondition + WithoutCondition;
}
