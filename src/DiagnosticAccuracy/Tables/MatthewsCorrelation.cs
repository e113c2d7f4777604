using System.Numerics;
using DiagnosticAccuracy.Numerics;

namespace DiagnosticAccuracy;

/// <summary>
/// The Matthews correlation coefficient (the phi coefficient of the table): the correlation of result and status, from -1 to 1.
/// </summary>
/// <remarks>
/// <para>It changes with the prevalence of the sample. Its interval holds for a cohort (all four cells random), not for a study whose group sizes
/// were chosen.</para>
/// <para><c>default(MatthewsCorrelation)</c> is undefined.</para>
/// </remarks>
public readonly record struct MatthewsCorrelation : IIntervalQuantity
{
    private readonly ConfusionMatrix _table;

    internal MatthewsCorrelation(ConfusionMatrix table) => _table = table;

    /// <inheritdoc/>
    public bool IsDefined => WhyUndefined is null;

    /// <summary>
    /// Gets (TP TN - FP FN) / sqrt((TP + FP) (TP + FN) (TN + FP) (TN + FN)) (Matthews, Biochim Biophys Acta 1975;405:442). Undefined when a
    /// group is empty or all results are alike.
    /// </summary>
    public double Value
    {
        get
        {
            if (!IsDefined)
            {
                return double.NaN;
            }

            // The ends are told by the cells, so that rounding cannot move them.
            if (_table.FalsePositives == 0 && _table.FalseNegatives == 0)
            {
                return 1;
            }

            if (_table.TruePositives == 0 && _table.TrueNegatives == 0)
            {
                return -1;
            }

            // The difference of products is taken exactly.
            BigInteger difference = ((BigInteger)_table.TruePositives * _table.TrueNegatives) - ((BigInteger)_table.FalsePositives * _table.FalseNegatives);
            double scale = Math.Sqrt((double)_table.Positives) * Math.Sqrt((double)_table.Negatives)
                * Math.Sqrt((double)_table.WithCondition) * Math.Sqrt((double)_table.WithoutCondition);
            return Math.Max(-1, Math.Min(1, (double)difference / scale));
        }
    }

    /// <inheritdoc/>
    public UndefinedReason? WhyUndefined
    {
        get
        {
            UndefinedReason? group = _table.Sensitivity.WhyUndefined ?? _table.Specificity.WhyUndefined;
            return group
                ?? (_table.Positives == 0 ? UndefinedReason.NoPositiveResults : _table.Negatives == 0 ? UndefinedReason.NoNegativeResults : null);
        }
    }

    /// <inheritdoc/>
    ConfidenceInterval IIntervalQuantity.Interval(Confidence confidence) => Interval(confidence);

    /// <summary>A confidence interval; it lies within -1 to 1.</summary>
    /// <param name="confidence">Level and side; two-sided 95 % unless said.</param>
    /// <param name="method">The method; Fisher's z unless said.</param>
    /// <returns>The interval; undefined, with the reason, where the value is, and at -1 and 1, where the estimated variance is zero.</returns>
    /// <exception cref="ArgumentOutOfRangeException"><paramref name="method"/> is not a value of its type.</exception>
    /// <remarks>The variance is that of phi under multinomial sampling: Bishop, Fienberg and Holland, Discrete Multivariate Analysis, 1975, section 11.3.</remarks>
    public ConfidenceInterval Interval(Confidence confidence = default, MatthewsMethod method = MatthewsMethod.FisherZ)
    {
        string name = method switch
        {
            MatthewsMethod.FisherZ => "Fisher z with delta-method variance",
            MatthewsMethod.Delta => "delta method",
            _ => throw Guard.UnknownOption(method),
        };
        if (WhyUndefined is { } reason)
        {
            return ConfidenceInterval.Undefined(reason, confidence, name);
        }

        double phi = Value;
        double variance = Variance(phi);
        if (Math.Abs(phi) == 1 || !(variance > 0))
        {
            return ConfidenceInterval.Undefined(
                new UndefinedReason(UndefinedCause.ZeroVariance, "the estimated variance of the coefficient is zero"), confidence, name);
        }

        double margin = StandardNormal.UpperQuantile(confidence.Tail) * Math.Sqrt(variance);
        double lower = -1;
        double upper = 1;
        if (method == MatthewsMethod.FisherZ)
        {
            double scaled = margin / ((1 - phi) * (1 + phi));
            lower = confidence.HasLower ? Shifted(phi, -scaled) : lower;
            upper = confidence.HasUpper ? Shifted(phi, scaled) : upper;
        }
        else
        {
            lower = confidence.HasLower ? Math.Min(1, Math.Max(-1, phi - margin)) : lower;
            upper = confidence.HasUpper ? Math.Max(-1, Math.Min(1, phi + margin)) : upper;
        }

        return new ConfidenceInterval(lower, upper, confidence, name);
    }

    /// <summary>The value to six significant digits in the invariant culture, or "undefined: " and the reason.</summary>
    /// <returns>The text.</returns>
    public override string ToString() => Display.Of((IQuantity)this);

    // tanh(atanh(phi) + shift).
    private static double Shifted(double phi, double shift)
    {
        double t = Math.Tanh(shift);
        return (phi + t) / (1 + (phi * t));
    }

    private double Variance(double phi)
    {
        double n = _table.Total;
        double resultGap = (_table.Positives - (double)_table.Negatives) / n;
        double statusGap = (_table.WithCondition - (double)_table.WithoutCondition) / n;
        double resultSpread = _table.Positives / n * (_table.Negatives / n);
        double statusSpread = _table.WithCondition / n * (_table.WithoutCondition / n);
        double square = phi * phi;
        return (1 - square
            + (phi * (1 + (square / 2)) * resultGap * statusGap / Math.Sqrt(resultSpread * statusSpread))
            - (0.75 * square * ((resultGap * resultGap / resultSpread) + (statusGap * statusGap / statusSpread)))) / n;
    }
}
