using System.Numerics;

namespace DiagnosticAccuracy.Tables;

/// <summary>The six cells that speak about one predictive value of two tests: subjects called by both or by one, rightly or wrongly.</summary>
internal readonly struct PredictiveCells(PairedTable right, PairedTable wrong)
{
    public PairedTable Right => right;

    public PairedTable Wrong => wrong;

    /// <summary>Gets how many the first test calls.</summary>
    public long FirstCalls => right.FirstPositives + wrong.FirstPositives;

    /// <summary>Gets how many the second test calls.</summary>
    public long SecondCalls => right.SecondPositives + wrong.SecondPositives;

    /// <summary>Gets the difference of the predictive values times the product of the calls, exactly.</summary>
    public BigInteger CrossDifference =>
        (new BigInteger(right.FirstPositives) * SecondCalls) - (new BigInteger(right.SecondPositives) * FirstCalls);

    public BigInteger ProductOfTrials => new BigInteger(FirstCalls) * SecondCalls;

    /// <summary>Gets the share of right calls among the calls of both tests, a subject called twice counted twice.</summary>
    public double PooledRight => (right.FirstPositives + (double)right.SecondPositives) / Calls;

    /// <summary>Gets the share of wrong calls among the calls of both tests.</summary>
    public double PooledWrong => (wrong.FirstPositives + (double)wrong.SecondPositives) / Calls;

    /// <summary>Gets the calls of both tests.</summary>
    public double Calls => FirstCalls + (double)SecondCalls;
}
