namespace DiagnosticAccuracy;

/// <summary>The test that scores do not tell the groups apart: the Mann-Whitney (Wilcoxon rank sum) test.</summary>
/// <remarks>
/// <para>Its null hypothesis is that the scores of both groups come from one distribution, under which the area is one half. It says whether a test tells
/// anything, not how much.</para>
/// <para><c>default(ChanceTest)</c> is undefined.</para>
/// </remarks>
public readonly record struct ChanceTest
{
    internal ChanceTest(ChanceTestMethod method, Alternative alternative, Quantity z, Quantity pValue)
    {
        Method = method;
        Alternative = alternative;
        Z = z;
        PValue = pValue;
    }

    /// <summary>Gets the method.</summary>
    public ChanceTestMethod Method { get; }

    /// <summary>Gets the alternative: an area that differs from one half, is greater, or is less.</summary>
    public Alternative Alternative { get; }

    /// <summary>Gets the standardised rank sum; undefined for the exact test and when all scores are equal.</summary>
    public Quantity Z { get; }

    /// <summary>
    /// Gets the p-value. Two-sided exact: the probability of a rank sum at least as far from its mean. Exactly 1 by the exact test when all scores are
    /// equal.
    /// </summary>
    public Quantity PValue { get; }

    /// <summary>For example "p 0.05 (Exact, Greater)".</summary>
    /// <returns>The text, in the invariant culture.</returns>
    public override string ToString() => $"p {PValue} ({Method}, {Alternative})";
}
