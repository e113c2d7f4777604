namespace DiagnosticAccuracy.Examples;

/// <summary>Writes the accuracy statement of a study: plain text, at most 80 columns wide.</summary>
internal sealed class Statement
{
    private const int Width = 80;
    private const int LabelWidth = 20;
    private const int ShareDecimals = 4;

    private readonly StudyDesign _design;
    private readonly Study _study;
    private readonly TextWriter _output;
    private readonly MethodsUsed _methods = new();
    private int _section;

    private Statement(StudyDesign design, Study study, TextWriter output)
    {
        _design = design;
        _study = study;
        _output = output;
    }

    public static void Write(StudyDesign design, Study study, TextWriter output) => new Statement(design, study, output).Write();

    private void Write()
    {
        Line("ACCURACY STATEMENT");
        Line(new string('=', Width));
        WhatWasRead();
        RocCurve[] curves = [.. Enumerable.Range(0, _design.Scores.Count).Select(Curve)];
        Areas(curves);
        if (_design.Scores.Count == 2)
        {
            Comparison();
        }

        for (int i = 0; i < curves.Length; i++)
        {
            Section($"RULING OUT WITH {_design.Scores[i].Name}", "a negative result is to exclude the condition");
            Choice(CutoffRule.SensitivityAtLeast(_design.RuleOutSensitivity).Choose(curves[i]));
            Section($"RULING IN WITH {_design.Scores[i].Name}", "a positive result is to establish the condition");
            Choice(CutoffRule.SpecificityAtLeast(_design.RuleInSpecificity).Choose(curves[i]));
        }

        Cautions();
        Methods();
    }

    private void WhatWasRead()
    {
        Section("WHAT WAS READ");
        Row("file", _design.File);
        Row("reference", $"{_design.StatusColumn}: {Values(_design.WithCondition)} = with the condition,");
        Row(string.Empty, $"{Values(_design.WithoutCondition)} = without it");
        Row("rows read", Figures.Count(_study.RowsRead));
        if (_design.IdColumn is { } id)
        {
            Row("subjects", $"named by {id}; no name comes twice");
        }

        LeftOutOf(_design.StatusColumn, "status not known");
        int with = _study.Subjects.Count(subject => subject.HasCondition);
        Row("status known", $"{_study.Subjects.Count}: {with} with the condition, {_study.Subjects.Count - with} without it");
        for (int i = 0; i < _design.Scores.Count; i++)
        {
            int test = i;
            Line();
            ScoreColumn column = _design.Scores[i];
            Row(column.Name, $"{Groups(_study.Subjects.Where(s => s.Scores[test] is not null))}");
            Row(string.Empty, column.Direction == ScoreDirection.HigherIsPositive ? "higher speaks for the condition" : "lower speaks for the condition");
            LeftOutOf(column.Name, "no result");
        }

        if (_design.Scores.Count == 2)
        {
            Line();
            Row("both tests", Groups(_study.Subjects.Where(IsComplete)));
        }
    }

    private void LeftOutOf(string what, string meaning)
    {
        foreach (LeftOut entry in _study.LeftOut.Where(entry => entry.What == what))
        {
            string groups = entry.StatusUnknown > 0
                ? string.Empty
                : $": {entry.WithCondition} with the condition, {entry.WithoutCondition} without it";
            Row("  left out", $"{entry.Rows} with {what} {entry.Reason} ({meaning}){groups}");
        }
    }

    private RocCurve Curve(int test)
    {
        Subject[] tested = [.. _study.Subjects.Where(subject => subject.Scores[test] is not null)];
        return tested.Length == 0
            ? throw new StudyException($"column '{_design.Scores[test].Name}': there is no result in it; at least one is needed")
            : RocCurve.Empirical(ScoredSample.FromRows(tested, s => s.Scores[test]!.Value, s => s.HasCondition, _design.Scores[test].Direction));
    }

    private void Areas(RocCurve[] curves)
    {
        Section("AREA UNDER THE ROC CURVE", _design.Confidence + " intervals");
        for (int i = 0; i < curves.Length; i++)
        {
            AreaUnderCurve area = curves[i].Area;
            Row(_design.Scores[i].Name, Estimate("areas", area, area.Interval(_design.Confidence), value => Figures.Share(value, 6)));
            Row("  standard error", Plain(area.StandardError, Figures.StandardError));
        }
    }

