using DiagnosticAccuracy.Tables;

namespace DiagnosticAccuracy;

/// <summary>
/// Two binary tests on the same subjects of one group: how many were positive on both, on one of them, on neither.
/// </summary>
/// <remarks>
/// <para>The group is whatever the caller puts in: subjects with the condition (then the positive shares are sensitivities), without it, or all.
/// The differences and ratios here depend on no prevalence when the group is one of status.</para>
/// <para><c>default(PairedTable)</c> has four empty cells; what it does not define says so.</para>
/// </remarks>
public readonly record struct PairedTable
{
    /// <summary>Initializes a new instance of the <see cref="PairedTable"/> struct.</summary>
    /// <param name="bothPositive">Subjects positive on both tests.</param>
    /// <param name="firstOnly">Subjects positive on the first test and negative on the second.</param>
    /// <param name="secondOnly">Subjects positive on the second test and negative on the first.</param>
    /// <param name="bothNegative">Subjects negative on both tests.</param>
    /// <exception cref="ArgumentOutOfRangeException">A cell is negative.</exception>
    /// <exception cref="OverflowException">The cells add up to more than <see cref="long.MaxValue"/>.</exception>
    public PairedTable(long bothPositive, long firstOnly, long secondOnly, long bothNegative)
    {
        Guard.Count(bothPositive);
        Guard.Count(firstOnly);
        Guard.Count(secondOnly);
        Guard.Count(bothNegative);
        BothPositive = bothPositive;
        FirstOnly = firstOnly;
        SecondOnly = secondOnly;
        BothNegative = bothNegative;
        _ = checked(bothPositive + firstOnly + secondOnly + bothNegative);
    }

    /// <summary>Gets the subjects positive on both tests.</summary>
    public long BothPositive { get; }

    /// <summary>Gets the subjects positive on the first test only.</summary>
    public long FirstOnly { get; }

    /// <summary>Gets the subjects positive on the second test only.</summary>
    public long SecondOnly { get; }

    /// <summary>Gets the subjects negative on both tests.</summary>
    public long BothNegative { get; }

    /// <summary>Gets the number of subjects.</summary>
    public long Total => BothPositive + FirstOnly + SecondOnly + BothNegative;

    /// <summary>Gets the number of subjects on whom the tests disagree; they alone speak about the difference.</summary>
    public long Discordant => FirstOnly + SecondOnly;

    /// <summary>Gets the share positive on the first test. Undefined when there are no subjects.</summary>
    public Proportion FirstPositive => new(FirstPositives, Total, UndefinedReason.NoSubjects);

    /// <summary>Gets the share positive on the second test. Undefined when there are no subjects.</summary>
    public Proportion SecondPositive => new(SecondPositives, Total, UndefinedReason.NoSubjects);

    /// <summary>Gets the share positive on the first test minus the share positive on the second. Undefined when there are no subjects.</summary>
    public PairedDifference Difference => new(this);

    /// <summary>
    /// Gets the share positive on the first test over the share positive on the second. Undefined when no result of either test is positive.
    /// </summary>
    public PairedRatio Ratio => new(this);

    /// <summary>Gets the table with the tests in the other order.</summary>
    public PairedTable Swapped => new(BothPositive, SecondOnly, FirstOnly, BothNegative);

    /// <summary>Gets the table in which negative results are counted as positive ones are here: the first test alone negative becomes "first only".</summary>
    public PairedTable Complement => new(BothNegative, SecondOnly, FirstOnly, BothPositive);

    internal long FirstPositives => BothPositive + FirstOnly;

    internal long SecondPositives => BothPositive + SecondOnly;

    /// <summary>The table of two separate groups of subjects together, cell by cell.</summary>
    /// <param name="left">One table.</param>
    /// <param name="right">The table of other subjects.</param>
    /// <returns>The sum.</returns>
    /// <exception cref="OverflowException">The cells add up to more than <see cref="long.MaxValue"/>.</exception>
    public static PairedTable operator +(PairedTable left, PairedTable right) => left.Add(right);

    /// <summary>The table of results, one element a subject in each argument.</summary>
    /// <param name="first">Whether the first test was positive.</param>
    /// <param name="second">Whether the second test was positive, in the same order of subjects.</param>
    /// <returns>The table; empty for no subjects.</returns>
    /// <exception cref="ArgumentException">The lengths differ.</exception>
    public static PairedTable Create(ReadOnlySpan<bool> first, ReadOnlySpan<bool> second)
    {
        Guard.SameLength(second.Length, first.Length, nameof(second), nameof(first));
        PairedCounter counter = default;
        for (int i = 0; i < first.Length; i++)
        {
            counter.Count(first[i], second[i]);
        }

        return counter.ToTable();
    }

    /// <summary>The table of any sequence of rows.</summary>
    /// <typeparam name="T">The type of a row.</typeparam>
    /// <param name="rows">The rows, one a subject; they are read once.</param>
    /// <param name="first">Gives whether the first test was positive.</param>
    /// <param name="second">Gives whether the second test was positive.</param>
    /// <returns>The table; empty for no rows.</returns>
    /// <exception cref="ArgumentNullException">An argument is null.</exception>
    /// <remarks>A subject without a valid result of both tests has no place here: leave it out, or decide how it counts, and report the number.</remarks>
    public static PairedTable FromRows<T>(IEnumerable<T> rows, Func<T, bool> first, Func<T, bool> second)
    {
        Guard.NotNull(rows);
        Guard.NotNull(first);
        Guard.NotNull(second);
        PairedCounter counter = default;
        foreach (T row in rows)
        {
            counter.Count(first(row), second(row));
        }

        return counter.ToTable();
    }

    /// <summary>The table of these subjects and others together, cell by cell.</summary>
    /// <param name="other">The table of other subjects.</param>
    /// <returns>The sum.</returns>
    /// <exception cref="OverflowException">The cells add up to more than <see cref="long.MaxValue"/>.</exception>
    public PairedTable Add(PairedTable other) => checked(new(
        BothPositive + other.BothPositive,
        FirstOnly + other.FirstOnly,
        SecondOnly + other.SecondOnly,
        BothNegative + other.BothNegative));

    /// <summary>McNemar's test that both tests are positive in the same share of subjects; two-sided.</summary>
    /// <param name="method">The form; asymptotic without continuity correction unless said, which agrees with the default interval of <see cref="Difference"/>.</param>
    /// <returns>The statistic, where the form has one, and the p-value; undefined, with the reason, when there are no subjects.</returns>
    /// <exception cref="ArgumentOutOfRangeException"><paramref name="method"/> is not a value of its type.</exception>
    /// <remarks>
    /// <para>Without discordant subjects p is 1 in every form, since nothing speaks against equality, and the statistic is undefined (0/0).</para>
    /// <para>For one side, or against a margin, test <see cref="Difference"/> with a <see cref="DifferenceMargin"/>. Sources: McNemar, Psychometrika
    /// 1947;12:153; Edwards, Psychometrika 1948;13:185; Fagerland, Lydersen and Laake, BMC Med Res Methodol 2013;13:91.</para>
    /// </remarks>
    public PairedTest McNemar(McNemarMethod method = McNemarMethod.Asymptotic) => method switch
    {
        McNemarMethod.Asymptotic => Tables.McNemar.Asymptotic(this),
        McNemarMethod.ContinuityCorrected => Tables.McNemar.ContinuityCorrected(this),
        McNemarMethod.ExactConditional => Tables.McNemar.ExactConditional(this),
        McNemarMethod.MidP => Tables.McNemar.MidP(this),
        _ => throw Guard.UnknownOption(method),
    };

    /// <summary>The four cells in the invariant culture.</summary>
    /// <returns>For example "both 43, first only 5, second only 2, neither 8".</returns>
    public override string ToString() =>
        $"both {Display.Of(BothPositive)}, first only {Display.Of(FirstOnly)}, second only {Display.Of(SecondOnly)}, neither {Display.Of(BothNegative)}";
}
