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

    /// <summary>A ratio from 0 to infinity, to four significant digits or whole.</summary>
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

    /// <summary>A p-value, to four significant digits.</summary>
    public static string Probability(double value) => value switch
    {
        < 1e-6 => "<0.000001",
        < 0.0001 => value.ToString("0.0000000", CultureInfo.InvariantCulture),
        < 0.01 => value.ToString("0.000000", CultureInfo.InvariantCulture),
        _ => value.ToString("0.0000", CultureInfo.InvariantCulture),
    };

    public static string Number(double value, int decimals) =>
        value.ToString("F" + decimals.ToString(CultureInfo.InvariantCulture), CultureInfo.InvariantCulture);

    public static string Count(long value) => value.ToString(CultureInfo.InvariantCulture);

    public static string Exact(double value) => value.ToString("R", CultureInfo.InvariantCulture);
}
