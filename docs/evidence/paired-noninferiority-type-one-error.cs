#:project ../../src/DiagnosticAccuracy/DiagnosticAccuracy.csproj

// Writes paired-noninferiority-type-one-error.md: how often the paired non-inferiority tests call a test not inferior that is inferior by exactly the margin,
// by enumeration of every table. No random numbers.
//
//     dotnet run -c Release docs/evidence/paired-noninferiority-type-one-error.cs > docs/evidence/paired-noninferiority-type-one-error.md
using System.Globalization;
using DiagnosticAccuracy;

CultureInfo.CurrentCulture = CultureInfo.InvariantCulture;
int[] sizes = [30, 50, 100];
double[] levels = [0.025, 0.05];
double[] logFactorial = new double[101];
for (int i = 1; i < logFactorial.Length; i++)
{
    logFactorial[i] = logFactorial[i - 1] + Math.Log(i);
}

Console.WriteLine("""
    # Type I error of the paired non-inferiority tests

    Made by `dotnet run -c Release docs/evidence/paired-noninferiority-type-one-error.cs > docs/evidence/paired-noninferiority-type-one-error.md`: every table of n subjects is
    tested, and its multinomial probability counted where the test calls the first test not inferior although it is inferior by exactly the margin. Nothing
    is simulated. All in percent, beside the nominal one-sided level.

    ## Difference: `DifferenceMargin.NonInferiority(margin).Test(table.Difference)` (Nam 1997)

    The size depends on how many subjects are discordant. Columns: the share of discordant subjects; "max" is the largest size over shares from the margin to 1 in
    steps of 0.005, with the share at which it is reached.

    | n | margin | level | 0.15 | 0.2 | 0.3 | 0.4 | 0.6 | 0.8 | max | at |
    |---|---|---|---|---|---|---|---|---|---|---|
    """);

foreach (int n in sizes)
{
    foreach (double margin in new[] { 0.05, 0.1 })
    {
        foreach (double level in levels)
        {
            List<(int B, int C)> rejected = Discordant(n, (b, c) =>
                DifferenceMargin.NonInferiority(margin).Test(new PairedTable(n - b - c, b, c, 0).Difference).PValue.Value <= level);
            string cells = string.Join(" | ", new[] { 0.15, 0.2, 0.3, 0.4, 0.6, 0.8 }.Select(share => Percent(DifferenceSize(n, rejected, margin, share))));
            (double max, double at) = LargestDifferenceSize(n, rejected, margin);
            Console.WriteLine($"| {n} | {margin} | {Percent(level)} | {cells} | {Percent(max)} | {at:0.###} |");
        }
    }
}

Console.WriteLine("""

    ## The same decision by the lower limit of each interval

    Not inferior when the lower limit at one less the level lies at or above minus the margin. The largest size over the shares of discordant subjects, and in brackets that over
    shares up to 0.3. Concordant subjects are half "both" and half "neither" where an interval looks at them.

    """);
PairedDifferenceMethod[] methods = Enum.GetValues<PairedDifferenceMethod>();
Console.WriteLine("| n | margin | level | " + string.Join(" | ", methods) + " |");
Console.WriteLine("|---|---|---|" + string.Concat(methods.Select(_ => "---|")));
foreach (int n in sizes)
{
    foreach (double margin in new[] { 0.05, 0.1 })
    {
        foreach (double level in levels)
        {
            List<string> cells = [];
            foreach (PairedDifferenceMethod method in methods)
            {
                List<(int B, int C)> rejected = Discordant(n, (b, c) =>
                {
                    int both = (n - b - c) / 2;
                    PairedDifference difference = new PairedTable(both, b, c, n - b - c - both).Difference;
                    return difference.Interval(Confidence.LowerBound(1 - level), method).Lower >= -margin;
                });
                cells.Add($"{Percent(LargestDifferenceSize(n, rejected, margin).Max)} ({Percent(LargestDifferenceSize(n, rejected, margin, 0.3).Max)})");
            }

            Console.WriteLine($"| {n} | {margin} | {Percent(level)} | {string.Join(" | ", cells)} |");
        }
    }
}

Console.WriteLine("""

    ## Ratio: `RatioMargin.NonInferiority(margin).Test(table.Ratio)` (Nam and Blackwelder 2002)

    Columns: the positive share of the second test (its sensitivity), with the smallest and largest size over the shares of discordant subjects that are possible there, in
    steps of a twentieth of their range.

    | n | margin | level | 0.5 | 0.7 | 0.8 | 0.9 | 0.95 |
    |---|---|---|---|---|---|---|---|
    """);

