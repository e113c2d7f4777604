using System.Numerics;
using DiagnosticAccuracy.Numerics;

namespace DiagnosticAccuracy;

/// <summary>
/// What a test is expected to do among so many people at a prevalence, as natural frequencies: whole numbers that add up to the people.
/// </summary>
/// <remarks>
/// <para>The four expectations are rounded together by the method of largest remainders, in exact arithmetic: each is rounded down, and the people
/// still missing go to the cells with the largest fractions. Equal fractions are served in the order false negatives, false
/// positives, true positives, true negatives, so that a tie shows an error rather than hides it. The prevalence is read as the decimal number
/// it prints as: 0.15 is fifteen hundredths, not the binary number next to it.</para>
/// <para><c>default(ExpectedCells)</c> is undefined: its table is empty.</para>
/// </remarks>
public readonly record struct ExpectedCells
{
    private readonly ConfusionMatrix _cells;

    internal ExpectedCells(ConfusionMatrix table, long people, Prevalence prevalence)
    {
        Table = table;
        People = people;
        Prevalence = prevalence;
        _cells = FindWhyUndefined(table, prevalence) is null ? Round(table, people, prevalence.Value) : default;
    }

    /// <summary>Gets the table that sensitivity and specificity come from.</summary>
    public ConfusionMatrix Table { get; }

    /// <summary>Gets the number of people.</summary>
    public long People { get; }

    /// <summary>Gets the prevalence.</summary>
    public Prevalence Prevalence { get; }

    /// <summary>Gets a value indicating whether the table defines the expectations.</summary>
    public bool IsDefined => WhyUndefined is null;

    /// <summary>
    /// Gets why the expectations are undefined; null when they are defined. Sensitivity is needed at every prevalence but 0, specificity at every
    /// prevalence but 1.
    /// </summary>
    public UndefinedReason? WhyUndefined => FindWhyUndefined(Table, Prevalence);

    /// <summary>Gets the people with the condition and a positive result; null exactly when undefined.</summary>
    public long? TruePositives => IsDefined ? _cells.TruePositives : null;

    /// <summary>Gets the people without the condition and with a positive result; null exactly when undefined.</summary>
    public long? FalsePositives => IsDefined ? _cells.FalsePositives : null;

    /// <summary>Gets the people with the condition and a negative result; null exactly when undefined.</summary>
    public long? FalseNegatives => IsDefined ? _cells.FalseNegatives : null;

    /// <summary>Gets the people without the condition and with a negative result; null exactly when undefined.</summary>
    public long? TrueNegatives => IsDefined ? _cells.TrueNegatives : null;

    /// <summary>Gets the people with the condition; null exactly when undefined.</summary>
    public long? WithCondition => IsDefined ? _cells.WithCondition : null;

    /// <summary>Gets the people without the condition; null exactly when undefined.</summary>
    public long? WithoutCondition => IsDefined ? _cells.WithoutCondition : null;

    /// <summary>Gets the people with a positive result; null exactly when undefined.</summary>
    public long? Positives => IsDefined ? _cells.Positives : null;

    /// <summary>Gets the people with a negative result; null exactly when undefined.</summary>
    public long? Negatives => IsDefined ? _cells.Negatives : null;

    /// <summary>Gets the expectation of the true positives before rounding.</summary>
    public Quantity ExactTruePositives => Exact(Prevalence.Value, Table.Sensitivity);

    /// <summary>Gets the expectation of the false positives before rounding.</summary>
    public Quantity ExactFalsePositives => Exact(1 - Prevalence.Value, Table.FalsePositiveRate);

    /// <summary>Gets the expectation of the false negatives before rounding.</summary>
    public Quantity ExactFalseNegatives => Exact(Prevalence.Value, Table.FalseNegativeRate);

    /// <summary>Gets the expectation of the true negatives before rounding.</summary>
    public Quantity ExactTrueNegatives => Exact(1 - Prevalence.Value, Table.Specificity);

    /// <summary>For example "of 1000: 50 with the condition (45 positive, 5 negative), 950 without it (95 positive, 855 negative)".</summary>
    /// <returns>The text, in the invariant culture.</returns>
    public override string ToString() => WhyUndefined is { } reason
        ? Display.Undefined(reason)
        : $"of {Display.Of(People)}: {Display.Of(_cells.WithCondition)} with the condition ({Display.Of(_cells.TruePositives)} positive, {Display.Of(_cells.FalseNegatives)} negative), "
            + $"{Display.Of(_cells.WithoutCondition)} without it ({Display.Of(_cells.FalsePositives)} positive, {Display.Of(_cells.TrueNegatives)} negative)";

    private static UndefinedReason? FindWhyUndefined(ConfusionMatrix table, Prevalence prevalence)
    {
        UndefinedReason? reason = prevalence.Value > 0 ? table.Sensitivity.WhyUndefined : null;
        return reason ?? (prevalence.Value < 1 ? table.Specificity.WhyUndefined : null);
    }

    private Quantity Exact(double share, Proportion proportion)
    {
        if (WhyUndefined is { } reason)
        {
            return Quantity.Undefined(reason);
        }

        return Quantity.Of(share == 0 ? 0 : People * share * proportion.Value);
    }

    private static ConfusionMatrix Round(ConfusionMatrix table, long people, double prevalence)
    {
        // Everything over one denominator: the prevalence is an integer over a power of ten, the rates have the group sizes below them.
        DecimalFraction fraction = DecimalFraction.Of(prevalence);
        BigInteger with = fraction.Numerator;
        BigInteger without = fraction.Denominator - with;
        BigInteger n1 = Math.Max(1, table.WithCondition);
        BigInteger n0 = Math.Max(1, table.WithoutCondition);
        BigInteger denominator = fraction.Denominator * n1 * n0;
        BigInteger[] numerators =
        [
            people * with * table.FalseNegatives * n0,
            people * without * table.FalsePositives * n1,
            people * with * table.TruePositives * n0,
            people * without * table.TrueNegatives * n1,
        ];
        long[] cells = new long[4];
        BigInteger[] remainders = new BigInteger[4];
        long missing = people;
        for (int i = 0; i < cells.Length; i++)
        {
            cells[i] = (long)BigInteger.DivRem(numerators[i], denominator, out remainders[i]);
            missing -= cells[i];
        }

        for (; missing > 0; missing--)
        {
            int largest = 0;
            for (int i = 1; i < remainders.Length; i++)
            {
                largest = remainders[i] > remainders[largest] ? i : largest;
            }

            cells[largest]++;
            remainders[largest] = -1;
        }

        return new ConfusionMatrix(cells[2], cells[1], cells[0], cells[3]);
    }
}
