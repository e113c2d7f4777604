using System.Diagnostics.CodeAnalysis;
using System.Runtime.CompilerServices;

namespace DiagnosticAccuracy;

/// <summary>
/// The checks at the public door. Every message names the argument, the value that came and what is allowed.
/// </summary>
internal static class Guard
{
    public static void NotNull([NotNull] object? value, [CallerArgumentExpression(nameof(value))] string name = "")
    {
        if (value is null)
        {
            throw new ArgumentNullException(name);
        }
    }

    public static void NotNaN(double value, [CallerArgumentExpression(nameof(value))] string name = "")
    {
        if (double.IsNaN(value))
        {
            throw OutOfRange(name, value, "any number but NaN");
        }
    }

    public static void Finite(double value, [CallerArgumentExpression(nameof(value))] string name = "")
    {
        if (double.IsNaN(value) || double.IsInfinity(value))
        {
            throw OutOfRange(name, value, "a finite number");
        }
    }

    /// <summary>A probability that may be 0 or 1.</summary>
    public static void Probability(double value, [CallerArgumentExpression(nameof(value))] string name = "")
    {
        if (!(value >= 0 && value <= 1))
        {
            throw OutOfRange(name, value, "a probability from 0 to 1");
        }
    }

    /// <summary>A probability strictly between 0 and 1.</summary>
    public static void InsideUnitInterval(double value, [CallerArgumentExpression(nameof(value))] string name = "")
    {
        if (!(value > 0 && value < 1))
        {
            throw OutOfRange(name, value, "above 0 and below 1");
        }
    }

    public static void Positive(double value, [CallerArgumentExpression(nameof(value))] string name = "")
    {
        if (!(value > 0) || double.IsInfinity(value))
        {
            throw OutOfRange(name, value, "a finite number above 0");
        }
    }

    public static void Count(long value, [CallerArgumentExpression(nameof(value))] string name = "")
    {
        if (value < 0)
        {
            throw OutOfRange(name, value, "a count, 0 or more");
        }
    }

    public static void CountAt(long value, int index, string name)
    {
        if (value < 0)
        {
            throw OutOfRange($"{name}[{Display.Of(index)}]", value, "a count, 0 or more");
        }
    }

    public static void NotNaNAt(double value, int index, string name)
    {
        if (double.IsNaN(value))
        {
            throw new ArgumentException($"{name} is NaN at index {Display.Of(index)}; allowed is any number, infinities included.", name);
        }
    }

    public static void NotEmpty(long length, string name)
    {
        if (length == 0)
        {
            throw new ArgumentException($"{name} is empty; at least one subject is needed.", name);
        }
    }

    public static void AtLeast(long value, long minimum, [CallerArgumentExpression(nameof(value))] string name = "")
    {
        if (value < minimum)
        {
            throw OutOfRange(name, value, $"{Display.Of(minimum)} or more");
        }
    }

    public static void Direction(ScoreDirection value, [CallerArgumentExpression(nameof(value))] string name = "")
    {
        if (value is not (ScoreDirection.HigherIsPositive or ScoreDirection.LowerIsPositive))
        {
            throw OutOfRange(
                name,
                value,
                $"{nameof(ScoreDirection.HigherIsPositive)} or {nameof(ScoreDirection.LowerIsPositive)}; it is always stated and never taken from the data");
        }
    }

    public static void SameLength(int length, int expected, string name, string otherName)
    {
        if (length != expected)
        {
            throw new ArgumentException(
                $"{name} has {Display.Of(length)} elements and {otherName} has {Display.Of(expected)}; they must have the same length.",
                name);
        }
    }

    /// <summary>For the last arm of a switch over an enum of options.</summary>
    public static ArgumentOutOfRangeException UnknownOption<T>(T value, [CallerArgumentExpression(nameof(value))] string name = "")
        where T : struct, Enum =>
        OutOfRange(name, value, $"a value of {typeof(T).Name}");

    public static ArgumentOutOfRangeException OutOfRange(string name, object value, string allowed)
    {
        string shown = value switch
        {
            double number => Display.Exact(number),
            IFormattable formattable => formattable.ToString(null, System.Globalization.CultureInfo.InvariantCulture),
            _ => value.ToString() ?? string.Empty,
        };
        return new ArgumentOutOfRangeException(name, value, $"{name} is {shown}; allowed is {allowed}.");
    }
}
