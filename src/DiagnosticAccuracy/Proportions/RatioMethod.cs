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

    /// <summary>
    /// All ratios that the score test does not reject, with the variance multiplied by N/(N - 1) (Miettinen and Nurminen 1985).
    /// </summary>
    MiettinenNurminen,

    /// <summary>
    /// The log method with one half added to both successes and both numbers of trials (Walter 1975; Pettigrew, Gart and Thomas 1986),
    /// centred at the ratio of those. Only on request; it has limits with empty cells, but they come from the added halves.
    /// </summary>
    LogAddHalf,
}
