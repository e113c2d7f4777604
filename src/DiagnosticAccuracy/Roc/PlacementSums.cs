using System.Runtime.CompilerServices;
using DiagnosticAccuracy.Numerics;

namespace DiagnosticAccuracy.Roc;

/// <summary>Takes the levels of a sample from the least to the most positive one and sums up placements.</summary>
internal interface IPlacementSums
{
    /// <summary>The next level: how many subjects of each group have it.</summary>
    void Add(ulong with, ulong without);

    PlacementMoments ToMoments();
}

/// <summary>Sums in 64 bits, for samples small enough.</summary>
internal struct ShortPlacementSums(long withCondition, long withoutCondition) : IPlacementSums
{
    // 4 n1 n0^2, the largest of the sums, is at most 16 n^3 / 27, which stays below 2^64 up to 3.1 million subjects.
    public const long MostSubjects = 3_000_000;

    private ulong _below;
    private ulong _withSoFar;
    private ulong _sum;
    private ulong _squaresWith;
    private ulong _squaresWithout;
    private ulong _tied;
    private ulong _tiedWith;
    private ulong _tiedWithout;

    [MethodImpl(MethodImplOptions.AggressiveInlining)]
    public void Add(ulong with, ulong without)
    {
        ulong u = (2 * _below) + without;
        ulong v = (2 * ((ulong)withCondition - _withSoFar)) - with;
        _sum += with * u;
        _squaresWith += with * u * u;
        _squaresWithout += without * v * v;
        ulong tied = with * without;
        _tied += tied;
        _tiedWith += tied * with;
        _tiedWithout += tied * without;
        _below += without;
        _withSoFar += with;
    }

    public readonly PlacementMoments ToMoments() =>
        new(withCondition, withoutCondition, _sum, _squaresWith, _squaresWithout, _tied, _tiedWith, _tiedWithout);
}

/// <summary>Sums in 128 bits, for samples of up to 2,147,483,647 subjects.</summary>
internal struct LongPlacementSums(long withCondition, long withoutCondition) : IPlacementSums
{
    private ulong _below;
    private ulong _withSoFar;
    private WideSum _sum;
    private WideSum _squaresWith;
    private WideSum _squaresWithout;
    private WideSum _tied;
    private WideSum _tiedWith;
    private WideSum _tiedWithout;

    [MethodImpl(MethodImplOptions.AggressiveInlining)]
    public void Add(ulong with, ulong without)
    {
        // Below 2^31 subjects u and v are below 2^32, so their squares and the products with a count fit 64 bits.
        ulong u = (2 * _below) + without;
        ulong v = (2 * ((ulong)withCondition - _withSoFar)) - with;
        _sum.Add(with * u);
        _squaresWith.AddProduct(u * u, with);
        _squaresWithout.AddProduct(v * v, without);
        ulong tied = with * without;
        _tied.Add(tied);
        _tiedWith.AddProduct(tied, with);
        _tiedWithout.AddProduct(tied, without);
        _below += without;
        _withSoFar += with;
    }

    public readonly PlacementMoments ToMoments() => new(
        withCondition,
        withoutCondition,
        _sum.ToBigInteger(),
        _squaresWith.ToBigInteger(),
        _squaresWithout.ToBigInteger(),
        _tied.ToBigInteger(),
        _tiedWith.ToBigInteger(),
        _tiedWithout.ToBigInteger());
}
