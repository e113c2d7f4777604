namespace DiagnosticAccuracy.Examples.Tests;

/// <summary>Files of the repository, found by walking up from the test assembly.</summary>
internal static class Repository
{
    public static string Root { get; } = FindRoot();

    public static string Data(string name) => Path.Combine(Root, "docs", "examples", "data", name);

    private static string FindRoot()
    {
        for (DirectoryInfo? folder = new(AppContext.BaseDirectory); folder is not null; folder = folder.Parent)
        {
            if (File.Exists(Path.Combine(folder.FullName, "DiagnosticAccuracy.sln")))
            {
                return folder.FullName;
            }
        }

        throw new InvalidOperationException($"no DiagnosticAccuracy.sln above {AppContext.BaseDirectory}");
    }
}
