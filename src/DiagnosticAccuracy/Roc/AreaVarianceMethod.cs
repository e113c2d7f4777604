namespace DiagnosticAccuracy;

/// <summary>Methods for the variance of the area under an empirical curve.</summary>
public enum AreaVarianceMethod
{
    /// <summary>From the placements (DeLong, DeLong and Clarke-Pearson, Biometrics 1988;44:837): the default everywhere.</summary>
    DeLong = 0,

    /// <summary>
    /// The unbiased estimate of the variance of the Mann-Whitney statistic (Bamber, J Math Psychol 1975;12:387): the squared area less an unbiased
    /// estimate of its square. In very small samples it can come out below zero, and is undefined then.
    /// </summary>
    Bamber,

    /// <summary>The formula of Hanley and McNeil (Radiology 1982;143:29) with Q1 and Q2 estimated from the data.</summary>
    HanleyMcNeil,

    /// <summary>
    /// The formula of Hanley and McNeil with Q1 = A / (2 - A) and Q2 = 2 A^2 / (1 + A), as under exponential scores: it needs the area and the
    /// group sizes only.
    /// </summary>
    HanleyMcNeilExponential,
}
