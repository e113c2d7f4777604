using System.Runtime.CompilerServices;
using System.Runtime.InteropServices;

namespace DiagnosticAccuracy.Numerics;

/// <summary>
/// Sorts 64-bit keys by counting digits, least significant digit first.
/// </summary>
/// <remarks>
/// Only the leading bits that tell almost all keys apart are sorted by digit; the rare keys that agree in those bits are put
/// right by one pass of insertion. When there are too many of them the remaining digits are sorted too, so the work is
/// linear whatever the keys are.
/// </remarks>
internal static class RadixSort
{
    private const int DigitBits = 11;
    private const int Buckets = 1 << DigitBits;
    private const int SmallLength = 256;

    /// <summary>Sorts the keys in place.</summary>
    /// <param name="keys">The keys.</param>
    /// <param name="scratch">At least as long; its content on return is of no meaning.</param>
    public static void Sort(Span<ulong> keys, Span<ulong> scratch)
    {
        if (keys.Length <= SmallLength)
        {
            SortSmall(keys, scratch);
            return;
        }

        int significant = SignificantBits(keys);
        int passes = PassesFor(keys.Length, significant);
        int lowBits = Math.Max(0, significant - (passes * DigitBits));
        SortDigits(keys, scratch, lowBits, passes);
        if (lowBits > 0 && !FinishByInsertion(keys))
        {
            SortDigits(keys, scratch, 0, FullPasses(significant));
        }
    }

    /// <summary>Sorts the keys in place and moves an index along with each.</summary>
    /// <param name="keys">The keys.</param>
    /// <param name="indices">What travels with each key.</param>
    /// <param name="scratchKeys">At least as long; its content on return is of no meaning.</param>
    /// <param name="scratchIndices">At least as long; its content on return is of no meaning.</param>
    public static void Sort(Span<ulong> keys, Span<int> indices, Span<ulong> scratchKeys, Span<int> scratchIndices)
    {
        if (keys.Length < 2)
        {
            return;
        }

        int significant = SignificantBits(keys);
        int passes = PassesFor(keys.Length, significant);
        int lowBits = Math.Max(0, significant - (passes * DigitBits));
        SortDigits(keys, indices, scratchKeys, scratchIndices, lowBits, passes);
        if (lowBits > 0 && !FinishByInsertion(keys, indices))
        {
            SortDigits(keys, indices, scratchKeys, scratchIndices, 0, FullPasses(significant));
        }
    }

    // Enough leading digits that few keys of a smooth distribution agree in all of them.
    private static int PassesFor(int length, int significant) =>
        Math.Min((12 + Log2(length) + DigitBits - 1) / DigitBits, FullPasses(significant));

    private static int FullPasses(int significant) => (significant + DigitBits - 1) / DigitBits;

    // How many low bits are not the same in all keys' common prefix: the position of the highest bit in which two keys differ.
    private static int SignificantBits(ReadOnlySpan<ulong> keys)
    {
        ulong first = keys[0];
        ulong differing = 0;
        foreach (ulong key in keys)
        {
            differing |= key ^ first;
        }

        int bits = 0;
        while (differing != 0)
        {
            bits++;
            differing >>= 1;
        }

        return bits;
    }

    private static void SortDigits(Span<ulong> keys, Span<ulong> scratch, int lowBits, int passes)
    {
        Span<int> starts = stackalloc int[Buckets];
        Span<ulong> from = keys;
        Span<ulong> to = scratch.Slice(0, keys.Length);
        bool inScratch = false;
        for (int pass = 0; pass < passes; pass++)
        {
            int shift = lowBits + (pass * DigitBits);
            if (!CountDigits(from, shift, starts))
            {
                continue;
            }

            Scatter(from, to, shift, starts);
            Span<ulong> swap = from;
            from = to;
            to = swap;
            inScratch = !inScratch;
        }

        if (inScratch)
        {
            from.CopyTo(keys);
        }
    }

    // False when all keys have the same digit, so that the pass would move nothing.
    private static bool CountDigits(ReadOnlySpan<ulong> keys, int shift, Span<int> starts)
    {
        starts.Clear();
        ref int start = ref MemoryMarshal.GetReference(starts);
        foreach (ulong key in keys)
        {
            Unsafe.Add(ref start, (int)(key >> shift) & (Buckets - 1))++;
        }

        if (starts[(int)(keys[0] >> shift) & (Buckets - 1)] == keys.Length)
        {
            return false;
        }

        int sum = 0;
        for (int i = 0; i < starts.Length; i++)
        {
            int count = starts[i];
            starts[i] = sum;
            sum += count;
        }

        return true;
    }

