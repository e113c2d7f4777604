using System.Text.Json;
using DiagnosticAccuracy.Tests.Contracts;
using DiagnosticAccuracy.Tests.Data;

namespace DiagnosticAccuracy.Tests.Tables;

/// <summary>Against statsmodels and SciPy (grade R): Data/tables/strata.json and the script that made it.</summary>
public class StrataTests
{
    private static readonly JsonElement Expected = ReferenceData.Json(Path.Combine("tables", "strata.json"));
    private static readonly JsonElement Limits = ReferenceData.Json(Path.Combine("tables", "strata-limits.json"));

    [Fact]
    public void Pooled_ratios_and_homogeneity()
    {
        int sets = 0;
        foreach (JsonElement set in Expected.GetProperty("strata").EnumerateArray())
        {
            StratifiedTables strata = StratifiedTables.Create(set.GetProperty("tables").EnumerateArray().Select(t => new ConfusionMatrix(
                t[0].GetInt64(), t[1].GetInt64(), t[2].GetInt64(), t[3].GetInt64())));
            Close(set, "dor", strata.DiagnosticOddsRatio.Value);
            Close(set, "dor_log_se", strata.DiagnosticOddsRatio.LogStandardError.Value);
            Close(set, "dor_lower", strata.DiagnosticOddsRatio.Interval().Lower);
            Close(set, "dor_upper", strata.DiagnosticOddsRatio.Interval().Upper);
            Close(set, "lr_positive", strata.PositiveLikelihoodRatio.Value);
            Close(set, "breslow_day_tarone", strata.OddsRatioHomogeneity.Statistic.Value);

            // The reference takes this p-value as one minus the distribution function, so it is right to 1e-15 only.
            Assert.Equal(set.GetProperty("breslow_day_p").GetDouble(), strata.OddsRatioHomogeneity.PValue.Value, 1e-12);
            Close(set, "sensitivity_chi2", strata.SensitivityHomogeneity.Statistic.Value);
            Close(set, "sensitivity_p", strata.SensitivityHomogeneity.PValue.Value);
            Close(set, "specificity_chi2", strata.SpecificityHomogeneity.Statistic.Value);
            Close(set, "specificity_p", strata.SpecificityHomogeneity.PValue.Value);
            sets++;
        }

        Assert.Equal(3, sets);
    }

    [Fact]
    public void Pooled_odds_ratio_and_negative_ratio_agree_with_a_second_implementation()
    {
        foreach (JsonElement set in Limits.GetProperty("ordinary").EnumerateArray())
        {
            StratifiedTables strata = Strata(set);
            JsonElement odds = set.GetProperty("odds");
            ConfidenceInterval interval = strata.DiagnosticOddsRatio.Interval();
            Near(odds[0].GetDouble(), strata.DiagnosticOddsRatio.Value, 1e-12);
            Near(odds[1].GetDouble(), interval.Lower, 1e-12);
            Near(odds[2].GetDouble(), interval.Upper, 1e-12);
            Near(set.GetProperty("lr_negative").GetDouble(), strata.NegativeLikelihoodRatio.Value, 1e-12);
        }
    }

