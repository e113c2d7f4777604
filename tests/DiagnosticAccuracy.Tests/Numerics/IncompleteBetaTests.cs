using DiagnosticAccuracy.Numerics;

namespace DiagnosticAccuracy.Tests.Numerics;

public class IncompleteBetaTests
{
    private static readonly double[] Shapes = [1e-3, 0.03, 0.4, 1.0, 1.7, 9.0, 55.5, 149.0, 152.0, 1e3, 2e5, 1e7, 1e9];

    [Fact]
    public void TailsAgreeWithReferenceValues()
    {
        List<string> wrong = [];
        int count = 0;
        foreach (string[] row in ReferenceTable.Rows("incomplete-beta"))
        {
            double a = ReferenceTable.Number(row[0]);
            double b = ReferenceTable.Number(row[1]);
            double x = ReferenceTable.Number(row[2]);
            BetaTails tails = IncompleteBeta.Tails(a, b, x);
            double lower = ReferenceTable.RelativeError(tails.Lower, ReferenceTable.Number(row[3]));
            double upper = ReferenceTable.RelativeError(tails.Upper, ReferenceTable.Number(row[4]));
            if (!(Math.Max(lower, upper) <= 1e-13))
            {
                wrong.Add($"a={a:R} b={b:R} x={x:R}: {lower:E1} {upper:E1}");
            }

            Assert.Equal(tails.Lower, IncompleteBeta.Lower(a, b, x));
            Assert.Equal(tails.Upper, IncompleteBeta.Upper(a, b, x));
            count++;
        }

        Assert.True(count > 1000, "The reference table is missing rows.");
        Assert.True(wrong.Count == 0, string.Join(Environment.NewLine, wrong));
    }

    [Fact]
    public void TheTailsAddToOne()
    {
        foreach ((double a, double b, double x) in Grid())
        {
            BetaTails tails = IncompleteBeta.Tails(a, b, x);
            Assert.InRange(tails.Lower + tails.Upper, 1.0 - 1e-15, 1.0 + 1e-15);
            Assert.InRange(tails.Lower, 0.0, 1.0);
            Assert.InRange(tails.Upper, 0.0, 1.0);
        }
    }

    [Fact]
    public void ExchangingShapesExchangesTails()
    {
        Random random = new(11);
        foreach (double a in Shapes)
        {
            foreach (double b in Shapes)
            {
                for (int i = 0; i < 20; i++)
                {
                    // A multiple of 2^-40, so that 1 - x is exact.
                    double x = Math.Round(random.NextDouble() * 1099511627776.0) / 1099511627776.0;
                    BetaTails direct = IncompleteBeta.Tails(a, b, x);
                    BetaTails mirrored = IncompleteBeta.Tails(b, a, 1.0 - x);
                    Assert.InRange(ReferenceTable.RelativeError(mirrored.Upper, direct.Lower), 0.0, 1e-14);
                    Assert.InRange(ReferenceTable.RelativeError(mirrored.Lower, direct.Upper), 0.0, 1e-14);
                }
            }
        }
    }

    [Fact]
    public void TailsAreMonotone()
    {
        foreach (double a in Shapes)
        {
            foreach (double b in Shapes)
            {
                BetaTails before = new(0.0, 1.0);
                double mean = a / (a + b);
                double deviation = Math.Sqrt(mean * (b / (a + b)) / (a + b + 1.0));
                for (double k = -12.0; k <= 12.0; k += 0.01)
                {
                    double x = mean + (k * deviation);
                    if (x <= 0.0 || x >= 1.0)
                    {
                        continue;
                    }

                    // Rounding may turn two equal values around, not more.
                    BetaTails tails = IncompleteBeta.Tails(a, b, x);
                    Assert.True(tails.Lower >= before.Lower * (1.0 - 2e-14), $"lower a={a} b={b} x={x:R}");
                    Assert.True(tails.Upper <= before.Upper * (1.0 + 2e-14), $"upper a={a} b={b} x={x:R}");
                    before = tails;
                }
            }
        }
    }

