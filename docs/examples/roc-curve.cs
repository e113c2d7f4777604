#:project ../../src/DiagnosticAccuracy/DiagnosticAccuracy.csproj

using DiagnosticAccuracy;

// Optical readings of contaminated and clean platelet units; 9.9 is the end of the measuring range, above it reads infinity.
double[] contaminated = [0.38, 0.61, 0.72, 0.72, 0.85, 1.10, 1.42, 2.30, 5.1, double.PositiveInfinity];
double[] clean = [0.12, 0.15, 0.21, 0.22, 0.28, 0.31, 0.33, 0.38, 0.41, 0.45, 0.52, 0.72];
RocCurve curve = RocCurve.Empirical(ScoredSample.FromGroups(contaminated, clean, ScoreDirection.HigherIsPositive));
Console.WriteLine(curve);
Console.WriteLine($"pairs won {curve.Area.ConcordantPairs}, tied {curve.Area.TiedPairs}, of {curve.Area.Pairs}; standard error {curve.Area.StandardError}");
foreach (AreaMethod method in Enum.GetValues<AreaMethod>())
{
    Console.WriteLine(curve.Area.Interval(default, method));
}

foreach (AreaVarianceMethod method in Enum.GetValues<AreaVarianceMethod>())
{
    Console.WriteLine($"variance {method}: {curve.Area.VarianceBy(method)}");
}

Console.WriteLine(curve.TestOfChance(ChanceTestMethod.Exact, Alternative.Greater));
Console.WriteLine(curve.PartialArea(PartialAreaRange.OverFalsePositiveRate(0, 0.2)).Interval());
Console.WriteLine(curve.PartialArea(PartialAreaRange.OverSensitivity(0.8, 1)).Standardised);
FixedPoint fixedPoint = curve.SensitivityAtSpecificity(0.9);
Console.WriteLine($"{fixedPoint}, {fixedPoint.Interval()}");
Console.WriteLine(curve.At(Cutoff.AtOrAbove(0.5)));
Console.WriteLine(CutoffRule.SensitivityAtLeast(0.9).Choose(curve));
Console.WriteLine(CutoffRule.LargestYoudenIndex.Choose(curve));
