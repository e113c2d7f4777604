namespace DiagnosticAccuracy;

/// <summary>On which sides a confidence interval is bounded by the data.</summary>
public enum IntervalSide
{
    /// <summary>Both limits come from the data; the error probability is split equally between them.</summary>
    TwoSided = 0,

    /// <summary>Only the lower limit comes from the data; the upper one is the end of the parameter space.</summary>
    LowerBound = 1,

    /// <summary>Only the upper limit comes from the data; the lower one is the end of the parameter space.</summary>
    UpperBound = 2,
}
