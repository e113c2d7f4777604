using MathNet.Numerics;

namespace DiagnosticAccuracy.Numerics;

/// <summary>The upper tail of the chi-squared distribution.</summary>
internal static class ChiSquared
{
    /// <summary>P(X &gt; x) with the given degrees of freedom.</summary>
    /// <param name="x">0 or more; may be infinite.</param>
    /// <param name="degreesOfFreedom">1 or more.</param>
    public static double Upper(double x, int degreesOfFreedom)
    {
        if (double.IsPositiveInfinity(x))
        {
            return 0;
        }

        // One degree of freedom is a squared normal, whose tail keeps all its digits.
        return degreesOfFreedom == 1
            ? StandardNormal.TwoSided(Math.Sqrt(x))
            : SpecialFunctions.GammaUpperRegularized(degreesOfFreedom / 2.0, x / 2);
    }
}
