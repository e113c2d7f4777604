using DiagnosticAccuracy.Tables;

namespace DiagnosticAccuracy;

/// <summary>Two or more binary tests on the same subjects of one group, such as those with the condition: every pair of them as a table.</summary>
public sealed class MatchedResults
{
    // The pairs (0, 1), (0, 2), ..., (1, 2), ...
    private readonly PairedTable[] _pairs;

    private MatchedResults(int tests, PairedTable[] pairs)
    {
        Tests = tests;
        _pairs = pairs;
    }

    /// <summary>Gets the number of tests, 2 or more.</summary>
    public int Tests { get; }

    /// <summary>Gets the number of subjects.</summary>
    public long Subjects => _pairs[0].Total;

    /// <summary>The results of any sequence of rows.</summary>
    /// <typeparam name="T">The type of a row.</typeparam>
    /// <param name="rows">The rows, one a subject; they are read once.</param>
    /// <param name="tests">For each test, whether it was positive on the subject; two or more.</param>
    /// <returns>The results; of no subjects for no rows.</returns>
    /// <exception cref="ArgumentNullException">An argument is null.</exception>
    /// <exception cref="ArgumentException">There are fewer than two tests.</exception>
    /// <remarks>A subject without a valid result of every test has no place here: leave it out, or decide how it counts, and report the number.</remarks>
    public static MatchedResults FromRows<T>(IEnumerable<T> rows, IReadOnlyList<Func<T, bool>> tests)
    {
        Guard.NotNull(rows);
        Guard.NotNull(tests);
        if (tests.Count < 2)
        {
            throw new ArgumentException($"{nameof(tests)} has {Display.Of(tests.Count)} elements; at least two tests are needed.", nameof(tests));
        }

        int k = tests.Count;
        PairedCounter[] counters = new PairedCounter[k * (k - 1) / 2];
        bool[] results = new bool[k];
        foreach (T row in rows)
        {
            for (int i = 0; i < k; i++)
            {
                results[i] = tests[i](row);
            }

            int pair = 0;
            for (int i = 0; i < k; i++)
            {
                for (int j = i + 1; j < k; j++)
                {
                    counters[pair++].Count(results[i], results[j]);
                }
            }
        }

        PairedTable[] pairs = new PairedTable[counters.Length];
        for (int i = 0; i < pairs.Length; i++)
        {
            pairs[i] = counters[i].ToTable();
        }

        return new MatchedResults(k, pairs);
    }

    /// <summary>The share positive on one test. Undefined when there are no subjects.</summary>
    /// <param name="test">The index of the test, from 0.</param>
    /// <returns>The proportion.</returns>
    /// <exception cref="ArgumentOutOfRangeException"><paramref name="test"/> is no index of a test.</exception>
    public Proportion Positive(int test)
    {
        CheckIndex(test, nameof(test));
        return test == 0 ? _pairs[0].FirstPositive : _pairs[Index(0, test)].SecondPositive;
    }

    /// <summary>Two of the tests on each subject.</summary>
    /// <param name="first">The index of one test, from 0.</param>
    /// <param name="second">The index of another test.</param>
    /// <returns>The table, in the order of the arguments.</returns>
    /// <exception cref="ArgumentOutOfRangeException">An index is none of a test, or both are the same.</exception>
    public PairedTable Pair(int first, int second)
    {
        CheckIndex(first, nameof(first));
        CheckIndex(second, nameof(second));
        if (first == second)
        {
            throw Guard.OutOfRange(nameof(second), second, "the index of another test than the first");
        }

        return first < second ? _pairs[Index(first, second)] : _pairs[Index(second, first)].Swapped;
    }

    /// <summary>Cochran's Q test that all tests are positive in the same share of subjects.</summary>
    /// <returns>
    /// The statistic, chi-squared with one degree of freedom less than there are tests, and the p-value; undefined, with the reason, when there are no
    /// subjects. Where all tests agree on every subject p is 1 and the statistic is undefined (0/0).
    /// </returns>
    /// <remarks>For two tests it is McNemar's asymptotic test. The p-value is asymptotic. Source: Cochran, Biometrika 1950;37:256.</remarks>
    public PairedTest CochranQ() => Tables.CochranQ.Test(_pairs, Tests);

    /// <summary>McNemar's test of every pair, with p-values adjusted for their number by Holm's procedure.</summary>
    /// <param name="method">The form of McNemar's test; asymptotic without continuity correction unless said.</param>
    /// <returns>The comparisons (0, 1), (0, 2), ..., (1, 2), ...; undefined, with the reason, when there are no subjects.</returns>
    /// <exception cref="ArgumentOutOfRangeException"><paramref name="method"/> is not a value of its type.</exception>
    /// <remarks>The adjusted p-values hold the family-wise error whatever the dependence of the tests. Source: Holm, Scand J Stat 1979;6:65.</remarks>
    public IReadOnlyList<PairwiseComparison> PairwiseMcNemar(McNemarMethod method = McNemarMethod.Asymptotic)
    {
        double[] pValues = new double[_pairs.Length];
        PairedTest[] tests = new PairedTest[_pairs.Length];
        for (int i = 0; i < _pairs.Length; i++)
        {
            tests[i] = _pairs[i].McNemar(method);
            pValues[i] = tests[i].PValue.Value;
        }

        double[] adjusted = Subjects == 0 ? pValues : HolmAdjustment.Of(pValues);
        List<PairwiseComparison> comparisons = new(_pairs.Length);
        for (int i = 0; i < Tests; i++)
        {
            for (int j = i + 1; j < Tests; j++)
            {
                int pair = comparisons.Count;
                Quantity p = Subjects == 0 ? tests[pair].PValue : Quantity.Of(adjusted[pair]);
                comparisons.Add(new PairwiseComparison(i, j, _pairs[pair], tests[pair], p));
            }
        }

        return comparisons.AsReadOnly();
    }

    /// <summary>For example "3 tests on 58 subjects".</summary>
    /// <returns>The text, in the invariant culture.</returns>
    public override string ToString() => $"{Display.Of(Tests)} tests on {Display.Of(Subjects)} subjects";

    private int Index(int first, int second) => (first * ((2 * Tests) - first - 1) / 2) + second - first - 1;

    private void CheckIndex(int test, string name)
    {
        if (test < 0 || test >= Tests)
        {
            throw Guard.OutOfRange(name, test, $"an index from 0 to {Display.Of(Tests - 1)}");
        }
    }
}
