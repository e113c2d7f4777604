#:project ../../src/DiagnosticAccuracy/DiagnosticAccuracy.csproj

using DiagnosticAccuracy;

// Platelet units on which both assays were done: 58 in which bacteria grew, 342 in which they did not.
PairedConfusionMatrix assays = new(
    withCondition: new PairedTable(bothPositive: 43, firstOnly: 9, secondOnly: 4, bothNegative: 2),
    withoutCondition: new PairedTable(bothPositive: 5, firstOnly: 4, secondOnly: 12, bothNegative: 321));

// Is the optical assay (first) at most 10 points less sensitive than the lactate assay? The margin was stated before the study.
PairedDifferenceTest nonInferiority = DifferenceMargin.NonInferiority(0.10).Test(assays.SensitivityDifference);
Console.WriteLine(assays.SensitivityDifference);
Console.WriteLine(nonInferiority);
Console.WriteLine(nonInferiority.Interval());
Console.WriteLine(assays.WithCondition.McNemar());
Console.WriteLine(assays.WithCondition.McNemar(McNemarMethod.MidP));
Console.WriteLine();

Console.WriteLine(assays.SpecificityDifference);
foreach (PairedDifferenceMethod method in Enum.GetValues<PairedDifferenceMethod>())
{
    Console.WriteLine(assays.SpecificityDifference.Interval(default, method));
}

Console.WriteLine(DifferenceEquivalenceMargins.Within(0.05).Test(assays.SpecificityDifference));
Console.WriteLine();

Console.WriteLine(assays.RelativeSensitivity);
foreach (PairedRatioMethod method in Enum.GetValues<PairedRatioMethod>())
{
    Console.WriteLine(assays.RelativeSensitivity.Interval(default, method));
}

Console.WriteLine(RatioMargin.NonInferiority(0.9).Test(assays.RelativeSensitivity));
Console.WriteLine(RatioMargin.NonInferiorityWhereLessIsBetter(1.25).Test(assays.RelativeFalsePositiveRate));
Console.WriteLine();

// Only because these units were a cohort, taken without regard to growth.
PairedPredictiveValue positive = assays.CohortPredictiveValues.Positive;
Console.WriteLine(positive);
Console.WriteLine(positive.Test());
Console.WriteLine(positive.Test(PredictiveValueTestMethod.GeneralisedScore));
Console.WriteLine($"{positive.Relative}, {positive.Relative.Interval()}");
