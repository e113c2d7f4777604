namespace DiagnosticAccuracy.Tests;

/// <summary>The binomial distribution as a product of its factors; for small numbers of trials.</summary>
internal static class SlowBinomial
{
    public static double Probability(long x, long n, double p)
    {
        double product = 1;
        for (long i = 1; i <= x; i++)
        {
            product *= (double)(n - x + i) / i * p;
        }

        for (long i = 0; i < n - x; i++)
        {
            product *= 1 - p;
        }

        return product;
    }

    public static double AtLeast(long x, long n, double p)
    {
        double sum = 0;
        for (long k = n; k >= x; k--)
        {
            sum += Probability(k, n, p);
        }

        return sum;
    }
}
