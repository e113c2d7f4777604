using System.Globalization;
using System.Text;

namespace DiagnosticAccuracy.Examples;

/// <summary>Text from a file or an option, made safe to print: ASCII, and nothing that a terminal would obey.</summary>
internal static class Printable
{
    private const int Longest = 60;

    /// <summary>Everything outside printable ASCII as \uXXXX, so that it can still be told apart.</summary>
    public static string Of(string text)
    {
        if (text.All(IsPlain))
        {
            return text;
        }

        StringBuilder safe = new();
        foreach (char character in text)
        {
            _ = IsPlain(character)
                ? safe.Append(character)
                : safe.Append(CultureInfo.InvariantCulture, $"\\u{(int)character:X4}");
        }

        return safe.ToString();
    }

    /// <summary>A value in quotation marks, cut when it is long.</summary>
    public static string Quoted(string value) => value.Length == 0 ? "(empty)" : $"'{Short(value, Longest)}'";

    public static string Short(string text, int longest) => text.Length <= longest ? text : text[..longest] + "...";

    private static bool IsPlain(char character) => character is >= ' ' and <= '~';
}
