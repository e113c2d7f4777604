namespace DiagnosticAccuracy;

/// <summary>In which direction a test looks for a departure from its null hypothesis.</summary>
public enum Alternative
{
    /// <summary>Both directions.</summary>
    TwoSided = 0,

    /// <summary>Larger values than the null hypothesis says.</summary>
    Greater,

    /// <summary>Smaller values than the null hypothesis says.</summary>
    Less,
}
