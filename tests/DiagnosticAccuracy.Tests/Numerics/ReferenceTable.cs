using System.Globalization;

namespace DiagnosticAccuracy.Tests.Numerics;

/// <summary>
/// Reads the reference values made by make-incomplete-beta.py.
/// </summary>
internal static class ReferenceTable
{
    /// <summary>The rows of a table below the heading.</summary>
    public static IEnumerable<string[]> Rows(string name)
    {
        using StreamReader reader = File.OpenText(Path.Combine(AppContext.BaseDirectory, "Data", "numerics", name + ".csv"));
        _ = reader.ReadLine();
        while (reader.ReadLine() is { } line)
        {
            if (line.Length > 0)
            {
                yield return line.Split(',');
            }
        }
    }

    /// <summary>The double nearest to a decimal number.</summary>
    public static double Number(string text) => double.Parse(text, NumberStyles.Float, CultureInfo.InvariantCulture);

    /// <summary>|actual/expected - 1|.</summary>
    public static double RelativeError(double actual, double expected)
        => expected == 0.0 ? Math.Abs(actual) : Math.Abs((actual - expected) / expected);
}
