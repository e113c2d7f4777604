namespace DiagnosticAccuracy;

/// <summary>What a test does at one cutoff: a point of the ROC curve with its four cells.</summary>
/// <remarks><c>default(OperatingPoint)</c> has no positive score and four empty cells.</remarks>
/// <param name="Cutoff">From which score on results are positive.</param>
/// <param name="Table">The four cells at this cutoff.</param>
public readonly record struct OperatingPoint(Cutoff Cutoff, ConfusionMatrix Table)
{
    /// <summary>Gets the positive share of those with the condition. Undefined when nobody has it.</summary>
    public Proportion Sensitivity => Table.Sensitivity;

    /// <summary>Gets the negative share of those without the condition. Undefined when everybody has it.</summary>
    public Proportion Specificity => Table.Specificity;

    /// <summary>For example ">= 12.5: TP 90, FP 20, FN 10, TN 180".</summary>
    /// <returns>The text, in the invariant culture.</returns>
    public override string ToString() => $"{Cutoff}: {Table}";
}
