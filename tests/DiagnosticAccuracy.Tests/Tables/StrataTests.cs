using System.Text.Json;
using DiagnosticAccuracy.Tests.Contracts;
using DiagnosticAccuracy.Tests.Data;

namespace DiagnosticAccuracy.Tests.Tables;

/// <summary>Against statsmodels and SciPy (grade R): Data/tables/strata.json and the script that made it.</summary>
public class StrataTests
{
    private static readonly JsonElement Expected = ReferenceData.Json(Path.Combine("tables", "strata.json"));

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
                    Assert.True(!interval.IsDefined || interval.Contains(quantity.Value), $"{first} {second} {quantity} {interval}");
                }

                foreach (HomogeneityTest test in new[] { strata.OddsRatioHomogeneity, strata.SensitivityHomogeneity, strata.SpecificityHomogeneity })
                {
                    ShapeOfTypesTests.AssertCoherent(test.PValue);
                    Assert.True(!test.PValue.IsDefined || test.PValue.Value is >= 0 and <= 1);
                }
            }
        }
    }

    private static void Close(JsonElement set, string name, double actual)
    {
        double expected = set.GetProperty(name).GetDouble();
        Assert.Equal(expected, actual, Math.Abs(expected) * 1e-9);
    }
}
