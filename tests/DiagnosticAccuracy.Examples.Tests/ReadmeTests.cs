using System.Text.RegularExpressions;

namespace DiagnosticAccuracy.Examples.Tests;

/// <summary>The code in the README is the code of docs/examples/first-steps.cs, which is compiled and run.</summary>
public partial class ReadmeTests
{
    [Fact]
    public void The_code_of_the_readme_is_the_example_that_is_run()
    {
        string readme = File.ReadAllText(Path.Combine(Repository.Root, "README.md")).ReplaceLineEndings("\n");
        string example = File.ReadAllText(Path.Combine(Repository.Root, "docs", "examples", "first-steps.cs")).ReplaceLineEndings("\n");
        string[] blocks = [.. CodeBlock().Matches(readme).Select(match => match.Groups[1].Value.Trim())];
        Assert.NotEmpty(blocks);
        Assert.All(blocks, block => Assert.Contains(block, example, StringComparison.Ordinal));
    }

    [GeneratedRegex("```csharp\n(.*?)```", RegexOptions.Singleline)]
    private static partial Regex CodeBlock();
}
