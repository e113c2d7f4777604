using System.Globalization;
using CsvHelper;
using CsvHelper.Configuration;

namespace DiagnosticAccuracy.Examples;

/// <summary>Reads a study from a CSV file with a heading line. Nothing is dropped without being counted.</summary>
public static class StudyReader
{
    public static Study Read(StudyDesign design)
    {
        ArgumentNullException.ThrowIfNull(design);
        string[] declared = [.. design.WithCondition, .. design.WithoutCondition, .. design.StatusUnknown];
        if (declared.GroupBy(value => value).FirstOrDefault(group => group.Count() > 1) is { } twice)
        {
            throw new StudyException($"column '{design.StatusColumn}': status '{twice.Key}' is declared more than once; allowed is one meaning for each value");
        }

        if (!File.Exists(design.File))
        {
            throw new StudyException($"{design.File}: there is no such file");
        }

        using StreamReader text = new(design.File);
        using CsvReader csv = new(text, new CsvConfiguration(CultureInfo.InvariantCulture) { BadDataFound = null, MissingFieldFound = null });
        return Read(csv, design);
    }

    private static Study Read(CsvReader csv, StudyDesign design)
    {
        if (!csv.Read() || !csv.ReadHeader())
        {
            throw new StudyException($"{design.File}: the file is empty; allowed is a heading line and one line for each subject");
        }

        string[] columns = csv.HeaderRecord!;
        int status = Column(columns, design.StatusColumn, design.File);
        int[] scores = [.. design.Scores.Select(score => Column(columns, score.Name, design.File))];
        List<Subject> subjects = [];
        Dictionary<(string What, string Reason), int> leftOut = [];
        int rows = 0;
        while (csv.Read())
        {
            rows++;
            string value = Field(csv, status);
            bool? hasCondition = Status(value, csv.Context.Parser!.RawRow, design);
            double?[] results = new double?[scores.Length];
            for (int i = 0; i < scores.Length; i++)
            {
                results[i] = Score(Field(csv, scores[i]), csv.Context.Parser.RawRow, design.Scores[i].Name, design.NoResult);
            }

            if (hasCondition is not { } known)
            {
                Count(leftOut, design.StatusColumn, Shown(value));
                continue;
            }

            for (int i = 0; i < scores.Length; i++)
            {
                if (results[i] is null)
                {
                    Count(leftOut, design.Scores[i].Name, Shown(Field(csv, scores[i])));
                }
            }

            subjects.Add(new Subject(known, results));
        }

        if (rows == 0)
        {
            throw new StudyException($"{design.File}: there is a heading line and no subject below it");
        }

        return new Study(rows, subjects, [.. leftOut.Select(entry => new LeftOut(entry.Key.What, entry.Key.Reason, entry.Value))]);
    }

    private static int Column(string[] columns, string name, string file)
    {
        int[] places = [.. Enumerable.Range(0, columns.Length).Where(i => columns[i] == name)];
        return places.Length switch
        {
            1 => places[0],
            0 => throw new StudyException($"{file}: there is no column '{name}'; the columns are {string.Join(", ", columns)}"),
            _ => throw new StudyException($"{file}: {places.Length} columns are called '{name}'; allowed is one"),
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
                $"column '{design.StatusColumn}', line {line}: status {Shown(value)} was not declared; declare it with --with-condition, --without-condition or --status-unknown");
    }

    private static double? Score(string text, int line, string column, IReadOnlyList<string> noResult)
    {
        if (text.Length == 0 || noResult.Contains(text))
        {
            return null;
        }

        return double.TryParse(text, NumberStyles.Float, CultureInfo.InvariantCulture, out double score) && !double.IsNaN(score)
            ? score
            : throw new StudyException(
                $"column '{column}', line {line}: {Shown(text)} is not a number; declare it with --no-result if it means that there is no result");
    }

    private static string Field(CsvReader csv, int index) => (csv.GetField(index) ?? string.Empty).Trim();

    private static string Shown(string value) => value.Length == 0 ? "(empty)" : $"'{value}'";

    private static void Count(Dictionary<(string What, string Reason), int> counts, string what, string reason) =>
        counts[(what, reason)] = counts.GetValueOrDefault((what, reason)) + 1;
}
