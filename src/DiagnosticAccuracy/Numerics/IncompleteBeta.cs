namespace DiagnosticAccuracy.Numerics;

internal readonly record struct BetaQuantile(double X, double Complement);

internal static class IncompleteBeta
{
    public static BetaQuantile LowerQuantile(double a, double b, double p)
    {
        double x = MathNet.Numerics.Distributions.Beta.InvCDF(a, b, p);
        return new BetaQuantile(x, 1 - x);
    }

    public static BetaQuantile UpperQuantile(double a, double b, double q) => LowerQuantile(a, b, 1 - q);
}
