namespace DiagnosticAccuracy;

/// <summary>A two-sided test of no difference between tests on the same subjects: statistic, p-value, and the method that made them.</summary>
/// <remarks><c>default(PairedTest)</c> is undefined, with the cause <see cref="UndefinedCause.NotComputed"/>.</remarks>
public readonly record struct PairedTest
{
    private readonly string? _method;

    internal PairedTest(Quantity statistic, Quantity pValue, string method, int degreesOfFreedom = 1)
    {
        Statistic = statistic;
        PValue = pValue;
        DegreesOfFreedom = degreesOfFreedom;
        _method = method;
    }

    /// <summary>
    /// Gets the statistic, 0 or more, chi-squared with <see cref="DegreesOfFreedom"/> when there is no difference. Undefined for an exact form, which has
    /// none, and where it is 0/0 because the results show no disagreement at all.
    /// </summary>
    public Quantity Statistic { get; }

    /// <summary>Gets the degrees of freedom of the statistic: the number of tests compared, less one; 0 when undefined.</summary>
    public int DegreesOfFreedom { get; }

    /// <summary>Gets the two-sided p-value, from 0 to 1. It is 1 where the results show no disagreement at all.</summary>
    public Quantity PValue { get; }

    /// <summary>Gets the name of the method, for example "McNemar, mid-P".</summary>
    public string Method => _method ?? "none";

    /// <summary>For example "McNemar, asymptotic: chi-squared 4.5 on 1 degree of freedom, p = 0.0338949".</summary>
    /// <returns>The text, in the invariant culture.</returns>
    public override string ToString()
    {
        string degrees = DegreesOfFreedom == 1 ? "1 degree" : Display.Of(DegreesOfFreedom) + " degrees";
        return Statistic.IsDefined ? $"{Method}: chi-squared {Statistic} on {degrees} of freedom, p = {PValue}" : $"{Method}: p = {PValue}";
    }

    internal static PairedTest Undefined(UndefinedReason reason, string method) =>
        new(Quantity.Undefined(reason), Quantity.Undefined(reason), method, degreesOfFreedom: 0);
}
