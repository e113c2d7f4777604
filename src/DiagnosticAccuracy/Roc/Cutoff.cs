namespace DiagnosticAccuracy;

/// <summary>
/// A rule that turns a score into a result: positive at or above a score, positive at or below a score, or positive for no score.
/// </summary>
/// <remarks>
/// The end at which no score is positive is a case of its own, not a number (<see cref="Score"/> is null).
/// <c>default(Cutoff)</c> is that end: nothing is positive.
/// </remarks>
public readonly record struct Cutoff
{
    private readonly bool _atScore;
    private readonly double _score;

    private Cutoff(ScoreDirection direction, bool atScore, double score)
    {
        Direction = direction;
        _atScore = atScore;
        _score = score;
    }

    /// <summary>Gets a cutoff above every score: nothing is positive.</summary>
    public static Cutoff AboveEveryScore => new(ScoreDirection.HigherIsPositive, false, 0);

    /// <summary>Gets a cutoff below every score of a test on which low scores are positive: nothing is positive.</summary>
    public static Cutoff BelowEveryScore => new(ScoreDirection.LowerIsPositive, false, 0);

    /// <summary>Gets which end of the scale is positive; not stated in <c>default(Cutoff)</c>.</summary>
    public ScoreDirection Direction { get; }

    /// <summary>Gets the score from which on results are positive, itself included; null when no score is positive.</summary>
    public double? Score => _atScore ? _score : null;

    /// <summary>Positive at or above a score.</summary>
    /// <param name="score">The score; not NaN.</param>
    /// <returns>The cutoff.</returns>
    /// <exception cref="ArgumentOutOfRangeException"><paramref name="score"/> is NaN.</exception>
    public static Cutoff AtOrAbove(double score)
    {
        Guard.NotNaN(score);
        return new Cutoff(ScoreDirection.HigherIsPositive, true, score + 0.0);
    }

    /// <summary>Positive at or below a score.</summary>
    /// <param name="score">The score; not NaN.</param>
    /// <returns>The cutoff.</returns>
    /// <exception cref="ArgumentOutOfRangeException"><paramref name="score"/> is NaN.</exception>
    public static Cutoff AtOrBelow(double score)
    {
        Guard.NotNaN(score);
        return new Cutoff(ScoreDirection.LowerIsPositive, true, score + 0.0);
    }

    /// <summary>Whether a score is positive by this cutoff.</summary>
    /// <param name="score">The score; not NaN.</param>
    /// <returns>True when it is.</returns>
    /// <exception cref="ArgumentOutOfRangeException"><paramref name="score"/> is NaN.</exception>
    public bool IsPositive(double score)
    {
        Guard.NotNaN(score);
        return _atScore && (Direction == ScoreDirection.HigherIsPositive ? score >= _score : score <= _score);
    }

    /// <summary>For example ">= 12.5", "&lt;= 3" or "above every score".</summary>
    /// <returns>The text, with all digits of the score, in the invariant culture.</returns>
    public override string ToString() => Direction switch
    {
        ScoreDirection.HigherIsPositive => _atScore ? ">= " + Display.Exact(_score) : "above every score",
        ScoreDirection.LowerIsPositive => _atScore ? "<= " + Display.Exact(_score) : "below every score",
        _ => "no score is positive",
    };

    // For scores that were checked when the sample was made.
    internal static Cutoff At(double score, ScoreDirection direction) => new(direction, true, score);

    internal static Cutoff Beyond(ScoreDirection direction) => new(direction, false, 0);
}
