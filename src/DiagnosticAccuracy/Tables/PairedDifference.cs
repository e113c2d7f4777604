using DiagnosticAccuracy.Numerics;
using DiagnosticAccuracy.Tables;

namespace DiagnosticAccuracy;

/// <summary>The difference of two proportions of the same subjects, first minus second: of two sensitivities, of two specificities.</summary>
/// <remarks>
/// <para>A difference of sensitivities or specificities does not depend on the prevalence.</para>
/// <para><c>default(PairedDifference)</c> is undefined: there are no subjects.</para>
/// </remarks>
public readonly record struct PairedDifference : IIntervalQuantity
{
    private readonly UndefinedReason? _emptyReason;

    /// <summary>Initializes a new instance of the <see cref="PairedDifference"/> struct.</summary>
    /// <param name="table">Both tests on each subject; the positive shares are compared.</param>
    public PairedDifference(PairedTable table)
        : this(table, UndefinedReason.NoSubjects)
    {
    }

    internal PairedDifference(PairedTable table, UndefinedReason emptyReason)
    {
        Table = table;
        _emptyReason = emptyReason;
    }

    /// <summary>Gets both tests on each subject; the positive shares are compared (for specificities these are the right negative results).</summary>
    public PairedTable Table { get; }

    /// <summary>Gets the proportion from which the other is taken.</summary>
    public Proportion First => new(Table.FirstPositives, Table.Total, EmptyReason);

    /// <summary>Gets the proportion that is taken from the first.</summary>
    public Proportion Second => new(Table.SecondPositives, Table.Total, EmptyReason);

    /// <summary>Gets the difference with the tests in the other order.</summary>
    public PairedDifference Swapped => new(Table.Swapped, EmptyReason);

    /// <inheritdoc/>
    public bool IsDefined => Table.Total > 0;

    /// <summary>Gets the first proportion minus the second, from -1 to 1, as one ratio of counts; NaN exactly when there are no subjects.</summary>
    public double Value => IsDefined ? (double)(Table.FirstOnly - Table.SecondOnly) / Table.Total : double.NaN;

    /// <inheritdoc/>
    public UndefinedReason? WhyUndefined => IsDefined ? null : EmptyReason;

    private UndefinedReason EmptyReason => _emptyReason ?? UndefinedReason.NoSubjects;

    /// <inheritdoc/>
    ConfidenceInterval IIntervalQuantity.Interval(Confidence confidence) => Interval(confidence);

    /// <summary>A confidence interval; it lies within -1 to 1.</summary>
    /// <param name="confidence">Level and side; two-sided 95 % unless said.</param>
    /// <param name="method">The method; Tango's score interval unless said.</param>
    /// <returns>The interval; undefined, with the reason, where the difference is.</returns>
    /// <exception cref="ArgumentOutOfRangeException"><paramref name="method"/> is not a value of its type.</exception>
    /// <remarks>
    /// The score and hybrid intervals and Wald's contain the difference at every level above one half; the two that add to the cells need not.
    /// Sources: Tango, Stat Med 1998;17:891; Newcombe, Stat Med 1998;17:2635; Agresti and Min, Stat Med 2005;24:729; Bonett and Price, J Educ Behav
    /// Stat 2012;37:479; compared by Fagerland, Lydersen and Laake, Stat Med 2014;33:2850.
    /// </remarks>
    public ConfidenceInterval Interval(Confidence confidence = default, PairedDifferenceMethod method = PairedDifferenceMethod.TangoScore) => method switch
    {
        PairedDifferenceMethod.TangoScore => TangoScore.Interval(this, confidence),
        PairedDifferenceMethod.NewcombeHybrid => NewcombePaired.Interval(this, confidence, correctPhi: false),
        PairedDifferenceMethod.NewcombeHybridPhiCorrected => NewcombePaired.Interval(this, confidence, correctPhi: true),
        PairedDifferenceMethod.BonettPrice => PairedWald.BonettPrice(this, confidence),
        PairedDifferenceMethod.AgrestiMin => PairedWald.AgrestiMin(this, confidence),
        PairedDifferenceMethod.Wald => PairedWald.Interval(this, confidence),
        _ => throw Guard.UnknownOption(method),
    };

    /// <summary>Whether the counts are equal.</summary>
    /// <param name="other">The other difference.</param>
    /// <returns>True when they are.</returns>
    public bool Equals(PairedDifference other) => Table == other.Table;

    /// <inheritdoc/>
    public override int GetHashCode() => Table.GetHashCode();

    /// <summary>For example "48/58 - 45/58 = 0.0517241 (paired)", or "0/0 - 0/0 (undefined: ...)".</summary>
    /// <returns>The text, in the invariant culture.</returns>
    public override string ToString()
    {
        string counts = $"{First.Counts} - {Second.Counts}";
        return IsDefined ? $"{counts} = {Display.Of(Value)} (paired)" : $"{counts} ({Display.Undefined(WhyUndefined!)})";
    }
}