    [Fact]
    public void NeighbouringMethodsAgree()
    {
        // I_x(a,b) = I_x(a+1,b) + x^a y^b / (a B(a,b)), and the last term is y times the binomial density at a of
        // n = a + b - 1 trials. Shapes on both sides of every change of method.
        foreach (double a in new[] { 1.0, 1.5, 9.0, 99.0, 100.0, 149.5, 150.0, 151.0, 400.0, 5000.0 })
        {
            foreach (double b in new[] { 1.0, 2.0, 99.0, 100.0, 101.0, 100.5, 149.5, 151.0, 300.0, 301.0, 1e4, 1e6 })
            {
                double mean = a / (a + b);
                double deviation = Math.Sqrt(mean * (1.0 - mean) / (a + b + 1.0));
                for (double k = -4.0; k <= 0.0; k += 0.25)
                {
                    double x = mean + (k * deviation);
                    if (x <= 0.0)
                    {
                        continue;
                    }

                    double step = BinomialDensity.Of(a, a + b - 1.0, x) * (1.0 - x);
                    double sum = IncompleteBeta.Lower(a + 1.0, b, x) + step;
                    Assert.InRange(ReferenceTable.RelativeError(sum, IncompleteBeta.Lower(a, b, x)), 0.0, 2e-14);
                }
            }
        }
    }

    [Fact]
    public void AnExactComplementKeepsTheUpperTail()
    {
        // 1 - I_x(1, b) = y^b and 1 - I_x(2, b) = y^b (1 + b x) for y = 1e-40, where x rounds to 1.
        Assert.InRange(ReferenceTable.RelativeError(IncompleteBeta.Upper(1.0, 3.0, 1.0, 1e-40), 1e-120), 0.0, 1e-14);
        Assert.InRange(ReferenceTable.RelativeError(IncompleteBeta.Upper(2.0, 3.0, 1.0, 1e-40), 4e-120), 0.0, 1e-14);
        Assert.InRange(ReferenceTable.RelativeError(IncompleteBeta.Lower(3.0, 2.0, 1e-40, 1.0), 4e-120), 0.0, 1e-14);
    }

    [Fact]
    public void EndsAndNaN()
    {
        Assert.Equal(0.0, IncompleteBeta.Lower(2.0, 3.0, 0.0));
        Assert.Equal(1.0, IncompleteBeta.Upper(2.0, 3.0, 0.0));
        Assert.Equal(1.0, IncompleteBeta.Lower(2.0, 3.0, 1.0));
        Assert.Equal(0.0, IncompleteBeta.Upper(2.0, 3.0, 1.0));
        Assert.True(double.IsNaN(IncompleteBeta.Lower(2.0, 3.0, double.NaN)));
        Assert.Throws<ArgumentOutOfRangeException>(() => IncompleteBeta.Lower(0.0, 3.0, 0.5));
        Assert.Throws<ArgumentOutOfRangeException>(() => IncompleteBeta.Lower(2.0, double.NaN, 0.5));
        Assert.Throws<ArgumentOutOfRangeException>(() => IncompleteBeta.LowerQuantile(2.0, 1.0, -0.1));
        Assert.Throws<ArgumentOutOfRangeException>(() => IncompleteBeta.UpperQuantile(2.0, 1.0, double.NaN));
    }

    private static IEnumerable<(double A, double B, double X)> Grid()
    {
        Random random = new(7);
        foreach (double a in Shapes)
        {
            foreach (double b in Shapes)
            {
                double mean = a / (a + b);
                double deviation = Math.Sqrt(mean * (1.0 - mean) / (a + b + 1.0));
                for (int i = 0; i < 25; i++)
                {
                    double x = i % 2 == 0 ? random.NextDouble() : mean + (deviation * 12.0 * (random.NextDouble() - 0.5));
                    if (x > 0.0 && x < 1.0)
                    {
                        yield return (a, b, x);
                    }
                }
            }
        }
    }
}
