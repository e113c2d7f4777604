namespace DiagnosticAccuracy;

/// <summary>Methods for confidence intervals that hold for several differences together.</summary>
public enum SimultaneousMethod
{
    /// <summary>Each interval at an equal share of the error probability (Bonferroni): the default; for a few differences the shorter one.</summary>
    Bonferroni = 0,

    /// <summary>
    /// From the chi-squared quantile with the rank of the covariance of the differences (Scheffe): holds for every contrast of the areas, also one
    /// chosen after seeing them. One-sided bounds are the limits of the two-sided intervals, and conservative.
    /// </summary>
    Scheffe,
}
