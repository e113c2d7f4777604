namespace DiagnosticAccuracy.Examples;

/// <summary>A column of scores, and which end of it speaks for the condition.</summary>
public sealed record ScoreColumn(string Name, ScoreDirection Direction)
{
    /// <summary>Reads NAME:higher or NAME:lower.</summary>
    public static ScoreColumn Parse(string text)
    {
        ArgumentNullException.ThrowIfNull(text);
        int colon = text.LastIndexOf(':');
        ScoreDirection? direction = (colon < 0 ? string.Empty : text[(colon + 1)..]) switch
        {
            "higher" => ScoreDirection.HigherIsPositive,
            "lower" => ScoreDirection.LowerIsPositive,
            _ => null,
        };
        return colon > 0 && direction is { } stated
            ? new ScoreColumn(text[..colon], stated)
            : throw new StudyException(
                $"--score {text}: allowed is COLUMN:higher or COLUMN:lower; the direction is always stated, never taken from the data");
    }
}

/// <summary>What is to be read from a file, and what is to be stated about it.</summary>
public sealed record StudyDesign
{
    public required string File { get; init; }

    public required string StatusColumn { get; init; }

    /// <summary>The column that names each subject, so that none is read twice; null when there is none.</summary>
    public string? IdColumn { get; init; }

    public required IReadOnlyList<string> WithCondition { get; init; }

    public required IReadOnlyList<string> WithoutCondition { get; init; }

    /// <summary>Status values of subjects whose status is not known; they are counted and left out.</summary>
    public IReadOnlyList<string> StatusUnknown { get; init; } = [];

    /// <summary>Texts in a score column that mean that there is no result, besides an empty field.</summary>
    public IReadOnlyList<string> NoResult { get; init; } = [];

    public required IReadOnlyList<ScoreColumn> Scores { get; init; }

    public required Prevalence Prevalence { get; init; }

    public required double RuleOutSensitivity { get; init; }

    public required double RuleInSpecificity { get; init; }

    public required Confidence Confidence { get; init; }
}
