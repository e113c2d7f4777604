using DiagnosticAccuracy.Tables;

namespace DiagnosticAccuracy;

/// <summary>The ratio of two proportions of the same subjects, first over second: relative sensitivity, relative false-positive rate.</summary>
/// <remarks>
/// <para>A relative sensitivity or relative false-positive rate does not depend on the prevalence. Subjects negative on both tests do not enter it.</para>
/// <para><c>default(PairedRatio)</c> is undefined: there are no subjects.</para>
/// </remarks>
public readonly record struct PairedRatio : IIntervalQuantity
{
    private readonly UndefinedReason? _emptyReason;

    /// <summary>Initializes a new instance of the <see cref="PairedRatio"/> struct.</summary>
    /// <param name="table">Both tests on each subject; the positive shares are compared.</param>
    public PairedRatio(PairedTable table)
        : this(table, UndefinedReason.NoSubjects)
    {
    }

    internal PairedRatio(PairedTable table, UndefinedReason emptyReason)
    {
        Table = table;
        _emptyReason = emptyReason;
    }

    /// <summary>Gets both tests on each subject; the positive shares are compared.</summary>
    public PairedTable Table { get; }

    /// <summary>Gets the proportion that is divided.</summary>
    public Proportion First => new(Table.FirstPositives, Table.Total, EmptyReason);

    /// <summary>Gets the proportion it is divided by.</summary>
    public Proportion Second => new(Table.SecondPositives, Table.Total, EmptyReason);

    /// <summary>Gets the ratio of the second to the first.</summary>
    public PairedRatio Inverse => new(Table.Swapped, EmptyReason);

    /// <inheritdoc/>
    public bool IsDefined => Table.FirstPositives > 0 || Table.SecondPositives > 0;

    /// <summary>
    /// Gets the first proportion over the second, 0 or more; positive infinity when only the second is zero, NaN exactly when both are
    /// zero or there are no subjects.
    /// </summary>
    public double Value => IsDefined ? (double)Table.FirstPositives / Table.SecondPositives : double.NaN;

    /// <inheritdoc/>
    public UndefinedReason? WhyUndefined => IsDefined ? null : Table.Total == 0 ? EmptyReason : UndefinedReason.NoPositiveResults;

    private UndefinedReason EmptyReason => _emptyReason ?? UndefinedReason.NoSubjects;

    /// <inheritdoc/>
    ConfidenceInterval IIntervalQuantity.Interval(Confidence confidence) => Interval(confidence);

    /// <summary>A confidence interval; it lies within 0 to infinity and contains the ratio at every level above one half.</summary>
    /// <param name="confidence">Level and side; two-sided 95 % unless said.</param>
    /// <param name="method">The method; the score interval unless said.</param>
    /// <returns>The interval; undefined, with the reason, where the ratio is.</returns>
    /// <exception cref="ArgumentOutOfRangeException"><paramref name="method"/> is not a value of its type.</exception>
    /// <remarks>
    /// A ratio of zero or infinity has a finite limit on its other side; nothing is added to the counts. Where the logarithm has no limit or no width,
    /// the score interval is given and its name says so. Sources: Nam and Blackwelder, Stat Med 2002;21:689; Tang, Tang and Chan, Stat Med 2003;22:1217;
    /// Bonett and Price, Stat Med 2006;25:3039; compared by Fagerland, Lydersen and Laake, Stat Med 2014;33:2850.
    /// </remarks>
    public ConfidenceInterval Interval(Confidence confidence = default, PairedRatioMethod method = PairedRatioMethod.NamBlackwelderScore) => method switch
    {
        PairedRatioMethod.NamBlackwelderScore => NamBlackwelder.Interval(this, confidence, NamBlackwelder.Name),
        PairedRatioMethod.BonettPriceHybrid => BonettPriceRatio.Interval(this, confidence),
        PairedRatioMethod.WaldLog => PairedLogRatio.Interval(this, confidence),
        _ => throw Guard.UnknownOption(method),
    };

    /// <summary>Whether the counts are equal.</summary>
    /// <param name="other">The other ratio.</param>
    /// <returns>True when they are.</returns>
    public bool Equals(PairedRatio other) => Table == other.Table;

    /// <inheritdoc/>
    public override int GetHashCode() => Table.GetHashCode();

    /// <summary>For example "(48/58) / (45/58) = 1.06667 (paired)", or "(0/10) / (0/10) (undefined: ...)".</summary>
    /// <returns>The text, in the invariant culture.</returns>
    public override string ToString()
    {
        string counts = $"({First.Counts}) / ({Second.Counts})";
        return IsDefined ? $"{counts} = {Display.Of(Value)} (paired)" : $"{counts} ({Display.Undefined(WhyUndefined!)})";
    }
}
