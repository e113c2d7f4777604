namespace DiagnosticAccuracy.Tests;

/// <summary>Pairs of proportions to try laws on: every pair up to a number of trials.</summary>
internal static class TwoProportionTables
{
    public static IEnumerable<(Proportion First, Proportion Second)> UpTo(long most)
    {
        for (long n1 = 1; n1 <= most; n1++)
        {
            for (long n2 = 1; n2 <= most; n2++)
            {
                for (long x1 = 0; x1 <= n1; x1++)
                {
                    for (long x2 = 0; x2 <= n2; x2++)
                    {
                        yield return (new Proportion(x1, n1), new Proportion(x2, n2));
                    }
                }
            }
        }
    }

    /// <summary>A fixed selection of pairs with numbers of trials up to 30, in which small and large counts are often met.</summary>
    public static IEnumerable<(Proportion First, Proportion Second)> SampleUpTo30()
    {
        Random random = new(20240607);
        for (int i = 0; i < 3000; i++)
        {
            yield return (Draw(random), Draw(random));
        }
    }

    private static Proportion Draw(Random random)
    {
        long n = random.Next(13, 31);
        return random.Next(5) switch
        {
            0 => new Proportion(0, n),
            1 => new Proportion(n, n),
            _ => new Proportion(random.NextInt64(n + 1), n),
        };
    }
}
