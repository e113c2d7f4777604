using FsCheck.Xunit;

namespace DiagnosticAccuracy.Tests.Tables;

/// <summary>Tables counted from rows and from results, against counting with a filter for each cell.</summary>
public class CountedTableTests
{
    [Property(MaxTest = 100)]
    public void Counting_rows_and_results_agrees_with_a_filter_for_each_cell((bool Test, bool Other)[] rows)
    {
        ArgumentNullException.ThrowIfNull(rows);
        long Cell(bool test, bool other) => rows.Count(r => r.Test == test && r.Other == other);
        ConfusionMatrix expected = new(Cell(true, true), Cell(true, false), Cell(false, true), Cell(false, false));
        Assert.Equal(expected, ConfusionMatrix.FromRows(rows, r => r.Test, r => r.Other));
        Assert.Equal(expected, ConfusionMatrix.Create(rows.Select(r => r.Test).ToArray(), rows.Select(r => r.Other).ToArray()));

        AgreementTable agreement = AgreementTable.FromRows(rows, r => r.Test, r => r.Other);
        Assert.Equal(new AgreementTable(Cell(true, true), Cell(true, false), Cell(false, true), Cell(false, false)), agreement);

        // Positive first.
        RatingTable ratings = RatingTable.FromRows(rows, r => r.Test ? 0 : 1, r => r.Other ? 0 : 1, 2);
        Assert.Equal(agreement.ToRatingTable().ToString(), ratings.ToString());
        Assert.Equal(agreement.TestOnlyPositive, ratings[0, 1]);
        Assert.Equal(agreement.ComparatorOnlyPositive, ratings[1, 0]);
    }

    [Fact]
    public void Bad_rows_are_refused_by_name()
    {
        Assert.Equal("hasCondition", Assert.Throws<ArgumentException>(() => ConfusionMatrix.Create([true], [true, false])).ParamName);
        Assert.Equal("rows", Assert.Throws<ArgumentNullException>(() => ConfusionMatrix.FromRows<int>(null!, _ => true, _ => true)).ParamName);
        Assert.Equal("isPositive", Assert.Throws<ArgumentNullException>(() => ConfusionMatrix.FromRows([1], null!, _ => true)).ParamName);
        Assert.Equal("comparator", Assert.Throws<ArgumentNullException>(() => AgreementTable.FromRows([1], _ => true, null!)).ParamName);
        ArgumentOutOfRangeException error = Assert.Throws<ArgumentOutOfRangeException>(() => RatingTable.FromRows([0, 1, 3], x => x, _ => 0, 3));
        Assert.Contains("first of row 2 is 3; allowed is a category from 0 to 2", error.Message, StringComparison.Ordinal);
        Assert.Equal("categories", Assert.Throws<ArgumentOutOfRangeException>(() => RatingTable.FromRows([0], x => x, x => x, 1)).ParamName);
    }

    /// <summary>For two ratings the kappa of Fleiss is the pi of Scott, and so is its error by chance.</summary>
    [Property(MaxTest = 100)]
    public void Scott_pi_is_the_kappa_of_Fleiss_for_two_ratings((byte First, byte Second)[] rows)
    {
        ArgumentNullException.ThrowIfNull(rows);
        if (rows.Length == 0)
        {
            return;
        }

        RatingTable table = RatingTable.FromRows(rows, r => r.First % 3, r => r.Second % 3, 3);
        int[] counts = [.. rows.SelectMany(r => Enumerable.Range(0, 3).Select(c => (r.First % 3 == c ? 1 : 0) + (r.Second % 3 == c ? 1 : 0)))];
        Kappa fleiss = MultipleRaters.FromCounts(counts, 3).FleissKappa;
        Assert.Equal(fleiss.IsDefined, table.ScottPi.IsDefined);
        if (fleiss.IsDefined)
        {
            Assert.Equal(fleiss.Value, table.ScottPi.Value, 1e-12);
            Assert.Equal(fleiss.NullStandardError.Value, table.ScottPi.NullStandardError.Value, 1e-12);
        }
    }
}