    private void Comparison()
    {
        string first = _design.Scores[0].Name;
        string second = _design.Scores[1].Name;
        Section($"COMPARISON: {first} minus {second}", "on the subjects with both results");
        if (!_study.Subjects.Any(IsComplete))
        {
            Row("difference", "undefined: no subject has both results");
            return;
        }

        PairedScores paired = PairedScores.FromRows(
            _study.Subjects, s => s.Scores[0], _design.Scores[0].Direction, s => s.Scores[1], _design.Scores[1].Direction, s => s.HasCondition);
        AreaComparison comparison = RocComparison.Paired(paired);
        Row("subjects", Groups(_study.Subjects.Where(IsComplete)));
        Row("left out", $"{paired.IncompleteSubjects} with a result of one test or none");
        Row($"area of {first}", Plain(comparison.First, value => Figures.Share(value, 6)));
        Row($"area of {second}", Plain(comparison.Second, value => Figures.Share(value, 6)));
        Row("difference", Estimate("difference of areas", comparison.Difference, comparison.Difference.Interval(_design.Confidence), value => Figures.Number(value, 6)));
        Row("  standard error", Plain(comparison.Difference.StandardError, Figures.StandardError));
        Row("correlation", Plain(comparison.Correlation, value => Figures.Number(value, 4)));
        Row("z", Plain(comparison.Z, value => Figures.Number(value, 4)));
        Row("p, two-sided", Plain(comparison.PValue, Figures.Probability));
    }

    private void Choice(CutoffChoice choice)
    {
        Row("rule", choice.Rule.ToString());
        if (!choice.IsDefined)
        {
            Row("cutoff", "undefined: " + choice.WhyUndefined);
            return;
        }

        OperatingPoint point = choice.Optima[0];
        ConfusionMatrix table = point.Table;
        Row("cutoff", $"positive when {point.Cutoff} (chosen on these data)");
        if (choice.IsTrivial)
        {
            string everybody = table.Negatives == 0 ? "every result is positive" : "no result is positive";
            Row(string.Empty, $"the target is out of reach: {everybody} here, which tells nobody apart");
        }

        Line();
        Line($"   {string.Empty,-20}{"with",12}{"without",12}");
        Line($"   {"positive",-20}{table.TruePositives,12}{table.FalsePositives,12}");
        Line($"   {"negative",-20}{table.FalseNegatives,12}{table.TrueNegatives,12}");
        Line();
        Share("sensitivity", table.Sensitivity);
        Share("specificity", table.Specificity);
        Ratio("LR positive", table.PositiveLikelihoodRatio);
        Ratio("LR negative", table.NegativeLikelihoodRatio);
        PredictiveValues values = table.PredictiveValuesAt(_design.Prevalence);
        Row("at prevalence", _design.Prevalence.ToString());
        Row("  PPV", Estimate("predictive values", values.Positive, values.Positive.Interval(_design.Confidence), value => Figures.Share(value, 6)));
        Row("  NPV", Estimate("predictive values", values.Negative, values.Negative.Interval(_design.Confidence), value => Figures.Share(value, 6)));
        Expected(table.ExpectedFor(1000, _design.Prevalence));
    }

    private void Expected(ExpectedCells cells)
    {
        if (!cells.IsDefined)
        {
            Row("of 1000 tested", "undefined: " + cells.WhyUndefined);
            return;
        }

        Row("of 1000 tested", $"{cells.WithCondition} with the condition: {cells.TruePositives} positive, {cells.FalseNegatives} negative");
        Row(string.Empty, $"{cells.WithoutCondition} without it: {cells.FalsePositives} positive, {cells.TrueNegatives} negative");
    }

    private void Share(string name, Proportion proportion) => Row(
        name,
        $"{$"{proportion.Successes}/{proportion.Trials}",-13} " + Estimate("sensitivity and specificity", proportion, proportion.Interval(_design.Confidence), value => Figures.Share(value, ShareDecimals)));

    private void Ratio(string name, ProportionRatio ratio) =>
        Row(name, $"{string.Empty,-13} " + Estimate("likelihood ratios", ratio, ratio.Interval(_design.Confidence), Figures.Ratio));

