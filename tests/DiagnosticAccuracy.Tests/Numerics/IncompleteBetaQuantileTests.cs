using DiagnosticAccuracy.Numerics;

namespace DiagnosticAccuracy.Tests.Numerics;

public class IncompleteBetaQuantileTests
{
    [Fact]
    public void QuantilesAgreeWithReferenceValues()
    {
        List<string> wrong = [];
        int count = 0;
        foreach (string[] row in ReferenceTable.Rows("incomplete-beta-quantile"))
        {
            double a = ReferenceTable.Number(row[0]);
            double b = ReferenceTable.Number(row[1]);
            double tail = ReferenceTable.Number(row[2]);
            double x = ReferenceTable.Number(row[4]);
            double complement = ReferenceTable.Number(row[5]);
            UnitPoint point = Quantile(a, b, tail, row[3]);

            // A relative error e of the tail T moves the logit by e T/(dT/dlogit), and x by (1-x) of that. With
            // shapes of 1e-3 this factor is up to 1000: x is as T^1000, and even a correctly rounded last step
            // leaves some 1e-13. From shapes of 0.1 on the tolerance is 1e-13 throughout.
            double tolerance = Math.Min(a, b) >= 0.1 ? 1e-13 : 1e-13 + (Conditioning(a, b, point, tail) * 5e-16);
            double errorX = ReferenceTable.RelativeError(point.X, x);
            double errorComplement = ReferenceTable.RelativeError(point.Complement, complement);
            if (!(Math.Max(errorX, errorComplement) <= tolerance))
            {
                wrong.Add($"{row[0]} {row[1]} {row[2]} {row[3]}: {errorX:E1} {errorComplement:E1}, allowed {tolerance:E1}");
            }

            count++;
        }

        Assert.True(count > 800, "The reference table is missing rows.");
        Assert.True(wrong.Count == 0, string.Join(Environment.NewLine, wrong));
    }

    [Fact]
    public void ClosedFormsAreRightToTheLastDigits()
    {
        int count = 0;
        foreach (string[] row in ReferenceTable.Rows("incomplete-beta-quantile"))
        {
            double a = ReferenceTable.Number(row[0]);
            double b = ReferenceTable.Number(row[1]);
            if (a == 1.0 || b == 1.0)
            {
                UnitPoint point = Quantile(a, b, ReferenceTable.Number(row[2]), row[3]);
                Assert.InRange(ReferenceTable.RelativeError(point.X, ReferenceTable.Number(row[4])), 0.0, 5e-16);
                Assert.InRange(ReferenceTable.RelativeError(point.Complement, ReferenceTable.Number(row[5])), 0.0, 5e-16);
                count++;
            }
        }

        Assert.True(count > 200, "The reference table is missing rows.");
    }

    [Fact]
    public void TheTailAtTheQuantileIsTheOneGiven()
    {
        Random random = new(5);
        for (int i = 0; i < 20000; i++)
        {
            double a = Math.Pow(10.0, -1.0 + (10.0 * random.NextDouble()));
            double b = Math.Pow(10.0, -1.0 + (10.0 * random.NextDouble()));
            double p = i % 2 == 0 ? random.NextDouble() : Math.Pow(10.0, -300.0 * random.NextDouble());
            UnitPoint point = IncompleteBeta.LowerQuantile(a, b, p);
            if (Math.Min(point.X, point.Complement) < 1e-300)
            {
                continue;
            }

            BetaTails tails = IncompleteBeta.Tails(a, b, point.X, point.Complement);

            // What the rounding of the exact coordinate (the smaller one) does to the tail.
            double change = 2.3e-16 * BinomialDensity.Of(a, a + b, point.X, point.Complement) * (a * b / (a + b))
                / Math.Max(point.X, point.Complement);
            double allowed = 5e-14 + (change / p);
            double allowedUpper = 5e-14 + (change / (1.0 - p));
            Assert.True(ReferenceTable.RelativeError(tails.Lower, p) <= allowed, $"a={a:R} b={b:R} p={p:R}: {tails.Lower:R}");
            Assert.True(ReferenceTable.RelativeError(tails.Upper, 1.0 - p) <= allowedUpper, $"a={a:R} b={b:R} p={p:R}: {tails.Upper:R}");
        }
    }

    [Fact]
    public void UpperQuantilesMirrorLowerOnes()
    {
        Random random = new(6);
        for (int i = 0; i < 2000; i++)
        {
            double a = Math.Pow(10.0, -2.0 + (8.0 * random.NextDouble()));
            double b = Math.Pow(10.0, -2.0 + (8.0 * random.NextDouble()));
            double q = random.NextDouble();
            UnitPoint upper = IncompleteBeta.UpperQuantile(a, b, q);
            UnitPoint lower = IncompleteBeta.LowerQuantile(b, a, q);
            Assert.Equal(lower.X, upper.Complement);
            Assert.Equal(lower.Complement, upper.X);
        }
    }

    [Fact]
    public void QuantilesAreMonotoneInTheTail()
    {
        foreach (double a in new[] { 1e-3, 0.5, 1.0, 3.0, 160.0, 1e5, 1e9 })
        {
            foreach (double b in new[] { 1e-3, 0.5, 1.0, 3.0, 160.0, 1e5, 1e9 })
            {
                double before = 0.0;
                for (int i = 1; i < 400; i++)
                {
                    double x = IncompleteBeta.LowerQuantile(a, b, i / 400.0).X;
                    Assert.True(x >= before, $"a={a} b={b} p={i / 400.0}");
                    before = x;
                }
            }
        }
    }

    [Fact]
    public void EndsAndExtremes()
    {
        Assert.Equal(0.0, IncompleteBeta.LowerQuantile(3.0, 4.0, 0.0).X);
        Assert.Equal(1.0, IncompleteBeta.LowerQuantile(3.0, 4.0, 1.0).X);
        Assert.Equal(0.0, IncompleteBeta.UpperQuantile(3.0, 4.0, 0.0).Complement);
        Assert.Equal(0.0, IncompleteBeta.UpperQuantile(3.0, 4.0, 1.0).X);

        // Below the smallest double.
        Assert.Equal(0.0, IncompleteBeta.LowerQuantile(1e-3, 5.0, 0.01).X);
        Assert.Equal(0.0, IncompleteBeta.UpperQuantile(5.0, 1e-3, 0.01).Complement);
        Random random = new(8);
        for (int i = 0; i < 20000; i++)
        {
            double a = Math.Pow(10.0, -6.0 + (21.0 * random.NextDouble()));
            double b = Math.Pow(10.0, -6.0 + (21.0 * random.NextDouble()));
            double p = i % 3 == 0 ? random.NextDouble() : Math.Pow(10.0, -320.0 * random.NextDouble());
            UnitPoint point = IncompleteBeta.LowerQuantile(a, b, p);
            Assert.InRange(point.X, 0.0, 1.0);
            Assert.InRange(point.Complement, 0.0, 1.0);
        }
    }

    private static UnitPoint Quantile(double a, double b, double tail, string side)
        => side == "lower" ? IncompleteBeta.LowerQuantile(a, b, tail) : IncompleteBeta.UpperQuantile(a, b, tail);

    /// <summary>The factor from the relative error of the smaller tail to the error of the logit.</summary>
    private static double Conditioning(double a, double b, UnitPoint point, double tail)
    {
        double slope = BinomialDensity.Of(a, a + b, point.X, point.Complement) * (a * (b / (a + b)));
        return Math.Min(tail, 1.0 - tail) / slope;
    }
}
