using DiagnosticAccuracy.Roc;

namespace DiagnosticAccuracy;

/// <summary>
/// Scores of subjects with and without the condition, sorted once and grouped by ties: all that a ROC analysis needs to know
/// of the data.
/// </summary>
/// <remarks>
/// <para>Scores are compared exactly: equal means equal in every bit, except that -0.0 equals 0.0. Rounding is the caller's
/// choice. Infinities are ordinary scores, for results below or above the measuring range. NaN is refused.</para>
/// <para>Nothing depends on the order of the subjects. A sample with one group only is well-formed: it has counts, and its area
/// is undefined with a reason.</para>
/// <para>Memory: 16 bytes for each distinct score (24 where the sample has more than 2,147,483,647 subjects).</para>
/// </remarks>
public sealed class ScoredSample
{
    private readonly double[] _scores;
    private readonly CumulativeCounts _with;
    private readonly CumulativeCounts _without;

    internal ScoredSample(
        double[] scores, CumulativeCounts with, CumulativeCounts without, int levelCount, long withCondition, long withoutCondition, ScoreDirection direction)
    {
        _scores = scores;
        _with = with;
        _without = without;
        LevelCount = levelCount;
        WithCondition = withCondition;
        WithoutCondition = withoutCondition;
        Direction = direction;
        Levels = new LazyList<ScoreLevel>(levelCount, i => new ScoreLevel(_scores[i], _with.At(i), _without.At(i)));
    }

    /// <summary>Gets which end of the scale speaks for the condition.</summary>
    public ScoreDirection Direction { get; }

    /// <summary>Gets the number of subjects with the condition.</summary>
    public long WithCondition { get; }

    /// <summary>Gets the number of subjects without the condition.</summary>
    public long WithoutCondition { get; }

    /// <summary>Gets the number of subjects.</summary>
    public long Total => WithCondition + WithoutCondition;

    /// <summary>Gets the number of distinct scores.</summary>
    public int LevelCount { get; }

    /// <summary>
    /// Gets the distinct scores with their counts, from the one that speaks least for the condition to the one that speaks most
    /// for it: ascending when higher is positive, descending when lower is.
    /// </summary>
    public IReadOnlyList<ScoreLevel> Levels { get; }

    // May be longer than LevelCount.
    internal double[] Scores => _scores;

    internal CumulativeCounts With => _with;

    internal CumulativeCounts Without => _without;

    /// <summary>Why quantities that need both groups are undefined; null when both are there.</summary>
    internal UndefinedReason? MissingGroup =>
        WithCondition == 0 ? UndefinedReason.NoSubjectsWithCondition
        : WithoutCondition == 0 ? UndefinedReason.NoSubjectsWithoutCondition
        : null;

    /// <summary>A sample from one score and one status for each subject.</summary>
    /// <param name="scores">The scores; no NaN, infinities allowed.</param>
    /// <param name="hasCondition">For each score, whether the reference standard says that the subject has the condition.</param>
    /// <param name="direction">Which end of the scale speaks for the condition.</param>
    /// <returns>The sample.</returns>
    /// <exception cref="ArgumentException">The lengths differ, there are no subjects, or a score is NaN (the message has the index of
    /// the first).</exception>
    /// <exception cref="ArgumentOutOfRangeException"><paramref name="direction"/> is not stated.</exception>
    public static ScoredSample Create(ReadOnlySpan<double> scores, ReadOnlySpan<bool> hasCondition, ScoreDirection direction)
    {
        Guard.Direction(direction);
        Guard.SameLength(hasCondition.Length, scores.Length, nameof(hasCondition), nameof(scores));
        Guard.NotEmpty(scores.Length, nameof(scores));
        return SampleBuilder.FromStatus(scores, hasCondition, direction);
    }

