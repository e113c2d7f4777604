namespace DiagnosticAccuracy;

/// <summary>Methods for the confidence interval of a ratio of two independent proportions.</summary>
public enum RatioMethod
{
    /// <summary>
    /// Normal on the logarithm of the ratio (Katz et al. 1978; for likelihood ratios Simel, Samsa and Matchar 1991): the default. With an
    /// empty cell it has no limit, and Koopman's score interval supplies both; the result says so.
    /// </summary>
    Log = 0,

    /// <summary>All ratios that the score test does not reject (Koopman 1984; Gart and Nam 1988, without their skewness correction).</summary>
    Koopman,
}
