using DiagnosticAccuracy.Tests.Contracts;
using DiagnosticAccuracy.Tests.Data;

namespace DiagnosticAccuracy.Tests.Tables;

public class MeasureTests
{
    private static readonly ConfusionMatrix Example = new(90, 20, 10, 180);

    /// <summary>Computed by hand for this project (grade R, Data/README.md).</summary>
    [Fact]
    public void Measures_of_the_worked_example()
    {
        Assert.Equal(.78259, Example.MatthewsCorrelation.Value, 5e-6);
        Assert.Equal(.78049, Example.CohenKappa.Value, 5e-6);
        Assert.Equal(.85714, Example.F1.Value, 5e-6);
        Assert.Equal(.9, Example.BalancedAccuracy.Value, 1e-15);
        Assert.Equal(new Proportion(20, 110), Example.CohortPredictiveValues.FalseDiscoveryRate);
        Assert.Equal(new Proportion(10, 190), Example.CohortPredictiveValues.FalseOmissionRate);
    }

    [Fact]
    public void Every_table_of_up_to_30_subjects_answers_or_says_why_not()
    {
        Confidence wider = Confidence.TwoSided(0.99);
        foreach (ConfusionMatrix table in ConfusionMatrixTests.TablesOf(30))
        {
            IIntervalQuantity[] quantities =
            [
                table.BalancedAccuracy, table.MatthewsCorrelation, table.F1, table.FBeta(2), table.CohenKappa,
                table.PredictiveValuesAtEstimated(new Proportion(3, 40)).Positive,
                table.PredictiveValuesAtEstimated(new Proportion(0, 40)).Positive,
                table.PredictiveValuesAtEstimated(new Proportion(3, 40)).Negative,
                table.PredictiveValuesAtEstimated(new Proportion(40, 40)).Negative,
                new AgreementTable(table.TruePositives, table.FalsePositives, table.FalseNegatives, table.TrueNegatives).OverallPercentAgreement,
                RatingTable.FromCounts([table.TruePositives, table.FalsePositives, table.FalseNegatives, table.TrueNegatives], 2).FirstOrderAgreementCoefficient,
                RatingTable.FromCounts([table.TruePositives, table.FalsePositives, table.FalseNegatives, table.TrueNegatives], 2).ScottPi,
                RatingTable.FromCounts([table.TruePositives, table.FalsePositives, table.FalseNegatives, table.TrueNegatives], 2).PrevalenceAndBiasAdjustedKappa,
            ];
            foreach (IIntervalQuantity quantity in quantities)
            {
                ShapeOfTypesTests.AssertCoherent(quantity);
                ConfidenceInterval interval = quantity.Interval();
                Holds(quantity.IsDefined || !interval.IsDefined, table, quantity, interval);
                Assert.Equal(interval.IsDefined, interval.WhyUndefined is null);
                if (interval.IsDefined)
                {
                    Holds(interval.Contains(quantity.Value), table, quantity, interval);
                    ConfidenceInterval wide = quantity.Interval(wider);
                    Holds(wide.Lower <= interval.Lower + 1e-15 && interval.Upper <= wide.Upper + 1e-15, table, quantity, wide);
                    Assert.InRange(interval.Lower, -1, 1);
                    Assert.InRange(interval.Upper, -1, 1);
                }
            }

            JointAccuracyRegion region = table.JointRegion();
            Assert.Equal(table.WithCondition > 0 && table.WithoutCondition > 0, region.IsDefined);
            if (region.IsDefined)
            {
                Assert.True(region.Contains(table.Sensitivity.Value, table.Specificity.Value));
            }
        }
    }

