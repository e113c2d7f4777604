using System.Buffers;
using System.Numerics;
using DiagnosticAccuracy.Numerics;

namespace DiagnosticAccuracy.Roc;

/// <summary>
/// The placements of every subject for one test, as integers and in the order of the subjects, so that tests on the same
/// subjects can be set against each other.
/// </summary>
/// <remarks>See <see cref="PlacementMoments"/> for what u and v are.</remarks>
internal sealed class Placements
{
    private Placements(ScoredSample sample, long[] with, long[] without)
    {
        Sample = sample;
        With = with;
        Without = without;
        Area = AreaUnderCurve.Of(sample);
    }

    public ScoredSample Sample { get; }

    public AreaUnderCurve Area { get; }

    /// <summary>Gets u of the subjects with the condition, in their order.</summary>
    public long[] With { get; }

    /// <summary>Gets v of the subjects without the condition, in their order.</summary>
    public long[] Without { get; }

    public static Placements Of(ReadOnlySpan<double> scores, ReadOnlySpan<bool> hasCondition, ScoreDirection direction, string name)
    {
        SampleBuilder.RefuseNaN(scores, name);
        int n = scores.Length;
        ulong[] keys = ArrayPool<ulong>.Shared.Rent(n);
        ulong[] scratchKeys = ArrayPool<ulong>.Shared.Rent(n);
        int[] order = ArrayPool<int>.Shared.Rent(n);
        int[] scratchOrder = ArrayPool<int>.Shared.Rent(n);
        try
        {
            // A subject's slot is its place within its own group; those without the condition have it as a negative number.
            ulong inversion = SampleBuilder.Inversion(direction);
            int withCount = 0;
            int withoutCount = 0;
            for (int i = 0; i < n; i++)
            {
                keys[i] = OrderedKey.Of(scores[i]) ^ inversion;
                order[i] = hasCondition[i] ? withCount++ : ~withoutCount++;
            }

            RadixSort.Sort(keys.AsSpan(0, n), order.AsSpan(0, n), scratchKeys, scratchOrder);
            return FromSorted(keys.AsSpan(0, n), order, inversion, withCount, withoutCount, direction);
        }
        finally
        {
            ArrayPool<ulong>.Shared.Return(keys);
            ArrayPool<ulong>.Shared.Return(scratchKeys);
            ArrayPool<int>.Shared.Return(order);
            ArrayPool<int>.Shared.Return(scratchOrder);
        }
    }

    /// <summary>The covariance of the areas of two tests on the same subjects (DeLong 1988); both groups have at least two subjects.</summary>
    public static double Covariance(Placements first, Placements second) =>
        DeLongVariance.Part(
            SumOfProducts(first.With, second.With), first.Area.Moments.Sum, second.Area.Moments.Sum, first.With.Length, first.Without.Length)
        + DeLongVariance.Part(
            SumOfProducts(first.Without, second.Without), first.Area.Moments.Sum, second.Area.Moments.Sum, first.Without.Length, first.With.Length);

    /// <summary>The variance of the difference of two areas, from the differences of placements, so that zero is recognised exactly.</summary>
    public static double VarianceOfDifference(Placements first, Placements second)
    {
        BigInteger sum = first.Area.Moments.Sum - second.Area.Moments.Sum;
        return DeLongVariance.Part(SumOfSquaredDifferences(first.With, second.With), sum, sum, first.With.Length, first.Without.Length)
            + DeLongVariance.Part(SumOfSquaredDifferences(first.Without, second.Without), sum, sum, first.Without.Length, first.With.Length);
    }

    private static Placements FromSorted(
        ReadOnlySpan<ulong> keys, ReadOnlySpan<int> order, ulong inversion, int withCount, int withoutCount, ScoreDirection direction)
    {
        int n = keys.Length;
        long[] with = new long[withCount];
        long[] without = new long[withoutCount];
        double[] scores = new double[n];
        int[] withThrough = new int[n];
        int[] withoutThrough = new int[n];
        long withSoFar = 0;
        long withoutSoFar = 0;
        int levels = 0;
        int start = 0;
        while (start < n)
        {
            int end = start;
            int tiedWith = 0;
            while (end < n && keys[end] == keys[start])
            {
                tiedWith += order[end] >= 0 ? 1 : 0;
                end++;
            }

            int tiedWithout = end - start - tiedWith;
            long u = (2 * withoutSoFar) + tiedWithout;
            long v = (2 * (withCount - withSoFar)) - tiedWith;
            for (int i = start; i < end; i++)
            {
                int slot = order[i];
                if (slot >= 0)
                {
                    with[slot] = u;
                }
                else
                {
                    without[~slot] = v;
                }
            }

            scores[levels] = OrderedKey.ToDouble(keys[start] ^ inversion);
            withSoFar += tiedWith;
            withoutSoFar += tiedWithout;
            withThrough[levels] = (int)withSoFar;
            withoutThrough[levels] = (int)withoutSoFar;
            levels++;
            start = end;
        }

        Array.Resize(ref scores, levels);
        Array.Resize(ref withThrough, levels);
        Array.Resize(ref withoutThrough, levels);
        ScoredSample sample = new(
            scores, new CumulativeCounts(withThrough), new CumulativeCounts(withoutThrough), levels, withCount, withoutCount, direction);
        return new Placements(sample, with, without);
    }

    private static BigInteger SumOfProducts(long[] first, long[] second)
    {
        WideSum sum = default;
        for (int i = 0; i < first.Length; i++)
        {
            sum.AddProduct((ulong)first[i], (ulong)second[i]);
        }

        return sum.ToBigInteger();
    }

    private static BigInteger SumOfSquaredDifferences(long[] first, long[] second)
    {
        WideSum sum = default;
        for (int i = 0; i < first.Length; i++)
        {
            ulong difference = (ulong)Math.Abs(first[i] - second[i]);
            sum.AddProduct(difference, difference);
        }

        return sum.ToBigInteger();
    }
}
