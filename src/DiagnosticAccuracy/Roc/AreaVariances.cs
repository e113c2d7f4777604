using System.Numerics;
using DiagnosticAccuracy.Numerics;

namespace DiagnosticAccuracy.Roc;

/// <summary>Variances of an area under a curve, from the integer sums behind it.</summary>
internal static class AreaVariances
{
    public static Quantity Of(AreaUnderCurve area, AreaVarianceMethod method)
    {
        bool needsTwo = method switch
        {
            AreaVarianceMethod.DeLong or AreaVarianceMethod.Bamber => true,
            AreaVarianceMethod.HanleyMcNeil or AreaVarianceMethod.HanleyMcNeilExponential => false,
            _ => throw Guard.UnknownOption(method),
        };
        if (area.WhyUndefined is { } reason)
        {
            return Quantity.Undefined(reason);
        }

        if (needsTwo && (area.WithCondition < 2 || area.WithoutCondition < 2))
        {
            string group = area.WithCondition < 2 ? "with" : "without";
            return Quantity.Undefined(UndefinedCause.TooFewSubjects, $"one subject {group} the condition gives no variance");
        }

        return method switch
        {
            AreaVarianceMethod.DeLong => Quantity.Of(DeLong(area.Moments)),
            AreaVarianceMethod.Bamber => Bamber(area.Moments),
            AreaVarianceMethod.HanleyMcNeil => Quantity.Of(HanleyMcNeilFromData(area)),
            _ => Quantity.Of(HanleyMcNeil(
                area, area.Value / (1 + area.Complement), 2 * area.Value * area.Value / (1 + area.Value))),
        };
    }

    private static double DeLong(PlacementMoments moments) =>
        DeLongVariance.Part(moments.SumOfSquaresWith, moments.Sum, moments.Sum, moments.WithCondition, moments.WithoutCondition)
        + DeLongVariance.Part(moments.SumOfSquaresWithout, moments.Sum, moments.Sum, moments.WithoutCondition, moments.WithCondition);

    /// <summary>
    /// A^2 - T with T the mean of s(i,j) s(k,l) over i != k and j != l, where s is 1, 1/2 or 0: an unbiased estimate of the squared expectation. The sum over
    /// those is the whole square, less the rows, less the columns, plus the single terms.
    /// </summary>
    private static Quantity Bamber(PlacementMoments moments)
    {
        BigInteger n1 = moments.WithCondition;
        BigInteger n0 = moments.WithoutCondition;

        // The sum of (2 s)^2: 4 for a pair won, 1 for a tie.
        BigInteger singles = (2 * (moments.Sum - moments.TiedPairs)) + moments.TiedPairs;
        BigInteger square = moments.Sum * moments.Sum;
        BigInteger apart = square - moments.SumOfSquaresWith - moments.SumOfSquaresWithout + singles;
        BigInteger pairsSquared = n1 * n1 * n0 * n0;
        BigInteger pairsApart = n1 * (n1 - 1) * n0 * (n0 - 1);
        BigInteger numerator = (square * pairsApart) - (apart * pairsSquared);
        return numerator.Sign < 0
            ? Quantity.Undefined(UndefinedCause.TooFewSubjects, "the unbiased estimate of the variance is below zero")
            : Quantity.Of(ExactRatio.ToDouble(numerator, 4 * pairsSquared * pairsApart));
    }

    /// <summary>
    /// Q1 is the share of triples of two subjects with the condition and one without in which both win, ties of one counting 1/2 and of both
    /// 1/3, as on the straight lines of the curve; Q2 likewise with two without.
    /// </summary>
    private static double HanleyMcNeilFromData(AreaUnderCurve area)
    {
        PlacementMoments moments = area.Moments;
        BigInteger n1 = moments.WithCondition;
        BigInteger n0 = moments.WithoutCondition;

        // a^2 + a t + t^2 / 3 = (2 a + t)^2 / 4 + t^2 / 12.
        double q1 = ExactRatio.ToDouble((3 * moments.SumOfSquaresWithout) + moments.TiedTriplesWith, 12 * n0 * n1 * n1);
        double q2 = ExactRatio.ToDouble((3 * moments.SumOfSquaresWith) + moments.TiedTriplesWithout, 12 * n1 * n0 * n0);
        return HanleyMcNeil(area, q1, q2);
    }

    // (A (1 - A) + (n1 - 1) (Q1 - A^2) + (n0 - 1) (Q2 - A^2)) / (n1 n0).
    private static double HanleyMcNeil(AreaUnderCurve area, double q1, double q2)
    {
        double square = area.Value * area.Value;
        double sum = (area.Value * area.Complement) + ((area.WithCondition - 1) * (q1 - square)) + ((area.WithoutCondition - 1) * (q2 - square));
        return Math.Max(0, sum) / area.WithCondition / area.WithoutCondition;
    }
}
