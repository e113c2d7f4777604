using DiagnosticAccuracy.Numerics;

namespace DiagnosticAccuracy.Proportions;

/// <summary>The interval of an odds ratio from the tails of the distribution of the first cell given the margins.</summary>
/// <remarks>Cornfield, Proc Third Berkeley Symp 1956;4:135. Mid-P: Lancaster, J Am Stat Assoc 1961;56:223.</remarks>
internal static class ConditionalOddsRatio
{
    public const string ExactName = "exact conditional (Cornfield)";
    public const string MidPName = "mid-P conditional";

    // From here on the discreteness and the skewness are so small that their first terms give the limit to 12 digits and more.
    private const double LargeDeviation = 5e4;

    // No step on the logarithm is longer, so that the distribution is never summed far away from the observed table.
    private const double LongestStep = 3;

    private const int MostSteps = 2000;

    public static ConfidenceInterval Exact(OddsRatio odds, Confidence confidence) => Interval(odds, confidence, 1, ExactName);

    public static ConfidenceInterval MidP(OddsRatio odds, Confidence confidence) => Interval(odds, confidence, 0.5, MidPName);

    /// <summary>The interval; each tail holds the given share of the probability of the observed table.</summary>
    public static ConfidenceInterval Interval(OddsRatio odds, Confidence confidence, double share, string name)
    {
        if (!odds.IsDefined)
        {
            return ConfidenceInterval.Undefined(odds.WhyUndefined!, confidence, name);
        }

        FourCells cells = new(odds.First.Successes, odds.First.Failures, odds.Second.Successes, odds.Second.Failures);
        double lower = confidence.HasLower ? LowerLimit(cells, confidence.LowerTail, share) : 0;

        // The upper limit is the inverse of the lower one with successes and failures swapped.
        double upper = confidence.HasUpper ? 1 / LowerLimit(cells.Swapped, confidence.UpperTail, share) : double.PositiveInfinity;
        return new ConfidenceInterval(lower, upper, confidence, name);
    }

    // The odds ratio under which P(first cell greater) + share P(first cell as observed) is the tail.
    private static double LowerLimit(FourCells cells, double tail, double share)
    {
        double target = Math.Log(tail) - ElementaryFunctions.Log1P(-tail);
        double shareAtEnd = Math.Log(share) - ElementaryFunctions.Log1P(-share);
        if (cells.IsLeast && shareAtEnd >= target)
        {
            return 0;
        }

        if (cells.IsGreatest && shareAtEnd <= target)
        {
            return double.PositiveInfinity;
        }

        double z = StandardNormal.UpperQuantile(tail);
        return cells.Deviation > LargeDeviation
            ? ByExpansion(cells, z, share)
            : Math.Exp(BySummation(cells, z, target, share));
    }

    // Newton on the logit of the tail, which rises with the logarithm of the odds ratio, kept within what is known.
    internal static double BySummation(FourCells cells, double z, double target, double share)
    {
        FourCells smoothed = new(cells.A + 0.5, cells.B + 0.5, cells.C + 0.5, cells.D + 0.5);
        double spread = 1 / smoothed.Deviation;
        double x = smoothed.LogOddsRatio - (z * spread);
        double below = double.NegativeInfinity;
        double above = double.PositiveInfinity;
        for (int i = 0; i < MostSteps; i++)
        {
            TailSum up = TailSum.Of(cells, x);
            TailSum down = TailSum.Of(cells.Swapped, -x);
            double excess = up.LogPlus(share) - down.LogPlus(1 - share) - target;
            if (excess == 0)
            {
                return x;
            }

            if (excess > 0)
            {
                above = x;
            }
            else
            {
                below = x;
            }

            double slope = up.SlopePlus(share) + down.SlopePlus(1 - share);
            double step = slope > 0 ? -excess / slope : -Math.Sign(excess) * LongestStep;
            step = Math.Min(LongestStep, Math.Max(-LongestStep, step));
            if (Math.Abs(step) <= Math.Max(1e-10 * Math.Min(1, spread), 2e-16 * Math.Abs(x)))
            {
                // What is left after such a step is of the order of its square.
                return x + step;
            }

            double next = x + step;
            if (!(next > below && next < above))
            {
                next = double.IsInfinity(below) || double.IsInfinity(above) ? next : below + ((above - below) / 2);
            }

            x = next;
        }

        return x;
    }

    /// <summary>
    /// The limit for large cells: the distribution is normal with the variance 1/(1/A+1/B+1/C+1/D) of the cells expected under the
    /// limit, corrected for discreteness, for the distance of mean and mode, and for the skewness.
    /// </summary>
    internal static double ByExpansion(FourCells cells, double z, double share)
    {
        double correction = share - 0.5;
        double shift = z * cells.Deviation;
        FourCells expected = cells;
        for (int i = 0; i < 100; i++)
        {
            expected = cells.Shifted(-shift);
            double deviation = expected.Deviation;
            double a = 1 / expected.A;
            double b = 1 / expected.B;
            double c = 1 / expected.C;
            double d = 1 / expected.D;
            double tilt = -deviation * (a - b - c + d) / 2;
            double skewness = deviation * deviation * deviation * ((a * a) - (b * b) - (c * c) + (d * d));
            double next = correction + (deviation * (z + tilt + (skewness * ((z * z) + 2) / 6)));
            bool settled = Math.Abs(next - shift) <= 1e-15 * Math.Abs(next);
            shift = next;
            if (settled)
            {
                break;
            }
        }

        expected = cells.Shifted(-shift);
        return expected.A / expected.B * (expected.D / expected.C);
    }
}
