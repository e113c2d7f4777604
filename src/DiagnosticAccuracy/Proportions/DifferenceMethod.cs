namespace DiagnosticAccuracy;

/// <summary>Methods for the confidence interval of a difference of two independent proportions.</summary>
public enum DifferenceMethod
{
    /// <summary>The hybrid of two Wilson score intervals, without continuity correction (Newcombe 1998, method 10): the default.</summary>
    HybridScore = 0,

    /// <summary>
    /// All differences that the score test does not reject, with the variance multiplied by N/(N - 1) (Miettinen and Nurminen 1985).
    /// </summary>
    MiettinenNurminen,

    /// <summary>
    /// All differences that the score test does not reject, without that factor (Mee 1984): agrees with the test of Farrington and
    /// Manning (1990), see <see cref="DifferenceMargin"/>.
    /// </summary>
    Mee,

    /// <summary>The hybrid of two Wilson score intervals with continuity correction (Newcombe 1998, method 11).</summary>
    HybridScoreContinuity,

    /// <summary>The Wald formula after one success and one failure were added to each group (Agresti and Caffo 2000), cut at -1 and 1.</summary>
    AgrestiCaffo,

    /// <summary>Beal's method with the mean of both proportions as nuisance parameter, after Haldane (Beal 1987; Newcombe 1998, method 3), cut at -1 and 1.</summary>
    Haldane,

    /// <summary>
    /// Beal's method with the nuisance parameter from counts to which one half was added, after Jeffreys and Perks (Beal 1987; Newcombe
    /// 1998, method 4), cut at -1 and 1.
    /// </summary>
    JeffreysPerks,

    /// <summary>
    /// The difference plus and minus a multiple of its estimated standard error, cut at -1 and 1. Only on request: it has no width
    /// where both proportions are 0 or 1, and covers too little in small groups.
    /// </summary>
    Wald,

    /// <summary>The Wald interval widened by (1/n1 + 1/n2)/2 on both sides, cut at -1 and 1. Only on request.</summary>
    WaldContinuity,
}
