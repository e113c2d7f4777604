using DiagnosticAccuracy.Tests.Reference;
using FsCheck;
using FsCheck.Fluent;
using FsCheck.Xunit;

namespace DiagnosticAccuracy.Tests.Roc;

/// <summary>Small samples with many ties, infinities and both zeros.</summary>
public sealed record SampleCase(double[] With, double[] Without, ScoreDirection Direction)
{
    public ScoredSample Sample() => ScoredSample.FromGroups(With, Without, Direction);

    public override string ToString() => $"with [{string.Join(" ", With)}] without [{string.Join(" ", Without)}] {Direction}";
}

public static class SampleArbitrary
{
    private static readonly double[] Values =
        [double.NegativeInfinity, -1e300, -3, -1, -double.Epsilon, -0.0, 0.0, double.Epsilon, 0.1, 0.2, 0.3, 1, 2, 1e300, double.PositiveInfinity];

    public static Arbitrary<SampleCase> Samples()
    {
        Gen<double> score = Gen.OneOf(Gen.Elements(Values), Gen.Choose(-5, 5).Select(i => i / 4.0));
        Gen<double[]> scores = Gen.Choose(1, 12).SelectMany(n => score.ArrayOf(n));
        Gen<SampleCase> cases =
            from with in scores
            from without in scores
            from direction in Gen.Elements(ScoreDirection.HigherIsPositive, ScoreDirection.LowerIsPositive)
            select new SampleCase(with, without, direction);
        return cases.ToArbitrary();
    }
}

[Properties(Arbitrary = [typeof(SampleArbitrary)], MaxTest = 300)]
public class RocProperties
{
    [Property]
    public void The_area_is_the_share_of_pairs_won(SampleCase data)
    {
        AreaUnderCurve area = RocCurve.Empirical(data.Sample()).Area;
        Assert.Equal(SlowRoc.Area(data.With, data.Without, data.Direction), area.Value, 1e-14);
        Assert.Equal(area.Pairs, area.ConcordantPairs + area.TiedPairs + area.DiscordantPairs);
    }

    [Property]
    public void The_variance_is_DeLongs_from_its_definition(SampleCase data)
    {
        AreaUnderCurve area = RocCurve.Empirical(data.Sample()).Area;
        if (data.With.Length < 2 || data.Without.Length < 2)
        {
            Assert.Equal(UndefinedCause.TooFewSubjects, area.StandardError.WhyUndefined?.Cause);
            return;
        }

        Assert.Equal(SlowRoc.DeLongVariance(data.With, data.Without, data.Direction), area.Variance.Value, 1e-14);
    }

    [Property]
    public void Every_point_has_the_table_that_counting_gives(SampleCase data)
    {
        RocCurve curve = RocCurve.Empirical(data.Sample());
        Assert.Equal(data.With.Concat(data.Without).Select(x => x + 0.0).Distinct().Count() + 1, curve.Points.Count);
        Assert.Null(curve.Points[0].Cutoff.Score);
        foreach (OperatingPoint point in curve.Points)
        {
            Assert.Equal(data.With.Count(point.Cutoff.IsPositive), point.Table.TruePositives);
            Assert.Equal(data.Without.Count(point.Cutoff.IsPositive), point.Table.FalsePositives);
            Assert.Equal(data.With.Length, point.Table.WithCondition);
            Assert.Equal(data.Without.Length, point.Table.WithoutCondition);
            Assert.Equal(point, curve.At(point.Cutoff));
        }

        Assert.Equal(0, curve.Points[^1].Table.Negatives);
    }

    [Property]
    public void Any_cutoff_has_the_table_that_counting_gives(SampleCase data, NormalFloat score)
    {
        RocCurve curve = RocCurve.Empirical(data.Sample());
        Cutoff cutoff = data.Direction == ScoreDirection.HigherIsPositive ? Cutoff.AtOrAbove(score.Get) : Cutoff.AtOrBelow(score.Get);
        Assert.Equal(data.With.Count(cutoff.IsPositive), curve.At(cutoff).Table.TruePositives);
        Assert.Equal(data.Without.Count(cutoff.IsPositive), curve.At(cutoff).Table.FalsePositives);
    }

    [Property]
    public void The_trapezoids_under_the_points_add_up_to_the_area(SampleCase data)
    {
        RocCurve curve = RocCurve.Empirical(data.Sample());
        double sum = 0;
        for (int i = 1; i < curve.Points.Count; i++)
        {
            OperatingPoint left = curve.Points[i - 1];
            OperatingPoint right = curve.Points[i];
            sum += (left.Specificity.Value - right.Specificity.Value) * (left.Sensitivity.Value + right.Sensitivity.Value) / 2;
        }

        Assert.Equal(curve.Area.Value, sum, 1e-14);
    }

