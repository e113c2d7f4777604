using DiagnosticAccuracy.Numerics;
using DiagnosticAccuracy.Proportions;

namespace DiagnosticAccuracy.Tables;

/// <summary>
/// The exact conditional limit of a common odds ratio when the first cell of every stratum is as great (or as small) as its margins
/// allow: its tail is the product of the probabilities of those tables.
/// </summary>
/// <remarks>Cornfield, Proc Third Berkeley Symp 1956;4:135; over strata: Gart, Biometrika 1970;57:471.</remarks>
internal readonly struct PooledExactOdds : IFunction
{
    public const string Name = ConditionalOddsRatio.ExactName;

    private readonly FourCells[] _cells;
    private readonly double _logTail;

    private PooledExactOdds(FourCells[] cells, double logTail)
    {
        _cells = cells;
        _logTail = logTail;
    }

    public static ConfidenceInterval Interval(IReadOnlyList<ConfusionMatrix> strata, bool infinite, Confidence confidence, string name)
    {
        FourCells[] cells =
        [
            .. strata.Where(MantelHaenszel.HasBothGroups)
                .Select(table => new FourCells(table.TruePositives, table.FalseNegatives, table.FalsePositives, table.TrueNegatives)),
        ];
        double lower = 0;
        double upper = double.PositiveInfinity;
        if (infinite)
        {
            lower = confidence.HasLower ? LowerLimit(cells, confidence.LowerTail) : 0;
        }
        else if (confidence.HasUpper)
        {
            upper = 1 / LowerLimit(Array.ConvertAll(cells, stratum => stratum.Swapped), confidence.UpperTail);
        }

        return new ConfidenceInterval(lower, upper, confidence, name);
    }

    /// <summary>The tail over the probability of the tables, on the log scale, at the exponential of the argument; it falls.</summary>
    public double Value(double x)
    {
        double sum = _logTail;
        foreach (FourCells cells in _cells)
        {
            sum += TailSum.Of(cells.Swapped, -x).LogPlus(1);
        }

        return sum;
    }

    private static double LowerLimit(FourCells[] cells, double tail)
    {
        double along = 0;
        double across = 0;
        foreach (FourCells stratum in cells)
        {
            double n = stratum.A + stratum.B + stratum.C + stratum.D;
            along += (stratum.A + 0.5) * (stratum.D + 0.5) / n;
            across += (stratum.B + 0.5) * (stratum.C + 0.5) / n;
        }

        return Math.Exp(FallingRoot.Find(new PooledExactOdds(cells, Math.Log(tail)), Math.Log(along / across), 1));
    }
}
