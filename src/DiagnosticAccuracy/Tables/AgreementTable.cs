using DiagnosticAccuracy.Tables;

namespace DiagnosticAccuracy;

/// <summary>
/// The four cells of a test against a comparator that is no reference standard: agreement, and no accuracy.
/// </summary>
/// <remarks>
/// <para>There is no sensitivity or specificity to be had from it: where the two differ, it does not tell which one is right. Percent agreement
/// depends on the share of positive results of the comparator, and taking the other test as the comparator gives other numbers
/// (see <see cref="Swapped"/>). After the guidance of the United States agency on reporting results of diagnostic tests, 2007.</para>
/// <para><c>default(AgreementTable)</c> has four empty cells; what it does not define says so.</para>
/// </remarks>
public readonly record struct AgreementTable
{
    /// <summary>Initializes a new instance of the <see cref="AgreementTable"/> struct.</summary>
    /// <param name="bothPositive">Subjects positive by both.</param>
    /// <param name="testOnlyPositive">Subjects positive by the test and negative by the comparator.</param>
    /// <param name="comparatorOnlyPositive">Subjects negative by the test and positive by the comparator.</param>
    /// <param name="bothNegative">Subjects negative by both.</param>
    /// <exception cref="ArgumentOutOfRangeException">A cell is negative.</exception>
    /// <exception cref="OverflowException">The cells add up to more than <see cref="long.MaxValue"/>.</exception>
    public AgreementTable(long bothPositive, long testOnlyPositive, long comparatorOnlyPositive, long bothNegative)
    {
        Guard.Count(bothPositive);
        Guard.Count(testOnlyPositive);
        Guard.Count(comparatorOnlyPositive);
        Guard.Count(bothNegative);
        BothPositive = bothPositive;
        TestOnlyPositive = testOnlyPositive;
        ComparatorOnlyPositive = comparatorOnlyPositive;
        BothNegative = bothNegative;
        _ = checked(bothPositive + testOnlyPositive + comparatorOnlyPositive + bothNegative);
    }

    /// <summary>Gets the subjects positive by both.</summary>
    public long BothPositive { get; }

    /// <summary>Gets the subjects positive by the test and negative by the comparator.</summary>
    public long TestOnlyPositive { get; }

    /// <summary>Gets the subjects negative by the test and positive by the comparator.</summary>
    public long ComparatorOnlyPositive { get; }

    /// <summary>Gets the subjects negative by both.</summary>
    public long BothNegative { get; }

    /// <summary>Gets the number of subjects.</summary>
    public long Total => BothPositive + TestOnlyPositive + ComparatorOnlyPositive + BothNegative;

    /// <summary>Gets the share of the comparator's positives that the test calls positive (PPA). Undefined when the comparator has none.</summary>
    public Proportion PositivePercentAgreement => new(
        BothPositive,
        BothPositive + ComparatorOnlyPositive,
        new UndefinedReason(UndefinedCause.NoPositiveResults, "no result of the comparator is positive"));

    /// <summary>Gets the share of the comparator's negatives that the test calls negative (NPA). Undefined when the comparator has none.</summary>
    public Proportion NegativePercentAgreement => new(
        BothNegative,
        BothNegative + TestOnlyPositive,
        new UndefinedReason(UndefinedCause.NoNegativeResults, "no result of the comparator is negative"));

    /// <summary>
    /// Gets the share of all subjects on whom both agree (OPA). It hides which of the two kinds of disagreement there is: state it beside the other
    /// two. Undefined when there are no subjects.
    /// </summary>
    public Proportion OverallPercentAgreement => new(BothPositive + BothNegative, Total, UndefinedReason.NoSubjects);

    /// <summary>Gets the table with the other test as the comparator.</summary>
    public AgreementTable Swapped => new(BothPositive, ComparatorOnlyPositive, TestOnlyPositive, BothNegative);

    /// <summary>The table of any sequence of rows.</summary>
    /// <typeparam name="T">The type of a row.</typeparam>
    /// <param name="rows">The rows, one a subject; they are read once.</param>
    /// <param name="test">Gives whether the test was positive.</param>
    /// <param name="comparator">Gives whether the comparator was positive.</param>
    /// <returns>The table; empty for no rows.</returns>
    /// <exception cref="ArgumentNullException">An argument is null.</exception>
    /// <remarks>A subject without a valid result of both has no place here: leave it out, or decide how it counts, and report the number.</remarks>
    public static AgreementTable FromRows<T>(IEnumerable<T> rows, Func<T, bool> test, Func<T, bool> comparator)
    {
        Guard.NotNull(rows);
        Guard.NotNull(test);
        Guard.NotNull(comparator);
        PairedCounter counter = default;
        foreach (T row in rows)
        {
            counter.Count(test(row), comparator(row));
        }

        PairedTable counted = counter.ToTable();
        return new AgreementTable(counted.BothPositive, counted.FirstOnly, counted.SecondOnly, counted.BothNegative);
    }

    /// <summary>The cross table of the two ratings, for kappa and its relatives.</summary>
    /// <returns>The cross table, positive first; rows are the test, columns the comparator.</returns>
    public RatingTable ToRatingTable() => RatingTable.FromCounts([BothPositive, TestOnlyPositive, ComparatorOnlyPositive, BothNegative], 2);

    /// <summary>The four cells in the invariant culture.</summary>
    /// <returns>For example "both positive 90, test only 20, comparator only 10, both negative 180".</returns>
    public override string ToString() =>
        $"both positive {Display.Of(BothPositive)}, test only {Display.Of(TestOnlyPositive)}, comparator only {Display.Of(ComparatorOnlyPositive)}, both negative {Display.Of(BothNegative)}";
}
