namespace DiagnosticAccuracy.Proportions;

/// <summary>
/// The score statistic of "the first proportion is the second one plus d", with the variance at the maximum of the likelihood
/// under that hypothesis.
/// </summary>
/// <remarks>
/// z = (x1/n1 - x2/n2 - d) / sqrt(factor (p1 q1 / n1 + p2 q2 / n2)). The factor is 1 (Mee, Biometrics 1984;40:1175; Farrington and
/// Manning, Stat Med 1990;9:1447) or N / (N - 1) (Miettinen and Nurminen, Stat Med 1985;4:213).
/// </remarks>
internal readonly struct DifferenceScore(Proportion first, Proportion second, double varianceFactor)
{
    /// <summary>Gets the observed difference.</summary>
    public double Estimate => ProportionDifference.Between(first, second);

    /// <summary>The statistic; 0 where the observed difference is d, whatever the variance.</summary>
    public double Statistic(double difference)
    {
        if (difference < 0)
        {
            return -new DifferenceScore(second, first, varianceFactor).Statistic(-difference);
        }

        double n1 = first.Trials;
        double n2 = second.Trials;
        double f1 = first.Failures;
        double f2 = second.Failures;
        double excess = Estimate - difference;
        if (excess == 0)
        {
            return 0;
        }

        // The likelihood equation x2/p2 + x1/(p2 + d) = f1/q1 + f2/(q1 + d), p2 + q1 = 1 - d, is solved for the smaller of p2 and q1.
        double width = 1 - difference;
        double half = width / 2;
        double atHalf = ((second.Successes - f1) / half) + ((first.Successes - f2) / (half + difference));
        double p2;
        double q1;
        if (atHalf <= 0)
        {
            p2 = Smaller(second.Successes, first.Successes, f1, f2, difference, width);
            q1 = width - p2;
        }
        else
        {
            q1 = Smaller(f1, f2, second.Successes, first.Successes, difference, width);
            p2 = width - q1;
        }

        double variance = varianceFactor * (((p2 + difference) * q1 / n1) + (p2 * (q1 + difference) / n2));
        return excess / Math.Sqrt(variance);
    }

    /// <summary>
    /// The root s in 0 to width/2 of a/s + b/(s+d) = R(s), R(s) = e/(width-s) + g/(width-s+d); 0 where there is none.
    /// </summary>
    /// <remarks>
    /// Multiplied by s (s + d) the equation is concave, K(s) = a (s+d) + b s - s (s+d) R(s); with R(0) for R it is quadratic and its root is
    /// not below the one sought. From there Newton's method falls to the root without passing it.
    /// </remarks>
    private static double Smaller(double a, double b, double e, double g, double d, double width)
    {
        double atZero = (e / width) + (g / (width + d));
        double linear = (atZero * d) - a - b;
        double constant = a * d;
        double root = Math.Sqrt((linear * linear) + (4 * atZero * constant));
        double start = linear > 0 ? 2 * constant / (linear + root) : (root - linear) / (2 * atZero);
        double s = Math.Min(start, width / 2);
        for (int i = 0; i < 200 && s > 0; i++)
        {
            double left = width - s;
            double rest = (e / left) + (g / (left + d));
            double slopeOfRest = (e / (left * left)) + (g / ((left + d) * (left + d)));

            // Without a the equation has a root at 0 that does not count, and is divided by s.
            double value = a == 0 ? b - ((s + d) * rest) : (a * (s + d)) + (b * s) - (s * (s + d) * rest);
            double slope = a == 0
                ? -rest - ((s + d) * slopeOfRest)
                : a + b - (((2 * s) + d) * rest) - (s * (s + d) * slopeOfRest);
            double next = slope < 0 ? s - (value / slope) : s;
            if (!(next < s) || !(next > 0))
            {
                return next > 0 ? s : 0;
            }

            bool settled = s - next <= 2e-16 * s;
            s = next;
            if (settled)
            {
                break;
            }
        }

        return s;
    }
}