    [Property]
    public void The_order_of_subjects_and_the_door_they_came_in_do_not_matter(SampleCase data, int seed)
    {
        (double Score, bool Status)[] rows =
            [.. data.With.Select(x => (x, true)).Concat(data.Without.Select(x => (x, false))).OrderBy(x => HashOf(x, seed))];
        ScoredSample expected = data.Sample();
        ScoredSample[] others =
        [
            ScoredSample.Create([.. rows.Select(r => r.Score)], [.. rows.Select(r => r.Status)], data.Direction),
            ScoredSample.FromRows(rows, r => r.Score, r => r.Status, data.Direction),
            ScoredSample.FromCounts(
                [.. rows.Select(r => r.Score)], [.. rows.Select(r => r.Status ? 1L : 0)], [.. rows.Select(r => r.Status ? 0L : 1)], data.Direction),
            PairedScores.Create(
                [.. rows.Select(r => r.Score)], data.Direction, [.. rows.Select(r => -r.Score)], data.Direction, [.. rows.Select(r => r.Status)]).First,
        ];
        foreach (ScoredSample other in others)
        {
            Assert.Equal(expected.Levels, other.Levels);
            Assert.Equal(RocCurve.Empirical(expected).Area.Value, RocCurve.Empirical(other).Area.Value);
            Assert.Equal(RocCurve.Empirical(expected).Area.Variance, RocCurve.Empirical(other).Area.Variance);
        }
    }

    [Property]
    public void The_area_without_a_sample_is_the_area_of_the_sample(SampleCase data)
    {
        AreaUnderCurve direct = AreaUnderCurve.FromScores(
            [.. data.With, .. data.Without], [.. data.With.Select(_ => true), .. data.Without.Select(_ => false)], data.Direction);
        AreaUnderCurve area = AreaUnderCurve.Of(data.Sample());
        Assert.Equal(area.Value, direct.Value);
        Assert.Equal(area.Variance, direct.Variance);
        Assert.Equal(area.ConcordantPairs, direct.ConcordantPairs);
        Assert.Equal(area.TiedPairs, direct.TiedPairs);
    }

    [Property]
    public void Negated_scores_with_the_other_direction_change_nothing(SampleCase data)
    {
        ScoreDirection opposite = data.Direction == ScoreDirection.HigherIsPositive ? ScoreDirection.LowerIsPositive : ScoreDirection.HigherIsPositive;
        RocCurve curve = RocCurve.Empirical(data.Sample());
        RocCurve mirrored = RocCurve.Empirical(ScoredSample.FromGroups([.. data.With.Select(x => -x)], [.. data.Without.Select(x => -x)], opposite));
        Assert.Equal(curve.Area.Value, mirrored.Area.Value);
        Assert.Equal(curve.Area.Variance, mirrored.Area.Variance);
        Assert.Equal(curve.Points.Select(p => p.Table), mirrored.Points.Select(p => p.Table));
    }

    [Property]
    public void Swapping_the_groups_gives_one_minus_the_area_with_the_same_variance(SampleCase data)
    {
        AreaUnderCurve area = RocCurve.Empirical(data.Sample()).Area;
        AreaUnderCurve swapped = RocCurve.Empirical(ScoredSample.FromGroups(data.Without, data.With, data.Direction)).Area;
        Assert.Equal(area.ConcordantPairs, swapped.DiscordantPairs);
        Assert.Equal(1 - area.Value, swapped.Value, 1e-15);
        Assert.Equal(area.Variance.Value, swapped.Variance.Value, 1e-15);
    }

    [Property]
    public void Every_subject_twice_leaves_the_area_and_the_curve_alone(SampleCase data)
    {
        RocCurve once = RocCurve.Empirical(data.Sample());
        RocCurve twice = RocCurve.Empirical(ScoredSample.FromGroups([.. data.With, .. data.With], [.. data.Without, .. data.Without], data.Direction));
        RocCurve counted = RocCurve.Empirical(ScoredSample.FromCounts(
            [.. once.Sample.Levels.Select(l => l.Score)],
            [.. once.Sample.Levels.Select(l => 2 * l.WithCondition)],
            [.. once.Sample.Levels.Select(l => 2 * l.WithoutCondition)],
            data.Direction));
        Assert.Equal(once.Area.Value, twice.Area.Value);
        Assert.Equal(twice.Area.Variance, counted.Area.Variance);
        Assert.Equal(twice.Points, counted.Points);
        Assert.Equal(once.Points.Select(p => p.Sensitivity.Value), twice.Points.Select(p => p.Sensitivity.Value));
    }

