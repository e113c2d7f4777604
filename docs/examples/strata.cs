#:project ../../src/DiagnosticAccuracy/DiagnosticAccuracy.csproj

using DiagnosticAccuracy;

// Three blood centres ran the optical assay on units of their own.
StratifiedTables centres = StratifiedTables.Create(
[
    new ConfusionMatrix(30, 5, 1, 140),
    new ConfusionMatrix(14, 4, 2, 110),
    new ConfusionMatrix(11, 3, 0, 80),
]);
Console.WriteLine(centres);
Console.WriteLine($"sensitivity by size {centres.Sensitivity()}, {centres.Sensitivity().Interval()}");
Console.WriteLine($"sensitivity, centres alike {centres.Sensitivity(StratumWeighting.Equal)}");
Console.WriteLine($"LR+ {centres.PositiveLikelihoodRatio}, {centres.PositiveLikelihoodRatio.Interval()}");
Console.WriteLine($"odds ratio {centres.DiagnosticOddsRatio}, {centres.DiagnosticOddsRatio.Interval()}");
Console.WriteLine(centres.OddsRatioHomogeneity);
Console.WriteLine(centres.SensitivityHomogeneity);

// At a stricter cutoff no centre had a false positive: the ratio is infinite, its lower limit is not.
StratifiedTables strict = StratifiedTables.Create([new(24, 0, 7, 145), new(11, 0, 5, 114), new(9, 0, 2, 83)]);
Console.WriteLine($"LR+ {strict.PositiveLikelihoodRatio}, {strict.PositiveLikelihoodRatio.Interval()}");
