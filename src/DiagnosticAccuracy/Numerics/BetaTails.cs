namespace DiagnosticAccuracy.Numerics;

/// <summary>
/// Both tails of a beta distribution at one point, each with its own relative accuracy.
/// </summary>
internal readonly struct BetaTails
{
    /// <summary>Initializes a new pair of tails.</summary>
    /// <param name="lower">The lower tail.</param>
    /// <param name="upper">The upper tail.</param>
    public BetaTails(double lower, double upper)
    {
        Lower = lower;
        Upper = upper;
    }

    /// <summary>Gets the lower tail, I_x(a, b).</summary>
    public double Lower { get; }

    /// <summary>Gets the upper tail, 1 - I_x(a, b).</summary>
    public double Upper { get; }
}
