namespace DiagnosticAccuracy;

/// <summary>Two performance goals that must both be met, as those of sensitivity and specificity.</summary>
/// <remarks>
/// <para>The intersection-union test (Berger, Technometrics 1982;24:295): each goal is tested at the whole significance level, none is split
/// between them, and the probability of meeting both while one of them does not hold is at most that level.</para>
/// <para>What is paid is power: with different subjects for both, it is the product of the two powers.</para>
/// </remarks>
/// <param name="First">The goal of the first proportion.</param>
/// <param name="Second">The goal of the second proportion.</param>
public readonly record struct CoPrimaryGoals(PerformanceGoal First, PerformanceGoal Second)
{
    /// <summary>Both exact tests.</summary>
    /// <param name="first">The proportion that goes with the first goal, for example the sensitivity.</param>
    /// <param name="second">The proportion that goes with the second goal, for example the specificity.</param>
    /// <param name="significance">The one-sided significance level of each, above 0 and below 1; 0.025 unless said.</param>
    /// <returns>Both results; met only when both are.</returns>
    /// <exception cref="ArgumentOutOfRangeException"><paramref name="significance"/> is NaN, or not above 0 and below 1.</exception>
    public CoPrimaryResult Test(Proportion first, Proportion second, double significance = 0.025)
    {
        Guard.InsideUnitInterval(significance);
        return new CoPrimaryResult(First.Test(first, significance), Second.Test(second, significance));
    }

    /// <summary>For example "above 0.9 and above 0.8".</summary>
    /// <returns>The text, in the invariant culture.</returns>
    public override string ToString() => $"{First} and {Second}";
}
