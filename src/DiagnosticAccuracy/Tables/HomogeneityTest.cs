using DiagnosticAccuracy.Numerics;

namespace DiagnosticAccuracy;

/// <summary>A chi-squared test of whether strata share one value of a measure.</summary>
/// <remarks><c>default(HomogeneityTest)</c> is undefined. A test with few subjects in each stratum sees little: a large p-value is no proof of homogeneity.</remarks>
public readonly record struct HomogeneityTest
{
    internal HomogeneityTest(Quantity statistic, int degreesOfFreedom, string method)
    {
        Statistic = statistic;
        DegreesOfFreedom = degreesOfFreedom;
        Method = method;
    }

    /// <summary>Gets the chi-squared statistic, 0 or more; undefined when fewer than two strata have something to compare.</summary>
    public Quantity Statistic { get; }

    /// <summary>Gets the degrees of freedom: the strata that have something to compare, less one.</summary>
    public int DegreesOfFreedom { get; }

    /// <summary>Gets the name of the test.</summary>
    public string? Method { get; }

    /// <summary>Gets the p-value from the chi-squared distribution.</summary>
    public Quantity PValue => Statistic.IsDefined ? Quantity.Of(Math.Min(1, ChiSquared.Upper(Statistic.Value, DegreesOfFreedom))) : Statistic;

    /// <summary>For example "Breslow-Day with Tarone's correction: 3.2 on 2 degrees of freedom, p 0.2".</summary>
    /// <returns>The text, in the invariant culture.</returns>
    public override string ToString() => $"{Method ?? "none"}: {Statistic} on {Display.Of(DegreesOfFreedom)} degrees of freedom, p {PValue}";
}
