using DiagnosticAccuracy.Numerics;
using DiagnosticAccuracy.Tables;

namespace DiagnosticAccuracy;

/// <summary>
/// One predictive value, positive or negative, of two tests on the same subjects of a cohort. The denominators differ, as each test calls others.
/// </summary>
/// <remarks>
/// <para>It depends on the prevalence: the comparison holds for a cohort, subjects enrolled without regard to their status, at its prevalence.</para>
/// <para><c>default(PairedPredictiveValue)</c> is undefined: there are no results.</para>
/// </remarks>
public readonly record struct PairedPredictiveValue
{
    private readonly PairedTable _right;
    private readonly PairedTable _wrong;
    private readonly UndefinedReason? _emptyReason;

    // In both tables "positive" stands for "called": by a positive result for the positive predictive value, by a negative one for the other.
    internal PairedPredictiveValue(PairedTable right, PairedTable wrong, UndefinedReason emptyReason)
    {
        _right = right;
        _wrong = wrong;
        _emptyReason = emptyReason;
    }

    /// <summary>Gets the predictive value of the first test; undefined when it has no such result.</summary>
    public Proportion First => new(_right.FirstPositives, _right.FirstPositives + _wrong.FirstPositives, EmptyReason);

    /// <summary>Gets the predictive value of the second test; undefined when it has no such result.</summary>
    public Proportion Second => new(_right.SecondPositives, _right.SecondPositives + _wrong.SecondPositives, EmptyReason);

    /// <summary>Gets the predictive value of the first test minus that of the second; undefined when one of them is.</summary>
    public Quantity Difference
    {
        get
        {
            UndefinedReason? reason = First.WhyUndefined ?? Second.WhyUndefined;
            return reason is null
                ? Quantity.Of(ExactRatio.ToDouble(Cells.CrossDifference, Cells.ProductOfTrials))
                : Quantity.Undefined(reason);
        }
    }

    /// <summary>Gets the predictive value of the first test over that of the second, with its interval; undefined when one of them is, or both are zero.</summary>
    public RelativePredictiveValue Relative => new(this);

    internal PredictiveCells Cells => new(_right, _wrong);

    private UndefinedReason EmptyReason => _emptyReason ?? UndefinedReason.NoSubjects;

    /// <summary>The test that both predictive values are equal; two-sided.</summary>
    /// <param name="method">The method; the weighted generalised score statistic unless said.</param>
    /// <returns>The statistic and the p-value; undefined, with the reason, where a predictive value is.</returns>
    /// <exception cref="ArgumentOutOfRangeException"><paramref name="method"/> is not a value of its type.</exception>
    /// <remarks>
    /// Where both tests call the same subjects, or all that they call have (or all have not) the condition, the predictive values are equal and nothing
    /// speaks against it: p is 1 and the statistic is undefined (0/0). Sources: Leisenring, Alonzo and Pepe, Biometrics 2000;56:345; Kosinski, Stat Med
    /// 2013;32:964.
    /// </remarks>
    public PairedTest Test(PredictiveValueTestMethod method = PredictiveValueTestMethod.WeightedGeneralisedScore)
    {
        UndefinedReason? reason = First.WhyUndefined ?? Second.WhyUndefined;
        return method switch
        {
            PredictiveValueTestMethod.WeightedGeneralisedScore => WeightedGeneralisedScore.Test(Cells, reason),
            PredictiveValueTestMethod.GeneralisedScore => GeneralisedScore.Test(Cells, reason),
            _ => throw Guard.UnknownOption(method),
        };
    }

    /// <summary>Whether the counts are equal.</summary>
    /// <param name="other">The other comparison.</param>
    /// <returns>True when they are.</returns>
    public bool Equals(PairedPredictiveValue other) => _right == other._right && _wrong == other._wrong;

    /// <inheritdoc/>
    public override int GetHashCode() => (_right, _wrong).GetHashCode();

    /// <summary>For example "52/61 = 0.852459 against 47/56 = 0.839286".</summary>
    /// <returns>The text, in the invariant culture.</returns>
    public override string ToString() => $"{First} against {Second}";
}
