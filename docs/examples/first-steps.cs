#:project ../../src/DiagnosticAccuracy/DiagnosticAccuracy.csproj

using DiagnosticAccuracy;

double[] scores = [0.31, 0.48, 0.52, 0.55, 0.61, 0.67, 0.72, 0.90];
bool[] hasCondition = [false, false, true, false, false, true, true, true];

ScoredSample sample = ScoredSample.Create(scores, hasCondition, ScoreDirection.HigherIsPositive);
RocCurve curve = RocCurve.Empirical(sample);
Console.WriteLine($"area {curve.Area.Value:F3}, {curve.Area.Interval()}");

OperatingPoint point = CutoffRule.SensitivityAtLeast(0.95).Choose(curve).Optima[0];
Console.WriteLine($"positive when {point.Cutoff}: {point.Table}");
Console.WriteLine($"sensitivity {point.Sensitivity}, {point.Sensitivity.Interval()}");
Console.WriteLine(point.Table.PredictiveValuesAt(new Prevalence(0.002)));
