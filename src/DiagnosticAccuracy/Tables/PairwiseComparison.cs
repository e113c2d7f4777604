namespace DiagnosticAccuracy;

/// <summary>Two of several tests on the same subjects compared, with the p-value adjusted for the number of comparisons.</summary>
/// <remarks><c>default(PairwiseComparison)</c> compares nothing: its table is empty and its test undefined.</remarks>
/// <param name="First">The index of the first test, from 0.</param>
/// <param name="Second">The index of the second test, above the first.</param>
/// <param name="Table">Both tests on each subject.</param>
/// <param name="Test">McNemar's test of the two alone.</param>
/// <param name="AdjustedPValue">The p-value adjusted by Holm's procedure for all pairs: at most alpha where the family of comparisons rejects this one at alpha.</param>
public readonly record struct PairwiseComparison(int First, int Second, PairedTable Table, PairedTest Test, Quantity AdjustedPValue)
{
    /// <summary>For example "test 0 against test 2: p = 0.01, adjusted 0.03".</summary>
    /// <returns>The text, in the invariant culture.</returns>
    public override string ToString() =>
        $"test {Display.Of(First)} against test {Display.Of(Second)}: p = {Test.PValue}, adjusted {AdjustedPValue}";
}