    [Property]
    public void Intervals_stay_inside_contain_the_area_and_nest(SampleCase data)
    {
        AreaUnderCurve area = RocCurve.Empirical(data.Sample()).Area;
        foreach (AreaMethod method in Enum.GetValues<AreaMethod>())
        {
            ConfidenceInterval wide = area.Interval(Confidence.TwoSided(0.99), method);
            ConfidenceInterval narrow = area.Interval(Confidence.TwoSided(0.8), method);
            Assert.True(wide.IsDefined);
            Assert.InRange(wide.Lower, 0, 1);
            Assert.InRange(wide.Upper, 0, 1);
            Assert.True(wide.Lower <= narrow.Lower && narrow.Upper <= wide.Upper, $"{wide} {narrow}");
            Assert.True(narrow.Contains(area.Value), $"{narrow} {area}");
            ConfidenceInterval lowerBound = area.Interval(Confidence.LowerBound(0.9), method);
            Assert.Equal(narrow.Lower, lowerBound.Lower);
            Assert.Equal(1, lowerBound.Upper);
            Assert.Equal(0, area.Interval(Confidence.UpperBound(0.9), method).Lower);
            Assert.Equal(narrow.Upper, area.Interval(Confidence.UpperBound(0.9), method).Upper);
        }
    }

    [Property]
    public void Covariance_and_variance_of_the_difference_are_DeLongs(SampleCase data, int seed)
    {
        double[] otherWith = [.. data.With.Select((x, i) => Math.Floor(HashOf((x, i), seed) / 1e9))];
        double[] otherWithout = [.. data.Without.Select((x, i) => Math.Floor(HashOf((i, x), seed) / 1e9))];
        AreaComparison comparison = RocComparison.Paired(PairedScores.Create(
            [.. data.With, .. data.Without],
            data.Direction,
            [.. otherWith, .. otherWithout],
            ScoreDirection.LowerIsPositive,
            [.. data.With.Select(_ => true), .. data.Without.Select(_ => false)]));
        double difference = SlowRoc.Area(data.With, data.Without, data.Direction) - SlowRoc.Area(otherWith, otherWithout, ScoreDirection.LowerIsPositive);
        Assert.Equal(difference, comparison.Difference.Value, 1e-14);
        if (data.With.Length < 2 || data.Without.Length < 2)
        {
            Assert.Equal(UndefinedCause.TooFewSubjects, comparison.Z.WhyUndefined?.Cause);
            return;
        }

        double covariance =
            (SlowRoc.Covariance(
                SlowRoc.PlacementsWith(data.With, data.Without, data.Direction),
                SlowRoc.PlacementsWith(otherWith, otherWithout, ScoreDirection.LowerIsPositive)) / data.With.Length)
            + (SlowRoc.Covariance(
                SlowRoc.PlacementsWithout(data.With, data.Without, data.Direction),
                SlowRoc.PlacementsWithout(otherWith, otherWithout, ScoreDirection.LowerIsPositive)) / data.Without.Length);
        Assert.Equal(covariance, comparison.Covariance.Value, 1e-14);
        double variance = comparison.First.Variance.Value + comparison.Second.Variance.Value - (2 * covariance);
        Assert.Equal(variance, Math.Pow(comparison.Difference.StandardError.Value, 2), 1e-14);
    }

    [Property]
    public void A_test_against_itself_has_a_difference_of_exactly_zero_and_no_z(SampleCase data)
    {
        double[] scores = [.. data.With, .. data.Without];
        bool[] status = [.. data.With.Select(_ => true), .. data.Without.Select(_ => false)];
        AreaComparison comparison = RocComparison.Paired(PairedScores.Create(scores, data.Direction, scores, data.Direction, status));
        Assert.Equal(0, comparison.Difference.Value);
        Assert.False(comparison.Z.IsDefined);
        Assert.False(comparison.Difference.Interval().IsDefined);
        if (data.With.Length > 1 && data.Without.Length > 1)
        {
            Assert.Equal(UndefinedCause.ZeroVariance, comparison.PValue.WhyUndefined?.Cause);
            Assert.Equal(0, comparison.Difference.StandardError.Value);
        }
    }

    private static uint HashOf<T>(T value, int seed)
    {
        // Any deterministic scatter will do.
        uint hash = unchecked(((uint)value!.GetHashCode() * 2654435761u) ^ (uint)seed);
        hash ^= hash >> 15;
        hash = unchecked(hash * 2246822519u);
        return hash ^ (hash >> 13);
    }
}
