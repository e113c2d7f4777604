using System.Text.RegularExpressions;

namespace DiagnosticAccuracy.Tests.Contracts;

/// <summary>Imports point down only: no folder of the library names a type of a folder above it.</summary>
public partial class FolderOrderTests
{
    // From the bottom up. A folder may use those before it, the root vocabulary and itself.
    private static readonly string[] Order =
        ["Numerics", "", "Proportions", "Tables", "Roc", "Resampling", "Binormal", "Cutoffs", "Bayes", "Usefulness", "Planning"];

    // The vocabulary at the root speaks of no room; these two are allowed to sit beside each other and not see each other.
    private static readonly Dictionary<string, string[]> Apart = new()
    {
        ["Resampling"] = ["Binormal", "Cutoffs", "Roc", "Tables", "Proportions"],
        ["Binormal"] = ["Cutoffs", "Resampling"],
        ["Cutoffs"] = ["Binormal", "Resampling"],
    };

    [Fact]
    public void No_folder_names_a_type_of_a_folder_above_it()
    {
        string source = SourceFolder();
        Dictionary<string, string> folderOfType = [];
        Dictionary<string, string> textOfFile = [];
        foreach (string path in Directory.EnumerateFiles(source, "*.cs", SearchOption.AllDirectories))
        {
            string relative = Path.GetRelativePath(source, path).Replace('\\', '/');
            if (relative.StartsWith("obj/", StringComparison.Ordinal) || relative.StartsWith("bin/", StringComparison.Ordinal))
            {
                continue;
            }

            string text = WithoutCommentsAndStrings().Replace(File.ReadAllText(path), " ");
            textOfFile[relative] = text;
            foreach (Match match in TypeDeclaration().Matches(text))
            {
                folderOfType.TryAdd(match.Groups[1].Value, Folder(relative));
            }
        }

        Assert.True(textOfFile.Count > 30, $"only {textOfFile.Count} files under {source}");
        List<string> violations = [];
        foreach ((string file, string text) in textOfFile)
        {
            string folder = Folder(file);
            Assert.Contains(folder, Order);
            foreach (string word in Word().Matches(text).Select(m => m.Value).Distinct())
            {
                if (folderOfType.TryGetValue(word, out string? other) && !MayUse(folder, other) && !IsMemberName(text, word))
                {
                    violations.Add($"{file} uses {word} of {other}/");
                }
            }
        }

        Assert.Empty(violations);
    }

    [Fact]
    public void Only_numerics_sees_the_numerics_package_and_compiles_conditionally()
    {
        string source = SourceFolder();
        foreach (string path in Directory.EnumerateFiles(source, "*.cs", SearchOption.AllDirectories))
        {
            string relative = Path.GetRelativePath(source, path).Replace('\\', '/');
            if (relative.StartsWith("Numerics/", StringComparison.Ordinal) || relative.StartsWith("obj/", StringComparison.Ordinal)
                || relative.StartsWith("bin/", StringComparison.Ordinal))
            {
                continue;
            }

            string text = File.ReadAllText(path);
            Assert.False(text.Contains("MathNet", StringComparison.Ordinal), relative);
            Assert.False(Regex.IsMatch(text, @"^\s*#\s*(if|else|elif)\b", RegexOptions.Multiline), relative);
        }
    }

    private static bool MayUse(string folder, string other)
    {
        int here = Array.IndexOf(Order, folder);
        int there = Array.IndexOf(Order, other);
        return folder == other
            || (there <= here && !(Apart.TryGetValue(folder, out string[]? apart) && apart.Contains(other)))
            || (folder == "Numerics" && other.Length == 0);
    }

    // A property may carry the same name as a type elsewhere; it is a use of the type only where no dot or declaration precedes it.
    private static bool IsMemberName(string text, string word) =>
        !Regex.IsMatch(text, $@"(?<![\.\w]){Regex.Escape(word)}(\s+\w+\s*[=;,){{(]|\s*[\.<\[\?]|\()");

    private static string Folder(string relative) => relative.Contains('/', StringComparison.Ordinal) ? relative[..relative.IndexOf('/', StringComparison.Ordinal)] : string.Empty;

    private static string SourceFolder()
    {
        for (DirectoryInfo? folder = new(AppContext.BaseDirectory); folder is not null; folder = folder.Parent)
        {
            string candidate = Path.Combine(folder.FullName, "src", "DiagnosticAccuracy");
            if (Directory.Exists(candidate))
            {
                return candidate;
            }
        }

        throw new InvalidOperationException($"no src/DiagnosticAccuracy above {AppContext.BaseDirectory}");
    }

    [GeneratedRegex("""//[^\n]*|"(?:\\.|[^"\\\n])*"|'(?:\\.|[^'\\\n])+'""")]
    private static partial Regex WithoutCommentsAndStrings();

    [GeneratedRegex(@"\b(?:class|struct|interface|enum|record)\s+(?:struct\s+|class\s+)?([A-Z]\w*)")]
    private static partial Regex TypeDeclaration();

    [GeneratedRegex(@"\b[A-Z]\w*\b")]
    private static partial Regex Word();
}
