using DiagnosticAccuracy.Numerics;

namespace DiagnosticAccuracy.Tests.Numerics;

public class BinomialDensityTests
{
    [Fact]
    public void DensitiesAgreeWithReferenceValues()
    {
        List<string> wrong = [];
        int count = 0;
        foreach (string[] row in ReferenceTable.Rows("binomial-density"))
        {
            double x = ReferenceTable.Number(row[0]);
            double n = ReferenceTable.Number(row[1]);
            double p = ReferenceTable.Number(row[2]);
            double error = ReferenceTable.RelativeError(BinomialDensity.Of(x, n, p), ReferenceTable.Number(row[3]));
            if (!(error <= 1e-13))
            {
                wrong.Add($"{row[0]} {row[1]} {row[2]}: {error:E1}");
            }

            count++;
        }

        Assert.True(count > 500, "The reference table is missing rows.");
        Assert.True(wrong.Count == 0, string.Join(Environment.NewLine, wrong));
    }

    [Theory]
    [InlineData(1)]
    [InlineData(7)]
    [InlineData(30)]
    [InlineData(1000)]
    public void DensitiesAddToOne(int n)
    {
        foreach (double p in new[] { 1e-9, 0.01, 0.3, 0.5, 0.9, 0.999999 })
        {
            double sum = 0.0;
            for (int x = 0; x <= n; x++)
            {
                sum += BinomialDensity.Of(x, n, p);
            }

            Assert.InRange(sum, 1.0 - 1e-14, 1.0 + 1e-14);
        }
    }

    [Fact]
    public void ComplementIsUsedWhenItIsTheSmallerOne()
    {
        // n q of the first order for x = n - 1: n p^(n-1) q
        Assert.InRange(ReferenceTable.RelativeError(BinomialDensity.Of(9.0, 10.0, 1.0, 1e-30), 1e-29), 0.0, 1e-14);
        Assert.Equal(1.0, BinomialDensity.Of(10.0, 10.0, 1.0, 1e-30));
        Assert.InRange(ReferenceTable.RelativeError(BinomialDensity.Of(0.0, 10.0, 1.0, 1e-30), 1e-300), 0.0, 1e-14);
    }

    [Fact]
    public void Ends()
    {
        Assert.Equal(1.0, BinomialDensity.Of(0.0, 5.0, 0.0));
        Assert.Equal(0.0, BinomialDensity.Of(1.0, 5.0, 0.0));
        Assert.Equal(1.0, BinomialDensity.Of(5.0, 5.0, 1.0));
        Assert.Equal(0.0, BinomialDensity.Of(4.0, 5.0, 1.0));
        Assert.Equal(0.0, BinomialDensity.Of(-1.0, 5.0, 0.5));
        Assert.Equal(0.0, BinomialDensity.Of(6.0, 5.0, 0.5));
        Assert.Equal(1.0, BinomialDensity.Of(0.0, 0.0, 0.5));
        Assert.True(double.IsNaN(BinomialDensity.Of(1.0, 5.0, double.NaN)));
    }
}
