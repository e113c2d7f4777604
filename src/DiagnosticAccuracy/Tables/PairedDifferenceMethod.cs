namespace DiagnosticAccuracy;

/// <summary>Methods for the confidence interval of a difference of two proportions of the same subjects.</summary>
public enum PairedDifferenceMethod
{
    /// <summary>
    /// All differences that the score test does not reject (Tango 1998): the default. It is the interval that agrees with McNemar's asymptotic
    /// test at 0 and with the non-inferiority test at a margin, and it has width where the tests agree on every subject.
    /// </summary>
    TangoScore = 0,

    /// <summary>The hybrid of two Wilson score intervals with the correlation as estimated (Newcombe 1998, method 8). It may have no width.</summary>
    NewcombeHybrid,

    /// <summary>
    /// The hybrid of two Wilson score intervals with a correlation whose numerator is brought nearer to 0 by half the number of subjects when
    /// it is positive (Newcombe 1998, method 10).
    /// </summary>
    NewcombeHybridPhiCorrected,

    /// <summary>The Wald formula after one subject was added to each discordant cell (Bonett and Price 2012), cut at -1 and 1.</summary>
    BonettPrice,

    /// <summary>The Wald formula after one half was added to each of the four cells (Agresti and Min 2005), cut at -1 and 1.</summary>
    AgrestiMin,

    /// <summary>
    /// The difference plus and minus a multiple of its estimated standard error, cut at -1 and 1. Only on request: it has no width
    /// where the tests agree on every subject, and covers too little in small samples.
    /// </summary>
    Wald,
}
