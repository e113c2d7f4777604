namespace DiagnosticAccuracy;

/// <summary>What accuracy figures at a cutoff were judged on.</summary>
public enum FigureBasis
{
    /// <summary>
    /// The cutoff was chosen and is judged on the same data: the figures are optimistic, and an interval that takes the cutoff as
    /// given is too short (Leeflang et al., Clin Chem 2008;54:729; Ewald, J Clin Epidemiol 2006;59:798).
    /// </summary>
    ChosenOnTheSameData = 0,
}
