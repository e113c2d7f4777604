namespace DiagnosticAccuracy;

/// <summary>Methods for the confidence interval of the Matthews correlation coefficient.</summary>
public enum MatthewsMethod
{
    /// <summary>Normal on Fisher's z scale, with the delta-method variance: the default. It stays within -1 to 1.</summary>
    FisherZ = 0,

    /// <summary>Normal on the scale of the coefficient, with the delta-method variance, cut at -1 and 1.</summary>
    Delta,
}
