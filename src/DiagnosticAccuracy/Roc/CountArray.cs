using System.Runtime.CompilerServices;

namespace DiagnosticAccuracy.Roc;

/// <summary>Counts of subjects, kept in 32 bits each where the total allows it and in 64 where it does not.</summary>
internal readonly struct CountArray
{
    private readonly int[]? _narrow;
    private readonly long[]? _wide;

    public CountArray(int[] counts)
    {
        _narrow = counts;
        _wide = null;
    }

    public CountArray(long[] counts)
    {
        _narrow = null;
        _wide = counts;
    }

    /// <summary>Gets the counts where they are narrow, else null.</summary>
    public int[]? Narrow => _narrow;

    public long this[int index]
    {
        [MethodImpl(MethodImplOptions.AggressiveInlining)]
        get => _narrow is { } narrow ? narrow[index] : _wide![index];
    }

    /// <summary>Room for so many counts of a total.</summary>
    public static CountArray Create(int length, long total) =>
        total <= int.MaxValue ? new CountArray(new int[length]) : new CountArray(new long[length]);

    public void Set(int index, long value)
    {
        if (_narrow is { } narrow)
        {
            narrow[index] = (int)value;
        }
        else
        {
            _wide![index] = value;
        }
    }
}
