using DiagnosticAccuracy.Numerics;
using DiagnosticAccuracy.Roc;

namespace DiagnosticAccuracy;

/// <summary>The partial areas of two tests on the same subjects set against each other.</summary>
public sealed class PartialAreaComparison
{
    private PartialAreaComparison(PartialArea first, PartialArea second, AreaDifference difference)
    {
        First = first;
        Second = second;
        Difference = difference;
        Z = difference.Standardised(difference.Value);
        PValue = Z.IsDefined ? Quantity.Of(StandardNormal.TwoSided(Z.Value)) : Z;
    }

    /// <summary>Gets the partial area of the first test.</summary>
    public PartialArea First { get; }

    /// <summary>Gets the partial area of the second test.</summary>
    public PartialArea Second { get; }

    /// <summary>Gets the difference of the partial areas, first minus second.</summary>
    public AreaDifference Difference { get; }

    /// <summary>Gets the difference over its standard error; undefined when that is zero.</summary>
    public Quantity Z { get; }

    /// <summary>Gets the two-sided p-value of no difference, from the normal distribution.</summary>
    public Quantity PValue { get; }

    /// <summary>Compares the partial areas of the first two tests on the same subjects.</summary>
    /// <param name="scores">The scores.</param>
    /// <param name="range">The range, stated beforehand.</param>
    /// <returns>The comparison; its difference is undefined, with the reason, when a group is empty.</returns>
    /// <exception cref="ArgumentNullException"><paramref name="scores"/> is null.</exception>
    /// <remarks>Sources: Zhang, Zhou, Freeman and Freeman, Stat Med 2002;21:701; He and Escobar, Stat Med 2008;27:5291.</remarks>
    public static PartialAreaComparison Paired(PairedScores scores, PartialAreaRange range)
    {
        Guard.NotNull(scores);
        PartialArea first = PartialAreas.Of(scores.First, range);
        PartialArea second = PartialAreas.Of(scores.Second, range);
        Quantity error = first.Variance.IsDefined
            ? Quantity.Of(Math.Sqrt(PartialAreas.VarianceOfDifference(
                scores.PlacementsOf(0, nameof(scores)), scores.PlacementsOf(1, nameof(scores)), range)))
            : first.Variance;
        Quantity value = first.IsDefined ? Quantity.Of(first.Value - second.Value) : Quantity.Undefined(first.WhyUndefined!);
        return new PartialAreaComparison(first, second, new AreaDifference(value, error));
    }

    /// <summary>For example "difference 0.0548, z 3.1, p 0.0019".</summary>
    /// <returns>The text, in the invariant culture.</returns>
    public override string ToString() => $"difference {Difference}, z {Z}, p {PValue}";
}
