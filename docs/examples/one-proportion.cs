#:project ../../src/DiagnosticAccuracy/DiagnosticAccuracy.csproj

using DiagnosticAccuracy;

// 57 of 58 contaminated platelet units were positive in the new optical assay.
Proportion sensitivity = new(57, 58);
Console.WriteLine($"sensitivity {sensitivity}");
foreach (ProportionMethod method in Enum.GetValues<ProportionMethod>())
{
    ConfidenceInterval interval = sensitivity.Interval(Confidence.TwoSided(0.95), method);
    double coverage = IntervalCoverage.At(method, 58, 0.98);
    CoverageMinimum least = IntervalCoverage.Minimum(method, 58, 0.90, 0.99);
    Console.WriteLine($"{method,-16} {interval.Lower:F4} to {interval.Upper:F4}  covers {coverage:F3} at .98, at least {least.Coverage:F3} from .90 to .99");
}

Console.WriteLine(sensitivity.Interval(Confidence.LowerBound(0.975), ProportionMethod.ClopperPearson));

// Both goals were stated before the study: sensitivity above .90 and specificity above .95, each at one-sided 2.5 %.
CoPrimaryGoals goals = new(PerformanceGoal.Above(0.90), PerformanceGoal.Above(0.95));
CoPrimaryResult result = goals.Test(sensitivity, new Proportion(338, 342));
Console.WriteLine(result.First);
Console.WriteLine(result.Second);
Console.WriteLine(result.IsMet ? "both goals are met" : "not both goals are met");
Console.WriteLine($"of 58 units {PerformanceGoal.Above(0.90).CriticalCount(58)} have to be positive");
