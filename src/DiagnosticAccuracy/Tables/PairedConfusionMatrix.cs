using DiagnosticAccuracy.Tables;

namespace DiagnosticAccuracy;

/// <summary>
/// Two binary tests on the same subjects against a reference standard: one table of both tests for those with the condition, one for those
/// without.
/// </summary>
/// <remarks><c>default(PairedConfusionMatrix)</c> has eight empty cells; what it does not define says so.</remarks>
public readonly record struct PairedConfusionMatrix
{
    /// <summary>Initializes a new instance of the <see cref="PairedConfusionMatrix"/> struct.</summary>
    /// <param name="withCondition">Both tests on the subjects with the condition.</param>
    /// <param name="withoutCondition">Both tests on the subjects without the condition.</param>
    /// <exception cref="OverflowException">The cells add up to more than <see cref="long.MaxValue"/>.</exception>
    public PairedConfusionMatrix(PairedTable withCondition, PairedTable withoutCondition)
    {
        WithCondition = withCondition;
        WithoutCondition = withoutCondition;
        _ = checked(withCondition.Total + withoutCondition.Total);
    }

    /// <summary>Gets both tests on the subjects with the condition. Its McNemar test compares the sensitivities.</summary>
    public PairedTable WithCondition { get; }

    /// <summary>Gets both tests on the subjects without the condition. Its McNemar test compares the specificities.</summary>
    public PairedTable WithoutCondition { get; }

    /// <summary>Gets the number of subjects.</summary>
    public long Total => WithCondition.Total + WithoutCondition.Total;

    /// <summary>Gets the first test against the reference standard.</summary>
    public ConfusionMatrix First => Of(WithCondition, WithoutCondition);

    /// <summary>Gets the second test against the reference standard.</summary>
    public ConfusionMatrix Second => Of(WithCondition.Swapped, WithoutCondition.Swapped);

    /// <summary>Gets the same with the tests in the other order.</summary>
    public PairedConfusionMatrix Swapped => new(WithCondition.Swapped, WithoutCondition.Swapped);

    /// <summary>
    /// Gets the sensitivity of the first test minus that of the second. It does not depend on the prevalence. Undefined when nobody has the
    /// condition.
    /// </summary>
    public PairedDifference SensitivityDifference => new(WithCondition, UndefinedReason.NoSubjectsWithCondition);

    /// <summary>
    /// Gets the specificity of the first test minus that of the second. It does not depend on the prevalence. Undefined when everybody has the
    /// condition.
    /// </summary>
    public PairedDifference SpecificityDifference => new(WithoutCondition.Complement, UndefinedReason.NoSubjectsWithoutCondition);

    /// <summary>
    /// Gets the sensitivity of the first test over that of the second. It does not depend on the prevalence. Undefined when nobody has the condition
    /// or no result of either test is positive among those who have it.
    /// </summary>
    public PairedRatio RelativeSensitivity => new(WithCondition, UndefinedReason.NoSubjectsWithCondition);

    /// <summary>
    /// Gets the false-positive rate of the first test over that of the second; less is better. It does not depend on the prevalence. Undefined
    /// when everybody has the condition or there is no false positive of either test.
    /// </summary>
    public PairedRatio RelativeFalsePositiveRate => new(WithoutCondition, UndefinedReason.NoSubjectsWithoutCondition);

    /// <summary>
    /// Gets the predictive values of both tests straight from the table, compared. They hold only for a cohort: subjects enrolled without regard to
    /// their status, at the prevalence of this sample. In a case-control or enriched study they are the product of the enrolment.
    /// </summary>
    public PairedCohortPredictiveValues CohortPredictiveValues => new(
        new PairedPredictiveValue(WithCondition, WithoutCondition, UndefinedReason.NoPositiveResults),
        new PairedPredictiveValue(WithoutCondition.Complement, WithCondition.Complement, UndefinedReason.NoNegativeResults));

    /// <summary>The tables of two separate groups of subjects together, cell by cell.</summary>
    /// <param name="left">One.</param>
    /// <param name="right">The one of other subjects.</param>
    /// <returns>The sum.</returns>
    /// <exception cref="OverflowException">The cells add up to more than <see cref="long.MaxValue"/>.</exception>
    public static PairedConfusionMatrix operator +(PairedConfusionMatrix left, PairedConfusionMatrix right) => left.Add(right);

    /// <summary>The tables of results, one element a subject in each argument.</summary>
    /// <param name="first">Whether the first test was positive.</param>
    /// <param name="second">Whether the second test was positive, in the same order of subjects.</param>
    /// <param name="hasCondition">Whether the subject has the condition by the reference standard.</param>
    /// <returns>The tables; empty for no subjects.</returns>
    /// <exception cref="ArgumentException">The lengths differ.</exception>
    public static PairedConfusionMatrix Create(ReadOnlySpan<bool> first, ReadOnlySpan<bool> second, ReadOnlySpan<bool> hasCondition)
    {
        Guard.SameLength(second.Length, first.Length, nameof(second), nameof(first));
        Guard.SameLength(hasCondition.Length, first.Length, nameof(hasCondition), nameof(first));
        PairedCounter with = default;
        PairedCounter without = default;
        for (int i = 0; i < first.Length; i++)
        {
            if (hasCondition[i])
            {
                with.Count(first[i], second[i]);
            }
            else
            {
                without.Count(first[i], second[i]);
            }
        }

        return new PairedConfusionMatrix(with.ToTable(), without.ToTable());
    }

    /// <summary>The tables of any sequence of rows.</summary>
    /// <typeparam name="T">The type of a row.</typeparam>
    /// <param name="rows">The rows, one a subject; they are read once.</param>
    /// <param name="first">Gives whether the first test was positive.</param>
    /// <param name="second">Gives whether the second test was positive.</param>
    /// <param name="hasCondition">Gives whether the subject has the condition by the reference standard.</param>
    /// <returns>The tables; empty for no rows.</returns>
    /// <exception cref="ArgumentNullException">An argument is null.</exception>
    /// <remarks>
    /// A subject without a valid result of both tests and of the reference standard has no place here: leave it out, or decide how it counts,
    /// and report the number.
    /// </remarks>
    public static PairedConfusionMatrix FromRows<T>(
        IEnumerable<T> rows, Func<T, bool> first, Func<T, bool> second, Func<T, bool> hasCondition)
    {
        Guard.NotNull(rows);
        Guard.NotNull(first);
        Guard.NotNull(second);
        Guard.NotNull(hasCondition);
        PairedCounter with = default;
        PairedCounter without = default;
        foreach (T row in rows)
        {
            if (hasCondition(row))
            {
                with.Count(first(row), second(row));
            }
            else
            {
                without.Count(first(row), second(row));
            }
        }

        return new PairedConfusionMatrix(with.ToTable(), without.ToTable());
    }

    /// <summary>The tables of these subjects and others together, cell by cell.</summary>
    /// <param name="other">The tables of other subjects.</param>
    /// <returns>The sum.</returns>
    /// <exception cref="OverflowException">The cells add up to more than <see cref="long.MaxValue"/>.</exception>
    public PairedConfusionMatrix Add(PairedConfusionMatrix other) => new(WithCondition + other.WithCondition, WithoutCondition + other.WithoutCondition);

    /// <summary>Both tables in the invariant culture.</summary>
    /// <returns>For example "with condition: both 43, ...; without condition: both 2, ...".</returns>
    public override string ToString() => $"with condition: {WithCondition}; without condition: {WithoutCondition}";

    private static ConfusionMatrix Of(PairedTable with, PairedTable without) => new(
        with.FirstPositives, without.FirstPositives, with.Total - with.FirstPositives, without.Total - without.FirstPositives);
}
