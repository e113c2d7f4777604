using System.CommandLine;
using System.CommandLine.Help;
using System.Globalization;

namespace DiagnosticAccuracy.Examples;

/// <summary>The options of the program.</summary>
internal sealed class ReportCommand
{
    private readonly Argument<string> _file = new("file") { Description = "A CSV file with a heading line and one line for each subject." };

    private readonly Option<string> _status = Required("--status", "COLUMN", "The column with the status by the reference standard.");
    private readonly Option<string[]> _with = Several("--with-condition", "VALUE", "A status value that means: with the condition. May be given several times.", true);
    private readonly Option<string[]> _without = Several("--without-condition", "VALUE", "A status value that means: without the condition. May be given several times.", true);
    private readonly Option<string[]> _unknown = Several("--status-unknown", "VALUE", "A status value that means: not known. Such subjects are counted and left out. An empty field is declared as \"\".", false);
    private readonly Option<string[]> _score = Several("--score", "COLUMN:WAY", "A column of scores and its direction, COLUMN:higher or COLUMN:lower, the way that speaks for the condition. Once or twice.", true);
    private readonly Option<string[]> _noResult = Several("--no-result", "TEXT", "A text in a score column that means: no result. Such results are counted and left out.", false);
    private readonly Option<string> _prevalence = Required("--prevalence", "SHARE", "The share of the intended users with the condition, from 0 to 1.");
    private readonly Option<string> _ruleOut = Required("--rule-out-sensitivity", "SHARE", "The sensitivity wanted for ruling out, above 0 and at most 1.");
    private readonly Option<string> _ruleIn = Required("--rule-in-specificity", "SHARE", "The specificity wanted for ruling in, above 0 and at most 1.");
    private readonly Option<string> _id = new("--id") { HelpName = "COLUMN", Description = "The column that names each subject; a name that comes twice is an error." };
    private readonly Option<string> _confidence = new("--confidence")
    {
        HelpName = "LEVEL",
        Description = "The confidence level of the two-sided intervals, above 0 and below 1.",
        DefaultValueFactory = _ => "0.95",
    };

    private readonly RootCommand _root;

    public ReportCommand()
    {
        _root = new RootCommand("States the accuracy of one or two tests from a file of scores and reference status. Without arguments: the demo study.")
        {
            _file, _status, _with, _without, _unknown, _score, _noResult, _id, _prevalence, _ruleOut, _ruleIn, _confidence,
        };
        foreach (HelpAction help in _root.Options.Select(option => option.Action).OfType<HelpAction>())
        {
            help.MaxWidth = 80;
        }
    }

    public ParseResult Parse(IReadOnlyList<string> args) => _root.Parse(args);

    public StudyDesign Design(ParseResult parsed)
    {
        string[] scores = parsed.GetValue(_score) ?? [];
        if (scores.Length > 2)
        {
            throw new StudyException($"--score is given {scores.Length} times; allowed is once or twice");
        }

        return new StudyDesign
        {
            File = parsed.GetValue(_file)!,
            StatusColumn = parsed.GetValue(_status)!,
            IdColumn = parsed.GetValue(_id),
            WithCondition = parsed.GetValue(_with)!,
            WithoutCondition = parsed.GetValue(_without)!,
            StatusUnknown = parsed.GetValue(_unknown) ?? [],
            NoResult = parsed.GetValue(_noResult) ?? [],
            Scores = [.. scores.Select(ScoreColumn.Parse)],
            Prevalence = new Prevalence(Number(parsed, _prevalence, "a share from 0 to 1", x => x is >= 0 and <= 1)),
            RuleOutSensitivity = Number(parsed, _ruleOut, "a share above 0, at most 1", x => x is > 0 and <= 1),
            RuleInSpecificity = Number(parsed, _ruleIn, "a share above 0, at most 1", x => x is > 0 and <= 1),
            Confidence = Confidence.TwoSided(Number(parsed, _confidence, "a level above 0 and below 1", x => x is > 0 and < 1)),
        };
    }

    private static double Number(ParseResult parsed, Option<string> option, string allowed, Predicate<double> isAllowed)
    {
        string text = parsed.GetValue(option)!;
        return double.TryParse(text, NumberStyles.Float, CultureInfo.InvariantCulture, out double value) && isAllowed(value)
            ? value
            : throw new StudyException($"{option.Name} is '{text}'; allowed is {allowed}");
    }

    private static Option<string> Required(string name, string helpName, string description) => new(name) { HelpName = helpName, Description = description, Required = true };

    private static Option<string[]> Several(string name, string helpName, string description, bool required) =>
        new(name) { HelpName = helpName, Description = description, Required = required, Arity = required ? ArgumentArity.OneOrMore : ArgumentArity.ZeroOrMore };
}
