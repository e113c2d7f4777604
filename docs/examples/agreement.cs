#:project ../../src/DiagnosticAccuracy/DiagnosticAccuracy.csproj

using DiagnosticAccuracy;

// The optical assay against the lactate assay, which is no reference standard.
AgreementTable table = new(bothPositive: 48, testOnlyPositive: 19, comparatorOnlyPositive: 26, bothNegative: 307);
Console.WriteLine($"PPA {table.PositivePercentAgreement}, {table.PositivePercentAgreement.Interval()}");
Console.WriteLine($"NPA {table.NegativePercentAgreement}, {table.NegativePercentAgreement.Interval()}");
Console.WriteLine($"OPA {table.OverallPercentAgreement}");
Console.WriteLine($"PPA with the other as comparator {table.Swapped.PositivePercentAgreement}");

RatingTable ratings = table.ToRatingTable();
Kappa kappa = ratings.CohenKappa();
Console.WriteLine($"kappa {kappa}, {kappa.Interval()}");
Console.WriteLine($"PABAK {ratings.PrevalenceAndBiasAdjustedKappa}, AC1 {ratings.FirstOrderAgreementCoefficient}, Scott's pi {ratings.ScottPi}");
Console.WriteLine($"agreement on positive {ratings.SpecificAgreement(0)}, on negative {ratings.SpecificAgreement(1)}");

// Two readers grade 120 culture plates as no, some or heavy growth.
RatingTable plates = RatingTable.FromCounts([50, 6, 1, 5, 22, 6, 0, 4, 26], 3);
Console.WriteLine($"weighted kappa {plates.CohenKappa(KappaWeights.Quadratic)}, {plates.CohenKappa(KappaWeights.Quadratic).Interval()}");
