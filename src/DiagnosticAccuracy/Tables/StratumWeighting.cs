namespace DiagnosticAccuracy;

/// <summary>How the proportions of several strata (sites) are weighted into one.</summary>
public enum StratumWeighting
{
    /// <summary>By the number of subjects: the proportion of all subjects together. The default.</summary>
    BySize = 0,

    /// <summary>Each stratum alike.</summary>
    Equal,

    /// <summary>By the inverse of the estimated variance, in which half a success and half a failure are added so that no stratum has variance zero.</summary>
    InverseVariance,
}
