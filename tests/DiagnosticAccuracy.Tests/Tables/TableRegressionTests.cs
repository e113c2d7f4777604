using System.Numerics;

namespace DiagnosticAccuracy.Tests.Tables;

/// <summary>One test a bug, named by what went wrong.</summary>
public class TableRegressionTests
{
    [Theory]
    [InlineData(1e200)]
    [InlineData(1e-200)]
    public void F_with_an_extreme_weight_was_infinity_over_infinity(double beta)
    {
        // At the ends the F measure is the sensitivity, or the positive predictive value.
        ConfusionMatrix table = new(90, 20, 10, 180);
        double expected = beta > 1 ? 90 / 100.0 : 90 / 110.0;
        Assert.Equal(expected, table.FBeta(beta).Value, 1e-15);
        Assert.Equal(0, new ConfusionMatrix(0, 3, 0, 5).FBeta(beta).Value);
        Assert.Equal(0, new ConfusionMatrix(0, 0, 3, 5).FBeta(beta).Value);
        Assert.True(table.FBeta(beta).Interval().Contains(expected));
    }

    [Fact]
    public void Kappa_with_own_weights_was_cut_at_minus_1_though_it_can_be_less()
    {
        // Only "first high, second low" counts as disagreement: observed .1, expected by chance .01, kappa 1 - 10.
        KappaWeights weights = KappaWeights.Own([1, 1, 0, 1], 2);
        Kappa kappa = RatingTable.FromCounts([0, 90, 10, 0], 2).CohenKappa(weights);
        Assert.Equal(1 - (.1 / (.1 * .1)), kappa.Value, 1e-12);
        ConfidenceInterval interval = kappa.Interval();
        Assert.True(interval.Contains(kappa.Value), $"{interval}");
        Assert.Equal(double.NegativeInfinity, kappa.Interval(Confidence.UpperBound(0.95)).Lower);
    }

    [Fact]
    public void Kappa_of_a_rare_category_lost_digits_in_one_minus_chance()
    {
        // Unweighted, in rational arithmetic: kappa = (n sum n(ii) - sum n(i.) n(.i)) / (n^2 - sum n(i.) n(.i)).
        foreach ((long a, long b, long c, long d) in new[] { (12L, 7L, 5L, 12_000_000_000L), (3L, 1L, 2L, 900_000_000_000_000L), (40L, 9L, 6L, 45L) })
        {
            RatingTable table = RatingTable.FromCounts([a, b, c, d], 2);
            BigInteger n = a + b + c + d;
            BigInteger chance = ((BigInteger)(a + b) * (a + c)) + ((BigInteger)(c + d) * (b + d));
            double exact = Exact((n * (a + d)) - chance, (n * n) - chance);
            Assert.Equal(exact, table.CohenKappa().Value, 1e-12);

            // In the limit of a rare category the standard error is that of its specific agreement, by the delta method over a, b, c alone.
            if (d > 1000 * a)
            {
                double x = a, y = b, z = c;
                double v = 2 * x / ((2 * x) + y + z);
                double root = Math.Sqrt((Square(2 * (y + z)) * x) + (Square(2 * x) * (y + z))) / Square((2 * x) + y + z);
                Assert.Equal(v, table.CohenKappa().Value, 1e-7);
                Assert.Equal(root, table.CohenKappa().StandardError.Value, root * 1e-7);
            }
        }
    }

    [Fact]
    public void First_order_agreement_of_a_rare_category_lost_its_standard_error_to_cancellation()
    {
        // With q the rare discordant share, AC1 = 1 - q / (1 - pe), and to first order in the rare cells its variance is q / n.
        RatingTable table = RatingTable.FromCounts([12, 7, 5, 1_000_000_000_000_000], 2);
        double n = table.Total;
        Assert.Equal(Math.Sqrt(12.0) / n, table.FirstOrderAgreementCoefficient.StandardError.Value, 1e-9 * Math.Sqrt(12.0) / n);
    }

    [Fact]
    public void Negative_predictive_value_at_a_tiny_prevalence_was_said_to_have_no_results()
    {
        // 1 - 1e-20 is 1 in floating point, but those with the condition still have negative results, and all negatives are theirs.
        PredictiveValue negative = new ConfusionMatrix(5, 8, 5, 0).PredictiveValuesAt(new Prevalence(1e-20)).Negative;
        Assert.True(negative.IsDefined);
        Assert.Equal(0, negative.Value);
    }

