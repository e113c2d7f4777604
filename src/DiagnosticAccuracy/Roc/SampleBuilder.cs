using System.Buffers;
using DiagnosticAccuracy.Numerics;

namespace DiagnosticAccuracy.Roc;

/// <summary>The one place where scores are checked, sorted and grouped by ties.</summary>
/// <remarks>
/// The two groups are parted while the scores turn into sortable keys, each is sorted by digits, and one merge makes the levels.
/// Keys of a lower-is-positive score are inverted, so that ascending keys always mean more evidence for the condition.
/// </remarks>
internal static class SampleBuilder
{
    public static ScoredSample FromStatus(ReadOnlySpan<double> scores, ReadOnlySpan<bool> hasCondition, ScoreDirection direction) =>
        Sorted<LevelMaker, ScoredSample>(scores, hasCondition, direction);

    /// <summary>The sums behind an area, without keeping a sample: all working memory goes back to its pool.</summary>
    public static PlacementMoments MomentsOf(ReadOnlySpan<double> scores, ReadOnlySpan<bool> hasCondition, ScoreDirection direction) =>
        Sorted<MomentMaker, PlacementMoments>(scores, hasCondition, direction);

    private static TResult Sorted<TMaker, TResult>(ReadOnlySpan<double> scores, ReadOnlySpan<bool> hasCondition, ScoreDirection direction)
        where TMaker : struct, ISortedGroupsMaker<TResult>
    {
        int n = scores.Length;
        ulong[] keys = ArrayPool<ulong>.Shared.Rent(n);
        try
        {
            // Those with the condition fill the array from the front, the others from the back: no branch on the status.
            ulong inversion = Inversion(direction);
            int front = 0;
            int back = n - 1;
            bool anyNaN = false;
            for (int i = 0; i < scores.Length && i < hasCondition.Length; i++)
            {
                double score = scores[i];
                anyNaN |= double.IsNaN(score);
                ulong key = OrderedKey.Of(score) ^ inversion;
                keys[front] = key;
                keys[back] = key;
                int with = hasCondition[i] ? 1 : 0;
                front += with;
                back -= 1 - with;
            }

            if (anyNaN)
            {
                RefuseNaN(scores, nameof(scores));
            }

            return SortAndMake<TMaker, TResult>(keys, n, front, direction);
        }
        finally
        {
            ArrayPool<ulong>.Shared.Return(keys);
        }
    }

    public static ScoredSample FromGroups(ReadOnlySpan<double> withCondition, ReadOnlySpan<double> withoutCondition, ScoreDirection direction)
    {
        RefuseNaN(withCondition, nameof(withCondition));
        RefuseNaN(withoutCondition, nameof(withoutCondition));
        int n = checked(withCondition.Length + withoutCondition.Length);
        ulong[] keys = ArrayPool<ulong>.Shared.Rent(n);
        try
        {
            ulong inversion = Inversion(direction);
            Fill(withCondition, keys.AsSpan(0, withCondition.Length), inversion);
            Fill(withoutCondition, keys.AsSpan(withCondition.Length, withoutCondition.Length), inversion);
            return SortAndMake<LevelMaker, ScoredSample>(keys, n, withCondition.Length, direction);
        }
        finally
        {
            ArrayPool<ulong>.Shared.Return(keys);
        }
    }

    public static ScoredSample FromCounts(
        ReadOnlySpan<double> levels, ReadOnlySpan<long> withCondition, ReadOnlySpan<long> withoutCondition, ScoreDirection direction)
    {
        RefuseNaN(levels, nameof(levels));
        long totalWith = 0;
        long totalWithout = 0;
        for (int i = 0; i < levels.Length; i++)
        {
            Guard.CountAt(withCondition[i], i, nameof(withCondition));
            Guard.CountAt(withoutCondition[i], i, nameof(withoutCondition));
            totalWith = checked(totalWith + withCondition[i]);
            totalWithout = checked(totalWithout + withoutCondition[i]);
        }

        long total = checked(totalWith + totalWithout);
        Guard.NotEmpty(total, nameof(levels));

        int n = levels.Length;
        ulong[] keys = new ulong[n];
        int[] order = new int[n];
        Fill(levels, keys, Inversion(direction));
        for (int i = 0; i < n; i++)
        {
            order[i] = i;
        }

        RadixSort.Sort(keys, order, new ulong[n], new int[n]);
        double[] scores = new double[n];
        long[] withThrough = new long[n];
        long[] withoutThrough = new long[n];
        long withSoFar = 0;
        long withoutSoFar = 0;
        int last = -1;
        foreach (int level in order)
        {
            if (withCondition[level] == 0 && withoutCondition[level] == 0)
            {
                continue;
            }

            double score = levels[level] + 0.0;
            if (last < 0 || scores[last] != score)
            {
                scores[++last] = score;
            }

            withSoFar += withCondition[level];
            withoutSoFar += withoutCondition[level];
            withThrough[last] = withSoFar;
            withoutThrough[last] = withoutSoFar;
        }

        int count = last + 1;
        return new ScoredSample(
            scores, Counts(withThrough, count, total), Counts(withoutThrough, count, total), count, totalWith, totalWithout, direction);
    }

