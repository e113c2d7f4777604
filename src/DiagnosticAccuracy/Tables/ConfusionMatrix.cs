namespace DiagnosticAccuracy;

/// <summary>
/// The four cells of one binary test against a reference standard.
/// </summary>
/// <remarks><c>default(ConfusionMatrix)</c> has four empty cells; what it does not define says so.</remarks>
public readonly record struct ConfusionMatrix
{
    /// <summary>Initializes a new instance of the <see cref="ConfusionMatrix"/> struct.</summary>
    /// <param name="truePositives">Subjects with the condition whose result is positive.</param>
    /// <param name="falsePositives">Subjects without the condition whose result is positive.</param>
    /// <param name="falseNegatives">Subjects with the condition whose result is negative.</param>
    /// <param name="trueNegatives">Subjects without the condition whose result is negative.</param>
    /// <exception cref="ArgumentOutOfRangeException">A cell is negative.</exception>
    /// <exception cref="OverflowException">The cells add up to more than <see cref="long.MaxValue"/>.</exception>
    public ConfusionMatrix(long truePositives, long falsePositives, long falseNegatives, long trueNegatives)
    {
        Guard.Count(truePositives);
        Guard.Count(falsePositives);
        Guard.Count(falseNegatives);
        Guard.Count(trueNegatives);
        TruePositives = truePositives;
        FalsePositives = falsePositives;
        FalseNegatives = falseNegatives;
        TrueNegatives = trueNegatives;
        _ = checked(truePositives + falsePositives + falseNegatives + trueNegatives);
    }

    /// <summary>Gets the subjects with the condition whose result is positive.</summary>
    public long TruePositives { get; }

    /// <summary>Gets the subjects without the condition whose result is positive.</summary>
    public long FalsePositives { get; }

    /// <summary>Gets the subjects with the condition whose result is negative.</summary>
    public long FalseNegatives { get; }

    /// <summary>Gets the subjects without the condition whose result is negative.</summary>
    public long TrueNegatives { get; }

    /// <summary>Gets the number of subjects with the condition.</summary>
    public long WithCondition => TruePositives + FalseNegatives;

    /// <summary>Gets the number of subjects without the condition.</summary>
    public long WithoutCondition => FalsePositives + TrueNegatives;

    /// <summary>Gets the number of positive results.</summary>
    public long Positives => TruePositives + FalsePositives;

    /// <summary>Gets the number of negative results.</summary>
    public long Negatives => FalseNegatives + TrueNegatives;

    /// <summary>Gets the number of subjects.</summary>
    public long Total => WithCondition + WithoutCondition;

    /// <summary>Gets the positive share of those with the condition. Undefined when nobody has it.</summary>
    public Proportion Sensitivity => new(TruePositives, WithCondition, UndefinedReason.NoSubjectsWithCondition);

    /// <summary>Gets the negative share of those without the condition. Undefined when everybody has it.</summary>
    public Proportion Specificity => new(TrueNegatives, WithoutCondition, UndefinedReason.NoSubjectsWithoutCondition);

    /// <summary>The four cells in the invariant culture.</summary>
    /// <returns>For example "TP 90, FP 20, FN 10, TN 180".</returns>
    public override string ToString() =>
        $"TP {Display.Of(TruePositives)}, FP {Display.Of(FalsePositives)}, FN {Display.Of(FalseNegatives)}, TN {Display.Of(TrueNegatives)}";
}
