namespace DiagnosticAccuracy;

/// <summary>What a rule chose on a curve: every cutoff that is best by the rule, with what the test does there.</summary>
public sealed class CutoffChoice
{
    internal CutoffChoice(CutoffRule rule, RocCurve curve, IReadOnlyList<OperatingPoint> optima, UndefinedReason? whyUndefined)
    {
        Rule = rule;
        Curve = curve;
        Optima = optima;
        WhyUndefined = whyUndefined;
        Basis = FigureBasis.ChosenOnTheSameData;
    }

    /// <summary>Gets the rule.</summary>
    public CutoffRule Rule { get; }

    /// <summary>Gets the curve the rule was applied to.</summary>
    public RocCurve Curve { get; }

    /// <summary>Gets a value indicating whether the data let the rule choose.</summary>
    public bool IsDefined => WhyUndefined is null;

    /// <summary>Gets why nothing could be chosen; null exactly when <see cref="IsDefined"/> is true.</summary>
    public UndefinedReason? WhyUndefined { get; }

    /// <summary>
    /// Gets the chosen points, all of them where several are equally good, in the order of the curve (the strictest cutoff first); empty
    /// when undefined.
    /// </summary>
    public IReadOnlyList<OperatingPoint> Optima { get; }

    /// <summary>Gets what the figures are judged on.</summary>
    public FigureBasis Basis { get; }

    /// <summary>
    /// Gets a value indicating whether a chosen cutoff calls everybody positive or nobody, which no test is needed for. That is all there is
    /// when the target is out of the test's reach.
    /// </summary>
    public bool IsTrivial
    {
        get
        {
            foreach (OperatingPoint point in Optima)
            {
                if (point.Table.Positives == 0 || point.Table.Negatives == 0)
                {
                    return true;
                }
            }

            return false;
        }
    }

    /// <summary>For example "sensitivity at least 0.99: >= 12.5: TP 99, FP 40, FN 1, TN 160 (chosen on the same data)".</summary>
    /// <returns>The text, in the invariant culture.</returns>
    public override string ToString() => IsDefined
        ? $"{Rule}: {string.Join("; ", Optima)} (chosen on the same data)"
        : $"{Rule}: {Display.Undefined(WhyUndefined!)}";
}