    /// <summary>
    /// The delta method from numerical derivatives over the cells, an independent route to the standard errors of phi, AC1 and kappa.
    /// </summary>
    [Theory]
    [InlineData(90, 20, 10, 180)]
    [InlineData(5, 2, 3, 7)]
    [InlineData(40, 9, 6, 45)]
    public void Standard_errors_are_those_of_the_delta_method(long tp, long fp, long fn, long tn)
    {
        double[] cells = [tp, fp, fn, tn];
        RatingTable table = RatingTable.FromCounts([tp, fp, fn, tn], 2);
        Assert.Equal(DeltaError(cells, KappaOf), table.CohenKappa().StandardError.Value, 1e-7);
        Assert.Equal(DeltaError(cells, ScottOf), table.ScottPi.StandardError.Value, 1e-7);
        Assert.Equal(ScottOf(cells), table.ScottPi.Value, 1e-12);
        Assert.Equal(DeltaError(cells, FirstOrderOf), table.FirstOrderAgreementCoefficient.StandardError.Value, 1e-7);
        Assert.Equal(KappaOf(cells), table.CohenKappa().Value, 1e-12);
        Assert.Equal(FirstOrderOf(cells), table.FirstOrderAgreementCoefficient.Value, 1e-12);

        MatthewsCorrelation phi = new ConfusionMatrix(tp, fp, fn, tn).MatthewsCorrelation;
        Assert.Equal(PhiOf(cells), phi.Value, 1e-12);
        double margin = 1.959963984540054 * DeltaError(cells, PhiOf);
        Assert.Equal(phi.Value - margin, phi.Interval(default, MatthewsMethod.Delta).Lower, 1e-6);
        Assert.Equal(
            Math.Tanh(Math.Atanh(phi.Value) + (margin / (1 - (phi.Value * phi.Value)))), phi.Interval().Upper, 1e-6);

        // F with beta 2 on the logit scale.
        FMeasure f = new ConfusionMatrix(tp, fp, fn, tn).FBeta(2);
        double LogitF(double[] c) => Math.Log(5 * c[0] / ((4 * c[2]) + c[1]));
        double limit = LogitF(cells) + (1.959963984540054 * DeltaError(cells, LogitF));
        Assert.Equal(1 / (1 + Math.Exp(-limit)), f.Interval().Upper, 1e-6);
    }

    [Fact]
    public void Products_of_huge_cells_do_not_overflow_or_cancel()
    {
        // One in 1e15 off independence: the difference of products is 1e15, of products near 1e30.
        long big = 1_000_000_000_000_000;
        MatthewsCorrelation phi = new ConfusionMatrix(big + 1, big, big, big).MatthewsCorrelation;
        Assert.Equal(2.5e-16, phi.Value, 1e-19);
    }

    [Fact]
    public void Joint_region_covers_jointly_by_enumeration()
    {
        // With Clopper-Pearson sides the product of the exact coverages cannot be below the level.
        Confidence joint = Confidence.TwoSided(0.9);
        foreach ((int n1, int n0, double p1, double p0) in new[] { (12, 15, 0.8, 0.9), (7, 30, 0.95, 0.6), (20, 20, 0.99, 0.99) })
        {
            double covered = 0;
            for (int x1 = 0; x1 <= n1; x1++)
            {
                for (int x0 = 0; x0 <= n0; x0++)
                {
                    ConfusionMatrix table = new(x1, n0 - x0, n1 - x1, x0);
                    covered += table.JointRegion(joint, ProportionMethod.ClopperPearson).Contains(p1, p0) ? Binomial(x1, n1, p1) * Binomial(x0, n0, p0) : 0;
                }
            }

            Assert.InRange(covered, 0.9, 1);
        }

        // With other sides it is the product of their exact coverages, which may be below the level.
        (int with, int without, double sensitivity, double specificity) = (12, 15, 0.8, 0.93);
        double wilson = 0;
        for (int x1 = 0; x1 <= with; x1++)
        {
            for (int x0 = 0; x0 <= without; x0++)
            {
                bool inside = new ConfusionMatrix(x1, without - x0, with - x1, x0).JointRegion(joint).Contains(sensitivity, specificity);
                wilson += inside ? Binomial(x1, with, sensitivity) * Binomial(x0, without, specificity) : 0;
            }
        }

        Confidence side = Example.JointRegion(joint).Specificity.Confidence;
        double product = IntervalCoverage.At(ProportionMethod.Wilson, with, sensitivity, side) * IntervalCoverage.At(ProportionMethod.Wilson, without, specificity, side);
        Assert.Equal(product, wilson, 1e-12);

        // 1 - sqrt(.9) on each side.
        Assert.Equal(1 - Math.Sqrt(.9), Example.JointRegion(joint).Sensitivity.Confidence.ErrorProbability, 1e-15);
    }

    [Fact]
    public void An_estimated_prevalence_widens_the_interval_and_a_huge_sample_of_it_does_not()
    {
        ConfidenceInterval known = Example.PredictiveValuesAt(new Prevalence(0.05)).Positive.Interval();
        ConfidenceInterval estimated = Example.PredictiveValuesAtEstimated(new Proportion(5, 100)).Positive.Interval();
        ConfidenceInterval nearlyKnown = Example.PredictiveValuesAtEstimated(new Proportion(50_000_000_000, 1_000_000_000_000)).Positive.Interval();
        Assert.True(estimated.Lower < known.Lower && known.Upper < estimated.Upper);
        Assert.Equal(known.Lower, nearlyKnown.Lower, 1e-6);
        Assert.Equal(known.Upper, nearlyKnown.Upper, 1e-6);
    }

