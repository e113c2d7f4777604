using System.Globalization;
using CsvHelper;
using CsvHelper.Configuration;

namespace DiagnosticAccuracy.Examples;

/// <summary>
/// The rows of a CSV file with their line numbers. What is not well-formed is refused: a quotation mark without its partner would make one
/// field of all rows up to the next one.
/// </summary>
internal sealed class CsvRows : IDisposable
{
    private readonly CsvParser _parser;

    public CsvRows(TextReader text) => _parser = new CsvParser(text, new CsvConfiguration(CultureInfo.InvariantCulture)
    {
        // Blank lines are passed over in Next, where they count as lines.
        IgnoreBlankLines = false,
        BadDataFound = _ => throw new StudyException(
            $"line {Line}: a field has quotation marks inside; such a field is written in quotation marks, with each inner one doubled"),
    });

    /// <summary>The fields of the row, without the spaces around them.</summary>
    public string[] Fields { get; private set; } = [];

    /// <summary>The line of the file on which the row begins, from 1.</summary>
    public int Line { get; private set; }

    public void Dispose() => _parser.Dispose();

    public bool Next()
    {
        do
        {
            // The parser counts to the last line of a row, so that the next one begins below it.
            Line = _parser.RawRow + 1;
            if (!_parser.Read())
            {
                return false;
            }
        }
        while (_parser.RawRecord.AsSpan().Trim("\r\n").IsEmpty);

        if (_parser.RawRecord.Count(character => character == '"') % 2 != 0)
        {
            throw new StudyException($"line {Line}: a quotation mark is not paired");
        }

        Fields = [.. (_parser.Record ?? []).Select(field => field.Trim())];
        return true;
    }

    public void Expect(int fields)
    {
        if (Fields.Length != fields)
        {
            string found = Fields.Length == 1 ? "is 1 field" : $"are {Fields.Length} fields";
            throw new StudyException($"line {Line}: there {found}; the heading has {fields}");
        }
    }
}
