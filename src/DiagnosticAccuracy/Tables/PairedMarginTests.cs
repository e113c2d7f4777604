using DiagnosticAccuracy.Numerics;
using DiagnosticAccuracy.Tables;

namespace DiagnosticAccuracy;

/// <summary>Tests of margins that were stated first, against two tests on the same subjects.</summary>
public static class PairedMarginTests
{
    /// <summary>The one-sided score test of "the difference is not above the bound", for two tests on the same subjects.</summary>
    /// <param name="margin">The margin.</param>
    /// <param name="difference">The observed difference.</param>
    /// <returns>The statistic, the p-value and the interval that agrees with them; undefined, with the reason, where the difference is.</returns>
    /// <remarks>
    /// Nam, Biometrics 1997;53:1422: the standard error is that of the maximum of the likelihood under a difference equal to the bound. With a
    /// bound of 0 this is one side of McNemar's asymptotic test. The p-value is asymptotic; its size at 30, 50 and 100 subjects is in the documentation.
    /// </remarks>
    public static PairedDifferenceTest Test(this DifferenceMargin margin, PairedDifference difference)
    {
        if (!difference.IsDefined)
        {
            Quantity undefined = Quantity.Undefined(difference.WhyUndefined!);
            return new PairedDifferenceTest(margin, difference, undefined, undefined);
        }

        double z = new PairedDifferenceScore(difference.Table).Statistic(margin.Bound);
        return new PairedDifferenceTest(margin, difference, Quantity.Of(z), Quantity.Of(StandardNormal.Upper(z)));
    }

    /// <summary>Two one-sided score tests, of "the difference is not above the lower margin" and "is not below the upper one".</summary>
    /// <param name="margins">The margins.</param>
    /// <param name="difference">The observed difference.</param>
    /// <returns>The statistics, the p-value and the interval that agrees with them; undefined, with the reason, where the difference is.</returns>
    /// <remarks>Liu, Hsueh, Hsieh and Chen, Stat Med 2002;21:231, with the score statistic; two one-sided tests: Schuirmann, J Pharmacokinet Biopharm 1987;15:657.</remarks>
    public static PairedDifferenceEquivalence Test(this DifferenceEquivalenceMargins margins, PairedDifference difference)
    {
        if (!difference.IsDefined)
        {
            Quantity undefined = Quantity.Undefined(difference.WhyUndefined!);
            return new PairedDifferenceEquivalence(margins, difference, undefined, undefined, undefined);
        }

        PairedDifferenceScore score = new(difference.Table);
        double lower = score.Statistic(margins.Lower);
        double upper = score.Statistic(margins.Upper);
        return new PairedDifferenceEquivalence(margins, difference, Quantity.Of(lower), Quantity.Of(upper), LargerTail(lower, upper));
    }

    /// <summary>The one-sided score test of "the ratio does not clear the bound", for two tests on the same subjects.</summary>
    /// <param name="margin">The margin.</param>
    /// <param name="ratio">The observed ratio.</param>
    /// <returns>The statistic, the p-value and the interval that agrees with them; undefined, with the reason, where the ratio is.</returns>
    /// <remarks>
    /// Nam and Blackwelder, Stat Med 2002;21:689: the standard error is that of the maximum of the likelihood under a ratio equal to the bound. With
    /// a bound of 1 this is one side of McNemar's asymptotic test.
    /// </remarks>
    public static PairedRatioTest Test(this RatioMargin margin, PairedRatio ratio)
    {
        if (!ratio.IsDefined)
        {
            Quantity undefined = Quantity.Undefined(ratio.WhyUndefined!);
            return new PairedRatioTest(margin, ratio, undefined, undefined);
        }

        double z = new PairedRatioScore(ratio.Table).Statistic(margin.Bound);
        return new PairedRatioTest(margin, ratio, Quantity.Of(z), Quantity.Of(margin.IsUpper ? StandardNormal.Lower(z) : StandardNormal.Upper(z)));
    }

    /// <summary>Two one-sided score tests, of "the ratio is not above the lower margin" and "is not below the upper one".</summary>
    /// <param name="margins">The margins.</param>
    /// <param name="ratio">The observed ratio.</param>
    /// <returns>The statistics, the p-value and the interval that agrees with them; undefined, with the reason, where the ratio is.</returns>
    /// <remarks>Nam and Blackwelder, Stat Med 2002;21:689; two one-sided tests: Schuirmann, J Pharmacokinet Biopharm 1987;15:657.</remarks>
    public static PairedRatioEquivalence Test(this RatioEquivalenceMargins margins, PairedRatio ratio)
    {
        if (!ratio.IsDefined)
        {
            Quantity undefined = Quantity.Undefined(ratio.WhyUndefined!);
            return new PairedRatioEquivalence(margins, ratio, undefined, undefined, undefined);
        }

        PairedRatioScore score = new(ratio.Table);
        double lower = score.Statistic(margins.Lower);
        double upper = score.Statistic(margins.Upper);
        return new PairedRatioEquivalence(margins, ratio, Quantity.Of(lower), Quantity.Of(upper), LargerTail(lower, upper));
    }

    private static Quantity LargerTail(double lower, double upper) =>
        Quantity.Of(Math.Max(StandardNormal.Upper(lower), StandardNormal.Lower(upper)));
}
