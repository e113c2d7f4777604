#:project ../../src/DiagnosticAccuracy/DiagnosticAccuracy.csproj

using DiagnosticAccuracy;

// Three assays on the same 16 platelet units.
bool[] contaminated = [true, true, true, true, true, true, true, false, false, false, false, false, false, false, false, false];
double[] optical = [0.6, 0.7, 0.9, 1.1, 1.4, 0.3, 2.3, 0.2, 0.1, 0.3, 0.5, 0.2, 0.4, 0.8, 0.1, 0.2];
double[] lactate = [12, 11, 14, 9.5, 16, 10.5, 13, 8, 9, 10.5, 9.5, 7.5, 12, 9, 8.5, 10];
double[] pH = [6.9, 7.0, 6.7, 7.1, 6.5, 7.2, 6.8, 7.3, 7.2, 7.1, 7.0, 7.3, 6.9, 7.2, 7.4, 7.1];

AreaComparison two = RocComparison.Paired(PairedScores.Create(
    optical, ScoreDirection.HigherIsPositive, lactate, ScoreDirection.HigherIsPositive, contaminated));
Console.WriteLine(two);
Console.WriteLine($"{two.Difference.Interval()}, correlation {two.Correlation}");
Console.WriteLine($"not inferior by .10: {two.Difference.Test(DifferenceMargin.NonInferiority(0.10))}");

PairedAreas three = PairedAreas.Of(PairedScores.Create(
[
    new TestScores("optical", optical, ScoreDirection.HigherIsPositive),
    new TestScores("lactate", lactate, ScoreDirection.HigherIsPositive),
    new TestScores("pH", pH, ScoreDirection.LowerIsPositive),
],
    contaminated));
Console.WriteLine(three);
Console.WriteLine($"all equal: {three.TestOfEquality()}");
foreach (PairwiseAreaDifference difference in three.SimultaneousDifferences())
{
    Console.WriteLine(difference);
}
