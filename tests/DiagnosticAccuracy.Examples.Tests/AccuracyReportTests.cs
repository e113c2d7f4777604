namespace DiagnosticAccuracy.Examples.Tests;

public sealed class AccuracyReportTests : IDisposable
{
    private readonly string _file = Path.GetTempFileName();

    public void Dispose() => File.Delete(_file);

    [Fact]
    public void The_demo_study_prints_its_statement()
    {
        string text = ReportRun.Succeeds();
        Assert.Contains("ACCURACY STATEMENT", text, StringComparison.Ordinal);
        Assert.Contains("left out          6 with a result of one test or none", text, StringComparison.Ordinal);
        Assert.Contains("not a medical device", text, StringComparison.Ordinal);
        Assert.Contains("'indeterminate' (status not known)", text, StringComparison.Ordinal);
    }

    [Fact]
    public void The_pancreatic_markers_have_the_areas_z_and_p_of_the_reference()
    {
        // See tests/DiagnosticAccuracy.Tests/Data/markers-expected.json.
        string text = ReportRun.Succeeds(Pancreatic());
        Assert.Contains("0.861438", text, StringComparison.Ordinal);
        Assert.Contains("0.705556", text, StringComparison.Ordinal);
        Assert.Contains("z                 2.7221", text, StringComparison.Ordinal);
        Assert.Contains("p, two-sided      0.006488", text, StringComparison.Ordinal);
    }

    [Fact]
    public void The_biopsy_features_leave_out_the_missing_ones_and_say_so()
    {
        string text = ReportRun.Succeeds(
            Repository.Data("breast-biopsy.csv"), "--status", "class", "--with-condition", "malignant", "--without-condition", "benign",
            "--score", "V1:higher", "--score", "V6:higher", "--no-result", "NA", "--prevalence", "0.05",
            "--rule-out-sensitivity", "1", "--rule-in-specificity", "1");
        Assert.Contains("16 with V6 'NA' (no result)", text, StringComparison.Ordinal);
        Assert.Contains("683 subjects: 239 with the condition, 444 without it", text, StringComparison.Ordinal);
        Assert.Contains("z                 -2.6551", text, StringComparison.Ordinal);
        Assert.Contains("infinite", text, StringComparison.Ordinal);
        Assert.Contains("since the log method has no limit with an empty cell", ReportRun.Unwrapped(text), StringComparison.Ordinal);
    }

    [Fact]
    public void No_line_is_wider_than_80_columns_and_all_text_is_ascii()
    {
        foreach (string text in new[] { ReportRun.Succeeds(), ReportRun.Succeeds(Pancreatic()) })
        {
            Assert.All(text.Split('\n'), line => Assert.True(line.Length <= 80, line));
            Assert.All(text, character => Assert.InRange(character, '\n', '~'));
        }
    }

    [Fact]
    public void One_group_only_is_undefined_with_its_reason_not_an_error()
    {
        File.WriteAllText(_file, "status,score\n1,2\n1,3\n");
        string text = ReportRun.Succeeds(ReportRun.Options(_file));
        Assert.Contains("undefined: no subject is without the condition", text, StringComparison.Ordinal);
    }

    [Fact]
    public void A_result_that_separates_the_groups_is_stated_with_limits()
    {
        File.WriteAllText(_file, "status,score\n1,2\n1,3\n0,1\n0,0\n");
        string text = ReportRun.Unwrapped(ReportRun.Succeeds(ReportRun.Options(_file)));
        Assert.Contains("1.000000", text, StringComparison.Ordinal);
        Assert.Contains("score-type (Newcombe 2006, method 5), the DeLong variance being zero", text, StringComparison.Ordinal);
        Assert.DoesNotContain("NaN", text, StringComparison.Ordinal);
    }

