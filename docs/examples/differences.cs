#:project ../../src/DiagnosticAccuracy/DiagnosticAccuracy.csproj

using DiagnosticAccuracy;

// Two assays on different contaminated platelet units: the optical one found 52 of 58, the lactate assay 47 of 60.
ProportionDifference difference = new(new Proportion(52, 58), new Proportion(47, 60));
Console.WriteLine(difference);
foreach (DifferenceMethod method in Enum.GetValues<DifferenceMethod>())
{
    Console.WriteLine(difference.Interval(default, method));
}

// The margin was stated before the study.
DifferenceTest nonInferiority = DifferenceMargin.NonInferiority(0.05).Test(difference);
Console.WriteLine(nonInferiority);
Console.WriteLine(nonInferiority.Interval(Confidence.LowerBound(0.975)));
Console.WriteLine(DifferenceMargin.Superiority().Test(difference));
