using System.Numerics;

namespace DiagnosticAccuracy.Roc;

/// <summary>
/// The exact integer sums behind the area and its variance.
/// </summary>
/// <remarks>
/// For a subject with the condition, u is twice the number of subjects without it who score below, plus the number who score
/// the same; for a subject without the condition, v is twice the number with it who score above, plus those who score the same.
/// A placement (a structural component, DeLong 1988) is u / (2 n0) or v / (2 n1). The sum of the u equals the sum of the v.
/// </remarks>
/// <param name="WithCondition">The size n1.</param>
/// <param name="WithoutCondition">The size n0.</param>
/// <param name="Sum">The sum of the u, and of the v.</param>
/// <param name="SumOfSquaresWith">The sum of the squared u.</param>
/// <param name="SumOfSquaresWithout">The sum of the squared v.</param>
/// <param name="TiedPairs">The sum over levels of w o, with w and o the subjects of both groups at the level.</param>
/// <param name="TiedTriplesWith">The sum over levels of w^2 o.</param>
/// <param name="TiedTriplesWithout">The sum over levels of w o^2.</param>
internal readonly record struct PlacementMoments(
    long WithCondition,
    long WithoutCondition,
    BigInteger Sum,
    BigInteger SumOfSquaresWith,
    BigInteger SumOfSquaresWithout,
    BigInteger TiedPairs,
    BigInteger TiedTriplesWith,
    BigInteger TiedTriplesWithout)
{
    public static PlacementMoments Of(ScoredSample sample)
    {
        if (sample.With.Narrow is not { } with || sample.Without.Narrow is not { } without)
        {
            return OfWideCounts(sample);
        }

        return sample.Total <= ShortPlacementSums.MostSubjects
            ? OfLevels(new ShortPlacementSums(sample.WithCondition, sample.WithoutCondition), with, without, sample.LevelCount)
            : OfLevels(new LongPlacementSums(sample.WithCondition, sample.WithoutCondition), with, without, sample.LevelCount);
    }

    /// <summary>The sums of two groups whose keys are sorted, without making levels of them.</summary>
    public static PlacementMoments OfSortedKeys(ReadOnlySpan<ulong> with, ReadOnlySpan<ulong> without) =>
        with.Length + (long)without.Length <= ShortPlacementSums.MostSubjects
            ? OfSortedKeys(new ShortPlacementSums(with.Length, without.Length), with, without)
            : OfSortedKeys(new LongPlacementSums(with.Length, without.Length), with, without);

    private static PlacementMoments OfLevels<TSums>(TSums sums, int[] withThrough, int[] withoutThrough, int levels)
        where TSums : struct, IPlacementSums
    {
        int with = 0;
        int without = 0;
        for (int i = 0; i < levels && i < withThrough.Length && i < withoutThrough.Length; i++)
        {
            sums.Add((ulong)(withThrough[i] - with), (ulong)(withoutThrough[i] - without));
            with = withThrough[i];
            without = withoutThrough[i];
        }

        return sums.ToMoments();
    }

    // One subject a step, without a branch on which group it comes from; a level is added where the next key differs.
    private static PlacementMoments OfSortedKeys<TSums>(TSums sums, ReadOnlySpan<ulong> with, ReadOnlySpan<ulong> without)
        where TSums : struct, IPlacementSums
    {
        int i = 0;
        int j = 0;
        ulong previous = ulong.MaxValue;
        ulong levelWith = 0;
        ulong levelWithout = 0;
        while (i < with.Length && j < without.Length)
        {
            ulong left = with[i];
            ulong right = without[j];
            int fromWith = left <= right ? 1 : 0;
            ulong key = left <= right ? left : right;
            if (key != previous)
            {
                sums.Add(levelWith, levelWithout);
                levelWith = 0;
                levelWithout = 0;
                previous = key;
            }

            levelWith += (ulong)fromWith;
            levelWithout += (ulong)(1 - fromWith);
            i += fromWith;
            j += 1 - fromWith;
        }

        // What is left of one group: the part that ties with the last level, then all the rest, which meets nobody of the other.
        int tiedWith = CountOf(previous, with.Slice(i));
        int tiedWithout = CountOf(previous, without.Slice(j));
        sums.Add(levelWith + (ulong)tiedWith, levelWithout + (ulong)tiedWithout);
        sums.Add((ulong)(with.Length - i - tiedWith), (ulong)(without.Length - j - tiedWithout));
        return sums.ToMoments();
    }

    private static int CountOf(ulong key, ReadOnlySpan<ulong> sorted)
    {
        int count = 0;
        while (count < sorted.Length && sorted[count] == key)
        {
            count++;
        }

        return count;
    }

    // More than 2^31 subjects came as counts, so the levels are few.
    private static PlacementMoments OfWideCounts(ScoredSample sample)
    {
        BigInteger below = 0;
        BigInteger withSoFar = 0;
        BigInteger sum = 0;
        BigInteger squaresWith = 0;
        BigInteger squaresWithout = 0;
        BigInteger tied = 0;
        BigInteger tiedWith = 0;
        BigInteger tiedWithout = 0;
        for (int i = 0; i < sample.LevelCount; i++)
        {
            BigInteger w = sample.With.At(i);
            BigInteger o = sample.Without.At(i);
            BigInteger u = (2 * below) + o;
            BigInteger v = (2 * (sample.WithCondition - withSoFar)) - w;
            sum += w * u;
            squaresWith += w * u * u;
            squaresWithout += o * v * v;
            tied += w * o;
            tiedWith += w * w * o;
            tiedWithout += w * o * o;
            below += o;
            withSoFar += w;
        }

        return new PlacementMoments(
            sample.WithCondition, sample.WithoutCondition, sum, squaresWith, squaresWithout, tied, tiedWith, tiedWithout);
    }
}
