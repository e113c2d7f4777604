namespace DiagnosticAccuracy;

/// <summary>
/// A rectangle that holds sensitivity and specificity together with the stated confidence: each side is an interval at the square root of the
/// level, since the two groups are independent.
/// </summary>
/// <remarks>
/// Two 95 % intervals side by side hold both parameters with about 90 % only. Source: Pepe, The Statistical Evaluation of Medical Tests for
/// Classification and Prediction, 2003. <c>default(JointAccuracyRegion)</c> is undefined.
/// </remarks>
public readonly record struct JointAccuracyRegion
{
    internal JointAccuracyRegion(ConfidenceInterval sensitivity, ConfidenceInterval specificity, Confidence confidence)
    {
        Sensitivity = sensitivity;
        Specificity = specificity;
        Confidence = confidence;
    }

    /// <summary>Gets the side of the sensitivity, at the square root of the joint level.</summary>
    public ConfidenceInterval Sensitivity { get; }

    /// <summary>Gets the side of the specificity, at the square root of the joint level.</summary>
    public ConfidenceInterval Specificity { get; }

    /// <summary>Gets the level of the rectangle, and the side it is bounded on.</summary>
    public Confidence Confidence { get; }

    /// <summary>Gets a value indicating whether both sides are defined.</summary>
    public bool IsDefined => Sensitivity.IsDefined && Specificity.IsDefined;

    /// <summary>Gets why the region is undefined; null exactly when it is defined.</summary>
    public UndefinedReason? WhyUndefined => Sensitivity.WhyUndefined ?? Specificity.WhyUndefined;

    /// <summary>Whether a pair lies in the rectangle, its edges included; false when undefined.</summary>
    /// <param name="sensitivity">A sensitivity from 0 to 1.</param>
    /// <param name="specificity">A specificity from 0 to 1.</param>
    /// <returns>True when it does.</returns>
    /// <exception cref="ArgumentOutOfRangeException">An argument is NaN or not from 0 to 1.</exception>
    public bool Contains(double sensitivity, double specificity)
    {
        Guard.Probability(sensitivity);
        Guard.Probability(specificity);
        return Sensitivity.Contains(sensitivity) && Specificity.Contains(specificity);
    }

    /// <summary>Both sides and the joint level.</summary>
    /// <returns>The text, in the invariant culture.</returns>
    public override string ToString() => IsDefined
        ? $"sensitivity {Display.Of(Sensitivity.Lower)} to {Display.Of(Sensitivity.Upper)} and specificity {Display.Of(Specificity.Lower)} to {Display.Of(Specificity.Upper)} ({Confidence}, jointly)"
        : Display.Undefined(WhyUndefined!);
}
