namespace DiagnosticAccuracy.Proportions;

/// <summary>
/// The probability that the first cell is greater than observed, given the margins and an odds ratio, relative to the probability of the
/// observed table; with its derivative by the logarithm of the odds ratio.
/// </summary>
/// <remarks>
/// Fisher's noncentral hypergeometric distribution (Fisher, J R Stat Soc 1935;98:39), summed outward from the observed table; what is
/// summed spans some standard deviations, of the order of the root of the least cell.
/// </remarks>
internal readonly struct TailSum
{
    private const double Rescale = 1e-200;
    private const double Negligible = 1e-17;

    // The sum and its derivative are these times exp(_logScale).
    private readonly double _sum;
    private readonly double _moment;
    private readonly double _logScale;

    private TailSum(double sum, double moment, double logScale)
    {
        _sum = sum;
        _moment = moment;
        _logScale = logScale;
    }

    public static TailSum Of(FourCells cells, double logOddsRatio)
    {
        double odds = Math.Exp(logOddsRatio);
        double last = Math.Min(cells.B, cells.C);
        double term = 1;
        double sum = 0;
        double moment = 0;
        double logScale = 0;
        for (double j = 0; j < last; j++)
        {
            double ratio = odds * (cells.B - j) / (cells.A + 1 + j) * ((cells.C - j) / (cells.D + 1 + j));
            term *= ratio;
            sum += term;
            moment += term * (j + 1);
            if (ratio < 1 && term * ratio <= Negligible * (1 - ratio) * sum)
            {
                break;
            }

            if (term > 1 / Rescale)
            {
                term *= Rescale;
                sum *= Rescale;
                moment *= Rescale;
                logScale -= Math.Log(Rescale);
            }
        }

        return new TailSum(sum, moment, logScale);
    }

    /// <summary>The logarithm of a constant plus the sum; minus infinity when both are 0.</summary>
    public double LogPlus(double constant) => _logScale == 0
        ? Math.Log(constant + _sum)
        : _logScale + Math.Log(_sum + (constant * Math.Exp(-_logScale)));

    /// <summary>The derivative of <see cref="LogPlus"/>.</summary>
    public double SlopePlus(double constant)
    {
        double whole = _sum + (constant * Math.Exp(-_logScale));
        return whole > 0 ? _moment / whole : 0;
    }
}
