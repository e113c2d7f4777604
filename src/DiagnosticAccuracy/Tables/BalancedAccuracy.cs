namespace DiagnosticAccuracy;

/// <summary>The mean of sensitivity and specificity, from 0 to 1; one half for a test that tells nothing.</summary>
/// <remarks>
/// <para>It does not depend on the prevalence. It is (1 + J) / 2, J the Youden index, and so is its interval.</para>
/// <para><c>default(BalancedAccuracy)</c> is undefined.</para>
/// </remarks>
public readonly record struct BalancedAccuracy : IIntervalQuantity
{
    private readonly ProportionDifference _youden;

    internal BalancedAccuracy(ProportionDifference youden) => _youden = youden;

    /// <inheritdoc/>
    public bool IsDefined => _youden.IsDefined;

    /// <summary>Gets (sensitivity + specificity) / 2. Undefined when a group is empty.</summary>
    public double Value => (1 + _youden.Value) / 2;

    /// <inheritdoc/>
    public UndefinedReason? WhyUndefined => _youden.WhyUndefined;

    /// <summary>The interval by variance recovery (MOVER) from the Wilson limits of sensitivity and specificity; it lies within 0 to 1.</summary>
    /// <param name="confidence">Level and side; two-sided 95 % unless said.</param>
    /// <returns>The interval; undefined, with the reason, where the value is.</returns>
    /// <remarks>Sources: Newcombe, Stat Med 1998;17:873; Zou and Donner, Stat Med 2008;27:1693.</remarks>
    public ConfidenceInterval Interval(Confidence confidence = default)
    {
        const string name = "variance recovery (MOVER) from Wilson limits";
        ConfidenceInterval youden = _youden.Interval(confidence);
        return youden.IsDefined
            ? new ConfidenceInterval((1 + youden.Lower) / 2, (1 + youden.Upper) / 2, confidence, name)
            : ConfidenceInterval.Undefined(WhyUndefined!, confidence, name);
    }

    /// <summary>The value to six significant digits in the invariant culture, or "undefined: " and the reason.</summary>
    /// <returns>The text.</returns>
    public override string ToString() => Display.Of((IQuantity)this);
}