    [Fact]
    public void Estimated_prevalence_with_only_positive_results_named_the_log_method_though_the_score_method_was_used()
    {
        EstimatedPredictiveValue value = new ConfusionMatrix(5, 9, 0, 0).PredictiveValuesAtEstimated(new Proportion(3, 40)).Positive;
        Assert.Contains("score (Koopman)", value.Interval().Method, StringComparison.Ordinal);
    }

    [Fact]
    public void Pooled_ratio_of_strata_in_which_every_result_is_positive_was_stated_with_certainty()
    {
        StratifiedTables strata = StratifiedTables.Create([new(5, 4, 0, 0), new(3, 6, 0, 0)]);
        Assert.Equal(1, strata.PositiveLikelihoodRatio.Value);
        ConfidenceInterval interval = strata.PositiveLikelihoodRatio.Interval();
        Assert.True(interval.Lower < 0.9 && interval.Upper > 1.1, $"{interval}");
    }

    [Fact]
    public void Pooled_ratios_without_a_false_positive_had_no_lower_limit()
    {
        StratifiedTables strata = StratifiedTables.Create([new(50, 0, 5, 90), new(30, 0, 4, 60)]);
        Assert.Equal(double.PositiveInfinity, strata.PositiveLikelihoodRatio.Value);
        ConfidenceInterval interval = strata.PositiveLikelihoodRatio.Interval();
        Assert.Equal(double.PositiveInfinity, interval.Upper);
        Assert.InRange(interval.Lower, 20, 100);
        interval = strata.DiagnosticOddsRatio.Interval();
        Assert.Equal(double.PositiveInfinity, interval.Upper);
        Assert.InRange(interval.Lower, 50, 1000);
    }

    [Fact]
    public void Stratified_proportion_did_not_equal_itself_and_gave_the_wrong_reason()
    {
        StratifiedTables strata = StratifiedTables.Create([new(0, 4, 0, 9), new(0, 6, 0, 3)]);
        Assert.Equal(strata.Specificity(), strata.Specificity());
        Assert.Equal(strata.Specificity().GetHashCode(), strata.Specificity().GetHashCode());
        Assert.NotEqual(strata.Specificity(), strata.Specificity(StratumWeighting.Equal));
        Assert.Equal(UndefinedCause.NoSubjectsWithCondition, strata.Sensitivity().WhyUndefined?.Cause);
    }

    [Fact]
    public void Breslow_day_at_a_tiny_odds_ratio_differed_from_the_same_table_seen_from_the_other_side()
    {
        // Positive and negative exchanged: the odds ratio is inverted, the test is the same.
        ConfusionMatrix[] tables = [new(1, 100_000_000, 100_000_000, 1), new(2, 5, 3, 1), new(1, 9, 3, 1)];
        StratifiedTables strata = StratifiedTables.Create(tables);
        StratifiedTables mirrored = StratifiedTables.Create(tables.Select(t => new ConfusionMatrix(t.FalseNegatives, t.TrueNegatives, t.TruePositives, t.FalsePositives)));
        double expected = mirrored.OddsRatioHomogeneity.Statistic.Value;
        Assert.Equal(expected, strata.OddsRatioHomogeneity.Statistic.Value, 1e-9 * expected);
    }

    [Fact]
    public void Weights_for_another_number_of_categories_blamed_an_argument_that_the_caller_did_not_give() =>
        Assert.Equal("weights", Assert.Throws<ArgumentException>(() =>
            RatingTable.FromCounts([1, 2, 3, 4], 2).CohenKappa(KappaWeights.Own([1, 0, 0, 0, 1, 0, 0, 0, 1], 3))).ParamName);

    [Fact]
    public void Ties_of_expected_cells_hung_on_the_binary_digits_of_the_prevalence()
    {
        // A perfect test: 10 people at 5, 15, 25, 35 and 45 % leave halves with and without the condition. Equal fractions go to the true positives first.
        ConfusionMatrix perfect = new(7, 0, 0, 9);
        foreach (double prevalence in new[] { .05, .15, .25, .35, .45, .55, .65, .75, .85, .95 })
        {
            long with = (long)Math.Floor(prevalence * 10 + 1e-9) + 1;
            Assert.Equal(with, perfect.ExpectedFor(10, new Prevalence(prevalence)).TruePositives);
        }
    }

    private static double Exact(BigInteger numerator, BigInteger denominator) =>
        (double)(long)(numerator * 1_000_000_000_000_000_000 / denominator) / 1e18;

    private static double Square(double x) => x * x;
}
