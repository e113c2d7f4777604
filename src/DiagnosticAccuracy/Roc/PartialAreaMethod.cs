namespace DiagnosticAccuracy;

/// <summary>Methods for the confidence interval of a partial area.</summary>
public enum PartialAreaMethod
{
    /// <summary>Normal on the log odds of the share of the largest possible area: the default. It stays within 0 and the largest possible area.</summary>
    Logit = 0,

    /// <summary>The area plus and minus a multiple of its standard error, cut at 0 and the largest possible area.</summary>
    Wald,
}
