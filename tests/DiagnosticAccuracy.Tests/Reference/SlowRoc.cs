namespace DiagnosticAccuracy.Tests.Reference;

/// <summary>Areas and variances from their definitions, pair by pair.</summary>
internal static class SlowRoc
{
    public static double[] PlacementsWith(IReadOnlyList<double> with, IReadOnlyList<double> without, ScoreDirection direction) =>
        [.. with.Select(x => without.Average(y => Win(x, y, direction)))];

    public static double[] PlacementsWithout(IReadOnlyList<double> with, IReadOnlyList<double> without, ScoreDirection direction) =>
        [.. without.Select(y => with.Average(x => Win(x, y, direction)))];

    public static double Area(IReadOnlyList<double> with, IReadOnlyList<double> without, ScoreDirection direction) =>
        PlacementsWith(with, without, direction).Average();

    public static double DeLongVariance(IReadOnlyList<double> with, IReadOnlyList<double> without, ScoreDirection direction) =>
        (Covariance(PlacementsWith(with, without, direction), PlacementsWith(with, without, direction)) / with.Count)
        + (Covariance(PlacementsWithout(with, without, direction), PlacementsWithout(with, without, direction)) / without.Count);

    public static double Covariance(double[] first, double[] second)
    {
        double firstMean = first.Average();
        double secondMean = second.Average();
        return first.Zip(second, (a, b) => (a - firstMean) * (b - secondMean)).Sum() / (first.Length - 1);
    }

    private static double Win(double with, double without, ScoreDirection direction)
    {
        if (with == without)
        {
            return 0.5;
        }

        return with > without == (direction == ScoreDirection.HigherIsPositive) ? 1 : 0;
    }
}