    /// <summary>No false positive in any stratum; and the same tables turned round, where the ratios are zero.</summary>
    [Fact]
    public void Limits_with_an_empty_side()
    {
        foreach (JsonElement set in Limits.GetProperty("empty").EnumerateArray())
        {
            StratifiedTables strata = Strata(set);
            ConfidenceInterval odds = strata.DiagnosticOddsRatio.Interval();
            Near(set.GetProperty("odds_product").GetDouble(), odds.Lower, 1e-9);
            Assert.Contains("exact conditional", odds.Method, StringComparison.Ordinal);
            if (set.GetProperty("odds_exact").ValueKind != JsonValueKind.Null)
            {
                // The root of the other implementation stops at 1.2e-4 on the scale of the inverse, about 3 % here at most.
                Near(set.GetProperty("odds_exact").GetDouble(), odds.Lower, 0.03);
            }

            ConfidenceInterval ratio = strata.PositiveLikelihoodRatio.Interval();
            Near(set.GetProperty("lr_positive_lower").GetDouble(), ratio.Lower, 1e-9);
            Assert.Equal(double.PositiveInfinity, ratio.Upper);
            Assert.Contains("stratified score", ratio.Method, StringComparison.Ordinal);

            // Condition exchanged: the inverse ratios. Result exchanged: the inverse odds ratio, and the other likelihood ratio.
            StratifiedTables turned = Map(strata, t => new(t.FalsePositives, t.TruePositives, t.TrueNegatives, t.FalseNegatives));
            Assert.Equal(0, turned.PositiveLikelihoodRatio.Value);
            Near(1 / ratio.Lower, turned.PositiveLikelihoodRatio.Interval().Upper, 1e-9);
            Near(1 / odds.Lower, turned.DiagnosticOddsRatio.Interval().Upper, 1e-9);
            StratifiedTables negative = Map(strata, t => new(t.FalseNegatives, t.TrueNegatives, t.TruePositives, t.FalsePositives));
            Near(ratio.Lower, negative.NegativeLikelihoodRatio.Interval().Lower, 1e-9);
            Near(1 / odds.Lower, negative.DiagnosticOddsRatio.Interval().Upper, 1e-9);

            // A one-sided bound at the tail of the two-sided interval is its limit.
            Near(odds.Lower, strata.DiagnosticOddsRatio.Interval(Confidence.LowerBound(0.975)).Lower, 1e-12);
            Assert.Equal(0, strata.PositiveLikelihoodRatio.Interval(Confidence.UpperBound(0.95)).Lower);
        }

        JsonElement alike = Limits.GetProperty("all_positive");
        ConfidenceInterval around = Strata(alike).PositiveLikelihoodRatio.Interval();
        Near(alike.GetProperty("lower").GetDouble(), around.Lower, 1e-9);
        Near(alike.GetProperty("upper").GetDouble(), around.Upper, 1e-9);
    }

    /// <summary>With one stratum the limits are those of the table: Koopman's, and the exact conditional one.</summary>
    [Theory]
    [InlineData(12, 0, 3, 20)]
    [InlineData(12, 0, 0, 20)]
    [InlineData(0, 7, 9, 20)]
    [InlineData(120_000, 0, 30_000, 2_000_000)]
    [InlineData(1_000_000_000, 0, 5, 1_000_000_000)]
    public void One_stratum_with_an_empty_cell_has_the_limits_of_its_table(long tp, long fp, long fn, long tn)
    {
        ConfusionMatrix table = new(tp, fp, fn, tn);
        StratifiedTables one = StratifiedTables.Create([table]);
        foreach (Confidence confidence in new[] { Confidence.TwoSided(.95), Confidence.TwoSided(.999999), Confidence.LowerBound(.9), Confidence.UpperBound(.99) })
        {
            ConfidenceInterval expected = table.PositiveLikelihoodRatio.Interval(confidence, RatioMethod.Koopman);
            ConfidenceInterval actual = one.PositiveLikelihoodRatio.Interval(confidence);
            Near(expected.Lower, actual.Lower, 1e-9);
            Near(expected.Upper, actual.Upper, 1e-9);
            expected = table.DiagnosticOddsRatio.Interval(confidence, OddsRatioMethod.ExactConditional);
            actual = one.DiagnosticOddsRatio.Interval(confidence);
            Near(expected.Lower, actual.Lower, 1e-9);
            Near(expected.Upper, actual.Upper, 1e-9);
        }
    }

