using System.Runtime.CompilerServices;

namespace DiagnosticAccuracy.Examples;

/// <summary>
/// The demo: invented platelet units tested for bacterial growth before release. Culture is the reference standard; a new optical assay and an
/// older lactate assay were run on the same units, three in ten of which were inoculated.
/// </summary>
internal static class DemoStudy
{
    public static StudyDesign Design() => new()
    {
        File = DataFile("platelet-units.csv"),
        StatusColumn = "culture",
        IdColumn = "unit",
        WithCondition = ["positive"],
        WithoutCondition = ["negative"],
        StatusUnknown = ["indeterminate"],
        NoResult = ["invalid"],
        Scores = [new ScoreColumn("optical", ScoreDirection.HigherIsPositive), new ScoreColumn("lactate", ScoreDirection.HigherIsPositive)],
        Prevalence = new Prevalence(0.002),
        RuleOutSensitivity = 0.98,
        RuleInSpecificity = 0.98,
        Confidence = default,
    };

    // The data stand beside the examples: found from the working folder upward, else from where the program was built.
    private static string DataFile(string name, [CallerFilePath] string thisFile = "")
    {
        for (DirectoryInfo? folder = new(Environment.CurrentDirectory); folder is not null; folder = folder.Parent)
        {
            string candidate = Path.Combine(folder.FullName, "docs", "examples", "data", name);
            if (File.Exists(candidate))
            {
                return Path.GetRelativePath(Environment.CurrentDirectory, candidate);
            }
        }

        return Path.Combine(Path.GetDirectoryName(thisFile) ?? ".", "..", "data", name);
    }
}
