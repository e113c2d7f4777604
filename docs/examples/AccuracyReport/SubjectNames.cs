namespace DiagnosticAccuracy.Examples;

/// <summary>The names of the subjects read so far: the intervals are for independent subjects, so that none may come twice.</summary>
internal sealed class SubjectNames(string column, int place)
{
    private readonly Dictionary<string, int> _lines = [];

    public void Add(CsvRows rows)
    {
        string name = rows.Fields[place];
        if (name.Length == 0)
        {
            throw new StudyException($"column '{column}', line {rows.Line}: (empty) names no subject");
        }

        if (!_lines.TryAdd(name, rows.Line))
        {
            throw new StudyException(
                $"column '{column}', line {rows.Line}: {Printable.Quoted(name)} was on line {_lines[name]} already; allowed is one row for each subject");
        }
    }
}
