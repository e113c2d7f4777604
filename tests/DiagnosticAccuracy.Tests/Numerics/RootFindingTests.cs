using DiagnosticAccuracy.Numerics;

namespace DiagnosticAccuracy.Tests.Numerics;

public class RootFindingTests
{
    [Fact]
    public void RootsAreFoundToFourteenDigits()
    {
        Check(x => (x * x) - 2.0, 0.0, 2.0, Math.Sqrt(2.0));
        Check(x => Math.Cos(x) - x, 0.0, 1.0, 0.7390851332151607);
        Check(x => Math.Exp(x) - 1e10, 0.0, 1000.0, 23.025850929940457);
        Check(x => 1.0 - (1e-9 / x), 1e-30, 1.0, 1e-9);
        Check(x => x < 0.3 ? -1.0 : 1.0, 0.0, 1.0, 0.3);
        Check(x => Math.Pow(x - 1.0, 9.0), 0.0, 3.1, 1.0);
        Check(x => Math.Log(x), 1e-300, 1e300, 1.0);
        Check(x => Math.Atan(x - 1e5), -1e9, 1e9, 1e5);
    }

    [Fact]
    public void FewEvaluationsForASmoothFunction()
    {
        int count = 0;
        _ = RootFinding.Find(
            x =>
            {
                count++;
                return Math.Exp(x) - 3.0;
            },
            -5.0,
            5.0);
        Assert.InRange(count, 3, 20);
    }

    [Fact]
    public void ARootAtAnEndIsReturned()
    {
        Assert.Equal(1.0, RootFinding.Find(x => x - 1.0, 1.0, 2.0));
        Assert.Equal(2.0, RootFinding.Find(x => x - 2.0, 1.0, 2.0));
        Assert.Equal(0.0, RootFinding.Find(x => x, -1.0, 1.0));
    }

    [Fact]
    public void TheEndsMayBeInEitherOrder() => Check(x => (x * x) - 2.0, 2.0, 0.0, Math.Sqrt(2.0));

    [Fact]
    public void ABracketWithoutChangeOfSignIsRefused()
    {
        InvalidOperationException error = Assert.Throws<InvalidOperationException>(() => RootFinding.Find(x => (x * x) + 1.0, -1.0, 3.0));
        Assert.Contains("does not change its sign", error.Message, StringComparison.Ordinal);
        Assert.Contains("10 at 3", error.Message, StringComparison.Ordinal);
        Assert.Throws<InvalidOperationException>(() => RootFinding.Find(_ => double.NaN, -1.0, 3.0));
        Assert.Throws<InvalidOperationException>(() => RootFinding.Find(x => x == 0.0 ? -1.0 : x == 1.0 ? 1.0 : double.NaN, 0.0, 1.0));
    }

    [Fact]
    public void AStructureIsAFunction()
    {
        Assert.InRange(ReferenceTable.RelativeError(RootFinding.Find(new Cube(27.0), 0.0, 10.0), 3.0), 0.0, 1e-14);
        Assert.InRange(RootFinding.Find(new Cube(27.0), 0.0, 10.0, 1e-3), 2.99, 3.01);
        Assert.InRange(RootFinding.Find(new Cube(27.0), 0.0, 10.0, 0.0, 1e-2), 2.98, 3.02);
    }

    private static void Check(Func<double, double> f, double lower, double upper, double root)
    {
        Assert.InRange(ReferenceTable.RelativeError(RootFinding.Find(f, lower, upper), root), 0.0, 1.1e-14);
    }

    private readonly struct Cube(double target) : IFunction
    {
        public double Value(double x) => (x * x * x) - target;
    }
}
