#:project ../../src/DiagnosticAccuracy/DiagnosticAccuracy.csproj

using DiagnosticAccuracy;

// The optical assay at its cutoff against culture: 58 contaminated platelet units, 342 clean ones, enriched study.
ConfusionMatrix table = new(truePositives: 55, falsePositives: 12, falseNegatives: 3, trueNegatives: 330);
Console.WriteLine($"sensitivity {table.Sensitivity}, {table.Sensitivity.Interval()}");
Console.WriteLine($"specificity {table.Specificity}, {table.Specificity.Interval()}");
Console.WriteLine($"Youden index {table.YoudenIndex.Value:F4}, {table.YoudenIndex.Interval()}");
Console.WriteLine($"LR+ {table.PositiveLikelihoodRatio.Value:F2}, {table.PositiveLikelihoodRatio.Interval()}");
Console.WriteLine($"LR- {table.NegativeLikelihoodRatio.Value:F4}, {table.NegativeLikelihoodRatio.Interval()}");
Console.WriteLine($"odds ratio {table.DiagnosticOddsRatio.Value:F1}, {table.DiagnosticOddsRatio.Interval()}");
Console.WriteLine($"balanced accuracy {table.BalancedAccuracy}, MCC {table.MatthewsCorrelation}, F1 {table.F1}, kappa {table.CohenKappa}");
Console.WriteLine(table.JointRegion());

// No clean unit positive: the ratio is infinite, its lower limit is not.
ConfusionMatrix clean = new(50, 0, 8, 342);
Console.WriteLine(clean.PositiveLikelihoodRatio.Interval());
Console.WriteLine(new ConfusionMatrix(55, 0, 3, 0).PositiveLikelihoodRatio);
