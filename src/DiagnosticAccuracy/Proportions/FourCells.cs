namespace DiagnosticAccuracy.Proportions;

/// <summary>The cells of a table of two groups by two outcomes: A and B of the first group, C and D of the second one.</summary>
internal readonly record struct FourCells(double A, double B, double C, double D)
{
    /// <summary>Gets the table with the outcomes swapped, whose odds ratio is the inverse.</summary>
    public FourCells Swapped => new(B, A, D, C);

    public double LogOddsRatio => Math.Log(A) + Math.Log(D) - Math.Log(B) - Math.Log(C);

    /// <summary>Gets the standard deviation of the first cell given the margins, were these the expected cells.</summary>
    public double Deviation => 1 / Math.Sqrt((1 / A) + (1 / B) + (1 / C) + (1 / D));

    /// <summary>Gets a value indicating whether the first cell is as small as the margins allow.</summary>
    public bool IsLeast => A == 0 || D == 0;

    /// <summary>Gets a value indicating whether the first cell is as great as the margins allow.</summary>
    public bool IsGreatest => B == 0 || C == 0;

    /// <summary>The table with the same margins and another first cell.</summary>
    public FourCells Shifted(double by) => new(A + by, B - by, C - by, D + by);
}
