namespace DiagnosticAccuracy;

/// <summary>Methods for the confidence interval of one proportion.</summary>
public enum ProportionMethod
{
    /// <summary>Wilson's score interval, without continuity correction (Wilson 1927): the default.</summary>
    Wilson = 0,

    /// <summary>The exact interval from the binomial tails (Clopper and Pearson 1934): never covers less than its level.</summary>
    ClopperPearson,
}
