using FsCheck.Fluent;
using FsCheck.Xunit;

namespace DiagnosticAccuracy.Tests.Tables;

public class PairedConfusionMatrixTests
{
    private static readonly PairedConfusionMatrix Tables = new(new PairedTable(43, 9, 4, 2), new PairedTable(5, 4, 12, 321));

    private sealed record Unit(bool Optical, bool Lactate, bool Grew);

    [Fact]
    public void Each_test_has_its_table()
    {
        Assert.Equal(new ConfusionMatrix(52, 9, 6, 333), Tables.First);
        Assert.Equal(new ConfusionMatrix(47, 17, 11, 325), Tables.Second);
        Assert.Equal(Tables.First, Tables.Swapped.Second);
        Assert.Equal(400, Tables.Total);
    }

    [Fact]
    public void Differences_and_ratios_are_those_of_the_two_tables()
    {
        Assert.Equal(Tables.First.Sensitivity, Tables.SensitivityDifference.First);
        Assert.Equal(Tables.Second.Sensitivity, Tables.SensitivityDifference.Second);
        Assert.Equal(Tables.First.Specificity, Tables.SpecificityDifference.First);
        Assert.Equal(Tables.Second.Specificity, Tables.SpecificityDifference.Second);
        Assert.Equal(Tables.First.Specificity.Value - Tables.Second.Specificity.Value, Tables.SpecificityDifference.Value, 1e-15);
        Assert.Equal(52.0 / 47, Tables.RelativeSensitivity.Value, 1e-15);
        Assert.Equal(9.0 / 17, Tables.RelativeFalsePositiveRate.Value, 1e-15);
        Assert.Equal("52/58 - 47/58 = 0.0862069 (paired)", Tables.SensitivityDifference.ToString());
        Assert.Equal("(52/58) / (47/58) = 1.10638 (paired)", Tables.RelativeSensitivity.ToString());
        Assert.Equal(Tables.RelativeSensitivity, new PairedRatio(Tables.WithCondition));
        Assert.Equal(Tables.SensitivityDifference.GetHashCode(), new PairedDifference(Tables.WithCondition).GetHashCode());
    }

    [Property]
    public void Rows_spans_and_counting_by_hand_agree(bool[] first)
    {
        Random random = new(first.Length);
        Unit[] units = [.. first.Select(f => new Unit(f, random.Next(2) == 0, random.Next(3) == 0))];
        PairedConfusionMatrix rows = PairedConfusionMatrix.FromRows(units, u => u.Optical, u => u.Lactate, u => u.Grew);
        PairedConfusionMatrix spans = PairedConfusionMatrix.Create(first, units.Select(u => u.Lactate).ToArray(), units.Select(u => u.Grew).ToArray());
        Assert.Equal(rows, spans);
        Assert.Equal(units.Count(u => u is { Optical: true, Lactate: true, Grew: true }), rows.WithCondition.BothPositive);
        Assert.Equal(units.Count(u => u is { Optical: true, Lactate: false, Grew: true }), rows.WithCondition.FirstOnly);
        Assert.Equal(units.Count(u => u is { Optical: false, Lactate: true, Grew: false }), rows.WithoutCondition.SecondOnly);
        Assert.Equal(units.Count(u => u is { Optical: false, Lactate: false, Grew: false }), rows.WithoutCondition.BothNegative);
        PairedTable all = PairedTable.Create(first, units.Select(u => u.Lactate).ToArray());
        Assert.Equal(rows.WithCondition + rows.WithoutCondition, all);
        Assert.Equal(all, PairedTable.FromRows(units, u => u.Optical, u => u.Lactate));
        Assert.Equal(rows + rows, new PairedConfusionMatrix(rows.WithCondition + rows.WithCondition, rows.WithoutCondition + rows.WithoutCondition));
    }

    [Fact]
    public void Bad_input_is_named()
    {
        Assert.Throws<ArgumentOutOfRangeException>("bothPositive", () => new PairedTable(-1, 0, 0, 0));
        Assert.Throws<ArgumentOutOfRangeException>("firstOnly", () => new PairedTable(0, -1, 0, 0));
        Assert.Throws<ArgumentOutOfRangeException>("secondOnly", () => new PairedTable(0, 0, -1, 0));
        Assert.Throws<ArgumentOutOfRangeException>("bothNegative", () => new PairedTable(0, 0, 0, -1));
        Assert.Throws<OverflowException>(() => new PairedTable(long.MaxValue, 1, 0, 0));
        Assert.Throws<OverflowException>(() => new PairedConfusionMatrix(new PairedTable(long.MaxValue, 0, 0, 0), new PairedTable(1, 0, 0, 0)));
        Assert.Throws<OverflowException>(() => new PairedTable(long.MaxValue, 0, 0, 0) + new PairedTable(0, 1, 0, 0));
        Assert.Throws<ArgumentException>("second", () => PairedTable.Create([true], [true, false]));
        Assert.Throws<ArgumentException>("hasCondition", () => PairedConfusionMatrix.Create([true], [true], []));
        Assert.Throws<ArgumentNullException>("rows", () => PairedTable.FromRows<Unit>(null!, u => u.Optical, u => u.Lactate));
        Assert.Throws<ArgumentNullException>("second", () => PairedTable.FromRows<Unit>([], u => u.Optical, null!));
        Assert.Throws<ArgumentNullException>("hasCondition", () => PairedConfusionMatrix.FromRows<Unit>([], u => u.Optical, u => u.Lactate, null!));
    }

    [Fact]
    public void An_empty_group_says_which()
    {
        PairedConfusionMatrix empty = PairedConfusionMatrix.Create([], [], []);
        Assert.Equal(default, empty);
        Assert.Equal(UndefinedCause.NoSubjectsWithCondition, empty.SensitivityDifference.WhyUndefined?.Cause);
        Assert.Equal(UndefinedCause.NoSubjectsWithoutCondition, empty.SpecificityDifference.WhyUndefined?.Cause);
        Assert.Equal(UndefinedCause.NoSubjectsWithoutCondition, empty.SpecificityDifference.Interval().WhyUndefined?.Cause);
        Assert.Equal(UndefinedCause.NoSubjectsWithCondition, empty.RelativeSensitivity.Interval().WhyUndefined?.Cause);
        Assert.Equal(
            "with condition: both 0, first only 0, second only 0, neither 0; without condition: both 0, first only 0, second only 0, neither 0", empty.ToString());
    }
}
