using DiagnosticAccuracy.Tables;

namespace DiagnosticAccuracy;

/// <summary>
/// The four cells of one binary test against a reference standard.
/// </summary>
/// <remarks><c>default(ConfusionMatrix)</c> has four empty cells; what it does not define says so.</remarks>
public readonly record struct ConfusionMatrix
{
    /// <summary>Initializes a new instance of the <see cref="ConfusionMatrix"/> struct.</summary>
    /// <param name="truePositives">Subjects with the condition whose result is positive.</param>
    /// <param name="falsePositives">Subjects without the condition whose result is positive.</param>
    /// <param name="falseNegatives">Subjects with the condition whose result is negative.</param>
    /// <param name="trueNegatives">Subjects without the condition whose result is negative.</param>
    /// <exception cref="ArgumentOutOfRangeException">A cell is negative.</exception>
    /// <exception cref="OverflowException">The cells add up to more than <see cref="long.MaxValue"/>.</exception>
    public ConfusionMatrix(long truePositives, long falsePositives, long falseNegatives, long trueNegatives)
    {
        Guard.Count(truePositives);
        Guard.Count(falsePositives);
        Guard.Count(falseNegatives);
        Guard.Count(trueNegatives);
        TruePositives = truePositives;
        FalsePositives = falsePositives;
        FalseNegatives = falseNegatives;
        TrueNegatives = trueNegatives;
        _ = checked(truePositives + falsePositives + falseNegatives + trueNegatives);
    }

    /// <summary>Gets the subjects with the condition whose result is positive.</summary>
    public long TruePositives { get; }

    /// <summary>Gets the subjects without the condition whose result is positive.</summary>
    public long FalsePositives { get; }

    /// <summary>Gets the subjects with the condition whose result is negative.</summary>
    public long FalseNegatives { get; }

    /// <summary>Gets the subjects without the condition whose result is negative.</summary>
    public long TrueNegatives { get; }

    /// <summary>Gets the number of subjects with the condition.</summary>
    public long WithCondition => TruePositives + FalseNegatives;

    /// <summary>Gets the number of subjects without the condition.</summary>
    public long WithoutCondition => FalsePositives + TrueNegatives;

    /// <summary>Gets the number of positive results.</summary>
    public long Positives => TruePositives + FalsePositives;

    /// <summary>Gets the number of negative results.</summary>
    public long Negatives => FalseNegatives + TrueNegatives;

    /// <summary>Gets the number of subjects.</summary>
    public long Total => WithCondition + WithoutCondition;

    /// <summary>Gets the positive share of those with the condition. Undefined when nobody has it.</summary>
    public Proportion Sensitivity => new(TruePositives, WithCondition, UndefinedReason.NoSubjectsWithCondition);

    /// <summary>Gets the negative share of those without the condition. Undefined when everybody has it.</summary>
    public Proportion Specificity => new(TrueNegatives, WithoutCondition, UndefinedReason.NoSubjectsWithoutCondition);

    /// <summary>Gets the positive share of those without the condition, 1 - specificity. Undefined when everybody has it.</summary>
    public Proportion FalsePositiveRate => new(FalsePositives, WithoutCondition, UndefinedReason.NoSubjectsWithoutCondition);

    /// <summary>Gets the negative share of those with the condition, 1 - sensitivity. Undefined when nobody has it.</summary>
    public Proportion FalseNegativeRate => new(FalseNegatives, WithCondition, UndefinedReason.NoSubjectsWithCondition);

    /// <summary>
    /// Gets the share of all subjects whose result is right. It mixes sensitivity and specificity in the proportion in which the groups were
    /// enrolled, so it carries over to no other prevalence. Undefined when there are no subjects.
    /// </summary>
    public Proportion Accuracy => new(TruePositives + TrueNegatives, Total, UndefinedReason.NoSubjects);

    /// <summary>
    /// Gets the share of all subjects who have the condition: the prevalence of the sample. It is the prevalence of the intended users only when
    /// the subjects were enrolled without regard to their status. Undefined when there are no subjects.
    /// </summary>
    public Proportion SamplePrevalence => new(WithCondition, Total, UndefinedReason.NoSubjects);

    /// <summary>
    /// Gets the Youden index, sensitivity + specificity - 1 (Youden, Cancer 1950;3:32), as the difference of the positive shares with and without
    /// the condition; from -1 to 1, 0 for a test that tells nothing. It does not depend on the prevalence. Undefined when a group is empty.
    /// </summary>
    public ProportionDifference YoudenIndex => new(Sensitivity, FalsePositiveRate);

    /// <summary>
    /// Gets the positive likelihood ratio, sensitivity / (1 - specificity): by what the odds of the condition are multiplied by a positive result.
    /// Positive infinity at a specificity of 1, with a finite lower limit. It does not depend on the prevalence. Undefined when a group is empty or
    /// no result is positive.
    /// </summary>
    public ProportionRatio PositiveLikelihoodRatio => new(Sensitivity, FalsePositiveRate, UndefinedReason.NoPositiveResults);

    /// <summary>
    /// Gets the negative likelihood ratio, (1 - sensitivity) / specificity: by what the odds of the condition are multiplied by a negative result.
    /// Zero at a sensitivity of 1, with an upper limit above zero. It does not depend on the prevalence. Undefined when a group is empty or no
    /// result is negative.
    /// </summary>
    public ProportionRatio NegativeLikelihoodRatio => new(FalseNegativeRate, Specificity, UndefinedReason.NoNegativeResults);

    /// <summary>
    /// Gets the diagnostic odds ratio: the odds of a positive result with the condition over those without it (Glas et al., J Clin Epidemiol
    /// 2003;56:1129). It does not depend on the prevalence. Undefined when a group is empty, or all results are alike.
    /// </summary>
    public OddsRatio DiagnosticOddsRatio => new(
        Sensitivity, FalsePositiveRate, Positives == 0 ? UndefinedReason.NoPositiveResults : UndefinedReason.NoNegativeResults);

    /// <summary>Gets the mean of sensitivity and specificity. It does not depend on the prevalence. Undefined when a group is empty.</summary>
    public BalancedAccuracy BalancedAccuracy => new(YoudenIndex);

    /// <summary>Gets the Matthews correlation coefficient. It changes with the prevalence of the sample. Undefined when a margin is empty.</summary>
    public MatthewsCorrelation MatthewsCorrelation => new(this);

    /// <summary>Gets F1, the F measure that weighs sensitivity and positive predictive value alike. It changes with the prevalence of the sample.</summary>
    public FMeasure F1 => FBeta(1);

    /// <summary>
    /// Gets Cohen's kappa between result and status. It changes with the prevalence of the sample; sensitivity and specificity say more. Undefined when
    /// there are no subjects, or when result and status have one value only.
    /// </summary>
    public Kappa CohenKappa => RatingTable.FromCounts([TruePositives, FalsePositives, FalseNegatives, TrueNegatives], 2).CohenKappa();

    /// <summary>
    /// Gets the predictive values straight from the table. They hold only for a cohort: subjects enrolled without regard to their status, at
    /// the prevalence of this sample. In a case-control or enriched study they are the product of the enrolment; use
    /// <see cref="PredictiveValuesAt"/> there.
    /// </summary>
    public CohortPredictiveValues CohortPredictiveValues => new(
        new Proportion(TruePositives, Positives, UndefinedReason.NoPositiveResults),
        new Proportion(TrueNegatives, Negatives, UndefinedReason.NoNegativeResults));

    /// <summary>The table of two separate groups of subjects together, cell by cell.</summary>
    /// <param name="left">One table.</param>
    /// <param name="right">The table of other subjects.</param>
    /// <returns>The sum.</returns>
    /// <exception cref="OverflowException">The cells add up to more than <see cref="long.MaxValue"/>.</exception>
    public static ConfusionMatrix operator +(ConfusionMatrix left, ConfusionMatrix right) => left.Add(right);

    /// <summary>The table of results, one element a subject in each argument.</summary>
    /// <param name="isPositive">Whether the test was positive.</param>
    /// <param name="hasCondition">Whether the subject has the condition by the reference standard, in the same order of subjects.</param>
    /// <returns>The table; empty for no subjects.</returns>
    /// <exception cref="ArgumentException">The lengths differ.</exception>
    public static ConfusionMatrix Create(ReadOnlySpan<bool> isPositive, ReadOnlySpan<bool> hasCondition)
    {
        Guard.SameLength(hasCondition.Length, isPositive.Length, nameof(hasCondition), nameof(isPositive));
        PairedCounter counter = default;
        for (int i = 0; i < isPositive.Length; i++)
        {
            counter.Count(isPositive[i], hasCondition[i]);
        }

        return Of(counter.ToTable());
    }

    /// <summary>The table of any sequence of rows.</summary>
    /// <typeparam name="T">The type of a row.</typeparam>
    /// <param name="rows">The rows, one a subject; they are read once.</param>
    /// <param name="isPositive">Gives whether the test was positive.</param>
    /// <param name="hasCondition">Gives whether the subject has the condition by the reference standard.</param>
    /// <returns>The table; empty for no rows.</returns>
    /// <exception cref="ArgumentNullException">An argument is null.</exception>
    /// <remarks>
    /// A subject without a valid result of the test and of the reference standard has no place here: leave it out, or decide how it counts, and
    /// report the number.
    /// </remarks>
    public static ConfusionMatrix FromRows<T>(IEnumerable<T> rows, Func<T, bool> isPositive, Func<T, bool> hasCondition)
    {
        Guard.NotNull(rows);
        Guard.NotNull(isPositive);
        Guard.NotNull(hasCondition);
        PairedCounter counter = default;
        foreach (T row in rows)
        {
            counter.Count(isPositive(row), hasCondition(row));
        }

        return Of(counter.ToTable());
    }

    /// <summary>The table of these subjects and others together, cell by cell.</summary>
    /// <param name="other">The table of other subjects.</param>
    /// <returns>The sum.</returns>
    /// <exception cref="OverflowException">The cells add up to more than <see cref="long.MaxValue"/>.</exception>
    public ConfusionMatrix Add(ConfusionMatrix other) => checked(new(
        TruePositives + other.TruePositives,
        FalsePositives + other.FalsePositives,
        FalseNegatives + other.FalseNegatives,
        TrueNegatives + other.TrueNegatives));

    /// <summary>The predictive values among people of whom a stated share has the condition.</summary>
    /// <param name="prevalence">The prevalence among the people the test is meant for, taken as known.</param>
    /// <returns>Both predictive values.</returns>
    /// <remarks>Sensitivity and specificity are taken to be the same among those people as in this study.</remarks>
    public PredictiveValues PredictiveValuesAt(Prevalence prevalence) => new(this, prevalence);

    /// <summary>The predictive values over a series of prevalences, as for a curve.</summary>
    /// <param name="prevalences">The prevalences, in any order.</param>
    /// <returns>The predictive values in the order given.</returns>
    /// <exception cref="ArgumentNullException"><paramref name="prevalences"/> is null.</exception>
    public IReadOnlyList<PredictiveValues> PredictiveValuesOver(IEnumerable<Prevalence> prevalences)
    {
        Guard.NotNull(prevalences);
        List<PredictiveValues> values = [];
        foreach (Prevalence prevalence in prevalences)
        {
            values.Add(PredictiveValuesAt(prevalence));
        }

        return values.AsReadOnly();
    }

    /// <summary>The predictive values at a prevalence that was itself estimated, from other subjects than these.</summary>
    /// <param name="prevalence">How many of how many had the condition.</param>
    /// <returns>Both predictive values, whose intervals carry both uncertainties.</returns>
    public EstimatedPredictiveValues PredictiveValuesAtEstimated(Proportion prevalence) => new(this, new EstimatedPrevalence(prevalence));

    /// <summary>The predictive values at a prevalence that was itself estimated, from other subjects than these.</summary>
    /// <param name="prevalence">The estimate, from counts or as reported with its interval.</param>
    /// <returns>Both predictive values, whose intervals carry both uncertainties.</returns>
    public EstimatedPredictiveValues PredictiveValuesAtEstimated(EstimatedPrevalence prevalence) => new(this, prevalence);

    /// <summary>The F measure with another weight of sensitivity.</summary>
    /// <param name="beta">How many times as much sensitivity weighs as the positive predictive value; finite, above 0.</param>
    /// <returns>The measure; undefined when there are only true negatives.</returns>
    /// <exception cref="ArgumentOutOfRangeException"><paramref name="beta"/> is not a finite number above 0.</exception>
    public FMeasure FBeta(double beta)
    {
        Guard.Positive(beta);
        return new FMeasure(TruePositives, FalsePositives, FalseNegatives, beta);
    }

    /// <summary>A rectangle that holds sensitivity and specificity together.</summary>
    /// <param name="confidence">The joint level, and the side on which both are bounded; two-sided 95 % unless said.</param>
    /// <param name="method">The method of each side; Wilson's score interval unless said.</param>
    /// <returns>The region; undefined, with the reason, when a group is empty.</returns>
    /// <exception cref="ArgumentOutOfRangeException"><paramref name="method"/> is not a value of its type.</exception>
    public JointAccuracyRegion JointRegion(Confidence confidence = default, ProportionMethod method = ProportionMethod.Wilson)
    {
        Confidence side = confidence.RootOfTwo();
        return new JointAccuracyRegion(Sensitivity.Interval(side, method), Specificity.Interval(side, method), confidence);
    }

    /// <summary>What the test is expected to do among so many people at a prevalence, as whole numbers that add up.</summary>
    /// <param name="people">How many people are tested, 0 or more.</param>
    /// <param name="prevalence">The share of them that has the condition.</param>
    /// <returns>The expected cells; undefined, with the reason, when a group they need is empty.</returns>
    /// <exception cref="ArgumentOutOfRangeException"><paramref name="people"/> is negative.</exception>
    public ExpectedCells ExpectedFor(long people, Prevalence prevalence)
    {
        Guard.Count(people);
        return new ExpectedCells(this, people, prevalence);
    }

    /// <summary>The four cells in the invariant culture.</summary>
    /// <returns>For example "TP 90, FP 20, FN 10, TN 180".</returns>
    public override string ToString() =>
        $"TP {Display.Of(TruePositives)}, FP {Display.Of(FalsePositives)}, FN {Display.Of(FalseNegatives)}, TN {Display.Of(TrueNegatives)}";

    private static ConfusionMatrix Of(PairedTable resultByStatus) =>
        new(resultByStatus.BothPositive, resultByStatus.FirstOnly, resultByStatus.SecondOnly, resultByStatus.BothNegative);
}
