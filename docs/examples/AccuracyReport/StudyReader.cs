using System.Globalization;

namespace DiagnosticAccuracy.Examples;

/// <summary>Reads a study from a CSV file with a heading line. No row is dropped without being counted.</summary>
public static class StudyReader
{
    public static Study Read(StudyDesign design)
    {
        ArgumentNullException.ThrowIfNull(design);
        CheckRoles(design);
        if (Directory.Exists(design.File))
        {
            throw new StudyException($"{design.File} is a folder; allowed is a CSV file");
        }

        if (!File.Exists(design.File))
        {
            throw new StudyException($"{design.File}: there is no such file");
        }

        using StreamReader text = new(design.File);
        using CsvRows rows = new(text);
        if (!rows.Next())
        {
            throw new StudyException($"{design.File}: the file is empty; allowed is a heading line and one line for each subject");
        }

        return Read(rows, design);
    }

    private static void CheckRoles(StudyDesign design)
    {
        string[] declared = [.. design.WithCondition, .. design.WithoutCondition, .. design.StatusUnknown];
        if (Repeated(declared) is { } value)
        {
            throw new StudyException(
                $"column '{design.StatusColumn}': status {Printable.Quoted(value)} is declared more than once; allowed is one meaning for each value");
        }

        string[] columns = [design.StatusColumn, .. design.Scores.Select(score => score.Name), .. design.IdColumn is { } id ? [id] : Array.Empty<string>()];
        if (Repeated(columns) is { } column)
        {
            throw new StudyException($"column '{column}' is given more than one role; allowed is one of --status, --score and --id, once");
        }
    }

    private static Study Read(CsvRows rows, StudyDesign design)
    {
        string[] columns = rows.Fields;
        int status = Column(columns, design.StatusColumn, design.File);
        int[] scores = [.. design.Scores.Select(score => Column(columns, score.Name, design.File))];
        SubjectNames? names = design.IdColumn is { } id ? new SubjectNames(id, Column(columns, id, design.File)) : null;
        List<Subject> subjects = [];
        List<(string What, string Reason, bool? HasCondition)> leftOut = [];
        int count = 0;
        while (rows.Next())
        {
            count++;
            rows.Expect(columns.Length);
            names?.Add(rows);
            string value = rows.Fields[status];
            bool? hasCondition = Status(value, rows.Line, design);
            double?[] results = new double?[scores.Length];
            for (int i = 0; i < scores.Length; i++)
            {
                results[i] = Score(rows.Fields[scores[i]], rows.Line, design.Scores[i].Name, design.NoResult);
            }

            if (hasCondition is not { } known)
            {
                leftOut.Add((design.StatusColumn, Printable.Quoted(value), null));
                continue;
            }

            for (int i = 0; i < scores.Length; i++)
            {
                if (results[i] is null)
                {
                    leftOut.Add((design.Scores[i].Name, Printable.Quoted(rows.Fields[scores[i]]), known));
                }
            }

            subjects.Add(new Subject(known, results));
        }

        return count > 0
            ? new Study(count, subjects, [.. leftOut.GroupBy(entry => (entry.What, entry.Reason)).Select(Counted)])
            : throw new StudyException($"{design.File}: there is a heading line and no subject below it");
    }

    private static LeftOut Counted(IGrouping<(string What, string Reason), (string What, string Reason, bool? HasCondition)> group) => new(
        group.Key.What,
        group.Key.Reason,
        group.Count(entry => entry.HasCondition is true),
        group.Count(entry => entry.HasCondition is false),
        group.Count(entry => entry.HasCondition is null));

    private static int Column(string[] columns, string name, string file)
    {
        int[] places = [.. Enumerable.Range(0, columns.Length).Where(i => columns[i] == name)];
        string separated = columns.Length == 1 ? "; fields are separated by commas" : string.Empty;
        return places.Length switch
        {
            1 => places[0],
            0 => throw new StudyException(
                $"{file}: there is no column {Printable.Quoted(name)}; the columns are {Printable.Short(string.Join(", ", columns), 200)}{separated}"),
            _ => throw new StudyException($"{file}: {places.Length} columns are called {Printable.Quoted(name)}; allowed is one"),
        };
    }

    private static bool? Status(string value, int line, StudyDesign design)
    {
        if (design.WithCondition.Contains(value))
        {
            return true;
        }

        if (design.WithoutCondition.Contains(value))
        {
            return false;
        }

        return design.StatusUnknown.Contains(value)
            ? null
            : throw new StudyException(
                $"column '{design.StatusColumn}', line {line}: status {Printable.Quoted(value)} was not declared; declare it with --with-condition, --without-condition or --status-unknown");
    }

    private static double? Score(string text, int line, string column, IReadOnlyList<string> noResult)
    {
        if (text.Length == 0 || noResult.Contains(text))
        {
            return null;
        }

        if (!double.TryParse(text, NumberStyles.Float, CultureInfo.InvariantCulture, out double score) || double.IsNaN(score))
        {
            throw new StudyException(
                $"column '{column}', line {line}: {Printable.Quoted(text)} is not a number; declare it with --no-result if it means that there is no result");
        }

        // Infinity is a score only where it is written as such.
        return double.IsInfinity(score) && text.Any(char.IsAsciiDigit)
            ? throw new StudyException($"column '{column}', line {line}: {Printable.Quoted(text)} is beyond the range of numbers; write Infinity or -Infinity if that is meant")
            : score;
    }

    private static string? Repeated(IEnumerable<string> values) =>
        values.GroupBy(value => value).FirstOrDefault(group => group.Count() > 1)?.Key;
}
