namespace DiagnosticAccuracy.Tests;

/// <summary>Every paired table of up to so many subjects.</summary>
internal static class PairedTables
{
    public static IEnumerable<PairedTable> UpTo(int most)
    {
        for (int n = 1; n <= most; n++)
        {
            for (int a = 0; a <= n; a++)
            {
                for (int b = 0; a + b <= n; b++)
                {
                    for (int c = 0; a + b + c <= n; c++)
                    {
                        yield return new PairedTable(a, b, c, n - a - b - c);
                    }
                }
            }
        }
    }

    /// <summary>Tables of up to 30 subjects and some larger ones, drawn from a fixed seed.</summary>
    public static IEnumerable<PairedTable> Sample(int count)
    {
        Random random = new(20240607);
        for (int i = 0; i < count; i++)
        {
            int most = i % 4 == 0 ? 400 : 10;
            yield return new PairedTable(random.Next(most), random.Next(most), random.Next(most), random.Next(1, most));
        }
    }
}
