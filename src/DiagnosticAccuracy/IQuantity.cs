namespace DiagnosticAccuracy;

/// <summary>A number that the data either define, or leave undefined for a reason that can be read.</summary>
public interface IQuantity
{
    /// <summary>Gets a value indicating whether the data define this quantity.</summary>
    bool IsDefined { get; }

    /// <summary>Gets the value; <see cref="double.NaN"/> exactly when <see cref="IsDefined"/> is false. It may be infinite.</summary>
    double Value { get; }

    /// <summary>Gets why the quantity is undefined; null exactly when <see cref="IsDefined"/> is true.</summary>
    UndefinedReason? WhyUndefined { get; }
}
