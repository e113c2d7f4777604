namespace DiagnosticAccuracy;

/// <summary>What is held fixed on a ROC curve, and what is read off it.</summary>
public enum FixedPointKind
{
    /// <summary>The sensitivity at a stated specificity.</summary>
    SensitivityAtSpecificity = 0,

    /// <summary>The specificity at a stated sensitivity.</summary>
    SpecificityAtSensitivity,
}