    /// <summary>
    /// The Greenland-Robins variance against the spread of the pooled ratio in 20,000 seeded sets of sparse strata; the Monte-Carlo error of a variance is
    /// sqrt(2 / 20000) = .01 of it, and the tolerance three of them and 2 % for what the logarithm bends.
    /// </summary>
    [Fact]
    public void Greenland_robins_variance_is_that_of_the_pooled_ratio()
    {
        Random random = new(5);
        const int sets = 20_000;
        double sum = 0, squares = 0, claimed = 0;
        for (int s = 0; s < sets; s++)
        {
            ConfusionMatrix[] tables = new ConfusionMatrix[12];
            for (int i = 0; i < tables.Length; i++)
            {
                // A ratio of 2 in every stratum, at different rates.
                double rate = 0.15 + (0.025 * i);
                int with = Draw(random, 12, Math.Min(1, 2 * rate));
                int without = Draw(random, 18, rate);
                tables[i] = new(with, without, 12 - with, 18 - without);
            }

            PooledRatio ratio = StratifiedTables.Create(tables).PositiveLikelihoodRatio;
            double log = Math.Log(ratio.Value);
            sum += log;
            squares += log * log;
            claimed += ratio.LogStandardError.Value * ratio.LogStandardError.Value;
        }

        double mean = sum / sets;
        Assert.Equal(Math.Log(2), mean, 0.02);
        Assert.InRange(claimed / sets / ((squares / sets) - (mean * mean)), 0.95, 1.05);
    }

    [Fact]
    public void Fleiss_kappa_of_several_raters()
    {
        foreach (JsonElement set in Expected.GetProperty("raters").EnumerateArray())
        {
            int[][] table = [.. set.GetProperty("table").EnumerateArray().Select(r => r.EnumerateArray().Select(c => c.GetInt32()).ToArray())];
            MultipleRaters raters = MultipleRaters.FromCounts(table.SelectMany(r => r).ToArray(), table[0].Length);
            Assert.Equal(set.GetProperty("kappa").GetDouble(), raters.FleissKappa.Value, 1e-12);

            // The jackknife, from leaving out one subject and starting over.
            double[] without = [.. Enumerable.Range(0, table.Length).Select(i => MultipleRaters.FromCounts(
                table.Where((_, j) => j != i).SelectMany(r => r).ToArray(), table[0].Length).FleissKappa.Value)];
            double mean = without.Average();
            double error = Math.Sqrt((table.Length - 1.0) / table.Length * without.Sum(v => (v - mean) * (v - mean)));
            Assert.Equal(error, raters.FleissKappa.StandardError.Value, 1e-12);
        }
    }

    /// <summary>The null standard error of Fleiss, Nee and Landis, against chance ratings: seeded, 4,000 sets, within three Monte-Carlo errors.</summary>
    [Fact]
    public void Fleiss_kappa_by_chance_spreads_as_its_null_standard_error_says()
    {
        Random random = new(3);
        const int sets = 4000, subjects = 60, raters = 4;
        double[] shares = [0.5, 0.3, 0.2];
        double squares = 0;
        double expected = 0;
        for (int s = 0; s < sets; s++)
        {
            int[] counts = new int[subjects * 3];
            for (int i = 0; i < subjects * raters; i++)
            {
                double u = random.NextDouble();
                counts[(i / raters * 3) + (u < shares[0] ? 0 : u < shares[0] + shares[1] ? 1 : 2)]++;
            }

            Kappa kappa = MultipleRaters.FromCounts(counts, 3).FleissKappa;
            squares += kappa.Value * kappa.Value;
            expected += kappa.NullStandardError.Value * kappa.NullStandardError.Value;
        }

        // The relative Monte-Carlo error of a variance from 4,000 normal values is sqrt(2 / 4000) = .022.
        Assert.InRange(squares / expected, 1 - (3 * 0.0224), 1 + (3 * 0.0224));
    }

