namespace DiagnosticAccuracy.Examples.Tests;

/// <summary>Runs the program inside the test.</summary>
internal static class ReportRun
{
    public static string Succeeds(params string[] args)
    {
        using StringWriter output = new();
        using StringWriter error = new();
        int code = AccuracyReport.Run(args, output, error);
        Assert.Equal(string.Empty, error.ToString());
        Assert.Equal(0, code);
        return output.ToString().ReplaceLineEndings("\n");
    }

    /// <summary>The one line of the error; nothing else may have been printed.</summary>
    public static string Fails(params string[] args)
    {
        using StringWriter output = new();
        using StringWriter error = new();
        Assert.Equal(2, AccuracyReport.Run(args, output, error));
        Assert.Equal(string.Empty, output.ToString());
        return Assert.Single(error.ToString().ReplaceLineEndings("\n").TrimEnd('\n').Split('\n'));
    }

    public static string[] Options(string file, params string[] more) =>
    [
        file, "--status", "status", "--with-condition", "1", "--without-condition", "0", "--score", "score:higher",
        "--prevalence", "0.1", "--rule-out-sensitivity", "0.9", "--rule-in-specificity", "0.9", .. more,
    ];

    public static string Unwrapped(string text) => string.Join(' ', text.Split('\n').Select(line => line.Trim()));
}
