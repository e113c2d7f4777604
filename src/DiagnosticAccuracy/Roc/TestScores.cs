namespace DiagnosticAccuracy;

/// <summary>The scores of one test, one a subject, with its name and direction.</summary>
public sealed class TestScores
{
    /// <summary>Initializes a new instance of the <see cref="TestScores"/> class.</summary>
    /// <param name="name">The name of the test.</param>
    /// <param name="scores">The scores in the order of the subjects; they are read when the tests are put together.</param>
    /// <param name="direction">Which end of the scale speaks for the condition.</param>
    /// <exception cref="ArgumentNullException"><paramref name="name"/> is null.</exception>
    /// <exception cref="ArgumentOutOfRangeException"><paramref name="direction"/> is not stated.</exception>
    public TestScores(string name, ReadOnlyMemory<double> scores, ScoreDirection direction)
    {
        Guard.NotNull(name);
        Guard.Direction(direction);
        Name = name;
        Scores = scores;
        Direction = direction;
    }

    /// <summary>Gets the name of the test.</summary>
    public string Name { get; }

    /// <summary>Gets the scores in the order of the subjects.</summary>
    public ReadOnlyMemory<double> Scores { get; }

    /// <summary>Gets which end of the scale speaks for the condition.</summary>
    public ScoreDirection Direction { get; }

    /// <summary>Name and number of scores.</summary>
    /// <returns>The text, in the invariant culture.</returns>
    public override string ToString() => $"{Name}: {Display.Of(Scores.Length)} scores";
}
