namespace DiagnosticAccuracy;

/// <summary>The predictive values of a test among people of whom a stated share has the condition.</summary>
/// <remarks><c>default(PredictiveValues)</c> is undefined: its table is empty.</remarks>
public readonly record struct PredictiveValues
{
    internal PredictiveValues(ConfusionMatrix table, Prevalence prevalence)
    {
        Table = table;
        Prevalence = prevalence;
    }

    /// <summary>Gets the table that sensitivity and specificity come from.</summary>
    public ConfusionMatrix Table { get; }

    /// <summary>Gets the prevalence, taken as known.</summary>
    public Prevalence Prevalence { get; }

    /// <summary>Gets the positive predictive value: the probability of the condition after a positive result.</summary>
    public PredictiveValue Positive => new(Table.PositiveLikelihoodRatio, Prevalence.Value, 1 - Prevalence.Value);

    /// <summary>Gets the negative predictive value: the probability of no condition after a negative result.</summary>
    public PredictiveValue Negative => new(
        new ProportionRatio(Table.Specificity, Table.FalseNegativeRate, UndefinedReason.NoNegativeResults), 1 - Prevalence.Value, Prevalence.Value);

    /// <summary>Both values and the prevalence.</summary>
    /// <returns>The text, in the invariant culture.</returns>
    public override string ToString() => $"positive {Positive}, negative {Negative} at a prevalence of {Prevalence}";
}
