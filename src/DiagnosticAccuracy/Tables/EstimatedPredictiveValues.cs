namespace DiagnosticAccuracy;

/// <summary>The predictive values of a test at a prevalence that was estimated, from other subjects.</summary>
/// <remarks><c>default(EstimatedPredictiveValues)</c> is undefined.</remarks>
public readonly record struct EstimatedPredictiveValues
{
    internal EstimatedPredictiveValues(ConfusionMatrix table, EstimatedPrevalence prevalence)
    {
        Table = table;
        Prevalence = prevalence;
    }

    /// <summary>Gets the table that sensitivity and specificity come from.</summary>
    public ConfusionMatrix Table { get; }

    /// <summary>Gets the estimated prevalence.</summary>
    public EstimatedPrevalence Prevalence { get; }

    /// <summary>Gets the positive predictive value.</summary>
    public EstimatedPredictiveValue Positive => new(Table.PositiveLikelihoodRatio, Prevalence);

    /// <summary>Gets the negative predictive value.</summary>
    public EstimatedPredictiveValue Negative => new(
        new ProportionRatio(Table.Specificity, Table.FalseNegativeRate, UndefinedReason.NoNegativeResults), Prevalence.Complement);

    /// <summary>Both values and the prevalence.</summary>
    /// <returns>The text, in the invariant culture.</returns>
    public override string ToString() => $"positive {Positive}, negative {Negative} at an estimated prevalence of {Prevalence}";
}
