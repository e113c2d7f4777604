namespace DiagnosticAccuracy.Examples;

/// <summary>One subject whose status is known: the score of each test, null where there is no result.</summary>
public sealed record Subject(bool HasCondition, IReadOnlyList<double?> Scores);

/// <summary>So many rows were left out for one reason, of the whole study or of one test; by group where the status is known.</summary>
public sealed record LeftOut(string What, string Reason, int WithCondition, int WithoutCondition, int StatusUnknown)
{
    public int Rows => WithCondition + WithoutCondition + StatusUnknown;
}

/// <summary>What was read from a file: the subjects, and who was left out and why.</summary>
public sealed record Study(int RowsRead, IReadOnlyList<Subject> Subjects, IReadOnlyList<LeftOut> LeftOut);
