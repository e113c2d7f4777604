using DiagnosticAccuracy.Numerics;

namespace DiagnosticAccuracy;

/// <summary>A partial area under an empirical ROC curve, with the definition it was taken by.</summary>
/// <remarks>
/// <para>The curve is straight between its points, also inside the sloped step of a tie. The variance is that of the trimmed Mann-Whitney statistic: the
/// false-positive rates at the ends of the range are fixed, the cutoffs there are estimated, and the variance knows it (Dodd and Pepe, Biometrics
/// 2003;59:614; He and Escobar, Stat Med 2008;27:5291). Over the whole range it is DeLong's.</para>
/// <para><c>default(PartialArea)</c> is undefined.</para>
/// </remarks>
public readonly record struct PartialArea : IIntervalQuantity
{
    private readonly Quantity _value;

    internal PartialArea(PartialAreaRange range, Quantity value, Quantity variance)
    {
        Range = range;
        _value = value;
        Variance = variance;
    }

    /// <summary>Gets the range and the definition.</summary>
    public PartialAreaRange Range { get; }

    /// <inheritdoc/>
    public bool IsDefined => _value.IsDefined;

    /// <summary>Gets the area, from 0 to <see cref="LargestPossible"/>. Undefined when a group is empty.</summary>
    public double Value => _value.Value;

    /// <inheritdoc/>
    public UndefinedReason? WhyUndefined => _value.WhyUndefined;

    /// <summary>Gets the area of a perfect test in this range.</summary>
    public double LargestPossible => Range.LargestPossible;

    /// <summary>
    /// Gets the standardised area. Over a range of false-positive rates that of McClish, 1/2 (1 + (A - chance) / (largest - chance)): 1/2 for a test
    /// that tells nothing, 1 for a perfect one. Over a range of sensitivities the same on the mirrored square. For both at once the share of the
    /// largest possible area.
    /// </summary>
    public Quantity Standardised
    {
        get
        {
            if (!IsDefined || Range.Kind == PartialAreaKind.Both)
            {
                return IsDefined ? Quantity.Of(Value / LargestPossible) : _value;
            }

            double middle = (Range.From + Range.To) / 2;
            double chance = LargestPossible * (Range.Kind == PartialAreaKind.OverFalsePositiveRate ? middle : 1 - middle);
            return Quantity.Of((1 + ((Value - chance) / (LargestPossible - chance))) / 2);
        }
    }

    /// <summary>Gets the variance of the area; undefined when a group has fewer than two subjects.</summary>
    public Quantity Variance { get; }

    /// <summary>Gets the standard error of the area.</summary>
    public Quantity StandardError => Variance.IsDefined ? Quantity.Of(Math.Sqrt(Variance.Value)) : Variance;

    /// <inheritdoc/>
    ConfidenceInterval IIntervalQuantity.Interval(Confidence confidence) => Interval(confidence);

    /// <summary>A confidence interval of the area; it lies within 0 and <see cref="LargestPossible"/>.</summary>
    /// <param name="confidence">Level and side; two-sided 95 % unless said.</param>
    /// <param name="method">The method; logit unless said.</param>
    /// <returns>The interval; undefined, with the reason, where the area or its variance is, and where the variance is zero.</returns>
    /// <exception cref="ArgumentOutOfRangeException"><paramref name="method"/> is not a value of its type.</exception>
    public ConfidenceInterval Interval(Confidence confidence = default, PartialAreaMethod method = PartialAreaMethod.Logit)
    {
        string name = method switch
        {
            PartialAreaMethod.Logit => "logit of the share of the largest possible area",
            PartialAreaMethod.Wald => "Wald",
            _ => throw Guard.UnknownOption(method),
        };
        UndefinedReason? reason = WhyUndefined ?? Variance.WhyUndefined
            ?? (Variance.Value == 0 ? new UndefinedReason(UndefinedCause.ZeroVariance, "the estimated variance of the partial area is zero") : null);
        if (reason is not null)
        {
            return ConfidenceInterval.Undefined(reason, confidence, name);
        }

        double largest = LargestPossible;
        double rest = Math.Max(0, largest - Value);
        double margin = StandardNormal.UpperQuantile(confidence.Tail) * Math.Sqrt(Variance.Value);
        double lower = 0;
        double upper = largest;
        if (method == PartialAreaMethod.Wald || Value == 0 || rest == 0)
        {
            lower = confidence.HasLower ? Math.Min(largest, Math.Max(0, Value - margin)) : lower;
            upper = confidence.HasUpper ? Math.Max(0, Math.Min(largest, Value + margin)) : upper;
            name = method == PartialAreaMethod.Wald ? name : "Wald, since the logit is infinite";
        }
        else
        {
            double factor = Math.Exp(margin * largest / (Value * rest));
            lower = confidence.HasLower ? largest * (Value / (Value + (rest * factor))) : lower;
            upper = confidence.HasUpper ? largest * (Value / (Value + (rest / factor))) : upper;
        }

        return new ConfidenceInterval(lower, upper, confidence, name);
    }

    /// <summary>For example "0.0668 over false-positive rate from 0 to 0.1".</summary>
    /// <returns>The text, in the invariant culture.</returns>
    public override string ToString() => $"{Display.Of(_value)} over {Range}";
}
