namespace DiagnosticAccuracy;

/// <summary>A weighted mean of the proportions of several strata, with its interval.</summary>
/// <remarks><c>default(StratifiedProportion)</c> is undefined.</remarks>
public readonly record struct StratifiedProportion : IIntervalQuantity
{
    private const string Name = "variance recovery (MOVER) from the Wilson limits of the strata";

    private readonly IReadOnlyList<Proportion>? _strata;

    internal StratifiedProportion(IReadOnlyList<Proportion> strata, StratumWeighting weighting)
    {
        _strata = strata;
        Weighting = weighting;
    }

    /// <summary>Gets how the strata are weighted.</summary>
    public StratumWeighting Weighting { get; }

    /// <inheritdoc/>
    public bool IsDefined => WhyUndefined is null;

    /// <summary>Gets the weighted mean over the strata that have subjects, from 0 to 1.</summary>
    public double Value
    {
        get
        {
            double sum = 0;
            foreach (Proportion stratum in Filled)
            {
                sum += Weight(stratum) * stratum.Value;
            }

            return IsDefined ? Math.Min(1, sum / TotalWeight) : double.NaN;
        }
    }

    /// <inheritdoc/>
    public UndefinedReason? WhyUndefined => _strata is null ? UndefinedReason.NotComputed
        : Filled.Any() ? null
        : _strata[0].WhyUndefined;

    private IEnumerable<Proportion> Filled => (_strata ?? []).Where(stratum => stratum.IsDefined);

    private double TotalWeight => Filled.Sum(Weight);

    /// <summary>
    /// A confidence interval from the Wilson limits of the strata, whose distances from the estimates are combined as independent errors. It holds
    /// whether or not the strata share one proportion; it lies within 0 to 1.
    /// </summary>
    /// <param name="confidence">Level and side; two-sided 95 % unless said.</param>
    /// <returns>The interval; undefined, with the reason, where the mean is.</returns>
    /// <remarks>Source: Zou and Donner, Stat Med 2008;27:1693. The weights are taken as known.</remarks>
    public ConfidenceInterval Interval(Confidence confidence = default)
    {
        if (WhyUndefined is { } reason)
        {
            return ConfidenceInterval.Undefined(reason, confidence, Name);
        }

        double total = TotalWeight;
        double below = 0;
        double above = 0;
        foreach (Proportion stratum in Filled)
        {
            ConfidenceInterval interval = stratum.Interval(confidence);
            double weight = Weight(stratum) / total;
            below += Math.Pow(weight * (stratum.Value - interval.Lower), 2);
            above += Math.Pow(weight * (interval.Upper - stratum.Value), 2);
        }

        return new ConfidenceInterval(
            confidence.HasLower ? Math.Max(0, Value - Math.Sqrt(below)) : 0,
            confidence.HasUpper ? Math.Min(1, Value + Math.Sqrt(above)) : 1,
            confidence,
            Name);
    }

    /// <summary>Whether the counts of the strata, in their order, and the weights are equal.</summary>
    /// <param name="other">The other mean.</param>
    /// <returns>True when they are.</returns>
    public bool Equals(StratifiedProportion other) =>
        Weighting == other.Weighting && (_strata is null) == (other._strata is null) && (_strata ?? []).SequenceEqual(other._strata ?? []);

    /// <inheritdoc/>
    public override int GetHashCode() => (Weighting, _strata?.Count, _strata?[0]).GetHashCode();

    /// <summary>The value to six significant digits in the invariant culture, or "undefined: " and the reason.</summary>
    /// <returns>The text.</returns>
    public override string ToString() => Display.Of((IQuantity)this);

    private double Weight(Proportion stratum)
    {
        double all = stratum.Trials + 1.0;
        return Weighting switch
        {
            StratumWeighting.BySize => stratum.Trials,
            StratumWeighting.Equal => 1,
            _ => stratum.Trials / ((stratum.Successes + 0.5) / all * ((stratum.Failures + 0.5) / all)),
        };
    }
}
