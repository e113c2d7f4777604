using System.Globalization;
using System.Text.Json;

namespace DiagnosticAccuracy.Tests.Data;

/// <summary>The reference values that lie beside the tests, see Data/README.md for sources and grades.</summary>
internal static class ReferenceData
{
    public static JsonElement Json(string file)
    {
        using JsonDocument document = JsonDocument.Parse(File.ReadAllText(PathOf(file)));
        return document.RootElement.Clone();
    }

    /// <summary>The rows of a CSV file, each as a map from column to text. No field in these files holds a comma.</summary>
    public static IReadOnlyList<IReadOnlyDictionary<string, string>> Csv(string file)
    {
        string[] lines = File.ReadAllLines(PathOf(file));
        string[] columns = [.. lines[0].Split(',').Select(Unquote)];
        return [.. lines.Skip(1).Where(line => line.Length > 0).Select(line => Row(columns, line))];
    }

    public static double Number(this IReadOnlyDictionary<string, string> row, string column) =>
        double.Parse(row[column], CultureInfo.InvariantCulture);

    private static Dictionary<string, string> Row(string[] columns, string line)
    {
        string[] fields = line.Split(',');
        Dictionary<string, string> row = [];
        for (int i = 0; i < columns.Length; i++)
        {
            row[columns[i]] = Unquote(fields[i]);
        }

        return row;
    }

    private static string Unquote(string field) => field.Trim('"');

    private static string PathOf(string file) => Path.Combine(AppContext.BaseDirectory, "Data", file);
}
