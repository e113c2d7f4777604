namespace DiagnosticAccuracy;

/// <summary>Methods for the confidence interval of an odds ratio.</summary>
public enum OddsRatioMethod
{
    /// <summary>
    /// Normal on the logarithm of the odds ratio (Woolf 1955): the default. With an empty cell it has no limit, and the exact
    /// conditional interval supplies both; the result says so.
    /// </summary>
    Log = 0,

    /// <summary>
    /// The exact interval from the tails of the distribution of the first cell given the margins (Cornfield 1956): never covers
    /// less than its level.
    /// </summary>
    ExactConditional,

    /// <summary>The same with half of the probability of the observed table in each tail (mid-P): shorter, and near its level on average.</summary>
    MidPConditional,

    /// <summary>
    /// The log method on counts to each of which one half was added (Haldane 1956; Anscombe 1956), centred at the odds ratio of those
    /// counts. Only on request; it has limits with empty cells, but they come from the added halves.
    /// </summary>
    LogAddHalf,
}
