using DiagnosticAccuracy.Numerics;
using DiagnosticAccuracy.Roc;

namespace DiagnosticAccuracy;

/// <summary>Comparisons of ROC curves.</summary>
public static class RocComparison
{
    /// <summary>The areas of the first two tests on the same subjects.</summary>
    /// <param name="scores">The scores; of more than two tests the first two are compared, see <see cref="PairedAreas"/> for all.</param>
    /// <returns>The comparison.</returns>
    /// <exception cref="ArgumentNullException"><paramref name="scores"/> is null.</exception>
    /// <remarks>
    /// Source: DeLong, DeLong and Clarke-Pearson, Biometrics 1988;44:837. Not for a model against another one that it contains,
    /// both fitted to these data: there the difference has another distribution (Demler, Pencina and D'Agostino, Stat Med 2012).
    /// </remarks>
    public static AreaComparison Paired(PairedScores scores)
    {
        Guard.NotNull(scores);
        return PairedPlacements(scores.PlacementsOf(0, nameof(scores)), scores.PlacementsOf(1, nameof(scores)));
    }

    internal static AreaComparison PairedPlacements(Placements first, Placements second)
    {
        AreaUnderCurve firstArea = first.Area;
        AreaUnderCurve secondArea = second.Area;
        if (!firstArea.Variance.IsDefined)
        {
            return Undefined(ComparisonDesign.Paired, firstArea, secondArea, firstArea.Variance);
        }

        // Both areas have the same denominator, so the difference too is one ratio of integers.
        double difference = ExactRatio.ToDouble(firstArea.Moments.Sum - secondArea.Moments.Sum, 2 * firstArea.Pairs);
        double variance = Placements.VarianceOfDifference(first, second);
        return new AreaComparison(
            ComparisonDesign.Paired,
            firstArea,
            secondArea,
            new AreaDifference(Quantity.Of(difference), Quantity.Of(Math.Sqrt(variance))),
            Quantity.Of(Placements.Covariance(first, second)));
    }

    /// <summary>The areas of two tests that were done on different subjects.</summary>
    /// <param name="first">The area of the first test.</param>
    /// <param name="second">The area of the second test, from other subjects.</param>
    /// <returns>The comparison.</returns>
    /// <exception cref="ArgumentNullException">An area is null.</exception>
    /// <remarks>
    /// The variances add. Subjects that are in both samples would make this wrong; when the tests were done on the same subjects
    /// use <see cref="Paired"/>. Source: Hanley and McNeil, Radiology 1982;143:29, here with DeLong variances.
    /// </remarks>
    public static AreaComparison Independent(AreaUnderCurve first, AreaUnderCurve second)
    {
        Guard.NotNull(first);
        Guard.NotNull(second);
        if (!first.Variance.IsDefined)
        {
            return Undefined(ComparisonDesign.Independent, first, second, first.Variance);
        }

        if (!second.Variance.IsDefined)
        {
            return Undefined(ComparisonDesign.Independent, first, second, second.Variance);
        }

        return new AreaComparison(
            ComparisonDesign.Independent,
            first,
            second,
            new AreaDifference(
                Quantity.Of(first.Value - second.Value), Quantity.Of(Math.Sqrt(first.Variance.Value + second.Variance.Value))),
            Quantity.Of(0));
    }

    // Without variances there may still be a difference to tell.
    private static AreaComparison Undefined(ComparisonDesign design, AreaUnderCurve first, AreaUnderCurve second, Quantity reason)
    {
        Quantity difference = first.IsDefined && second.IsDefined
            ? Quantity.Of(first.Value - second.Value)
            : Quantity.Undefined((first.WhyUndefined ?? second.WhyUndefined)!);
        return new AreaComparison(design, first, second, new AreaDifference(difference, reason), reason);
    }
}
