using DiagnosticAccuracy.Numerics;
using DiagnosticAccuracy.Proportions;

namespace DiagnosticAccuracy;

/// <summary>
/// A margin that a difference of two proportions (or of two areas under ROC curves) has to exceed: stated first, then tested against the
/// data, of independent groups or of two tests on the same subjects.
/// </summary>
/// <remarks>
/// <para>Greater is better for the first proportion, as with the sensitivity of a new test against a comparator. Where less is
/// better, swap the two.</para>
/// <para><c>default(DifferenceMargin)</c> is superiority: the difference has to exceed 0.</para>
/// </remarks>
public readonly record struct DifferenceMargin
{
    private DifferenceMargin(double bound) => Bound = bound;

    /// <summary>Gets the difference that has to be exceeded: minus the margin for non-inferiority, plus the margin for superiority.</summary>
    public double Bound { get; }

    /// <summary>The first proportion may be lower than the second, but by less than the margin.</summary>
    /// <param name="margin">The margin, above 0 and below 1.</param>
    /// <returns>The margin as a bound on the difference, <c>-margin</c>.</returns>
    /// <exception cref="ArgumentOutOfRangeException"><paramref name="margin"/> is NaN, or not above 0 and below 1.</exception>
    public static DifferenceMargin NonInferiority(double margin)
    {
        Guard.InsideUnitInterval(margin);
        return new DifferenceMargin(-margin);
    }

    /// <summary>The first proportion has to be higher than the second, by more than the margin.</summary>
    /// <param name="margin">The margin, from 0 (plain superiority) to below 1.</param>
    /// <returns>The margin as a bound on the difference.</returns>
    /// <exception cref="ArgumentOutOfRangeException"><paramref name="margin"/> is NaN, negative, or not below 1.</exception>
    public static DifferenceMargin Superiority(double margin = 0)
    {
        if (!(margin >= 0 && margin < 1))
        {
            throw Guard.OutOfRange(nameof(margin), margin, "from 0 to below 1");
        }

        return new DifferenceMargin(margin);
    }

    /// <summary>The one-sided score test of "the difference is not above the bound", for independent groups.</summary>
    /// <param name="difference">The observed difference.</param>
    /// <returns>The statistic, the p-value and the interval that agrees with them; undefined, with the reason, where the difference is.</returns>
    /// <remarks>
    /// Farrington and Manning, Stat Med 1990;9:1447: the standard error is that of the maximum of the likelihood under a difference equal to
    /// the bound. With a bound of 0 this is the pooled test of two proportions.
    /// </remarks>
    public DifferenceTest Test(ProportionDifference difference)
    {
        if (!difference.IsDefined)
        {
            Quantity undefined = Quantity.Undefined(difference.WhyUndefined!);
            return new DifferenceTest(this, difference, undefined, undefined);
        }

        double statistic = new DifferenceScore(difference.First, difference.Second, 1).Statistic(Bound);
        return new DifferenceTest(this, difference, Quantity.Of(statistic), Quantity.Of(StandardNormal.Upper(statistic)));
    }

    /// <summary>For example "difference above -0.05".</summary>
    /// <returns>The text, in the invariant culture.</returns>
    public override string ToString() => "difference above " + Display.Of(Bound);
}