    [Fact]
    public void An_estimated_prevalence_covers_in_simulation()
    {
        // Seeded; 4,000 studies, so the Monte-Carlo standard error at 95 % is .0034: three of them below and above.
        Random random = new(7);
        const double sensitivity = 0.9, specificity = 0.85, prevalence = 0.1;
        double truth = sensitivity * prevalence / ((sensitivity * prevalence) + ((1 - specificity) * (1 - prevalence)));
        int covered = 0;
        for (int i = 0; i < 4000; i++)
        {
            int tp = Draw(random, 60, sensitivity);
            int tn = Draw(random, 90, specificity);
            Proportion estimate = new(Draw(random, 200, prevalence), 200);
            covered += new ConfusionMatrix(tp, 90 - tn, 60 - tp, tn).PredictiveValuesAtEstimated(estimate).Positive.Interval().Contains(truth) ? 1 : 0;
        }

        Assert.InRange(covered / 4000.0, 0.94, 0.965);
    }

    [Fact]
    public void A_series_of_prevalences_gives_a_curve()
    {
        IReadOnlyList<PredictiveValues> curve = Example.PredictiveValuesOver([new Prevalence(0), new Prevalence(0.05), new Prevalence(1)]);
        Assert.Equal([0, 0.05, 1], curve.Select(v => v.Prevalence.Value));
        Assert.Equal(0, curve[0].Positive.Value);
        Assert.Equal(1, curve[2].Positive.Value);
        Assert.Equal(Example.PredictiveValuesAt(new Prevalence(0.05)), curve[1]);
        Assert.Throws<ArgumentNullException>(() => Example.PredictiveValuesOver(null!));
    }

    /// <summary>Predictive values of Vecchio, NEJM 1966;274:1171, and the problems of Eddy 1982 and Casscells 1978 (grade M).</summary>
    [Fact]
    public void Classic_predictive_values()
    {
        System.Text.Json.JsonElement expected = ReferenceData.Json("bayes-and-bias.json");
        ConfusionMatrix ninetyFive = new(95, 5, 5, 95);
        foreach (System.Text.Json.JsonProperty entry in expected.GetProperty("vecchio_table_95_95").EnumerateObject())
        {
            Prevalence prevalence = new(double.Parse(entry.Name, System.Globalization.CultureInfo.InvariantCulture));
            Assert.Equal(entry.Value.GetDouble(), ninetyFive.PredictiveValuesAt(prevalence).Positive.Value, 1e-12);
        }

        // Sensitivity 79 %, false positives 9.6 %, prevalence 1 %, printed as .077 (from memory). The reference file has 1/13 = .07692, which these
        // numbers do not give (.00790 / .10294 = .07674): it is 8/(8 + 96), the same problem in rounded counts of a thousand. The print tells nothing between them.
        double eddy = new ConfusionMatrix(790, 96, 210, 904).PredictiveValuesAt(new Prevalence(.01)).Positive.Value;
        Assert.Equal(.0079 / .10294, eddy, 1e-12);
        Assert.Equal(.077, eddy, 5e-4);
        Assert.Equal(.077, expected.GetProperty("eddy1982").GetDouble(), 5e-4);

        // Sensitivity 1, false positives 5 %, one in a thousand.
        Assert.Equal(expected.GetProperty("casscells1978").GetDouble(), new ConfusionMatrix(100, 5, 0, 95).PredictiveValuesAt(new Prevalence(.001)).Positive.Value, 1e-12);
    }

    [Fact]
    public void Agreement_without_a_reference_has_both_directions_and_no_sensitivity()
    {
        AgreementTable table = new(40, 5, 10, 45);
        Assert.Equal(new Proportion(40, 50), table.PositivePercentAgreement);
        Assert.Equal(new Proportion(45, 50), table.NegativePercentAgreement);
        Assert.Equal(new Proportion(85, 100), table.OverallPercentAgreement);
        Assert.Equal(new Proportion(40, 45), table.Swapped.PositivePercentAgreement);
        Assert.Equal(new Proportion(45, 55), table.Swapped.NegativePercentAgreement);
        Assert.Equal(table, table.Swapped.Swapped);
        Assert.Equal("no result of the comparator is positive", new AgreementTable(0, 3, 0, 4).PositivePercentAgreement.WhyUndefined?.Explanation);
        Assert.DoesNotContain(typeof(AgreementTable).GetMembers(), m => m.Name.Contains("Sensitivity", StringComparison.Ordinal) || m.Name.Contains("Specificity", StringComparison.Ordinal));
        Assert.Equal("comparatorOnlyPositive", Assert.Throws<ArgumentOutOfRangeException>(() => new AgreementTable(0, 0, -1, 0)).ParamName);
        Assert.Equal(table.OverallPercentAgreement, table.ToRatingTable().ObservedAgreement);
    }

