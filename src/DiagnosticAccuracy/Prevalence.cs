namespace DiagnosticAccuracy;

/// <summary>
/// The share of the people (or units) in question who have the condition: the pre-test probability of one drawn at random.
/// </summary>
/// <remarks><c>default(Prevalence)</c> is 0: nobody has the condition.</remarks>
public readonly record struct Prevalence
{
    /// <summary>Initializes a new instance of the <see cref="Prevalence"/> struct.</summary>
    /// <param name="value">A share from 0 to 1; 0.02 is 2 %.</param>
    /// <exception cref="ArgumentOutOfRangeException"><paramref name="value"/> is NaN or not from 0 to 1.</exception>
    public Prevalence(double value)
    {
        Guard.Probability(value);
        Value = value == 0 ? 0 : value;
    }

    /// <summary>Gets the share, from 0 to 1.</summary>
    public double Value { get; }

    /// <summary>Gets the odds, p / (1 - p); infinite at 1.</summary>
    public double Odds => Value / (1 - Value);

    /// <summary>A prevalence stated as so many of so many, for example 7 of 10,000.</summary>
    /// <param name="withCondition">How many have the condition, 0 or more.</param>
    /// <param name="total">Of how many, 1 or more and not fewer than <paramref name="withCondition"/>.</param>
    /// <returns>The prevalence.</returns>
    /// <exception cref="ArgumentOutOfRangeException">A count is out of its range.</exception>
    public static Prevalence FromCounts(long withCondition, long total)
    {
        Guard.Count(withCondition);
        Guard.AtLeast(total, Math.Max(1, withCondition));
        return new Prevalence((double)withCondition / total);
    }

    /// <summary>The share as a percentage, in the invariant culture.</summary>
    /// <returns>For example "2 %".</returns>
    public override string ToString() => Display.Percent(Value);
}