    [Fact]
    public void One_stratum_is_the_table_itself()
    {
        ConfusionMatrix table = new(90, 20, 10, 180);
        StratifiedTables one = StratifiedTables.Create([table]);
        Assert.Equal(table.PositiveLikelihoodRatio.Value, one.PositiveLikelihoodRatio.Value, 1e-12);
        Assert.Equal(table.NegativeLikelihoodRatio.Value, one.NegativeLikelihoodRatio.Value, 1e-12);
        Assert.Equal(table.DiagnosticOddsRatio.Value, one.DiagnosticOddsRatio.Value, 1e-10);

        // The variances reduce to those of the log methods.
        Assert.Equal(table.PositiveLikelihoodRatio.Interval().Lower, one.PositiveLikelihoodRatio.Interval().Lower, 1e-10);
        Assert.Equal(table.NegativeLikelihoodRatio.Interval().Upper, one.NegativeLikelihoodRatio.Interval().Upper, 1e-10);
        Assert.Equal(table.DiagnosticOddsRatio.Interval().Lower, one.DiagnosticOddsRatio.Interval().Lower, 1e-9);
        foreach (StratumWeighting weighting in Enum.GetValues<StratumWeighting>())
        {
            Assert.Equal(table.Sensitivity.Value, one.Sensitivity(weighting).Value, 1e-15);
            Assert.Equal(table.Sensitivity.Interval().Lower, one.Sensitivity(weighting).Interval().Lower, 1e-15);
        }

        Assert.Equal(UndefinedCause.TooFewSubjects, one.OddsRatioHomogeneity.Statistic.WhyUndefined?.Cause);
    }

    [Fact]
    public void Pairs_of_small_strata_answer_or_say_why_not()
    {
        ConfusionMatrix[] tables = [.. ConfusionMatrixTests.TablesOf(4)];
        foreach (ConfusionMatrix first in tables)
        {
            foreach (ConfusionMatrix second in tables)
            {
                StratifiedTables strata = StratifiedTables.Create([first, second]);
                IIntervalQuantity[] quantities =
                [
                    strata.PositiveLikelihoodRatio, strata.NegativeLikelihoodRatio, strata.DiagnosticOddsRatio,
                    strata.Sensitivity(), strata.Specificity(StratumWeighting.InverseVariance), strata.Sensitivity(StratumWeighting.Equal),
                ];
                foreach (IIntervalQuantity quantity in quantities)
                {
                    ShapeOfTypesTests.AssertCoherent(quantity);
                    ConfidenceInterval interval = quantity.Interval();
                    Assert.Equal(quantity.IsDefined, interval.IsDefined);
                    Assert.True(!interval.IsDefined || interval.Contains(quantity.Value), $"{first} {second} {quantity} {interval}");
                    Assert.True(!interval.IsDefined || interval.Lower < interval.Upper, $"{first} {second} {quantity} {interval}");
                    Assert.True(interval.Lower is double.NaN or >= 0);
                }

                foreach (HomogeneityTest test in new[] { strata.OddsRatioHomogeneity, strata.SensitivityHomogeneity, strata.SpecificityHomogeneity })
                {
                    ShapeOfTypesTests.AssertCoherent(test.PValue);
                    Assert.True(!test.PValue.IsDefined || test.PValue.Value is >= 0 and <= 1);
                }
            }
        }
    }

    private static StratifiedTables Strata(JsonElement set) => StratifiedTables.Create(set.GetProperty("tables").EnumerateArray().Select(t => new ConfusionMatrix(
        t[0].GetInt64(), t[1].GetInt64(), t[2].GetInt64(), t[3].GetInt64())));

    private static StratifiedTables Map(StratifiedTables strata, Func<ConfusionMatrix, ConfusionMatrix> turn) => StratifiedTables.Create(strata.Strata.Select(turn));

    private static int Draw(Random random, int n, double p)
    {
        int count = 0;
        for (int i = 0; i < n; i++)
        {
            count += random.NextDouble() < p ? 1 : 0;
        }

        return count;
    }

    // Relative; equal ends of the space are equal.
    private static void Near(double expected, double actual, double tolerance) => Assert.True(
        expected.Equals(actual) || Math.Abs(actual - expected) <= tolerance * Math.Abs(expected), $"{expected:R} {actual:R}");

    private static void Close(JsonElement set, string name, double actual)
    {
        double expected = set.GetProperty(name).GetDouble();
        Assert.Equal(expected, actual, Math.Abs(expected) * 1e-9);
    }
}
