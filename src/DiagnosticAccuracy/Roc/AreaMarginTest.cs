namespace DiagnosticAccuracy;

/// <summary>The test of a difference of areas against a margin that was stated first.</summary>
/// <remarks><c>default(AreaMarginTest)</c> is undefined.</remarks>
public readonly record struct AreaMarginTest
{
    internal AreaMarginTest(AreaDifference difference, Quantity z, Quantity pValue)
    {
        Difference = difference;
        Z = z;
        PValue = pValue;
    }

    /// <summary>Gets the observed difference.</summary>
    public AreaDifference Difference { get; }

    /// <summary>
    /// Gets the distance from the margin (of two margins the smaller distance) over the standard error: large when the difference is clear of it. Undefined
    /// when the standard error is undefined or zero.
    /// </summary>
    public Quantity Z { get; }

    /// <summary>Gets the one-sided p-value (of two margins the larger one), from the normal distribution.</summary>
    public Quantity PValue { get; }

    /// <summary>For example "z 2.1, p 0.0179".</summary>
    /// <returns>The text, in the invariant culture.</returns>
    public override string ToString() => $"z {Z}, p {PValue}";
}
