using System.Runtime.CompilerServices;

namespace DiagnosticAccuracy.Roc;

/// <summary>
/// How many subjects of a group stand at or below each level of a sample; in 32 bits each where the total allows it, in 64 where it
/// does not.
/// </summary>
internal readonly struct CumulativeCounts
{
    private readonly int[]? _narrow;
    private readonly long[]? _wide;

    public CumulativeCounts(int[] through)
    {
        _narrow = through;
        _wide = null;
    }

    public CumulativeCounts(long[] through)
    {
        _narrow = null;
        _wide = through;
    }

    /// <summary>Gets the counts where they are narrow, else null.</summary>
    public int[]? Narrow => _narrow;

    /// <summary>The number of subjects at or below a level.</summary>
    [MethodImpl(MethodImplOptions.AggressiveInlining)]
    public long Through(int level) => _narrow is { } narrow ? narrow[level] : _wide![level];

    /// <summary>The number of subjects below a level; a level past the last one is above everybody.</summary>
    [MethodImpl(MethodImplOptions.AggressiveInlining)]
    public long Below(int level) => level == 0 ? 0 : Through(level - 1);

    /// <summary>The number of subjects at a level.</summary>
    [MethodImpl(MethodImplOptions.AggressiveInlining)]
    public long At(int level) => Through(level) - Below(level);
}
