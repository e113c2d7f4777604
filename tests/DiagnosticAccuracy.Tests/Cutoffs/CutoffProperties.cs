using DiagnosticAccuracy.Tests.Roc;
using FsCheck.Xunit;

namespace DiagnosticAccuracy.Tests.Cutoffs;

[Properties(Arbitrary = [typeof(SampleArbitrary)], MaxTest = 300)]
public class CutoffProperties
{
    private static readonly double[] Targets = [0, 0.25, 0.5, 2 / 3.0, 0.75, 0.9, 1];

    [Property]
    public void Sensitivity_at_least_is_the_best_by_looking_at_all(SampleCase data)
    {
        RocCurve curve = RocCurve.Empirical(data.Sample());
        foreach (double target in Targets)
        {
            OperatingPoint best = curve.Points
                .Where(p => p.Sensitivity.Value >= target)
                .OrderByDescending(p => p.Specificity.Value)
                .ThenByDescending(p => p.Sensitivity.Value)
                .First();
            Assert.Equal([best], CutoffRule.SensitivityAtLeast(target).Choose(curve).Optima);
        }
    }

    [Property]
    public void Specificity_at_least_is_the_best_by_looking_at_all(SampleCase data)
    {
        RocCurve curve = RocCurve.Empirical(data.Sample());
        foreach (double target in Targets)
        {
            OperatingPoint best = curve.Points
                .Where(p => p.Specificity.Value >= target)
                .OrderByDescending(p => p.Sensitivity.Value)
                .ThenByDescending(p => p.Specificity.Value)
                .First();
            Assert.Equal([best], CutoffRule.SpecificityAtLeast(target).Choose(curve).Optima);
        }
    }

    [Property]
    public void The_largest_Youden_index_has_all_its_optima(SampleCase data)
    {
        RocCurve curve = RocCurve.Empirical(data.Sample());
        long n1 = data.With.Length;
        long n0 = data.Without.Length;
        long Scaled(OperatingPoint p) => (p.Table.TruePositives * n0) - (p.Table.FalsePositives * n1);
        long largest = curve.Points.Max(Scaled);
        CutoffChoice choice = CutoffRule.LargestYoudenIndex.Choose(curve);
        Assert.Equal(curve.Points.Where(p => Scaled(p) == largest), choice.Optima);
        Assert.True(choice.IsDefined);
    }
}
