namespace DiagnosticAccuracy.Tables;

/// <summary>The weighted generalised score test of equal predictive values.</summary>
/// <remarks>
/// <para>The squared difference of the predictive values over (p (1 - p) - 2 C) (1/n1 + 1/n2), with p the share of right calls among the n1 + n2
/// calls of both tests and C = (r (1 - p)^2 + w p^2) / (n1 + n2) for r right and w wrong subjects called by both. Since p (1 - p) is the mean of the
/// squares (D - p)^2 over all calls, and a subject called by both has two of them, p (1 - p) - 2 C is the sum of the squares over the subjects that
/// one test alone calls, divided by n1 + n2: what is summed here.</para>
/// <para>Kosinski, Stat Med 2013;32:964.</para>
/// </remarks>
internal static class WeightedGeneralisedScore
{
    public const string Name = "weighted generalised score (Kosinski)";

    public static PairedTest Test(PredictiveCells cells, UndefinedReason? reason)
    {
        if (reason is not null)
        {
            return PairedTest.Undefined(reason, Name);
        }

        double wrong = cells.PooledWrong;
        double right = cells.PooledRight;
        double squares = (wrong * wrong * cells.Right.Discordant) + (right * right * cells.Wrong.Discordant);

        // (1/n1 + 1/n2) / (n1 + n2) = 1 / (n1 n2), and the difference is the exact cross difference over n1 n2.
        double product = Math.Sqrt(cells.FirstCalls) * Math.Sqrt(cells.SecondCalls);
        return GeneralisedScore.Result((double)cells.CrossDifference / product, squares, Name);
    }
}
