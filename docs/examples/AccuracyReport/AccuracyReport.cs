using System.CommandLine;
using CsvHelper;

namespace DiagnosticAccuracy.Examples;

/// <summary>The program: options in, statement out; 0 when it went well, 2 with a one-line error when it did not.</summary>
public static class AccuracyReport
{
    private const int Failed = 2;

    /// <summary>Runs the program.</summary>
    /// <param name="args">The options; none for the demo study.</param>
    /// <param name="output">Where the statement goes.</param>
    /// <param name="error">Where a one-line error goes.</param>
    /// <returns>0 or 2.</returns>
    public static int Run(IReadOnlyList<string> args, TextWriter output, TextWriter error)
    {
        ArgumentNullException.ThrowIfNull(args);
        ArgumentNullException.ThrowIfNull(output);
        ArgumentNullException.ThrowIfNull(error);
        try
        {
            if (args.Count == 0)
            {
                return Report(DemoStudy.Design(), output);
            }

            ReportCommand command = new();
            ParseResult parsed = command.Parse(args);
            if (parsed.Action is not null)
            {
                return parsed.Errors.Count > 0
                    ? throw new StudyException(parsed.Errors[0].Message)
                    : parsed.Invoke(new InvocationConfiguration { Output = output, Error = error, EnableDefaultExceptionHandler = false });
            }

            if (parsed.Errors.Count > 0)
            {
                throw new StudyException(parsed.Errors[0].Message);
            }

            return Report(command.Design(parsed), output);
        }
        catch (Exception exception) when (exception is StudyException or IOException or UnauthorizedAccessException or ArgumentException or CsvHelperException)
        {
            string message = Printable.Of(exception.Message.ReplaceLineEndings(" "));
            int parameter = message.IndexOf(" (Parameter '", StringComparison.Ordinal);
            error.WriteLine("error: " + (parameter < 0 ? message : message[..parameter]));
            return Failed;
        }
    }

    // The statement comes out whole or not at all.
    private static int Report(StudyDesign design, TextWriter output)
    {
        using StringWriter statement = new() { NewLine = output.NewLine };
        Statement.Write(design, StudyReader.Read(design), statement);
        output.Write(statement.ToString());
        return 0;
    }
}