    private static void Scatter(ReadOnlySpan<ulong> from, Span<ulong> to, int shift, Span<int> starts)
    {
        ref int start = ref MemoryMarshal.GetReference(starts);
        ref ulong target = ref MemoryMarshal.GetReference(to);
        foreach (ulong key in from)
        {
            // The starts are sums of counts of these very keys, so they stay below the length.
            Unsafe.Add(ref target, Unsafe.Add(ref start, (int)(key >> shift) & (Buckets - 1))++) = key;
        }
    }

    private static void SortDigits(Span<ulong> keys, Span<int> indices, Span<ulong> scratchKeys, Span<int> scratchIndices, int lowBits, int passes)
    {
        Span<int> starts = stackalloc int[Buckets];
        Span<ulong> from = keys;
        Span<int> fromIndices = indices;
        Span<ulong> to = scratchKeys.Slice(0, keys.Length);
        Span<int> toIndices = scratchIndices.Slice(0, keys.Length);
        bool inScratch = false;
        for (int pass = 0; pass < passes; pass++)
        {
            int shift = lowBits + (pass * DigitBits);
            if (!CountDigits(from, shift, starts))
            {
                continue;
            }

            for (int i = 0; i < from.Length; i++)
            {
                int target = starts[(int)(from[i] >> shift) & (Buckets - 1)]++;
                to[target] = from[i];
                toIndices[target] = fromIndices[i];
            }

            Span<ulong> swap = from;
            from = to;
            to = swap;
            Span<int> swapIndices = fromIndices;
            fromIndices = toIndices;
            toIndices = swapIndices;
            inScratch = !inScratch;
        }

        if (inScratch)
        {
            from.CopyTo(keys);
            fromIndices.CopyTo(indices);
        }
    }

    private static bool FinishByInsertion(Span<ulong> keys, Span<int> indices)
    {
        long budget = 4L * keys.Length;
        for (int i = 1; i < keys.Length; i++)
        {
            ulong key = keys[i];
            if (keys[i - 1] <= key)
            {
                continue;
            }

            int index = indices[i];
            int j = i;
            while (j > 0 && keys[j - 1] > key)
            {
                keys[j] = keys[j - 1];
                indices[j] = indices[j - 1];
                j--;
            }

            keys[j] = key;
            indices[j] = index;
            budget -= i - j;
            if (budget < 0)
            {
                return false;
            }
        }

        return true;
    }

    // Insertion with a budget: false when the keys are not nearly sorted.
    private static bool FinishByInsertion(Span<ulong> keys)
    {
        long budget = 4L * keys.Length;
        for (int i = 1; i < keys.Length; i++)
        {
            ulong key = keys[i];
            if (keys[i - 1] <= key)
            {
                continue;
            }

            int j = i;
            while (j > 0 && keys[j - 1] > key)
            {
                keys[j] = keys[j - 1];
                j--;
            }

            keys[j] = key;
            budget -= i - j;
            if (budget < 0)
            {
                return false;
            }
        }

        return true;
    }

    private static void SortSmall(Span<ulong> keys, Span<ulong> scratch)
    {
#if NET
        keys.Sort();
#else
        for (int width = 1; width < keys.Length; width *= 2)
        {
            keys.CopyTo(scratch);
            for (int low = 0; low < keys.Length; low += 2 * width)
            {
                Merge(scratch, low, Math.Min(low + width, keys.Length), Math.Min(low + (2 * width), keys.Length), keys);
            }
        }
#endif
    }

#if !NET
    private static void Merge(ReadOnlySpan<ulong> from, int low, int middle, int high, Span<ulong> to)
    {
        int left = low;
        int right = middle;
        for (int i = low; i < high; i++)
        {
            to[i] = right >= high || (left < middle && from[left] <= from[right]) ? from[left++] : from[right++];
        }
    }
#endif

    private static int Log2(int value)
    {
        int log = 0;
        while ((value >>= 1) != 0)
        {
            log++;
        }

        return log;
    }
}
