namespace DiagnosticAccuracy;

/// <summary>A two-sided test of no difference between tests on the same subjects: statistic, p-value, and the method that made them.</summary>
/// <remarks><c>default(PairedTest)</c> is undefined, with the cause <see cref="UndefinedCause.NotComputed"/>.</remarks>
public readonly record struct PairedTest
{
    private readonly string? _method;

    internal PairedTest(Quantity statistic, Quantity pValue, string method)
    {
        Statistic = statistic;
        PValue = pValue;
        _method = method;
    }

    /// <summary>
    /// Gets the statistic, 0 or more, chi-square with one degree of freedom when there is no difference. Undefined for an exact form, which has
    /// none, and where it is 0/0 because the results show no disagreement at all.
    /// </summary>
    public Quantity Statistic { get; }

    /// <summary>Gets the two-sided p-value, from 0 to 1. It is 1 where the results show no disagreement at all.</summary>
    public Quantity PValue { get; }

    /// <summary>Gets the name of the method, for example "McNemar, mid-P".</summary>
    public string Method => _method ?? "none";

    /// <summary>For example "McNemar, asymptotic: chi-square = 4.5, p = 0.0338949".</summary>
    /// <returns>The text, in the invariant culture.</returns>
    public override string ToString() => Statistic.IsDefined
        ? $"{Method}: chi-square = {Statistic}, p = {PValue}"
        : $"{Method}: p = {PValue}";

    internal static PairedTest Undefined(UndefinedReason reason, string method) =>
        new(Quantity.Undefined(reason), Quantity.Undefined(reason), method);
}
