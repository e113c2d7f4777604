namespace DiagnosticAccuracy;

/// <summary>Methods for the confidence interval of a predictive value at a known prevalence.</summary>
public enum PredictiveValueMethod
{
    /// <summary>
    /// Normal on the log odds (Mercaldo, Lau and Zhou, Stat Med 2007;26:2170): the default. It is the log interval of the likelihood ratio
    /// carried to the predictive value. Where a count that it needs is zero its limits are those of <see cref="LikelihoodRatioScore"/>,
    /// and the interval's method says so.
    /// </summary>
    Logit = 0,

    /// <summary>
    /// The adjusted logit interval of the same authors: sensitivity and specificity are replaced by (x + z^2 / 2) / (n + z^2). It has limits at
    /// every table, around the adjusted value; so it need not contain a predictive value of 0 or 1.
    /// </summary>
    AdjustedLogit,

    /// <summary>The score interval of the likelihood ratio (Koopman, Biometrics 1984;40:513) carried to the predictive value.</summary>
    LikelihoodRatioScore,
}