    private string Estimate(string kind, IQuantity quantity, ConfidenceInterval interval, Func<double, string> format)
    {
        if (!quantity.IsDefined)
        {
            return "undefined: " + quantity.WhyUndefined;
        }

        if (!interval.IsDefined)
        {
            return $"{format(quantity.Value)}; interval undefined: {interval.WhyUndefined}";
        }

        _methods.Add(kind, interval.Method);
        return $"{format(quantity.Value),-9} ({format(interval.Lower)} to {format(interval.Upper)})";
    }

    private static string Plain(IQuantity quantity, Func<double, string> format) =>
        quantity.IsDefined ? format(quantity.Value) : "undefined: " + quantity.WhyUndefined;

    private void Cautions()
    {
        Section("CAUTIONS");
        Bullet("The cutoffs were chosen and are judged on the same subjects: the figures at them are optimistic, and their intervals do not know that the cutoff was chosen. Confirm a cutoff on new subjects before it is used.");
        Bullet($"Predictive values and expected cells hold at the stated prevalence of {_design.Prevalence} only, which is taken as known. The study's own share with the condition is not used: where subjects were enrolled by status (an enriched design), it says nothing about the intended users.");
        Bullet("Sensitivity and specificity belong to the spectrum of subjects studied. Clear-cut cases and healthy controls can make a test look better than it will be among those it is meant for.");
        Bullet("An area averages over all cutoffs, most of which nobody would use. It does not say that a test is good enough for a purpose.");
        Bullet("Subjects without a result are left out above. Where failing is not by chance alone, accuracy in use differs from what is stated.");
        Bullet("Intervals are for independent subjects: not for several results of the same subject.");
        Bullet("This is a calculation, not a medical device and not advice. Whether and how a test is used is for local rules and licensed practice to decide.");
    }

    private void Methods()
    {
        Section("METHODS");
        string delong = _design.Scores.Count == 2 ? "standard errors and paired comparison" : "standard error";
        Bullet($"Empirical ROC curve; area as the Mann-Whitney share of pairs, ties counting one half; {delong} after DeLong, DeLong and Clarke-Pearson (1988).");
        Bullet($"Intervals: {_design.Confidence}; the methods that were used:");
        foreach (string method in _methods.Lines)
        {
            Bullet(method, indent: 6);
        }

        Bullet("Expected cells are rounded to whole people by largest remainders, so that they add up; a 0 among them may stand for less than one.");
        Bullet($"DiagnosticAccuracy {typeof(RocCurve).Assembly.GetName().Version?.ToString(3)}.");
    }

    private static bool IsComplete(Subject subject) => subject.Scores.All(score => score is not null);

    private static string Groups(IEnumerable<Subject> subjects)
    {
        int with = 0;
        int without = 0;
        foreach (Subject subject in subjects)
        {
            if (subject.HasCondition)
            {
                with++;
            }
            else
            {
                without++;
            }
        }

        return $"{with + without} subjects: {with} with the condition, {without} without it";
    }

    private static string Values(IReadOnlyList<string> values) => string.Join(" or ", values.Select(value => $"'{value}'"));

    private void Section(string title, string remark = "")
    {
        Line();
        _section++;
        Wrapped($"{_section}  {title}{(remark.Length == 0 ? string.Empty : $" ({remark})")}", 3);
        Line(new string('-', Width));
    }

    private void Row(string name, string text)
    {
        string label = Printable.Of("   " + name);
        if (label.Length > LabelWidth)
        {
            Wrapped(label, 5);
            label = string.Empty;
        }

        Wrapped($"{label.PadRight(LabelWidth)} {text}", LabelWidth + 1);
    }

    private void Bullet(string text, int indent = 3) => Wrapped($"{new string(' ', indent)}- {text}", indent + 2);

    // Breaks at spaces; a word that is longer than a line is broken where the line ends.
    private void Wrapped(string text, int indent)
    {
        string rest = Printable.Of(text);
        while (rest.Length > Width)
        {
            int cut = rest.LastIndexOf(' ', Width);
            if (cut <= indent)
            {
                cut = Width;
            }

            Line(rest[..cut].TrimEnd());
            rest = new string(' ', indent) + rest[cut..].TrimStart();
        }

        Line(rest);
    }

    private void Line(string text = "") => _output.WriteLine(text.TrimEnd());
}
