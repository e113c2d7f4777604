namespace DiagnosticAccuracy;

/// <summary>Methods for the confidence interval of one proportion.</summary>
/// <remarks><see cref="IntervalCoverage"/> gives the exact coverage of each at any number of trials and any true proportion.</remarks>
public enum ProportionMethod
{
    /// <summary>Wilson's score interval, without continuity correction (Wilson 1927): the default.</summary>
    Wilson = 0,

    /// <summary>The exact interval from the binomial tails (Clopper and Pearson 1934): never covers less than its level.</summary>
    ClopperPearson,

    /// <summary>
    /// The interval from the binomial tails with half of the probability of the observed count in each (Lancaster 1961; Newcombe 1998):
    /// shorter than the exact one, covers its level on average and not always.
    /// </summary>
    MidP,

    /// <summary>
    /// The equal-tailed quantiles of the beta distribution with shapes x + 1/2 and n - x + 1/2 (Brown, Cai and DasGupta 2001). End rule: at
    /// 0 of n the lower limit is 0, at n of n the upper limit is 1, and the other limit is left alone.
    /// </summary>
    Jeffreys,

    /// <summary>
    /// The Wald formula after z^2/2 was added to successes and to failures (Agresti and Coull 1998), cut at 0 and 1, which it
    /// would leave near the ends.
    /// </summary>
    AgrestiCoull,

    /// <summary>All proportions whose likelihood ratio against the estimate is not significant (Newcombe 1998, the likelihood-based interval).</summary>
    LikelihoodRatio,

    /// <summary>Wilson's score interval with a continuity correction of half a count (Newcombe 1998, method 4): more than its level nearly always.</summary>
    WilsonContinuity,

    /// <summary>
    /// The estimate plus and minus a multiple of its estimated standard error, cut at 0 and 1. Only on request: at a nominal 95 % its exact
    /// coverage is 0.639 for 20 trials at 0.95 and 0.633 for 100 trials at 0.99, and at 0 of n and n of n it has no width.
    /// </summary>
    Wald,

    /// <summary>
    /// The Wald interval widened by 1/(2n) on both sides, cut at 0 and 1. Only on request: at a nominal 95 % it covers
    /// 0.641 for 20 trials at 0.95.
    /// </summary>
    WaldContinuity,
}
