using System.Globalization;

namespace DiagnosticAccuracy;

/// <summary>How values show in a debugger or a console: invariant culture, six significant digits.</summary>
internal static class Display
{
    public static string Of(double value) => value.ToString("G6", CultureInfo.InvariantCulture);

    public static string Of(long value) => value.ToString(CultureInfo.InvariantCulture);

    public static string Exact(double value) => value.ToString("R", CultureInfo.InvariantCulture);

    public static string Of(IQuantity quantity) =>
        quantity.IsDefined ? Of(quantity.Value) : Undefined(quantity.WhyUndefined!);

    public static string Undefined(UndefinedReason reason) => "undefined: " + reason.Explanation;

    /// <summary>
    /// A probability as a percentage with no more digits than it was given with: 0.95 is "95 %". It is "0 %" and "100 %" only when it is 0 and 1.
    /// </summary>
    public static string Percent(double value)
    {
        // Fifteen digits: what 1 - 0.003 adds beyond them is not shown.
        decimal share = (decimal)value;
        return value switch
        {
            > 0 and < 1e-20 => Of(value * 100) + " %",
            < 1 when share == 1 => "1 - " + Exact(1 - value),
            _ => (share * 100m).ToString("0.##########################", CultureInfo.InvariantCulture) + " %",
        };
    }
}