    private static CumulativeCounts Counts(long[] through, int count, long total) => total <= int.MaxValue
        ? new CumulativeCounts(Array.ConvertAll(through.AsSpan(0, count).ToArray(), value => (int)value))
        : new CumulativeCounts(through);

    internal static ulong Inversion(ScoreDirection direction) => direction == ScoreDirection.LowerIsPositive ? ulong.MaxValue : 0;

    internal static void RefuseNaN(ReadOnlySpan<double> scores, string name)
    {
        for (int i = 0; i < scores.Length; i++)
        {
            Guard.NotNaNAt(scores[i], i, name);
        }
    }

    private static void Fill(ReadOnlySpan<double> scores, Span<ulong> keys, ulong inversion)
    {
        for (int i = 0; i < scores.Length; i++)
        {
            keys[i] = OrderedKey.Of(scores[i]) ^ inversion;
        }
    }

    private static TResult SortAndMake<TMaker, TResult>(ulong[] keys, int n, int withCondition, ScoreDirection direction)
        where TMaker : struct, ISortedGroupsMaker<TResult>
    {
        ulong[] scratch = ArrayPool<ulong>.Shared.Rent(n);
        Span<ulong> with = keys.AsSpan(0, withCondition);
        Span<ulong> without = keys.AsSpan(withCondition, n - withCondition);
        RadixSort.Sort(with, scratch);
        RadixSort.Sort(without, scratch);
        ArrayPool<ulong>.Shared.Return(scratch);
        return default(TMaker).Make(with, without, direction);
    }

    /// <summary>What is made of the sorted keys of the two groups.</summary>
    private interface ISortedGroupsMaker<TResult>
    {
        TResult Make(ReadOnlySpan<ulong> with, ReadOnlySpan<ulong> without, ScoreDirection direction);
    }

    private readonly struct MomentMaker : ISortedGroupsMaker<PlacementMoments>
    {
        public PlacementMoments Make(ReadOnlySpan<ulong> with, ReadOnlySpan<ulong> without, ScoreDirection direction) =>
            PlacementMoments.OfSortedKeys(with, without);
    }

    private readonly struct LevelMaker : ISortedGroupsMaker<ScoredSample>
    {
        public ScoredSample Make(ReadOnlySpan<ulong> with, ReadOnlySpan<ulong> without, ScoreDirection direction)
        {
            int n = with.Length + without.Length;
            double[] scores = UninitializedArray.Of<double>(n);
            int[] withThrough = UninitializedArray.Of<int>(n);
            int[] withoutThrough = UninitializedArray.Of<int>(n);
            int count = Merge(with, without, Inversion(direction), scores, withThrough, withoutThrough);
            if (count < n)
            {
                Array.Resize(ref scores, count);
                Array.Resize(ref withThrough, count);
                Array.Resize(ref withoutThrough, count);
            }

            return new ScoredSample(
                scores, new CumulativeCounts(withThrough), new CumulativeCounts(withoutThrough), count, with.Length, without.Length, direction);
        }

        // One subject a step, without a branch on which group it comes from; a new level begins where the key differs from the last.
        private static int Merge(
            ReadOnlySpan<ulong> with, ReadOnlySpan<ulong> without, ulong inversion, double[] scores, int[] withThrough, int[] withoutThrough)
        {
            int i = 0;
            int j = 0;
            int level = -1;
            ulong previous = ulong.MaxValue;
            while (i < with.Length && j < without.Length)
            {
                ulong left = with[i];
                ulong right = without[j];
                int fromWith = left <= right ? 1 : 0;
                ulong key = left <= right ? left : right;
                level += key != previous ? 1 : 0;
                previous = key;
                i += fromWith;
                j += 1 - fromWith;
                scores[level] = OrderedKey.ToDouble(key ^ inversion);
                withThrough[level] = i;
                withoutThrough[level] = j;
            }

            for (; i < with.Length || j < without.Length;)
            {
                ulong key = i < with.Length ? with[i++] : without[j++];
                level += key != previous ? 1 : 0;
                previous = key;
                scores[level] = OrderedKey.ToDouble(key ^ inversion);
                withThrough[level] = i;
                withoutThrough[level] = j;
            }

            return level + 1;
        }
    }
}
