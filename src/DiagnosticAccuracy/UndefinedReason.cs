namespace DiagnosticAccuracy;

/// <summary>
/// Why a quantity is not defined by the data: a cause that a program can act on and a sentence that a person can read.
/// </summary>
/// <remarks>
/// This is the one way in which the library says "the data do not define this". Well-formed data never cause an
/// exception, an invented zero, or a NaN without a word beside it.
/// </remarks>
/// <param name="Cause">The kind of gap in the data.</param>
/// <param name="Explanation">One sentence, in English, that says what is missing, for example
/// "no subject has the condition".</param>
public sealed record UndefinedReason(UndefinedCause Cause, string Explanation)
{
    internal static readonly UndefinedReason NotComputed =
        new(UndefinedCause.NotComputed, "this is an empty value that no computation produced");

    internal static readonly UndefinedReason NoSubjects =
        new(UndefinedCause.NoSubjects, "there are no subjects");

    internal static readonly UndefinedReason NoTrials =
        new(UndefinedCause.NoSubjects, "there are no trials (0 of 0)");

    internal static readonly UndefinedReason NoSubjectsWithCondition =
        new(UndefinedCause.NoSubjectsWithCondition, "no subject has the condition");

    internal static readonly UndefinedReason NoSubjectsWithoutCondition =
        new(UndefinedCause.NoSubjectsWithoutCondition, "no subject is without the condition");

    internal static readonly UndefinedReason NoPositiveResults =
        new(UndefinedCause.NoPositiveResults, "no result is positive");

    internal static readonly UndefinedReason NoNegativeResults =
        new(UndefinedCause.NoNegativeResults, "no result is negative");

    /// <summary>Returns the explanation.</summary>
    /// <returns><see cref="Explanation"/>.</returns>
    public override string ToString() => Explanation;
}
