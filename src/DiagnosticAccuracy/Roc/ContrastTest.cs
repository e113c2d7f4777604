using DiagnosticAccuracy.Numerics;

namespace DiagnosticAccuracy;

/// <summary>A chi-squared test that contrasts of several areas are zero.</summary>
/// <remarks><c>default(ContrastTest)</c> is undefined.</remarks>
public readonly record struct ContrastTest
{
    internal ContrastTest(Quantity statistic, int degreesOfFreedom)
    {
        Statistic = statistic;
        DegreesOfFreedom = degreesOfFreedom;
    }

    /// <summary>Gets the statistic, 0 or more.</summary>
    public Quantity Statistic { get; }

    /// <summary>
    /// Gets the degrees of freedom: the rank of the covariance of the contrasts, which is less than their number when they depend on each other or
    /// tests order the subjects alike.
    /// </summary>
    public int DegreesOfFreedom { get; }

    /// <summary>Gets the p-value from the chi-squared distribution.</summary>
    public Quantity PValue => Statistic.IsDefined ? Quantity.Of(Math.Min(1, ChiSquared.Upper(Statistic.Value, DegreesOfFreedom))) : Statistic;

    /// <summary>For example "7.40964 on 1 degrees of freedom, p 0.00648755".</summary>
    /// <returns>The text, in the invariant culture.</returns>
    public override string ToString() => $"{Statistic} on {Display.Of(DegreesOfFreedom)} degrees of freedom, p {PValue}";
}
