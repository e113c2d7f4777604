namespace DiagnosticAccuracy;

/// <summary>Tests of equal predictive values of two tests on the same subjects of a cohort.</summary>
public enum PredictiveValueTestMethod
{
    /// <summary>
    /// The weighted generalised score statistic (Kosinski 2013): the default. Where no subject is called by both tests it is the pooled test of two
    /// independent proportions.
    /// </summary>
    WeightedGeneralisedScore = 0,

    /// <summary>The generalised score statistic of the marginal regression of status on test, with independence as working correlation (Leisenring, Alonzo and Pepe 2000).</summary>
    GeneralisedScore,
}
