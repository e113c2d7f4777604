using System.Globalization;
using System.Text.RegularExpressions;

namespace DiagnosticAccuracy.Examples.Tests;

/// <summary>Laws that the text of every statement keeps, on many small invented studies full of ties, gaps and empty groups.</summary>
public sealed partial class StatementTests : IDisposable
{
    private readonly string _file = Path.GetTempFileName();

    public void Dispose() => File.Delete(_file);

    [Fact]
    public void Every_statement_fits_adds_up_and_never_shows_a_bare_NaN()
    {
        Random random = new(20260902);
        for (int study = 0; study < 200; study++)
        {
            List<(bool With, string[] Scores)> rows = [];
            int subjects = random.Next(1, 14);
            for (int i = 0; i < subjects; i++)
            {
                rows.Add((random.Next(3) > 0, [Score(random), Score(random)]));
            }

            if (rows.All(row => row.Scores[0].Length == 0) || rows.All(row => row.Scores[1].Length == 0))
            {
                continue;
            }

            File.WriteAllText(_file, "status,first,second\n" + string.Concat(rows.Select(row => $"{(row.With ? 1 : 0)},{row.Scores[0]},{row.Scores[1]}\n")));
            string prevalence = new[] { "0", "1e-9", "0.002", "0.37", "1" }[random.Next(5)];
            string target = new[] { "0.5", "0.9", "1" }[random.Next(3)];
            string text = ReportRun.Succeeds(
                _file, "--status", "status", "--with-condition", "1", "--without-condition", "0", "--score", "first:higher", "--score", "second:lower",
                "--prevalence", prevalence, "--rule-out-sensitivity", target, "--rule-in-specificity", target);
            Lawful(text);
            Cells(text, rows);
        }
    }

    [Fact]
    public void The_demo_and_the_open_data_keep_the_laws()
    {
        Lawful(ReportRun.Succeeds());
        Lawful(ReportRun.Succeeds(
            Repository.Data("breast-biopsy.csv"), "--status", "class", "--with-condition", "malignant", "--without-condition", "benign",
            "--score", "V1:higher", "--score", "V6:higher", "--no-result", "NA", "--prevalence", "0.05",
            "--rule-out-sensitivity", "0.98", "--rule-in-specificity", "0.98"));
    }

    [Fact]
    public void Long_names_and_letters_beyond_ascii_keep_the_layout()
    {
        string name = "Gr\u00F6\u00DFe of a marker whose name is far longer than the place that the layout has for it, and more";
        File.WriteAllText(_file, $"status,\"{name}\"\n1,5\n0,3\n1,2\n0,1\n");
        string text = ReportRun.Succeeds(
            _file, "--status", "status", "--with-condition", "1", "--without-condition", "0", "--score", name + ":higher",
            "--prevalence", "0.1", "--rule-out-sensitivity", "0.9", "--rule-in-specificity", "0.9");
        Lawful(text);
        Assert.Contains("Gr\\u00F6\\u00DFe", text, StringComparison.Ordinal);
    }

    [Fact]
    public void A_prevalence_that_is_not_zero_is_not_shown_as_zero()
    {
        File.WriteAllText(_file, "status,score\n1,5\n0,3\n1,2\n0,1\n");
        string[] options = ReportRun.Options(_file);
        options[Array.IndexOf(options, "--prevalence") + 1] = "1e-20";
        string text = ReportRun.Succeeds(options);
        Assert.DoesNotContain(" 0 %", text, StringComparison.Ordinal);
        Assert.Contains("at prevalence     0.000000000000000001 %", text, StringComparison.Ordinal);
    }

    [Fact]
    public void Who_was_left_out_is_told_by_group()
    {
        File.WriteAllText(_file, "status,score\n1,5\n1,\n0,\n0,\n0,1\n1,4\n");
        string text = ReportRun.Unwrapped(ReportRun.Succeeds(ReportRun.Options(_file)));
        Assert.Contains("3 with score (empty) (no result): 1 with the condition, 2 without it", text, StringComparison.Ordinal);
    }

    [Fact]
    public void Help_fits_the_page() =>
        Assert.All(ReportRun.Succeeds("--help").Split('\n'), line => Assert.True(line.Length <= 80, line));

    private static string Score(Random random) => random.Next(8) switch
    {
        0 => string.Empty,
        1 => "-Infinity",
        _ => random.Next(5).ToString(CultureInfo.InvariantCulture),
    };

    private static void Lawful(string text)
    {
        Assert.All(text.Split('\n'), line => Assert.True(line.Length <= 80, line));
        Assert.All(text, character => Assert.True(character is '\n' or (>= ' ' and <= '~'), $"character {(int)character}"));
        Assert.DoesNotContain("NaN", text, StringComparison.Ordinal);
        Assert.DoesNotMatch(NegativeZero(), text);
        foreach (Match expected in Expected().Matches(text))
        {
            long[] n = [.. Enumerable.Range(1, 6).Select(i => long.Parse(expected.Groups[i].Value, CultureInfo.InvariantCulture))];
            Assert.Equal((1000, n[0], n[3]), (n[0] + n[3], n[1] + n[2], n[4] + n[5]));
        }
    }

    // The cells at each cutoff are counted again from the rows.
    private static void Cells(string text, List<(bool With, string[] Scores)> rows)
    {
        foreach (Match block in Block().Matches(text))
        {
            int test = block.Groups["test"].Value == "first" ? 0 : 1;
            string cutoff = block.Groups["cutoff"].Value;
            bool Positive(string score) => cutoff.StartsWith(">= ", StringComparison.Ordinal)
                ? Number(score) >= Number(cutoff[3..])
                : cutoff.StartsWith("<= ", StringComparison.Ordinal) && Number(score) <= Number(cutoff[3..]);
            int Count(bool with, bool positive) => rows.Count(row => row.Scores[test].Length > 0 && row.With == with && Positive(row.Scores[test]) == positive);
            int Cell(string name) => int.Parse(block.Groups[name].Value, CultureInfo.InvariantCulture);
            Assert.Equal(
                (Count(true, true), Count(false, true), Count(true, false), Count(false, false)),
                (Cell("tp"), Cell("fp"), Cell("fn"), Cell("tn")));
        }

        int defined = Regex.Count(text, "cutoff            positive when");
        Assert.Equal(defined, Block().Count(text));
    }

    private static double Number(string text) => double.Parse(text, CultureInfo.InvariantCulture);

    [GeneratedRegex(@"-0(\.0+)?(?![\d.])")]
    private static partial Regex NegativeZero();

    [GeneratedRegex(@"of 1000 tested\s+(\d+) with the condition: (\d+) positive, (\d+) negative\s+(\d+) without it: (\d+) positive, (\d+) negative")]
    private static partial Regex Expected();

    [GeneratedRegex(@"RULING (?:OUT|IN) WITH (?<test>\w+)[^\n]*\n-+\n\s+rule[^\n]*\n\s+cutoff\s+positive when (?<cutoff>[^(]*?) \(chosen[\s\S]*?positive\s+(?<tp>\d+)\s+(?<fp>\d+)\n\s+negative\s+(?<fn>\d+)\s+(?<tn>\d+)\n")]
    private static partial Regex Block();
}
