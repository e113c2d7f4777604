using DiagnosticAccuracy.Roc;

namespace DiagnosticAccuracy;

/// <summary>The scores of two or more tests on the same subjects.</summary>
/// <remarks>
/// Each subject has a score of every test. Rows in which one of them is missing are counted (<see cref="IncompleteSubjects"/>) and take no
/// part, so that all tests are judged on the same subjects.
/// </remarks>
public sealed class PairedScores
{
    private static readonly IReadOnlyList<string> TwoNames = Array.AsReadOnly(["first", "second"]);

    private readonly Placements[] _tests;

    private PairedScores(Placements[] tests, IReadOnlyList<string> names, long incompleteSubjects)
    {
        _tests = tests;
        Names = names;
        IncompleteSubjects = incompleteSubjects;
    }

    /// <summary>Gets the number of tests, two or more.</summary>
    public int TestCount => _tests.Length;

    /// <summary>Gets the names of the tests, in order.</summary>
    public IReadOnlyList<string> Names { get; }

    /// <summary>Gets the sample of the first test.</summary>
    public ScoredSample First => _tests[0].Sample;

    /// <summary>Gets the sample of the second test.</summary>
    public ScoredSample Second => _tests[1].Sample;

    /// <summary>Gets the number of subjects that were left out because a score of one of the tests was missing.</summary>
    public long IncompleteSubjects { get; }

    /// <summary>Paired scores of two or more tests, with their names.</summary>
    /// <param name="tests">The tests, in the same order of subjects; at least two.</param>
    /// <param name="hasCondition">Whether the subject has the condition by the reference standard.</param>
    /// <returns>The paired scores.</returns>
    /// <exception cref="ArgumentNullException"><paramref name="tests"/> or one of them is null.</exception>
    /// <exception cref="ArgumentException">There are fewer than two tests, the lengths differ, there are no subjects, or a score is NaN (the message has
    /// the test and the index of the first).</exception>
    public static PairedScores Create(IEnumerable<TestScores> tests, ReadOnlySpan<bool> hasCondition)
    {
        Guard.NotNull(tests);
        TestScores[] all = [.. tests];
        if (all.Length < 2)
        {
            throw new ArgumentException($"{nameof(tests)} has {Display.Of(all.Length)} tests; allowed are two or more.", nameof(tests));
        }

        Placements[] placements = new Placements[all.Length];
        for (int i = 0; i < all.Length; i++)
        {
            string name = $"{nameof(tests)}[{Display.Of(i)}]";
            Guard.NotNull(all[i], name);
            Guard.SameLength(all[i].Scores.Length, hasCondition.Length, name, nameof(hasCondition));
            Guard.NotEmpty(hasCondition.Length, nameof(hasCondition));
            placements[i] = Placements.Of(all[i].Scores.Span, hasCondition, all[i].Direction, name);
        }

        return new PairedScores(placements, Array.AsReadOnly(Array.ConvertAll(all, test => test.Name)), incompleteSubjects: 0);
    }

    /// <summary>The sample of one of the tests.</summary>
    /// <param name="test">The test, from 0.</param>
    /// <returns>Its sample.</returns>
    /// <exception cref="ArgumentOutOfRangeException">There is no such test.</exception>
    public ScoredSample Sample(int test) => PlacementsOf(test, nameof(test)).Sample;

    internal Placements PlacementsOf(int test, string name)
    {
        if (test < 0 || test >= _tests.Length)
        {
            throw Guard.OutOfRange(name, test, $"a test from 0 to {Display.Of(_tests.Length - 1)}");
        }

        return _tests[test];
    }

