using FsCheck;
using FsCheck.Fluent;
using FsCheck.Xunit;

namespace DiagnosticAccuracy.Tests.Tables;

/// <summary>Laws of the paired intervals for counts of any size and levels of any height.</summary>
public class PairedIntervalProperties
{
    /// <summary>Cells from 0 to about 1e12, small ones as often as large ones.</summary>
    private static readonly Gen<PairedTable> Tables =
        from a in Cell()
        from b in Cell()
        from c in Cell()
        from d in Cell()
        where a + b + c + d > 0
        select new PairedTable(a, b, c, d);

    private static readonly Gen<double> Errors = Gen.Choose(1, 120).Select(i => Math.Pow(10, -i / 10.0));

    [Property(MaxTest = 1000)]
    public Property Differences_are_nested_mirrored_and_inside() => Prop.ForAll(
        (from table in Tables from first in Errors from second in Errors select (table, first, second)).ToArbitrary(),
        draw =>
        {
            (PairedTable table, double first, double second) = draw;
            foreach (PairedDifferenceMethod method in Enum.GetValues<PairedDifferenceMethod>())
            {
                ConfidenceInterval wide = table.Difference.Interval(Confidence.FromErrorProbability(Math.Min(first, second)), method);
                ConfidenceInterval narrow = table.Difference.Interval(Confidence.FromErrorProbability(Math.Max(first, second)), method);
                double tolerance = 1e-13 * wide.Width;
                Assert.True(-1 <= wide.Lower && wide.Upper <= 1, $"{table} {wide}");
                Assert.True(wide.Lower <= narrow.Lower + tolerance && narrow.Upper <= wide.Upper + tolerance, $"{table} {wide} {narrow}");
                if (method is not (PairedDifferenceMethod.BonettPrice or PairedDifferenceMethod.AgrestiMin))
                {
                    Assert.True(narrow.Contains(table.Difference.Value), $"{table} {narrow}");
                }

                ConfidenceInterval mirrored = table.Swapped.Difference.Interval(wide.Confidence, method);
                Assert.True(Math.Abs(wide.Lower + mirrored.Upper) <= Math.Max(tolerance, 1e-13 * Math.Abs(wide.Lower)), $"{table} {wide} {mirrored}");
                Assert.True(Math.Abs(wide.Upper + mirrored.Lower) <= Math.Max(tolerance, 1e-13 * Math.Abs(wide.Upper)), $"{table} {wide} {mirrored}");
            }
        });

    [Property(MaxTest = 1000)]
    public Property Ratios_are_nested_inverted_and_contain_the_ratio() => Prop.ForAll(
        (from table in Tables from first in Errors from second in Errors select (table, first, second)).ToArbitrary(),
        draw =>
        {
            (PairedTable table, double first, double second) = draw;
            if (!table.Ratio.IsDefined)
            {
                return;
            }

            foreach (PairedRatioMethod method in Enum.GetValues<PairedRatioMethod>())
            {
                ConfidenceInterval wide = table.Ratio.Interval(Confidence.FromErrorProbability(Math.Min(first, second)), method);
                ConfidenceInterval narrow = table.Ratio.Interval(Confidence.FromErrorProbability(Math.Max(first, second)), method);
                Assert.True(wide.Lower <= narrow.Lower * (1 + 1e-13) && narrow.Upper <= wide.Upper * (1 + 1e-13), $"{table} {wide} {narrow}");
                Assert.True(narrow.Contains(table.Ratio.Value), $"{table} {narrow}");
                ConfidenceInterval inverted = table.Ratio.Inverse.Interval(wide.Confidence, method);
                Assert.True(wide.Lower == 0 ? double.IsPositiveInfinity(inverted.Upper) : Math.Abs((wide.Lower * inverted.Upper) - 1) < 1e-12, $"{table} {wide} {inverted}");
            }
        });

    /// <summary>The smaller the p-value against a margin, the smaller the error at which the lower bound still clears it.</summary>
    [Property(MaxTest = 500)]
    public Property P_value_and_bound_meet_at_the_margin() => Prop.ForAll(
        (from table in Tables from margin in Gen.Choose(1, 60) select (table, margin: margin / 200.0)).ToArbitrary(),
        draw =>
        {
            double p = DifferenceMargin.NonInferiority(draw.margin).Test(draw.table.Difference).PValue.Value;
            if (p is > 1e-12 and < 0.4)
            {
                double bound = draw.table.Difference.Interval(Confidence.FromErrorProbability(p, IntervalSide.LowerBound)).Lower;
                Assert.Equal(-draw.margin, bound, 1e-10);
            }

            PairedRatio ratio = draw.table.Ratio;
            double q = ratio.IsDefined ? RatioMargin.NonInferiority(1 - draw.margin).Test(ratio).PValue.Value : 1;
            if (q is > 1e-12 and < 0.4)
            {
                Assert.Equal(1 - draw.margin, ratio.Interval(Confidence.FromErrorProbability(q, IntervalSide.LowerBound)).Lower, 1e-10);
            }
        });

    private static Gen<long> Cell() => from digits in Gen.Choose(0, 12)
                                       from value in Gen.Choose(0, 1_000_000)
                                       select (long)(value / 1e6 * Math.Pow(10, digits));
}