    [Fact]
    public void Bad_input_is_refused_by_name()
    {
        Assert.Equal("beta", Assert.Throws<ArgumentOutOfRangeException>(() => Example.FBeta(0)).ParamName);
        Assert.Equal("beta", Assert.Throws<ArgumentOutOfRangeException>(() => Example.FBeta(double.NaN)).ParamName);
        Assert.Equal("counts", Assert.Throws<ArgumentException>(() => RatingTable.FromCounts([1, 2, 3], 2)).ParamName);
        Assert.Contains("counts[1] is -2", Assert.Throws<ArgumentOutOfRangeException>(() => RatingTable.FromCounts([1, -2, 3, 4], 2)).Message, StringComparison.Ordinal);
        Assert.Equal("categories", Assert.Throws<ArgumentOutOfRangeException>(() => RatingTable.FromCounts([1], 1)).ParamName);
        RatingTable table = RatingTable.FromCounts([1, 2, 3, 4], 2);
        Assert.Equal("first", Assert.Throws<ArgumentOutOfRangeException>(() => table[2, 0]).ParamName);
        Assert.Equal("category", Assert.Throws<ArgumentOutOfRangeException>(() => table.BiasIndex(2)).ParamName);
        Assert.Contains("1 on the diagonal", Assert.Throws<ArgumentOutOfRangeException>(() => KappaWeights.Own([1, 0, 0, 0.5], 2)).Message, StringComparison.Ordinal);
        Assert.Contains("at most 1", Assert.Throws<ArgumentOutOfRangeException>(() => KappaWeights.Own([1, 2, 0, 1], 2)).Message, StringComparison.Ordinal);
        Assert.Throws<ArgumentException>(() => table.CohenKappa(KappaWeights.Own([1, 0, 0, 0, 1, 0, 0, 0, 1], 3)));
        Assert.Throws<ArgumentException>(() => StratifiedTables.Create([]));
        Assert.Throws<ArgumentException>(() => MultipleRaters.FromCounts([2, 1, 1, 1], 2));
        Assert.Equal("weighting", Assert.Throws<ArgumentOutOfRangeException>(() => StratifiedTables.Create([Example]).Sensitivity((StratumWeighting)9)).ParamName);
    }

    // The message is made on failure only: there are a million of these.
    internal static void Holds(bool condition, ConfusionMatrix table, IIntervalQuantity quantity, ConfidenceInterval interval)
    {
        if (!condition)
        {
            Assert.Fail($"{table}: {quantity} {interval}");
        }
    }

    private static double DeltaError(double[] cells, Func<double[], double> statistic)
    {
        double n = cells.Sum();
        double[] slopes = new double[cells.Length];
        for (int i = 0; i < cells.Length; i++)
        {
            double step = n * 1e-5;
            double[] up = [.. cells];
            double[] down = [.. cells];
            up[i] += step;
            down[i] -= step;
            slopes[i] = (statistic(up) - statistic(down)) / (2 * step) * n;
        }

        double mean = cells.Zip(slopes, (c, s) => c / n * s).Sum();
        return Math.Sqrt(cells.Zip(slopes, (c, s) => c / n * s * s).Sum() - (mean * mean)) / Math.Sqrt(n);
    }

    private static double KappaOf(double[] c)
    {
        double n = c.Sum();
        double expected = (((c[0] + c[1]) * (c[0] + c[2])) + ((c[2] + c[3]) * (c[1] + c[3]))) / (n * n);
        return (((c[0] + c[3]) / n) - expected) / (1 - expected);
    }

    private static double ScottOf(double[] c)
    {
        double n = c.Sum();
        double p = ((2 * c[0]) + c[1] + c[2]) / (2 * n);
        double expected = (p * p) + ((1 - p) * (1 - p));
        return (((c[0] + c[3]) / n) - expected) / (1 - expected);
    }

    private static double FirstOrderOf(double[] c)
    {
        double n = c.Sum();
        double p = ((2 * c[0]) + c[1] + c[2]) / (2 * n);
        double expected = 2 * p * (1 - p);
        return (((c[0] + c[3]) / n) - expected) / (1 - expected);
    }

    private static double PhiOf(double[] c) =>
        ((c[0] * c[3]) - (c[1] * c[2])) / Math.Sqrt((c[0] + c[1]) * (c[2] + c[3]) * (c[0] + c[2]) * (c[1] + c[3]));

    private static double Binomial(int x, int n, double p)
    {
        double value = 1;
        for (int i = 1; i <= x; i++)
        {
            value *= (n - x + i) / (double)i * p;
        }

        return value * Math.Pow(1 - p, n - x);
    }

    private static int Draw(Random random, int n, double p) => Enumerable.Range(0, n).Count(_ => random.NextDouble() < p);
}
