namespace DiagnosticAccuracy.Numerics;

/// <summary>
/// A real function of one real variable; a structure that implements it is called without a delegate.
/// </summary>
internal interface IFunction
{
    /// <summary>The value of the function.</summary>
    /// <param name="x">The argument.</param>
    /// <returns>The value.</returns>
    double Value(double x);
}