    /// <summary>A sample from the scores of the two groups.</summary>
    /// <param name="withCondition">Scores of the subjects with the condition; no NaN; may be empty if the other is not.</param>
    /// <param name="withoutCondition">Scores of the subjects without the condition; no NaN; may be empty if the other is not.</param>
    /// <param name="direction">Which end of the scale speaks for the condition.</param>
    /// <returns>The sample.</returns>
    /// <exception cref="ArgumentException">Both groups are empty, or a score is NaN (the message has the index of the first).</exception>
    /// <exception cref="ArgumentOutOfRangeException"><paramref name="direction"/> is not stated.</exception>
    public static ScoredSample FromGroups(ReadOnlySpan<double> withCondition, ReadOnlySpan<double> withoutCondition, ScoreDirection direction)
    {
        Guard.Direction(direction);
        Guard.NotEmpty(withCondition.Length + (long)withoutCondition.Length, $"{nameof(withCondition)} and {nameof(withoutCondition)}");
        return SampleBuilder.FromGroups(withCondition, withoutCondition, direction);
    }

    /// <summary>A sample from counts: for each level (a rating, a category, a distinct score) how many subjects of each group have it.</summary>
    /// <param name="levels">The levels, in any order; no NaN; a level that is given twice has its counts added.</param>
    /// <param name="withCondition">For each level the number of subjects with the condition, 0 or more.</param>
    /// <param name="withoutCondition">For each level the number of subjects without the condition, 0 or more.</param>
    /// <param name="direction">Which end of the scale speaks for the condition.</param>
    /// <returns>The sample. Levels at which no subject stands are left out of it.</returns>
    /// <exception cref="ArgumentException">The lengths differ, there are no subjects, or a level is NaN (the message has the index of
    /// the first).</exception>
    /// <exception cref="ArgumentOutOfRangeException">A count is negative, or <paramref name="direction"/> is not stated.</exception>
    /// <exception cref="OverflowException">The counts add up to more than <see cref="long.MaxValue"/>.</exception>
    public static ScoredSample FromCounts(
        ReadOnlySpan<double> levels, ReadOnlySpan<long> withCondition, ReadOnlySpan<long> withoutCondition, ScoreDirection direction)
    {
        Guard.Direction(direction);
        Guard.SameLength(withCondition.Length, levels.Length, nameof(withCondition), nameof(levels));
        Guard.SameLength(withoutCondition.Length, levels.Length, nameof(withoutCondition), nameof(levels));
        return SampleBuilder.FromCounts(levels, withCondition, withoutCondition, direction);
    }

    /// <summary>A sample from any sequence of rows.</summary>
    /// <typeparam name="T">The type of a row.</typeparam>
    /// <param name="rows">The rows, one a subject; they are read once.</param>
    /// <param name="score">Gives the score of a row; not NaN.</param>
    /// <param name="hasCondition">Gives whether the row's subject has the condition.</param>
    /// <param name="direction">Which end of the scale speaks for the condition.</param>
    /// <returns>The sample.</returns>
    /// <exception cref="ArgumentNullException">An argument is null.</exception>
    /// <exception cref="ArgumentException">There are no rows, or a score is NaN (the message has the index of the first).</exception>
    /// <exception cref="ArgumentOutOfRangeException"><paramref name="direction"/> is not stated.</exception>
    public static ScoredSample FromRows<T>(IEnumerable<T> rows, Func<T, double> score, Func<T, bool> hasCondition, ScoreDirection direction)
    {
        Guard.NotNull(rows);
        Guard.NotNull(score);
        Guard.NotNull(hasCondition);
        Guard.Direction(direction);
        List<double> with = [];
        List<double> without = [];
        int index = 0;
        foreach (T row in rows)
        {
            double value = score(row);
            Guard.NotNaNAt(value, index, nameof(score));
            (hasCondition(row) ? with : without).Add(value);
            index++;
        }

        Guard.NotEmpty(index, nameof(rows));
        return SampleBuilder.FromGroups([.. with], [.. without], direction);
    }

    /// <summary>For example "90 with and 51 without the condition, 130 distinct scores, higher is positive".</summary>
    /// <returns>The text, in the invariant culture.</returns>
    public override string ToString() =>
        $"{Display.Of(WithCondition)} with and {Display.Of(WithoutCondition)} without the condition, {Display.Of(LevelCount)} distinct scores, "
        + (Direction == ScoreDirection.HigherIsPositive ? "higher is positive" : "lower is positive");
}
