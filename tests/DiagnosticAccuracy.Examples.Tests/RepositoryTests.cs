namespace DiagnosticAccuracy.Examples.Tests;

/// <summary>What a stranger meets first is there and in order.</summary>
public class RepositoryTests
{
    [Fact]
    public void The_first_two_commands_of_the_readme_are_the_example_and_the_tests()
    {
        string[] commands =
        [
            .. File.ReadLines(Path.Combine(Repository.Root, "README.md"))
                .Where(line => line.StartsWith("    ", StringComparison.Ordinal)).Take(2).Select(line => line.Trim()),
        ];
        Assert.Equal(["dotnet run docs/examples/accuracy-report.cs", "dotnet test"], commands);
    }

    [Fact]
    public void Every_data_set_has_its_source()
    {
        string sources = File.ReadAllText(Repository.Data("SOURCES.md"));
        string[] files = Directory.GetFiles(Path.GetDirectoryName(Repository.Data("SOURCES.md"))!, "*.csv");
        Assert.True(files.Length >= 3);
        Assert.All(files, file => Assert.Contains("## " + Path.GetFileName(file), sources, StringComparison.Ordinal));
    }
}
