namespace DiagnosticAccuracy;

/// <summary>Forms of McNemar's test.</summary>
public enum McNemarMethod
{
    /// <summary>
    /// (b - c)^2 / (b + c) as chi-squared with one degree of freedom, b and c the discordant counts: the default. It rejects at the level alpha exactly
    /// when Tango's interval at 1 - alpha leaves out 0. Its size may exceed the level by little (Fagerland, Lydersen and Laake 2013).
    /// </summary>
    Asymptotic = 0,

    /// <summary>(|b - c| - 1)^2 / (b + c), 0 where b = c (Edwards 1948). Close to the exact form, and as conservative.</summary>
    ContinuityCorrected,

    /// <summary>Twice the smaller binomial tail of b of b + c at one half, at most 1. Its size never exceeds the level, and lies well below it in small samples.</summary>
    ExactConditional,

    /// <summary>
    /// The exact form with half of the probability of the observed split: twice the smaller tail less the probability of b, and 1 less half of it
    /// where b = c (Fagerland, Lydersen and Laake 2013).
    /// </summary>
    MidP,
}