    [Theory]
    [InlineData("status,score\n1,2\n2,3\n", "column 'status', line 3: status '2' was not declared")]
    [InlineData("status,score\n1,2\n,3\n", "column 'status', line 3: status (empty) was not declared")]
    [InlineData("status,score\n1,2\n0,x\n", "column 'score', line 3: 'x' is not a number")]
    [InlineData("status,score\n1,2\n0,NaN\n", "column 'score', line 3: 'NaN' is not a number")]
    [InlineData("status,other\n1,2\n", "there is no column 'score'; the columns are status, other")]
    [InlineData("status,score,score\n1,2,3\n", "2 columns are called 'score'")]
    [InlineData("status,score\n1,\n0,\n", "column 'score': there is no result in it")]
    [InlineData("status,score\n", "there is a heading line and no subject below it")]
    [InlineData("", "the file is empty")]
    public void What_is_wrong_in_the_file_is_named_with_its_place(string content, string expected)
    {
        File.WriteAllText(_file, content);
        Assert.Contains(expected, ReportRun.Fails(ReportRun.Options(_file)), StringComparison.Ordinal);
    }

    [Theory]
    [InlineData("--prevalence", "1.5", "--prevalence is '1.5'; allowed is a share from 0 to 1")]
    [InlineData("--prevalence", "NaN", "--prevalence is 'NaN'; allowed is a share from 0 to 1")]
    [InlineData("--confidence", "1", "--confidence is '1'; allowed is a level above 0 and below 1")]
    [InlineData("--confidence", "0", "--confidence is '0'; allowed is a level above 0 and below 1")]
    [InlineData("--confidence", "NaN", "--confidence is 'NaN'; allowed is a level above 0 and below 1")]
    [InlineData("--rule-out-sensitivity", "2", "--rule-out-sensitivity is '2'; allowed is a share above 0, at most 1")]
    [InlineData("--rule-in-specificity", "all", "--rule-in-specificity is 'all'; allowed is a share above 0, at most 1")]
    [InlineData("--score", "score", "--score score: allowed is COLUMN:higher or COLUMN:lower")]
    [InlineData("--score", "score:up", "--score score:up: allowed is COLUMN:higher or COLUMN:lower")]
    [InlineData("--with-condition", "0", "status '0' is declared more than once")]
    public void What_is_wrong_in_the_options_is_named(string option, string value, string expected)
    {
        File.WriteAllText(_file, "status,score\n1,2\n0,1\n");
        string[] options = ReportRun.Options(_file);
        int place = Array.IndexOf(options, option);
        if (place < 0)
        {
            options = [.. options, option, value];
        }
        else
        {
            options[place + 1] = value;
        }

        Assert.Contains(expected, ReportRun.Fails(options), StringComparison.Ordinal);
    }

    [Fact]
    public void A_missing_file_a_missing_option_and_an_unknown_option_are_errors_of_one_line()
    {
        string[] options = ReportRun.Options(_file);
        Assert.Contains("there is no such file", ReportRun.Fails(["nowhere.csv", .. options[1..]]), StringComparison.Ordinal);
        Assert.Contains("--prevalence", ReportRun.Fails([.. options.TakeWhile(o => o != "--prevalence"), .. options.SkipWhile(o => o != "--prevalence").Skip(2)]), StringComparison.Ordinal);
        Assert.Contains("--colour", ReportRun.Fails([.. options, "--colour", "red"]), StringComparison.Ordinal);
    }

    [Fact]
    public void Help_is_printed_when_asked_for() =>
        Assert.Contains("--rule-out-sensitivity", ReportRun.Succeeds("--help"), StringComparison.Ordinal);

    private static string[] Pancreatic() =>
    [
        Repository.Data("pancreatic-markers.csv"), "--status", "d", "--with-condition", "1", "--without-condition", "0",
        "--score", "ca199:higher", "--score", "ca125:higher", "--prevalence", "0.01",
        "--rule-out-sensitivity", "0.95", "--rule-in-specificity", "0.98",
    ];
}
