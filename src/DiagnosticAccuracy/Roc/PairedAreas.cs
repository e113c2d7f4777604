using DiagnosticAccuracy.Numerics;
using DiagnosticAccuracy.Roc;

namespace DiagnosticAccuracy;

/// <summary>The areas of two or more tests on the same subjects, with their covariance matrix.</summary>
/// <remarks>Source: DeLong, DeLong and Clarke-Pearson, Biometrics 1988;44:837.</remarks>
public sealed class PairedAreas
{
    private readonly PairedScores _scores;
    private readonly double[][]? _covariance;

    private PairedAreas(PairedScores scores)
    {
        _scores = scores;
        int tests = scores.TestCount;
        AreaUnderCurve[] areas = new AreaUnderCurve[tests];
        for (int i = 0; i < tests; i++)
        {
            areas[i] = TestPlacements(i).Area;
        }

        Areas = Array.AsReadOnly(areas);
        WhyUndefined = areas[0].Variance.WhyUndefined;
        if (WhyUndefined is null)
        {
            _covariance = new double[tests][];
            for (int i = 0; i < tests; i++)
            {
                _covariance[i] = new double[tests];
                for (int j = 0; j <= i; j++)
                {
                    double value = i == j ? areas[i].Variance.Value : Placements.Covariance(TestPlacements(i), TestPlacements(j));
                    _covariance[i][j] = value;
                    _covariance[j][i] = value;
                }
            }
        }
    }

    /// <summary>Gets the areas, in the order of the tests.</summary>
    public IReadOnlyList<AreaUnderCurve> Areas { get; }

    /// <summary>Gets the names of the tests.</summary>
    public IReadOnlyList<string> Names => _scores.Names;

    /// <summary>Gets why there are no variances (an empty group, or one subject in it); null when there are.</summary>
    public UndefinedReason? WhyUndefined { get; }

    /// <summary>The areas of all tests.</summary>
    /// <param name="scores">The scores.</param>
    /// <returns>The areas with their covariances.</returns>
    /// <exception cref="ArgumentNullException"><paramref name="scores"/> is null.</exception>
    public static PairedAreas Of(PairedScores scores)
    {
        Guard.NotNull(scores);
        return new PairedAreas(scores);
    }

    /// <summary>The covariance of two areas; of an area with itself its variance.</summary>
    /// <param name="first">A test, from 0.</param>
    /// <param name="second">A test, from 0.</param>
    /// <returns>The covariance; undefined when the areas have no variances.</returns>
    /// <exception cref="ArgumentOutOfRangeException">There is no such test.</exception>
    public Quantity Covariance(int first, int second)
    {
        _ = _scores.PlacementsOf(first, nameof(first));
        _ = _scores.PlacementsOf(second, nameof(second));
        return _covariance is { } covariance ? Quantity.Of(covariance[first][second]) : Quantity.Undefined(WhyUndefined!);
    }

    /// <summary>Two of the tests set against each other.</summary>
    /// <param name="first">A test, from 0.</param>
    /// <param name="second">Another test, from 0.</param>
    /// <returns>The comparison, first minus second.</returns>
    /// <exception cref="ArgumentOutOfRangeException">There is no such test.</exception>
    public AreaComparison Compare(int first, int second) =>
        RocComparison.PairedPlacements(_scores.PlacementsOf(first, nameof(first)), _scores.PlacementsOf(second, nameof(second)));

    /// <summary>The test that all areas are equal.</summary>
    /// <returns>The test, with one degree of freedom fewer than tests unless the covariance is short of rank.</returns>
    public ContrastTest TestOfEquality()
    {
        int tests = Areas.Count;
        double[] coefficients = new double[(tests - 1) * tests];
        for (int i = 0; i < tests - 1; i++)
        {
            coefficients[i * tests] = 1;
            coefficients[(i * tests) + i + 1] = -1;
        }

        return TestOfContrasts(coefficients, tests - 1);
    }

