#:project ../../src/DiagnosticAccuracy/DiagnosticAccuracy.csproj

using DiagnosticAccuracy;

// Positive in the optical assay: 52 of 58 contaminated platelet units, and 9 of 342 others.
Proportion sensitivity = new(52, 58);
Proportion falsePositives = new(9, 342);

ProportionRatio likelihoodRatio = new(sensitivity, falsePositives);
Console.WriteLine(likelihoodRatio);
foreach (RatioMethod method in Enum.GetValues<RatioMethod>())
{
    Console.WriteLine(likelihoodRatio.Interval(default, method));
}

OddsRatio odds = new(sensitivity, falsePositives);
Console.WriteLine(odds);
foreach (OddsRatioMethod method in Enum.GetValues<OddsRatioMethod>())
{
    Console.WriteLine(odds.Interval(default, method));
}

// No false positive: the ratio is infinite, and what the data say is its lower limit.
ProportionRatio infinite = new(sensitivity, new Proportion(0, 342));
Console.WriteLine(infinite);
Console.WriteLine(infinite.Interval());
Console.WriteLine(new OddsRatio(sensitivity, new Proportion(0, 342)).Interval());
Console.WriteLine(new ProportionRatio(new Proportion(0, 58), new Proportion(0, 342)).Interval());