foreach (int n in sizes)
{
    foreach (double margin in new[] { 0.8, 0.9 })
    {
        // A table is rejected or not by its cells "both", "first only" and "second only".
        List<(int A, int B, int C, double P)> tables = [];
        for (int a = 0; a <= n; a++)
        {
            for (int b = 0; a + b <= n; b++)
            {
                for (int c = 0; a + b + c <= n; c++)
                {
                    Quantity p = RatioMargin.NonInferiority(margin).Test(new PairedTable(a, b, c, n - a - b - c).Ratio).PValue;
                    if (p.IsDefined && p.Value <= levels.Max())
                    {
                        tables.Add((a, b, c, p.Value));
                    }
                }
            }
        }

        foreach (double level in levels)
        {
            List<string> cells = [];
            foreach (double second in new[] { 0.5, 0.7, 0.8, 0.9, 0.95 })
            {
                double smallest = 1;
                double largest = 0;
                double first = margin * second;

                // "First only" from 0 to where "both" or "neither" is empty.
                double most = Math.Min(first, 1 - second);
                for (int step = 0; step <= 20; step++)
                {
                    double size = RatioSize(n, tables, level, first, second, most * step / 20);
                    smallest = Math.Min(smallest, size);
                    largest = Math.Max(largest, size);
                }

                cells.Add($"{Percent(smallest)} to {Percent(largest)}");
            }

            Console.WriteLine($"| {n} | {margin} | {Percent(level)} | {string.Join(" | ", cells)} |");
        }
    }
}

Console.WriteLine("""

    ## Reading

    The score tests are asymptotic: their size lies near the level and exceeds it in places, by the amounts in the columns "max" and the upper ends of the ranges. Where that is not
    acceptable, state a smaller level beforehand. `McNemarMethod.ExactConditional` never exceeds its level, for plain superiority.

    Few discordant subjects are the rule between good tests. There the intervals that need an estimated variance or correlation fail: without any discordant subject Wald's
    interval has no width, and Newcombe's without phi correction little or none: they clear every margin. This is why Tango's interval, whose lower limit is the score test, is the default.
    """);

static string Percent(double share) => (100 * share).ToString("0.00", CultureInfo.InvariantCulture);

static List<(int B, int C)> Discordant(int n, Func<int, int, bool> rejected)
{
    List<(int, int)> tables = [];
    for (int b = 0; b <= n; b++)
    {
        for (int c = 0; b + c <= n; c++)
        {
            if (rejected(b, c))
            {
                tables.Add((b, c));
            }
        }
    }

    return tables;
}

(double Max, double At) LargestDifferenceSize(int n, List<(int B, int C)> rejected, double margin, double upTo = 1)
{
    (double Max, double At) best = (0, 0);
    for (double share = margin; share <= upTo + 1e-9; share += 0.005)
    {
        double size = DifferenceSize(n, rejected, margin, Math.Min(share, 1));
        best = size > best.Max ? (size, share) : best;
    }

    return best;
}

double DifferenceSize(int n, List<(int B, int C)> rejected, double margin, double share)
{
    double first = (share - margin) / 2;
    double second = (share + margin) / 2;
    return rejected.Sum(table => Math.Exp(LogMultinomial(n, (table.B, first), (table.C, second), (n - table.B - table.C, 1 - share))));
}

double RatioSize(int n, List<(int A, int B, int C, double P)> tables, double level, double first, double second, double firstOnly)
{
    double both = Math.Max(0, first - firstOnly);
    double secondOnly = second - both;
    double neither = Math.Max(0, 1 - second - firstOnly);
    double sum = 0;
    foreach ((int a, int b, int c, double p) in tables)
    {
        sum += p <= level ? Math.Exp(LogMultinomial(n, (a, both), (b, firstOnly), (c, secondOnly), (n - a - b - c, neither))) : 0;
    }

    return sum;
}

double LogMultinomial(int n, params ReadOnlySpan<(int Count, double Probability)> cells)
{
    double log = logFactorial[n];
    foreach ((int count, double probability) in cells)
    {
        if (count > 0)
        {
            log += (count * Math.Log(probability)) - logFactorial[count];
        }
    }

    return log;
}