    /// <summary>The test that stated contrasts of the areas are zero.</summary>
    /// <param name="coefficients">The coefficients, contrast by contrast, one a test; finite; those of a contrast add up to 0.</param>
    /// <param name="contrasts">How many contrasts there are, 1 or more.</param>
    /// <returns>
    /// The test, by a generalised inverse where the contrasts depend on each other. Undefined when the areas have no variances, when the
    /// estimated variance of every contrast is zero, and when a contrast differs from zero in a direction in which the estimated variance is zero.
    /// </returns>
    /// <exception cref="ArgumentException">The number of coefficients is not contrasts times tests, or those of a contrast do not add up to 0.</exception>
    /// <exception cref="ArgumentOutOfRangeException">A coefficient is not finite, or there are no contrasts.</exception>
    public ContrastTest TestOfContrasts(ReadOnlySpan<double> coefficients, int contrasts)
    {
        int tests = Areas.Count;
        Guard.AtLeast(contrasts, 1);
        Guard.SameLength(coefficients.Length, checked(contrasts * tests), nameof(coefficients), "contrasts times tests");
        double[][] rows = new double[contrasts][];
        for (int c = 0; c < contrasts; c++)
        {
            rows[c] = coefficients.Slice(c * tests, tests).ToArray();
            CheckContrast(rows[c], c);
        }

        if (_covariance is not { } covariance)
        {
            return new ContrastTest(Quantity.Undefined(WhyUndefined!), 0);
        }

        double[] values = new double[contrasts];
        double[][] spread = new double[contrasts][];
        for (int c = 0; c < contrasts; c++)
        {
            spread[c] = new double[contrasts];
            for (int d = 0; d < contrasts; d++)
            {
                for (int i = 0; i < tests; i++)
                {
                    for (int j = 0; j < tests; j++)
                    {
                        spread[c][d] += rows[c][i] * covariance[i][j] * rows[d][j];
                    }
                }
            }

            for (int i = 0; i < tests; i++)
            {
                values[c] += rows[c][i] * Areas[i].Value;
            }
        }

        double scale = covariance.Select((row, i) => row[i]).Max();
        if (spread.Select((row, i) => row[i]).Max() <= 1e-14 * scale || scale == 0)
        {
            return new ContrastTest(Quantity.Undefined(AreaDifference.ZeroVariance), 0);
        }

        InverseForm form = SymmetricMatrix.InverseForm(spread, values);
        return form.InRange
            ? new ContrastTest(Quantity.Of(form.Value), form.Rank)
            : new ContrastTest(
                Quantity.Undefined(UndefinedCause.ZeroVariance, "a contrast differs from zero where its estimated variance is zero"), form.Rank);
    }

    /// <summary>Intervals of all pairwise differences that hold together.</summary>
    /// <param name="confidence">The joint level, and the side; two-sided 95 % unless said.</param>
    /// <param name="method">The method; Bonferroni unless said.</param>
    /// <returns>One interval for each pair of tests (0-1, 0-2, ..., 1-2, ...), first minus second, each cut at -1 and 1.</returns>
    /// <exception cref="ArgumentOutOfRangeException"><paramref name="method"/> is not a value of its type.</exception>
    public IReadOnlyList<PairwiseAreaDifference> SimultaneousDifferences(
        Confidence confidence = default, SimultaneousMethod method = SimultaneousMethod.Bonferroni)
    {
        if (method is not (SimultaneousMethod.Bonferroni or SimultaneousMethod.Scheffe))
        {
            throw Guard.UnknownOption(method);
        }

        int tests = Areas.Count;
        int pairs = tests * (tests - 1) / 2;
        double critical = method == SimultaneousMethod.Bonferroni
            ? StandardNormal.UpperQuantile(confidence.Tail / pairs)
            : Math.Sqrt(ChiSquared.UpperQuantile(confidence.ErrorProbability, Math.Max(1, TestOfEquality().DegreesOfFreedom)));
        string name = (method == SimultaneousMethod.Bonferroni ? "Bonferroni" : "Scheffe") + ", DeLong variance";
        List<PairwiseAreaDifference> all = [];
        for (int i = 0; i < tests; i++)
        {
            for (int j = i + 1; j < tests; j++)
            {
                AreaDifference difference = Compare(i, j).Difference;
                all.Add(new PairwiseAreaDifference(i, j, difference, difference.Interval(critical, confidence, name)));
            }
        }

        return all.AsReadOnly();
    }

    /// <summary>Name and area of each test.</summary>
    /// <returns>The text, in the invariant culture.</returns>
    public override string ToString() => string.Join("; ", Areas.Select((area, i) => $"{Names[i]} {Display.Of(area)}"));

    private Placements TestPlacements(int test) => _scores.PlacementsOf(test, nameof(test));

    private static void CheckContrast(double[] row, int contrast)
    {
        double sum = 0;
        double size = 0;
        foreach (double coefficient in row)
        {
            Guard.Finite(coefficient, "coefficients");
            sum += coefficient;
            size = Math.Max(size, Math.Abs(coefficient));
        }

        if (Math.Abs(sum) > 1e-12 * size || size == 0)
        {
            throw new ArgumentException(
                $"coefficients of contrast {Display.Of(contrast)} add up to {Display.Exact(sum)} and the largest is {Display.Exact(size)}; allowed are sums of 0 with one that is not 0.",
                nameof(row));
        }
    }
}
