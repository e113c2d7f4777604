namespace DiagnosticAccuracy;

/// <summary>The least coverage of an interval method over a range of true proportions, and where it lies.</summary>
/// <remarks><c>default(CoverageMinimum)</c> is a coverage of 0 at the proportion 0.</remarks>
/// <param name="Coverage">The least coverage (an infimum), from 0 to 1.</param>
/// <param name="Proportion">The true proportion where it lies.</param>
/// <param name="Approach">Whether it is the coverage at that proportion, or that of proportions just below or just above it.</param>
public readonly record struct CoverageMinimum(double Coverage, double Proportion, CoverageApproach Approach)
{
    internal CoverageMinimum OrLess(double coverage, double proportion, CoverageApproach approach) =>
        coverage < Coverage ? new CoverageMinimum(coverage, proportion, approach) : this;

    /// <summary>For example "0.8366 just above 0.0089".</summary>
    /// <returns>The text, in the invariant culture.</returns>
    public override string ToString()
    {
        string place = Approach switch
        {
            CoverageApproach.FromBelow => "just below",
            CoverageApproach.FromAbove => "just above",
            _ => "at",
        };
        return $"{Display.Of(Coverage)} {place} {Display.Of(Proportion)}";
    }
}
