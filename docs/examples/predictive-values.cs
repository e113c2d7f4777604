#:project ../../src/DiagnosticAccuracy/DiagnosticAccuracy.csproj

using DiagnosticAccuracy;

ConfusionMatrix table = new(truePositives: 55, falsePositives: 12, falseNegatives: 3, trueNegatives: 330);

// The study was enriched; in use 2 of 1,000 units are contaminated.
PredictiveValues values = table.PredictiveValuesAt(new Prevalence(0.002));
Console.WriteLine($"positive {values.Positive}, {values.Positive.Interval()}");
Console.WriteLine($"negative {values.Negative}, {values.Negative.Interval()}");
Console.WriteLine(table.ExpectedFor(100_000, new Prevalence(0.002)));

// The prevalence itself was seen as 9 of 4,200 units.
EstimatedPredictiveValues estimated = table.PredictiveValuesAtEstimated(new Proportion(9, 4200));
Console.WriteLine($"positive {estimated.Positive}, {estimated.Positive.Interval()}");

// Or it was reported with an interval, here by a surveillance system.
EstimatedPrevalence reported = new(new Prevalence(0.0022), new ConfidenceInterval(0.0012, 0.0041, Confidence.TwoSided(0.95), "as reported"));
Console.WriteLine($"positive {table.PredictiveValuesAtEstimated(reported).Positive.Interval()}");

foreach (PredictiveValues at in table.PredictiveValuesOver([new Prevalence(0.0005), new Prevalence(0.002), new Prevalence(0.01)]))
{
    Console.WriteLine(at);
}