    /// <summary>Paired scores from one element a subject in each argument.</summary>
    /// <param name="firstScores">Scores of the first test; no NaN.</param>
    /// <param name="firstDirection">Which end of the first scale speaks for the condition.</param>
    /// <param name="secondScores">Scores of the second test, in the same order of subjects; no NaN.</param>
    /// <param name="secondDirection">Which end of the second scale speaks for the condition.</param>
    /// <param name="hasCondition">Whether the subject has the condition by the reference standard.</param>
    /// <returns>The paired scores.</returns>
    /// <exception cref="ArgumentException">The lengths differ, there are no subjects, or a score is NaN (the message has the index of
    /// the first).</exception>
    /// <exception cref="ArgumentOutOfRangeException">A direction is not stated.</exception>
    public static PairedScores Create(
        ReadOnlySpan<double> firstScores,
        ScoreDirection firstDirection,
        ReadOnlySpan<double> secondScores,
        ScoreDirection secondDirection,
        ReadOnlySpan<bool> hasCondition)
    {
        Guard.Direction(firstDirection);
        Guard.Direction(secondDirection);
        Guard.SameLength(secondScores.Length, firstScores.Length, nameof(secondScores), nameof(firstScores));
        Guard.SameLength(hasCondition.Length, firstScores.Length, nameof(hasCondition), nameof(firstScores));
        Guard.NotEmpty(firstScores.Length, nameof(firstScores));
        return new PairedScores(
            [
                Placements.Of(firstScores, hasCondition, firstDirection, nameof(firstScores)),
                Placements.Of(secondScores, hasCondition, secondDirection, nameof(secondScores)),
            ],
            TwoNames,
            incompleteSubjects: 0);
    }

    /// <summary>Paired scores from any sequence of rows, in which a score may be missing.</summary>
    /// <typeparam name="T">The type of a row.</typeparam>
    /// <param name="rows">The rows, one a subject; they are read once.</param>
    /// <param name="firstScore">Gives the score of the first test, or null when it is missing; not NaN.</param>
    /// <param name="firstDirection">Which end of the first scale speaks for the condition.</param>
    /// <param name="secondScore">Gives the score of the second test, or null when it is missing; not NaN.</param>
    /// <param name="secondDirection">Which end of the second scale speaks for the condition.</param>
    /// <param name="hasCondition">Gives whether the subject has the condition.</param>
    /// <returns>The paired scores of the complete rows, with the number of the others.</returns>
    /// <exception cref="ArgumentNullException">An argument is null.</exception>
    /// <exception cref="ArgumentException">No row is complete, or a score is NaN (the message has the index of the first).</exception>
    /// <exception cref="ArgumentOutOfRangeException">A direction is not stated.</exception>
    public static PairedScores FromRows<T>(
        IEnumerable<T> rows,
        Func<T, double?> firstScore,
        ScoreDirection firstDirection,
        Func<T, double?> secondScore,
        ScoreDirection secondDirection,
        Func<T, bool> hasCondition)
    {
        Guard.NotNull(rows);
        Guard.NotNull(firstScore);
        Guard.Direction(firstDirection);
        Guard.NotNull(secondScore);
        Guard.Direction(secondDirection);
        Guard.NotNull(hasCondition);
        List<double> first = [];
        List<double> second = [];
        List<bool> status = [];
        int index = 0;
        long incomplete = 0;
        foreach (T row in rows)
        {
            double? a = firstScore(row);
            double? b = secondScore(row);
            Guard.NotNaNAt(a ?? 0, index, nameof(firstScore));
            Guard.NotNaNAt(b ?? 0, index, nameof(secondScore));
            index++;
            if (a is { } firstValue && b is { } secondValue)
            {
                first.Add(firstValue);
                second.Add(secondValue);
                status.Add(hasCondition(row));
            }
            else
            {
                incomplete++;
            }
        }

        Guard.NotEmpty(first.Count, $"complete {nameof(rows)}");
        bool[] hasConditions = [.. status];
        return new PairedScores(
            [
                Placements.Of(first.ToArray(), hasConditions, firstDirection, nameof(firstScore)),
                Placements.Of(second.ToArray(), hasConditions, secondDirection, nameof(secondScore)),
            ],
            TwoNames,
            incomplete);
    }

    /// <summary>For example "90 with and 51 without the condition, 2 tests; 0 incomplete".</summary>
    /// <returns>The text, in the invariant culture.</returns>
    public override string ToString() =>
        $"{Display.Of(First.WithCondition)} with and {Display.Of(First.WithoutCondition)} without the condition, {Display.Of(TestCount)} tests; {Display.Of(IncompleteSubjects)} incomplete";
}
