using System.Numerics;
using DiagnosticAccuracy.Numerics;

namespace DiagnosticAccuracy.Roc;

/// <summary>
/// The exact integer sums behind the area and its variance.
/// </summary>
/// <remarks>
/// For a subject with the condition, u is twice the number of subjects without it who score below, plus the number who score
/// the same; for a subject without the condition, v is twice the number with it who score above, plus those who score the same.
/// A placement (a structural component, DeLong 1988) is u / (2 n0) or v / (2 n1). The sum of the u equals the sum of the v.
/// </remarks>
internal readonly record struct PlacementMoments(
    long WithCondition, long WithoutCondition, BigInteger Sum, BigInteger SumOfSquaresWith, BigInteger SumOfSquaresWithout, BigInteger TiedPairs)
{
    public static PlacementMoments Of(ScoredSample sample)
    {
        if (sample.With.Narrow is { } with && sample.Without.Narrow is { } without)
        {
            // 4 n1 n0^2, the largest of the sums, is at most 16 n^3 / 27, which stays below 2^64 up to 3.1 million subjects.
            return sample.Total <= 3_000_000
                ? Small(sample, with, without)
                : Narrow(sample, with, without);
        }

        return Wide(sample);
    }

    private static PlacementMoments Small(ScoredSample sample, int[] with, int[] without)
    {
        ulong n1 = (ulong)sample.WithCondition;
        ulong below = 0;
        ulong withSoFar = 0;
        ulong sum = 0;
        ulong squaresWith = 0;
        ulong squaresWithout = 0;
        ulong tied = 0;
        int levels = sample.LevelCount;
        for (int i = 0; i < levels && i < with.Length && i < without.Length; i++)
        {
            ulong w = (ulong)with[i];
            ulong o = (ulong)without[i];
            ulong u = (2 * below) + o;
            ulong v = (2 * (n1 - withSoFar)) - w;
            sum += w * u;
            squaresWith += w * u * u;
            squaresWithout += o * v * v;
            tied += w * o;
            below += o;
            withSoFar += w;
        }

        return new PlacementMoments(sample.WithCondition, sample.WithoutCondition, sum, squaresWith, squaresWithout, tied);
    }

    private static PlacementMoments Narrow(ScoredSample sample, int[] with, int[] without)
    {
        ulong n1 = (ulong)sample.WithCondition;
        ulong below = 0;
        ulong withSoFar = 0;
        WideSum sum = default;
        WideSum squaresWith = default;
        WideSum squaresWithout = default;
        WideSum tied = default;
        for (int i = 0; i < sample.LevelCount; i++)
        {
            // Below 2^31 subjects u and v are below 2^32, so u^2 fits, and w u fits.
            ulong w = (ulong)with[i];
            ulong o = (ulong)without[i];
            ulong u = (2 * below) + o;
            ulong v = (2 * (n1 - withSoFar)) - w;
            sum.Add(w * u);
            squaresWith.AddProduct(u * u, w);
            squaresWithout.AddProduct(v * v, o);
            tied.Add(w * o);
            below += o;
            withSoFar += w;
        }

        return new PlacementMoments(
            sample.WithCondition,
            sample.WithoutCondition,
            sum.ToBigInteger(),
            squaresWith.ToBigInteger(),
            squaresWithout.ToBigInteger(),
            tied.ToBigInteger());
    }

    // More than 2^31 subjects came as counts, so the levels are few.
    private static PlacementMoments Wide(ScoredSample sample)
    {
        BigInteger below = 0;
        BigInteger withSoFar = 0;
        BigInteger sum = 0;
        BigInteger squaresWith = 0;
        BigInteger squaresWithout = 0;
        BigInteger tied = 0;
        for (int i = 0; i < sample.LevelCount; i++)
        {
            BigInteger w = sample.With[i];
            BigInteger o = sample.Without[i];
            BigInteger u = (2 * below) + o;
            BigInteger v = (2 * (sample.WithCondition - withSoFar)) - w;
            sum += w * u;
            squaresWith += w * u * u;
            squaresWithout += o * v * v;
            tied += w * o;
            below += o;
            withSoFar += w;
        }

        return new PlacementMoments(sample.WithCondition, sample.WithoutCondition, sum, squaresWith, squaresWithout, tied);
    }
}
