namespace DiagnosticAccuracy;

/// <summary>A quantity estimated from data that states its uncertainty as a confidence interval.</summary>
public interface IIntervalQuantity : IQuantity
{
    /// <summary>The confidence interval by the default method of the quantity, which the result names.</summary>
    /// <param name="confidence">Level and side; the default is two-sided 95 %.</param>
    /// <returns>The interval; undefined, with a reason, where the data do not define one.</returns>
    ConfidenceInterval Interval(Confidence confidence = default);
}
