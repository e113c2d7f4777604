using DiagnosticAccuracy.Numerics;

namespace DiagnosticAccuracy.Tables;

/// <summary>The generalised score test of equal predictive values.</summary>
/// <remarks>
/// <para>Every call is a row: D = 1 when it is right, Z = 1 when it comes from the second test. With means over all rows, the statistic is
/// (sum D (Z - mean Z))^2 / sum over subjects of (sum over rows (D - mean D) (Z - mean Z))^2, chi-squared with one degree of freedom.</para>
/// <para>Leisenring, Alonzo and Pepe, Biometrics 2000;56:345.</para>
/// </remarks>
internal static class GeneralisedScore
{
    public const string Name = "generalised score (Leisenring-Alonzo-Pepe)";

    internal static readonly UndefinedReason NothingDiffers =
        new(UndefinedCause.ZeroOverZero, "no subject speaks about the difference, so the statistic is zero over zero");

    public static PairedTest Test(PredictiveCells cells, UndefinedReason? reason)
    {
        if (reason is not null)
        {
            return PairedTest.Undefined(reason, Name);
        }

        double wrong = cells.PooledWrong;
        double right = cells.PooledRight;
        double fromFirst = cells.FirstCalls / cells.Calls;
        double fromSecond = cells.SecondCalls / cells.Calls;

        // (D - mean D) is the share of wrong calls for a right call, minus the share of right calls for a wrong one.
        double variance = (wrong * wrong * Squares(cells.Right, fromFirst, fromSecond)) + (right * right * Squares(cells.Wrong, fromFirst, fromSecond));
        double numerator = (double)cells.CrossDifference / cells.Calls;
        return Result(numerator, variance, Name);
    }

    internal static PairedTest Result(double numerator, double variance, string name)
    {
        if (numerator == 0 && variance == 0)
        {
            return new PairedTest(Quantity.Undefined(NothingDiffers), Quantity.Of(1), name);
        }

        double z = numerator / Math.Sqrt(variance);
        return new PairedTest(Quantity.Of(z * z), Quantity.Of(StandardNormal.TwoSided(z)), name);
    }

    // The squares of the sums of Z - mean Z over the rows of each subject.
    private static double Squares(PairedTable table, double fromFirst, double fromSecond)
    {
        double both = fromFirst - fromSecond;
        return (table.BothPositive * both * both) + (table.FirstOnly * fromSecond * fromSecond) + (table.SecondOnly * fromFirst * fromFirst);
    }
}
