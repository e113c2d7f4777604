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

    /// <summary>A probability as a percentage with no more digits than it was given with: 0.95 is "95 %".</summary>
    public static string Percent(double value) => ((decimal)value * 100m).ToString("0.##############", CultureInfo.InvariantCulture) + " %";
}
