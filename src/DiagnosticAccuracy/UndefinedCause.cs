namespace DiagnosticAccuracy;

/// <summary>The kinds of gap in the data that leave a quantity undefined.</summary>
public enum UndefinedCause
{
    /// <summary>The value is the default of its type; no computation produced it.</summary>
    NotComputed = 0,

    /// <summary>There are no subjects (or trials) at all.</summary>
    NoSubjects,

    /// <summary>No subject has the condition.</summary>
    NoSubjectsWithCondition,

    /// <summary>No subject is without the condition.</summary>
    NoSubjectsWithoutCondition,

    /// <summary>No result is positive.</summary>
    NoPositiveResults,

    /// <summary>No result is negative.</summary>
    NoNegativeResults,

    /// <summary>The definition divides zero by zero.</summary>
    ZeroOverZero,

    /// <summary>There are subjects, but too few for this quantity (for example a variance from one subject).</summary>
    TooFewSubjects,

    /// <summary>The estimated variance is zero, so nothing can be standardised by it.</summary>
    ZeroVariance,

    /// <summary>The chosen method has no answer at this boundary; the explanation names one that has.</summary>
    MethodHasNoLimit,

    /// <summary>The chosen method has no such quantity, as an exact test has no statistic.</summary>
    NotPartOfMethod,
}
