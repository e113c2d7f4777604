namespace DiagnosticAccuracy;

/// <summary>Methods for the test that scores do not tell the groups apart (an area of one half).</summary>
public enum ChanceTestMethod
{
    /// <summary>The normal approximation of the rank sum with its variance corrected for ties: the default.</summary>
    Normal = 0,

    /// <summary>The same with a continuity correction of half a pair.</summary>
    NormalWithContinuity,

    /// <summary>
    /// The exact distribution over all ways to deal the observed scores, ties included, to the groups (Streitberg and Roehmel, Stat Softw Newsl
    /// 1986;12:10). The work grows with the fourth power of the number of subjects; beyond some 300 it is undefined, with that reason.
    /// </summary>
    Exact,
}
