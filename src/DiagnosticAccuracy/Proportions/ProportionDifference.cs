using DiagnosticAccuracy.Proportions;

namespace DiagnosticAccuracy;

/// <summary>The difference of two independent proportions, first minus second.</summary>
/// <remarks>
/// <para>The two proportions must come from different subjects; for two tests on the same subjects the intervals do not hold.</para>
/// <para><c>default(ProportionDifference)</c> is undefined: neither proportion has trials.</para>
/// </remarks>
public readonly record struct ProportionDifference : IIntervalQuantity
{
    /// <summary>Initializes a new instance of the <see cref="ProportionDifference"/> struct.</summary>
    /// <param name="first">The proportion from which the other is taken.</param>
    /// <param name="second">The proportion that is taken from the first, of other subjects.</param>
    public ProportionDifference(Proportion first, Proportion second)
    {
        First = first;
        Second = second;
    }

    /// <summary>Gets the proportion from which the other is taken.</summary>
    public Proportion First { get; }

    /// <summary>Gets the proportion that is taken from the first.</summary>
    public Proportion Second { get; }

    /// <inheritdoc/>
    public bool IsDefined => First.IsDefined && Second.IsDefined;

    /// <summary>Gets the first proportion minus the second, from -1 to 1; NaN exactly when one of them has no trials.</summary>
    public double Value => Between(First, Second);

    /// <inheritdoc/>
    public UndefinedReason? WhyUndefined => First.WhyUndefined ?? Second.WhyUndefined;

    /// <inheritdoc/>
    ConfidenceInterval IIntervalQuantity.Interval(Confidence confidence) => Interval(confidence);

    /// <summary>A confidence interval; it lies within -1 to 1.</summary>
    /// <param name="confidence">Level and side; two-sided 95 % unless said.</param>
    /// <param name="method">The method; the hybrid of two Wilson score intervals unless said.</param>
    /// <returns>The interval; undefined, with the reason, where the difference is.</returns>
    /// <exception cref="ArgumentOutOfRangeException"><paramref name="method"/> is not a value of its type.</exception>
    /// <remarks>
    /// The score and hybrid intervals contain the difference at every level above one half. Sources: Newcombe, Stat Med 1998;17:873; Miettinen
    /// and Nurminen, Stat Med 1985;4:213; Mee, Biometrics 1984;40:1175; Beal, Biometrics 1987;43:941; Agresti and Caffo, Am Stat 2000;54:280.
    /// </remarks>
    public ConfidenceInterval Interval(Confidence confidence = default, DifferenceMethod method = DifferenceMethod.HybridScore) => method switch
    {
        DifferenceMethod.HybridScore => HybridScore.Interval(this, confidence),
        DifferenceMethod.MiettinenNurminen => ScoreDifference.MiettinenNurminen(this, confidence),
        DifferenceMethod.Mee => ScoreDifference.Mee(this, confidence),
        DifferenceMethod.HybridScoreContinuity => HybridScore.WithContinuity(this, confidence),
        DifferenceMethod.AgrestiCaffo => WaldDifference.AgrestiCaffo(this, confidence),
        DifferenceMethod.Haldane => BealDifference.Haldane(this, confidence),
        DifferenceMethod.JeffreysPerks => BealDifference.JeffreysPerks(this, confidence),
        DifferenceMethod.Wald => WaldDifference.Interval(this, confidence),
        DifferenceMethod.WaldContinuity => WaldDifference.WithContinuity(this, confidence),
        _ => throw Guard.UnknownOption(method),
    };

    /// <summary>For example "56/70 - 48/80 = 0.2", or "0/0 - 48/80 (undefined: ...)".</summary>
    /// <returns>The text, in the invariant culture.</returns>
    public override string ToString()
    {
        string counts = $"{First.Counts} - {Second.Counts}";
        return IsDefined ? $"{counts} = {Display.Of(Value)}" : $"{counts} ({Display.Undefined(WhyUndefined!)})";
    }

    /// <summary>The difference; of two large proportions by their failures, so that it keeps its digits.</summary>
    internal static double Between(Proportion first, Proportion second) => first.Value > 0.5 && second.Value > 0.5
        ? second.Complement.Value - first.Complement.Value
        : first.Value - second.Value;
}
