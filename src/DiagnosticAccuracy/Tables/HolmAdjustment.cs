namespace DiagnosticAccuracy.Tables;

/// <summary>P-values adjusted for their number by Holm's step-down procedure.</summary>
/// <remarks>
/// In rising order the i-th of m, from 0, is multiplied by m - i, is not below the one before it, and not above 1. Holm, Scand J Stat 1979;6:65.
/// </remarks>
internal static class HolmAdjustment
{
    public static double[] Of(double[] pValues)
    {
        int[] order = new int[pValues.Length];
        for (int i = 0; i < order.Length; i++)
        {
            order[i] = i;
        }

        Array.Sort((double[])pValues.Clone(), order);
        double[] adjusted = new double[pValues.Length];
        double least = 0;
        for (int i = 0; i < order.Length; i++)
        {
            least = Math.Min(1, Math.Max(least, (order.Length - i) * pValues[order[i]]));
            adjusted[order[i]] = least;
        }

        return adjusted;
    }
}
