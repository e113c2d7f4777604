namespace DiagnosticAccuracy.Numerics;

/// <summary>
/// The tail of a beta distribution of large shapes near its mean, by one Gauss-Legendre panel.
/// </summary>
internal static class BetaPanel
{
    /// <summary>The positive nodes of the Gauss-Legendre rule of 28 points on [-1, 1].</summary>
    private static readonly double[] Nodes =
    [
        0.9964424975739544, 0.9813031653708727, 0.9542592806289382, 0.9156330263921321, 0.8658925225743951,
        0.8056413709171791, 0.7356108780136318, 0.656651094038865, 0.5697204718114017, 0.4758742249551183,
        0.3762515160890787, 0.2720616276351781, 0.16456928213338076, 0.05507928988403427,
    ];

    /// <summary>The weights of the nodes.</summary>
    private static readonly double[] Weights =
    [
        0.009124282593094517, 0.02113211259277126, 0.03290142778230438, 0.04427293475900423, 0.05510734567571675,
        0.0652729239669996, 0.07464621423456878, 0.08311341722890121, 0.09057174439303284, 0.09693065799792992,
        0.10211296757806076, 0.10605576592284642, 0.10871119225829413, 0.1100470130164752,
    ];

    /// <summary>I_x(a,b) / (x^a y^b / B(a,b)) for large shapes and x not above the mean.</summary>
    /// <param name="variance">(a+b) x y.</param>
    /// <param name="x">The point.</param>
    /// <param name="y">1 - x.</param>
    /// <param name="lambda">a - (a+b) x, not negative.</param>
    /// <returns>The tail in units of its derivative by the logit of x.</returns>
    /// <remarks>
    /// With the logit of the variable of integration s below that of x, the ratio is the integral over s from 0 of
    /// exp(psi(s)), psi(s) = -a s - (a+b) ln(1 + x (exp(-s) - 1)). The logarithm is the cumulant generating function
    /// of a Bernoulli variable: psi(s) = -lambda s - (a+b) (k2 s^2/2! - k3 s^3/3! + k4 s^4/4! - ...), where with
    /// q = x y and k2 = q each cumulant is q times the derivative of the one before by x. Here s is small, and the
    /// terms from s^13 on are below 1e-17 of the result.
    /// </remarks>
    public static double TailOverSlope(double variance, double x, double y, double lambda)
    {
        double q = x * y;
        double skew = y - x;
        double c3 = skew / 6.0;
        double c4 = (1.0 - (6.0 * q)) / 24.0;
        double c5 = skew * (1.0 - (12.0 * q)) / 120.0;
        double c6 = (1.0 - (q * (30.0 - (120.0 * q)))) / 720.0;
        double c7 = skew * (1.0 - (q * (60.0 - (360.0 * q)))) / 5040.0;
        double c8 = (1.0 - (q * (126.0 - (q * (1680.0 - (5040.0 * q)))))) / 40320.0;
        double c9 = skew * (1.0 - (q * (252.0 - (q * (5040.0 - (20160.0 * q)))))) / 362880.0;
        double c10 = (1.0 - (q * (510.0 - (q * (17640.0 - (q * (151200.0 - (362880.0 * q)))))))) / 3628800.0;
        double c11 = skew * (1.0 - (q * (1020.0 - (q * (52920.0 - (q * (604800.0 - (1814400.0 * q)))))))) / 39916800.0;
        double c12 = (1.0 - (q * (2046.0 - (q * (168960.0 - (q * (3160080.0 - (q * (19958400.0 - (39916800.0 * q)))))))))) / 479001600.0;

        // psi = -38 without the third and higher cumulants, which can make the decay slower.
        double top = 76.0 / (lambda + Math.Sqrt((lambda * lambda) + (76.0 * variance)));
        top *= 1.0 + (0.25 * top);

        double half = 0.5 * top;
        double sum = 0.0;
        for (int i = 0; i < Nodes.Length; i++)
        {
            double pair = 0.0;
            double s = half * (1.0 - Nodes[i]);
            for (int side = 0; side < 2; side++)
            {
                double tail = c9 - (s * (c10 - (s * (c11 - (s * c12)))));
                tail = c5 - (s * (c6 - (s * (c7 - (s * (c8 - (s * tail)))))));
                tail = 0.5 - (s * (c3 - (s * (c4 - (s * tail)))));
                pair += Math.Exp(-s * (lambda + (variance * s * tail)));
                s = half * (1.0 + Nodes[i]);
            }

            sum += Weights[i] * pair;
        }

        return half * sum;
    }
}
