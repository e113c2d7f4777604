namespace DiagnosticAccuracy;

/// <summary>The difference of the areas of two of several tests, with an interval that holds together with those of the other pairs.</summary>
/// <param name="First">The first test, from 0.</param>
/// <param name="Second">The second test, from 0.</param>
/// <param name="Difference">The area of the first minus that of the second.</param>
/// <param name="SimultaneousInterval">The interval at the joint level.</param>
public readonly record struct PairwiseAreaDifference(int First, int Second, AreaDifference Difference, ConfidenceInterval SimultaneousInterval)
{
    /// <summary>The pair, the difference and its interval.</summary>
    /// <returns>The text, in the invariant culture.</returns>
    public override string ToString() => $"{Display.Of(First)} - {Display.Of(Second)}: {Difference}, {SimultaneousInterval}";
}
