namespace DiagnosticAccuracy;

/// <summary>How the least coverage is reached at the proportion where it lies.</summary>
public enum CoverageApproach
{
    /// <summary>It is the coverage at the proportion itself.</summary>
    AtThePoint = 0,

    /// <summary>It is the limit for true proportions that rise to this one; the coverage at the proportion itself is higher.</summary>
    FromBelow,

    /// <summary>It is the limit for true proportions that fall to this one; the coverage at the proportion itself is higher.</summary>
    FromAbove,
}
