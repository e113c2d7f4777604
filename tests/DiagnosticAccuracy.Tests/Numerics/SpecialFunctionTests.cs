using DiagnosticAccuracy.Numerics;

namespace DiagnosticAccuracy.Tests.Numerics;

public class SpecialFunctionTests
{
    [Theory]
    [InlineData("log1p", 3e-16)]
    [InlineData("expm1", 3e-16)]
    [InlineData("log1pmx", 1e-15)]
    [InlineData("stirling", 1e-15)]
    [InlineData("gammaratio", 1e-14)]
    public void FunctionsAgreeWithReferenceValues(string name, double tolerance)
    {
        Check(name, (_, _, expected) => tolerance * Math.Abs(expected));
    }

    [Theory]
    [InlineData("loggamma")]
    [InlineData("logbeta")]
    public void LogarithmsAgreeWithReferenceValues(string name)
    {
        // These cross zero, where a sum of large terms has an absolute accuracy only.
        Check(name, (_, _, expected) => 2e-15 * Math.Max(1.0, Math.Abs(expected)));
    }

    [Fact]
    public void LogGammaKeepsItsZeros()
    {
        Assert.Equal(0.0, StirlingSeries.LogGamma(1.0));
        Assert.Equal(0.0, StirlingSeries.LogGamma(2.0));

        // -gamma h + zeta(2)/2 h^2 and (1 - gamma) h + (zeta(2) - 1)/2 h^2 near the zeros
        const double Gamma = 0.5772156649015329;
        const double HalfZeta = 0.8224670334241132;
        double h = Math.Pow(2.0, -20.0);
        double nearOne = (-Gamma * h) + (HalfZeta * h * h);
        double nearTwo = ((1.0 - Gamma) * h) + ((HalfZeta - 0.5) * h * h);
        Assert.InRange(ReferenceTable.RelativeError(StirlingSeries.LogGamma(1.0 + h), nearOne), 0.0, 1e-11);
        Assert.InRange(ReferenceTable.RelativeError(StirlingSeries.LogGamma(2.0 + h), nearTwo), 0.0, 1e-11);
    }

    [Fact]
    public void DoubleDoubleLogarithmInvertsExp()
    {
        // ln(2^k) = k ln 2, and ln(z^2) = 2 ln z to 30 digits
        foreach (double z in new[] { 1e-300, 3e-17, 0.1, 0.70710678, 0.999999, 1.0000001, 1.41421356, 7.0, 12345.678, 1e140 })
        {
            DoubleDouble once = DoubleDouble.Log(new DoubleDouble(z, 0.0));
            Assert.InRange(ReferenceTable.RelativeError(once.High, Math.Log(z)), 0.0, 2.3e-16);
            if (z > 1e-140)
            {
                DoubleDouble difference = DoubleDouble.Log(DoubleDouble.Product(z, z)) - (once * 2.0);
                Assert.InRange(Math.Abs(difference.High), 0.0, 1e-22 * Math.Abs(once.High));
            }
        }
    }

    [Fact]
    public void DoubleDoubleQuotientsTimesDivisorsGiveBack()
    {
        Random random = new(1);
        for (int i = 0; i < 1000; i++)
        {
            DoubleDouble a = DoubleDouble.Sum(random.NextDouble(), 1e-17 * random.NextDouble());
            DoubleDouble b = DoubleDouble.Sum(random.NextDouble() + 0.01, 1e-17 * random.NextDouble());
            DoubleDouble rest = (a / b * b) - a;
            Assert.InRange(Math.Abs(rest.High), 0.0, 1e-30);
        }
    }

    [Fact]
    public void LimitsOfElementaryFunctions()
    {
        Assert.Equal(double.NegativeInfinity, ElementaryFunctions.Log1P(-1.0));
        Assert.True(double.IsNaN(ElementaryFunctions.Log1P(-2.0)));
        Assert.True(double.IsNaN(ElementaryFunctions.Expm1(double.NaN)));
        Assert.Equal(-1.0, ElementaryFunctions.Expm1(double.NegativeInfinity));
        Assert.Equal(double.PositiveInfinity, ElementaryFunctions.Expm1(double.PositiveInfinity));
        Assert.Equal(double.PositiveInfinity, ElementaryFunctions.Log1P(double.PositiveInfinity));
        Assert.Equal(1e-300, ElementaryFunctions.Log1P(1e-300));
        Assert.Equal(1e-300, ElementaryFunctions.Expm1(1e-300));
    }

    private static void Check(string name, Func<double, double, double, double> allowed)
    {
        List<string> wrong = [];
        int count = 0;
        foreach (string[] row in ReferenceTable.Rows("special-functions"))
        {
            if (row[0] != name)
            {
                continue;
            }

            double x = ReferenceTable.Number(row[1]);
            double y = ReferenceTable.Number(row[2]);
            double expected = ReferenceTable.Number(row[3]);
            double actual = name switch
            {
                "log1p" => ElementaryFunctions.Log1P(x),
                "expm1" => ElementaryFunctions.Expm1(x),
                "log1pmx" => ElementaryFunctions.Log1PMinusX(x),
                "stirling" => StirlingSeries.StirlingError(x),
                "loggamma" => StirlingSeries.LogGamma(x),
                "logbeta" => StirlingSeries.LogBeta(x, y),
                "gammaratio" => StirlingSeries.LogGammaRatio(x, y),
                _ => throw new ArgumentException(name),
            };
            if (!(Math.Abs(actual - expected) <= allowed(x, y, expected)))
            {
                wrong.Add($"{name}({row[1]}, {row[2]}): {actual:R}, expected {expected:R}, relative {ReferenceTable.RelativeError(actual, expected):E1}");
            }

            count++;
        }

        Assert.True(count > 100, "The reference table is missing rows.");
        Assert.True(wrong.Count == 0, string.Join(Environment.NewLine, wrong));
    }
}
