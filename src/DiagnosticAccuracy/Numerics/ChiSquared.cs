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

    /// <summary>The x with P(X &gt; x) = q.</summary>
    /// <param name="q">Above 0 and below 1.</param>
    /// <param name="degreesOfFreedom">1 or more.</param>
    public static double UpperQuantile(double q, int degreesOfFreedom)
    {
        if (degreesOfFreedom == 1)
        {
            double z = StandardNormal.UpperQuantile(q / 2);
            return z * z;
        }

        double upper = degreesOfFreedom;
        while (Upper(upper, degreesOfFreedom) > q)
        {
            upper *= 2;
        }

        return RootFinding.Find(x => Math.Log(Upper(x, degreesOfFreedom) / q), 0, upper, absoluteAccuracy: 1e-14);
    }
}
