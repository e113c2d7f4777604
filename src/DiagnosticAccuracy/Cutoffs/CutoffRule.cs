using DiagnosticAccuracy.Cutoffs;

namespace DiagnosticAccuracy;

/// <summary>
/// A rule that chooses a cutoff. It is a value: it can be written down before the data are seen, printed, and compared.
/// </summary>
public abstract record CutoffRule
{
    // Only the rules of this library.
    private protected CutoffRule()
    {
    }

    /// <summary>
    /// Gets the rule of Youden (Cancer 1950;3:32): the largest sensitivity + specificity - 1. All optima of a tie are chosen. It weighs a missed
    /// subject and a false alarm alike, which few uses of a test do.
    /// </summary>
    public static CutoffRule LargestYoudenIndex { get; } = new LargestYoudenIndexRule();

    /// <summary>The cutoff with the highest specificity among those whose sensitivity is at least a target: a cutoff to rule out with.</summary>
    /// <param name="target">The sensitivity wanted, from 0 to 1; reached means equal or above.</param>
    /// <returns>The rule.</returns>
    /// <exception cref="ArgumentOutOfRangeException"><paramref name="target"/> is NaN or not from 0 to 1.</exception>
    /// <remarks>
    /// The observed sensitivity reaches the target; its confidence limit need not. Cutoffs of equal specificity are told apart by the higher
    /// sensitivity, so there is one optimum. Source: Schaefer, Stat Med 1989.
    /// </remarks>
    public static CutoffRule SensitivityAtLeast(double target)
    {
        Guard.Probability(target);
        return new SensitivityAtLeastRule(target);
    }

    /// <summary>The cutoff with the highest sensitivity among those whose specificity is at least a target: a cutoff to rule in with.</summary>
    /// <param name="target">The specificity wanted, from 0 to 1; reached means equal or above.</param>
    /// <returns>The rule.</returns>
    /// <exception cref="ArgumentOutOfRangeException"><paramref name="target"/> is NaN or not from 0 to 1.</exception>
    /// <remarks>
    /// The observed specificity reaches the target; its confidence limit need not. Cutoffs of equal sensitivity are told apart by the higher
    /// specificity, so there is one optimum.
    /// </remarks>
    public static CutoffRule SpecificityAtLeast(double target)
    {
        Guard.Probability(target);
        return new SpecificityAtLeastRule(target);
    }

    /// <summary>Applies the rule to a curve.</summary>
    /// <param name="curve">The curve.</param>
    /// <returns>The choice, marked as made on the data it is judged on; undefined, with the reason, when a group is empty.</returns>
    /// <exception cref="ArgumentNullException"><paramref name="curve"/> is null.</exception>
    public CutoffChoice Choose(RocCurve curve)
    {
        Guard.NotNull(curve);
        return curve.Area.WhyUndefined is { } reason
            ? new CutoffChoice(this, curve, [], reason)
            : new CutoffChoice(this, curve, Optima(curve), null);
    }

    /// <summary>The optimal points of a curve with both groups, in its order.</summary>
    private protected abstract IReadOnlyList<OperatingPoint> Optima(RocCurve curve);

    private sealed record LargestYoudenIndexRule : CutoffRule
    {
        public override string ToString() => "largest Youden index";

        private protected override IReadOnlyList<OperatingPoint> Optima(RocCurve curve) => CurveSearch.LargestYoudenIndex(curve);
    }

    private sealed record SensitivityAtLeastRule(double Target) : CutoffRule
    {
        public override string ToString() => "sensitivity at least " + Display.Exact(Target);

        private protected override IReadOnlyList<OperatingPoint> Optima(RocCurve curve) => [CurveSearch.SensitivityAtLeast(curve, Target)];
    }

    private sealed record SpecificityAtLeastRule(double Target) : CutoffRule
    {
        public override string ToString() => "specificity at least " + Display.Exact(Target);

        private protected override IReadOnlyList<OperatingPoint> Optima(RocCurve curve) => [CurveSearch.SpecificityAtLeast(curve, Target)];
    }
}
