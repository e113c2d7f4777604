namespace DiagnosticAccuracy;

/// <summary>Methods for the confidence interval of a difference of two independent proportions.</summary>
public enum DifferenceMethod
{
    /// <summary>The hybrid of two Wilson score intervals, without continuity correction (Newcombe 1998, method 10): the default.</summary>
    HybridScore = 0,
}
