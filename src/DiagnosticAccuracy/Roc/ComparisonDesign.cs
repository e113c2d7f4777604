namespace DiagnosticAccuracy;

/// <summary>Whether two tests were done on the same subjects.</summary>
public enum ComparisonDesign
{
    /// <summary>Both tests on the same subjects: their areas are correlated.</summary>
    Paired = 0,

    /// <summary>Each test on subjects of its own: their areas are independent.</summary>
    Independent,
}
