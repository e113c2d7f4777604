using DiagnosticAccuracy.Numerics;
using DiagnosticAccuracy.Proportions;

namespace DiagnosticAccuracy;

/// <summary>
/// The exact coverage of a confidence interval for one proportion: the probability, over the binomial counts, that the interval contains
/// the true proportion.
/// </summary>
/// <remarks>
/// No simulation and no grid. The limits of every method rise with the count, so the counts whose interval contains a proportion are a
/// range, and the coverage is one minus two binomial tails. Compare Brown, Cai and DasGupta, Stat Sci 2001;16:101.
/// </remarks>
public static class IntervalCoverage
{
    /// <summary>The exact coverage at one true proportion.</summary>
    /// <param name="method">The method of the interval.</param>
    /// <param name="trials">The number of trials, 1 or more.</param>
    /// <param name="proportion">The true proportion, from 0 to 1.</param>
    /// <param name="confidence">Level and side; two-sided 95 % unless said.</param>
    /// <returns>The coverage, from 0 to 1; limits count as inside.</returns>
    /// <exception cref="ArgumentOutOfRangeException">An argument is outside of its range.</exception>
    public static double At(ProportionMethod method, long trials, double proportion, Confidence confidence = default)
    {
        Guard.AtLeast(trials, 1);
        Guard.Probability(proportion);

        // The greatest count whose lower limit is not above the proportion, and the least whose upper limit is not below it.
        long most = -1;
        for (long beyond = trials + 1; beyond - most > 1;)
        {
            long middle = most + ((beyond - most) / 2);
            if (Limits(method, middle, trials, confidence).Lower <= proportion)
            {
                most = middle;
            }
            else
            {
                beyond = middle;
            }
        }

        long least = trials + 1;
        for (long below = -1; least - below > 1;)
        {
            long middle = below + ((least - below) / 2);
            if (Limits(method, middle, trials, confidence).Upper >= proportion)
            {
                least = middle;
            }
            else
            {
                below = middle;
            }
        }

        return ProbabilityOf(least, most, trials, proportion);
    }

    /// <summary>The least coverage over a range of true proportions.</summary>
    /// <param name="method">The method of the interval.</param>
    /// <param name="trials">The number of trials, 1 or more.</param>
    /// <param name="from">The lower end of the range, from 0 to 1.</param>
    /// <param name="to">The upper end of the range, from <paramref name="from"/> to 1.</param>
    /// <param name="confidence">Level and side; two-sided 95 % unless said.</param>
    /// <returns>The least coverage and where it lies.</returns>
    /// <exception cref="ArgumentOutOfRangeException">An argument is outside of its range.</exception>
    /// <remarks>
    /// Between two neighbouring limits the coverage rises and then falls, so its infimum is a one-sided limit at one of the interval's limits or
    /// at an end of the range. All of them are looked at: the work grows with the number of limits within the range.
    /// </remarks>
    public static CoverageMinimum Minimum(
        ProportionMethod method, long trials, double from = 0, double to = 1, Confidence confidence = default)
    {
        Guard.AtLeast(trials, 1);
        Guard.Probability(from);
        if (!(to >= from && to <= 1))
        {
            throw Guard.OutOfRange(nameof(to), to, $"from {Display.Exact(from)} (the lower end of the range) to 1");
        }

        CoverageMinimum best = new(At(method, trials, from, confidence), from, CoverageApproach.AtThePoint);
        CoverageWalk walk = new(method, trials, confidence);
        walk.StartAbove(from);
        double here = from;
        while (here < to)
        {
            best = best.OrLess(walk.Probability(here), here, CoverageApproach.FromAbove);
            double next = Math.Min(to, walk.NextLimit);
            best = best.OrLess(walk.Probability(next), next, CoverageApproach.FromBelow);
            walk.Pass(next);
            here = next;
        }

        return best.OrLess(At(method, trials, to, confidence), to, CoverageApproach.AtThePoint);
    }

    internal static ConfidenceInterval Limits(ProportionMethod method, long successes, long trials, Confidence confidence) =>
        new Proportion(successes, trials).Interval(confidence, method);

    /// <summary>The probability of a count from the least to the most; 0 when there is none.</summary>
    internal static double ProbabilityOf(long least, long most, long trials, double proportion)
    {
        if (least > most)
        {
            return 0;
        }

        double below = least == 0 ? 0 : proportion == 0 ? 1 : IncompleteBeta.Upper(least, trials - least + 1.0, proportion);
        double above = most == trials ? 0 : proportion == 1 ? 1 : IncompleteBeta.Lower(most + 1.0, trials - most, proportion);
        return Math.Max(0, 1 - below - above);
    }
}
