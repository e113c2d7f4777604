using System.Globalization;

namespace DiagnosticAccuracy.Examples;

/// <summary>Numbers as they are printed: invariant, estimate and limits to the same digits, never 0 or 1 unless exact.</summary>
internal static class Figures
{
    /// <summary>A share from 0 to 1.</summary>
    public static string Share(double value, int decimals)
    {
        double step = Math.Pow(10, -decimals);
        string text = value.ToString("F" + decimals.ToString(CultureInfo.InvariantCulture), CultureInfo.InvariantCulture);
        if (value > 0 && value < step / 2)
        {
            return "<" + Share(step, decimals);
        }

        return value < 1 && value > 1 - (step / 2) ? ">" + Share(1 - step, decimals) : text;
    }

    /// <summary>A ratio from 0 to infinity: four significant digits from 1 up, whole from 1000 up, four decimals below 1.</summary>
    public static string Ratio(double value) => value switch
    {
        double.PositiveInfinity => "infinite",
        >= 1000 => value.ToString("F0", CultureInfo.InvariantCulture),
        >= 100 => value.ToString("F1", CultureInfo.InvariantCulture),
        >= 10 => value.ToString("F2", CultureInfo.InvariantCulture),
        >= 1 => value.ToString("F3", CultureInfo.InvariantCulture),
        0 => "0",
        < 0.00005 => "<0.0001",
        _ => value.ToString("F4", CultureInfo.InvariantCulture),
    };

    /// <summary>A p-value, to four significant digits, never 1 unless exact.</summary>
    public static string Probability(double value) =>
        value < 1e-6 ? "<0.000001" : Share(value, SignificantDecimals(value, 4));

    /// <summary>A standard error: six decimals, more where four significant digits need them.</summary>
    public static string StandardError(double value) => Number(value, SignificantDecimals(value, 6));

    /// <summary>A signed number; what rounds to zero has no sign.</summary>
    public static string Number(double value, int decimals)
    {
        string text = value.ToString("F" + decimals.ToString(CultureInfo.InvariantCulture), CultureInfo.InvariantCulture);
        return text.StartsWith('-') && !text.AsSpan().ContainsAnyInRange('1', '9') ? text[1..] : text;
    }

    public static string Count(long value) => value.ToString(CultureInfo.InvariantCulture);

    private static int SignificantDecimals(double value, int fewest) =>
        value > 0 ? Math.Clamp(3 - (int)Math.Floor(Math.Log10(value)), fewest, 15) : fewest;
}
