using MathNet.Numerics.Distributions;

namespace DiagnosticAccuracy.Numerics;

/// <summary>The standard normal distribution, tails kept apart so that small ones keep their digits.</summary>
internal static class StandardNormal
{
    /// <summary>P(Z &lt;= z).</summary>
    public static double Lower(double z) => Normal.CDF(0, 1, z);

    /// <summary>P(Z &gt; z).</summary>
    public static double Upper(double z) => Normal.CDF(0, 1, -z);

    /// <summary>P(|Z| &gt; |z|).</summary>
    public static double TwoSided(double z) => Math.Min(1, 2 * Normal.CDF(0, 1, -Math.Abs(z)));

    /// <summary>The z with P(Z &gt; z) = q.</summary>
    public static double UpperQuantile(double q) => q == 0.5 ? 0 : -Normal.InvCDF(0, 1, q);
}
