namespace DiagnosticAccuracy.Numerics;

/// <summary>
/// The tails of a beta distribution at one point and what is needed for a step towards a quantile.
/// </summary>
internal readonly struct BetaEvaluation
{
    /// <summary>Initializes a new evaluation.</summary>
    /// <param name="lower">The lower tail.</param>
    /// <param name="upper">The upper tail.</param>
    /// <param name="slope">The derivative of the lower tail by the logit of x.</param>
    /// <param name="lambda">a - (a+b) x.</param>
    public BetaEvaluation(double lower, double upper, double slope, double lambda)
    {
        Lower = lower;
        Upper = upper;
        Slope = slope;
        Lambda = lambda;
    }

    /// <summary>Gets the lower tail.</summary>
    public double Lower { get; }

    /// <summary>Gets the upper tail.</summary>
    public double Upper { get; }

    /// <summary>Gets x^a (1-x)^b / B(a,b), the derivative of the lower tail by ln(x/(1-x)).</summary>
    public double Slope { get; }

    /// <summary>Gets a - (a+b) x, the derivative of ln(Slope) by ln(x/(1-x)).</summary>
    public double Lambda { get; }
}
