namespace DiagnosticAccuracy.Examples.Tests;

/// <summary>A file that is not a well-formed table is refused with its place: no row may be lost or read as something else.</summary>
public sealed class MalformedFileTests : IDisposable
{
    private readonly string _file = Path.GetTempFileName();

    public void Dispose() => File.Delete(_file);

    [Theory]
    [InlineData("status,score\n1,2\n0\n", "line 3: there is 1 field; the heading has 2")]
    [InlineData("status,score\n1,2\n0,1,7\n", "line 3: there are 3 fields; the heading has 2")]
    [InlineData("status,score,note\n1,5,a\n0,3,\"b\n1,4,c\n0,1,d\n", "line 3: a quotation mark is not paired")]
    [InlineData("status,score,note\n1,5,a\n0,3,\"b\n1,4,c\n0,1,\"d\n1,9,e\n", "line 3: a field has quotation marks inside")]
    [InlineData("status,score,note\n1,5,a\n\n0,3,5\" wide\n1,4,c\n", "line 4: a quotation mark is not paired")]
    [InlineData("status,score\n1,2\n0,3\"4\"\n", "line 3: a field has quotation marks inside")]
    [InlineData("status,score\n1,2\n0,1e999\n", "column 'score', line 3: '1e999' is beyond the range of numbers")]
    [InlineData("status,score\n1,2\n0,-1e999\n", "column 'score', line 3: '-1e999' is beyond the range of numbers")]
    [InlineData("status;score\n1;2\n", "the columns are status;score; fields are separated by commas")]
    public void What_breaks_the_table_is_named_with_its_line(string content, string expected)
    {
        File.WriteAllText(_file, content);
        Assert.Contains(expected, ReportRun.Fails(ReportRun.Options(_file)), StringComparison.Ordinal);
    }

    [Theory]
    [InlineData("note,status,score\n\"a\nb\",1,2\n\"c\nd\",0,q\n", 4)]
    [InlineData("status,score,note\n1,2,\"a\nb\"\n0,q,\"c\nd\"\n", 4)]
    [InlineData("status,score,note\r\n1,2,\"a\r\nb\"\r\n0,q,\"c\r\nd\"\r\n", 4)]
    [InlineData("\nstatus,score\n\n\n1,2\n\n0,q\n", 7)]
    [InlineData("status,score,note\n1,2,a\n0,q,\"b\u2028c\u0085d\fe\"\n", 3)]
    [InlineData("status,score,note\r1,2,\"a\rb\"\r0,q,c\r", 4)]
    public void The_line_is_the_one_on_which_the_row_begins(string content, int line)
    {
        File.WriteAllText(_file, content);
        Assert.Contains($"column 'score', line {line}: 'q'", ReportRun.Fails(ReportRun.Options(_file)), StringComparison.Ordinal);
    }

    [Fact]
    public void Bytes_that_are_no_text_are_an_error_of_one_line_too()
    {
        Random random = new(20260903);
        for (int i = 0; i < 300; i++)
        {
            byte[] bytes = new byte[random.Next(1, 3000)];
            random.NextBytes(bytes);
            File.WriteAllBytes(_file, bytes);
            Assert.DoesNotContain("line -", ReportRun.Fails(ReportRun.Options(_file)), StringComparison.Ordinal);
            File.WriteAllBytes(_file, [.. "status,score\n1,2\n0,1\n"u8, .. bytes]);
            string error = ReportRun.Fails(ReportRun.Options(_file));
            Assert.Matches(@"^error: (column '[a-z]+', )?line ([4-9]|\d\d+): ", error);
        }
    }

    [Fact]
    public void Infinity_written_as_such_is_a_score_beyond_the_measuring_range()
    {
        File.WriteAllText(_file, "status,score\n1,Infinity\n0,-Infinity\n1,3\n0,2\n");
        Assert.Contains("4 subjects: 2 with the condition, 2 without it", ReportRun.Succeeds(ReportRun.Options(_file)), StringComparison.Ordinal);
    }

    [Fact]
    public void Spaces_around_headings_do_not_count()
    {
        File.WriteAllText(_file, " status , score \n1,2\n0,1\n");
        Assert.Contains("rows read         2", ReportRun.Succeeds(ReportRun.Options(_file)), StringComparison.Ordinal);
    }

    [Fact]
    public void A_folder_is_not_a_file() =>
        Assert.Contains("is a folder", ReportRun.Fails(ReportRun.Options(Path.GetTempPath())), StringComparison.Ordinal);

    [Theory]
    [InlineData("score", "lower")]
    [InlineData("status", "higher")]
    public void A_column_has_one_role(string column, string direction)
    {
        File.WriteAllText(_file, "status,score\n1,2\n0,1\n");
        string error = ReportRun.Fails(ReportRun.Options(_file, "--score", $"{column}:{direction}"));
        Assert.Contains($"column '{column}' is given more than one role", error, StringComparison.Ordinal);
    }

    [Theory]
    [InlineData("id,status,score\na,1,2\nb,0,1\na,0,3\n", "column 'id', line 4: 'a' was on line 2 already")]
    [InlineData("id,status,score\na,1,2\n,0,1\n", "column 'id', line 3: (empty) names no subject")]
    [InlineData("status,score\n1,2\n0,1\n", "there is no column 'id'")]
    public void A_subject_has_one_row(string content, string expected)
    {
        File.WriteAllText(_file, content);
        Assert.Contains(expected, ReportRun.Fails(ReportRun.Options(_file, "--id", "id")), StringComparison.Ordinal);
    }

    [Fact]
    public void What_stands_in_the_file_cannot_write_to_the_terminal()
    {
        File.WriteAllText(_file, "status,score\n1,2\n0,\u001b[2Jx\n");
        string error = ReportRun.Fails(ReportRun.Options(_file));
        Assert.Contains("'\\u001B[2Jx' is not a number", error, StringComparison.Ordinal);
        File.WriteAllText(_file, "status,score\n1,2\n0," + new string('x', 5000) + "\n");
        Assert.InRange(ReportRun.Fails(ReportRun.Options(_file)).Length, 1, 400);
        File.WriteAllText(_file, string.Join(',', Enumerable.Range(0, 900).Select(i => "column" + i)) + "\n1\n");
        Assert.InRange(ReportRun.Fails(ReportRun.Options(_file)).Length, 1, 600);
    }
}
