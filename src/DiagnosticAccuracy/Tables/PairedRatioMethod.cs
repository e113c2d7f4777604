namespace DiagnosticAccuracy;

/// <summary>Methods for the confidence interval of a ratio of two proportions of the same subjects.</summary>
public enum PairedRatioMethod
{
    /// <summary>
    /// All ratios that the score test does not reject (Nam and Blackwelder 2002; Tang, Tang and Chan 2003): the default. It is the interval that
    /// agrees with McNemar's asymptotic test at 1 and with the non-inferiority test at a margin, and it is defined for empty cells.
    /// </summary>
    NamBlackwelderScore = 0,

    /// <summary>The hybrid of two Wilson score intervals whose level is adjusted to the correlation (Bonett and Price 2006).</summary>
    BonettPriceHybrid,

    /// <summary>Normal on the logarithm, with the delta-method standard error sqrt((b + c) / (x1 x2)).</summary>
    WaldLog,
}
