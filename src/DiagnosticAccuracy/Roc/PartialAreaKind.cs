namespace DiagnosticAccuracy;

/// <summary>Definitions of a partial area, which give different numbers.</summary>
public enum PartialAreaKind
{
    /// <summary>Under the curve over a range of false-positive rates.</summary>
    OverFalsePositiveRate = 0,

    /// <summary>Between the curve and the right side over a range of sensitivities.</summary>
    OverSensitivity,

    /// <summary>Under the curve, above a least sensitivity and left of a greatest false-positive rate.</summary>
    Both,
}
