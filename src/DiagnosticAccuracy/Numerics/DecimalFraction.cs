using System.Globalization;
using System.Numerics;

namespace DiagnosticAccuracy.Numerics;

/// <summary>Doubles from 0 to 1 as the decimal fractions they print as: 0.15 is 15 / 100, not the binary number next to it.</summary>
internal readonly struct DecimalFraction
{
    private DecimalFraction(BigInteger numerator, BigInteger denominator)
    {
        Numerator = numerator;
        Denominator = denominator;
    }

    public BigInteger Numerator { get; }

    /// <summary>Gets a power of ten.</summary>
    public BigInteger Denominator { get; }

    /// <summary>The shortest decimal number that reads back as the value.</summary>
    /// <param name="value">A number from 0 to 1.</param>
    public static DecimalFraction Of(double value)
    {
        // One digit, a point and sixteen more, the exponent: 1.5000000000000000E-007.
        string text = value.ToString("R", CultureInfo.InvariantCulture);
        long digits = 0;
        int decimals = 0;
        int exponent = 0;
        bool behindPoint = false;
        bool behindE = false;
        foreach (char c in text)
        {
            switch (c)
            {
                case '.':
                    behindPoint = true;
                    break;
                case 'E':
                    behindE = true;
                    break;
                case '-':
                    break;
                default:
                    if (behindE)
                    {
                        exponent = (10 * exponent) + (c - '0');
                    }
                    else
                    {
                        digits = (10 * digits) + (c - '0');
                        decimals += behindPoint ? 1 : 0;
                    }

                    break;
            }
        }

        // A number from 0 to 1 has no positive exponent.
        return new DecimalFraction(digits, BigInteger.Pow(10, decimals + exponent));
    }
}
