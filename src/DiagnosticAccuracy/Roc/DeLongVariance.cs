using System.Numerics;
using DiagnosticAccuracy.Numerics;

namespace DiagnosticAccuracy.Roc;

/// <summary>The variance of an area, or of a sum of areas, from integer placements.</summary>
/// <remarks>
/// DeLong, DeLong and Clarke-Pearson, Biometrics 1988;44:837: S10 / n1 + S01 / n0, where S10 and S01 are the sample variances
/// (or covariances) of the placements u / (2 n0) and v / (2 n1). Each is one ratio of integers, rounded once, so that a variance
/// of zero is recognised exactly.
/// </remarks>
internal static class DeLongVariance
{
    /// <summary>The part that one group contributes: its sample covariance of placements over its size.</summary>
    /// <param name="sumOfProducts">The sum of products u u'.</param>
    /// <param name="sum">The sum of u.</param>
    /// <param name="otherSum">The sum of u'.</param>
    /// <param name="size">The size of this group, at least 2.</param>
    /// <param name="otherSize">The size of the other group.</param>
    public static double Part(BigInteger sumOfProducts, BigInteger sum, BigInteger otherSum, long size, long otherSize)
    {
        BigInteger n = size;
        BigInteger m = 2 * (BigInteger)otherSize;
        return ExactRatio.ToDouble((n * sumOfProducts) - (sum * otherSum), n * n * (n - 1) * m * m);
    }
}
