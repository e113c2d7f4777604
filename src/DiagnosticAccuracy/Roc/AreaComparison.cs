using DiagnosticAccuracy.Numerics;

namespace DiagnosticAccuracy;

/// <summary>Two areas set against each other: the difference with its interval, and the test of no difference.</summary>
public sealed class AreaComparison
{
    internal AreaComparison(ComparisonDesign design, AreaUnderCurve first, AreaUnderCurve second, AreaDifference difference, Quantity covariance)
    {
        Design = design;
        First = first;
        Second = second;
        Difference = difference;
        Covariance = covariance;
        Z = difference.Standardised(difference.Value);
        PValue = Z.IsDefined ? Quantity.Of(StandardNormal.TwoSided(Z.Value)) : Z;
        Correlation = FindCorrelation(first, second, covariance);
    }

    /// <summary>Gets whether both tests were done on the same subjects.</summary>
    public ComparisonDesign Design { get; }

    /// <summary>Gets the area of the first test.</summary>
    public AreaUnderCurve First { get; }

    /// <summary>Gets the area of the second test.</summary>
    public AreaUnderCurve Second { get; }

    /// <summary>Gets the difference of the areas, first minus second.</summary>
    public AreaDifference Difference { get; }

    /// <summary>Gets the covariance of the two areas; 0 in the independent design.</summary>
    public Quantity Covariance { get; }

    /// <summary>Gets the correlation of the two areas, from -1 to 1; undefined when the variance of either is zero.</summary>
    public Quantity Correlation { get; }

    /// <summary>Gets the difference over its standard error; undefined when that is zero.</summary>
    public Quantity Z { get; }

    /// <summary>Gets the two-sided p-value of no difference, from the normal distribution.</summary>
    public Quantity PValue { get; }

    /// <summary>For example "difference 0.155882, z 2.72206, p 0.00648755".</summary>
    /// <returns>The text, in the invariant culture.</returns>
    public override string ToString() => $"difference {Difference}, z {Z}, p {PValue}";

    private static Quantity FindCorrelation(AreaUnderCurve first, AreaUnderCurve second, Quantity covariance)
    {
        if (!covariance.IsDefined)
        {
            return covariance;
        }

        double product = first.StandardError.Value * second.StandardError.Value;
        return product == 0
            ? Quantity.Undefined(UndefinedCause.ZeroVariance, "the estimated variance of an area is zero")
            : Quantity.Of(Math.Max(-1, Math.Min(1, covariance.Value / product)));
    }
}
