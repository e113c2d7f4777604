namespace DiagnosticAccuracy.Proportions;

/// <summary>
/// Goes from limit to limit of an interval method upward, and knows between them which counts have an interval that contains the true
/// proportion: a range from the least to the most.
/// </summary>
internal sealed class CoverageWalk(ProportionMethod method, long trials, Confidence confidence)
{
    // Limits that are equal on paper differ by rounding; what lies nearer together than this is passed at once.
    private const double Together = 1e-13;

    private long _least;
    private long _most;
    private double _nextLower;
    private double _nextUpper;

    /// <summary>Gets the next limit above, 1 when there is none below 1.</summary>
    public double NextLimit => Math.Min(1, Math.Min(_nextLower, _nextUpper));

    /// <summary>Goes to just above a proportion.</summary>
    public void StartAbove(double proportion)
    {
        // The first count whose lower limit is beyond, and the first whose upper limit is.
        long beyond = First(count => LowerOf(count) > proportion * (1 + Together));
        _most = beyond - 1;
        _least = First(count => UpperOf(count) > proportion * (1 + Together));
        Look();
    }

    /// <summary>Goes past all limits at a proportion.</summary>
    public void Pass(double proportion)
    {
        double reach = proportion * (1 + Together);
        while (_most < trials && _nextLower <= reach)
        {
            _most++;
            _nextLower = LowerOf(_most + 1);
        }

        while (_least <= trials && _nextUpper <= reach)
        {
            _least++;
            _nextUpper = UpperOf(_least);
        }
    }

    /// <summary>The probability of the counts that cover here.</summary>
    public double Probability(double proportion) => IntervalCoverage.ProbabilityOf(_least, _most, trials, proportion);

    private void Look()
    {
        _nextLower = LowerOf(_most + 1);
        _nextUpper = UpperOf(_least);
    }

    private double LowerOf(long count) =>
        count > trials ? double.PositiveInfinity : IntervalCoverage.Limits(method, count, trials, confidence).Lower;

    private double UpperOf(long count) =>
        count > trials ? double.PositiveInfinity : IntervalCoverage.Limits(method, count, trials, confidence).Upper;

    private long First(Func<long, bool> isBeyond)
    {
        long below = -1;
        long beyond = trials + 1;
        while (beyond - below > 1)
        {
            long middle = below + ((beyond - below) / 2);
            if (isBeyond(middle))
            {
                beyond = middle;
            }
            else
            {
                below = middle;
            }
        }

        return beyond;
    }
}
