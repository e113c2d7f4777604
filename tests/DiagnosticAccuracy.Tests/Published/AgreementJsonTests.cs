using System.Text.Json;
using DiagnosticAccuracy.Tests.Data;

namespace DiagnosticAccuracy.Tests.Published;

/// <summary>
/// Kappa and its relatives: Cohen 1960 (.492) and 1968 (.348, .353) (grade S); Fleiss 1981 (.68, SE0 .076), Feinstein and Cicchetti 1990
/// (.70, .32), Chicco and Jurman 2020 (grade M); the rest recomputed (R). See Data/README.md.
/// </summary>
public class AgreementJsonTests
{
    private static readonly JsonElement Expected = ReferenceData.Json("agreement.json");

    [Theory]
    [InlineData("kappa_cohen1960", "none")]
    [InlineData("kappa_fleiss1981_diag", "none")]
    [InlineData("kappa_fce1969_unw", "none")]
    [InlineData("kappa_fce1969_unw_n200", "none")]
    [InlineData("kappa_cohen1960_linear", "linear")]
    [InlineData("kappa_cohen1960_quadratic", "quadratic")]
    [InlineData("kappa_feinstein_a", "none")]
    [InlineData("kappa_feinstein_b", "none")]
    [InlineData("kappa_feinstein_c", "none")]
    [InlineData("kappa_feinstein_d", "none")]
    public void Kappa_and_both_standard_errors(string name, string weights)
    {
        JsonElement expected = Expected.GetProperty(name);
        RatingTable table = Table(expected);
        Kappa kappa = table.CohenKappa(weights switch
        {
            "linear" => KappaWeights.Linear,
            "quadratic" => KappaWeights.Quadratic,
            _ => KappaWeights.None,
        });
        Assert.Equal(expected.GetProperty("kappa").GetDouble(), kappa.Value, 1e-10);
        Assert.Equal(expected.GetProperty("se").GetDouble(), kappa.StandardError.Value, 1e-10);
        Assert.Equal(expected.GetProperty("se0").GetDouble(), kappa.NullStandardError.Value, 1e-10);
        Assert.Equal(expected.GetProperty("z0").GetDouble(), kappa.Z.Value, 1e-9);
        if (weights == "none")
        {
            Assert.Equal(expected.GetProperty("po").GetDouble(), table.ObservedAgreement.Value, 1e-12);
        }

        if (expected.TryGetProperty("PABAK", out JsonElement pabak))
        {
            Assert.Equal(pabak.GetDouble(), table.PrevalenceAndBiasAdjustedKappa.Value, 1e-12);
            Assert.Equal(expected.GetProperty("bias_index").GetDouble(), table.BiasIndex().Value, 1e-12);
            Assert.Equal(expected.GetProperty("prev_index").GetDouble(), table.PrevalenceIndex().Value, 1e-12);
            Assert.Equal(expected.GetProperty("p_pos").GetDouble(), table.SpecificAgreement(0).Value, 1e-12);
            Assert.Equal(expected.GetProperty("p_neg").GetDouble(), table.SpecificAgreement(1).Value, 1e-12);
        }
    }

    /// <summary>
    /// The weights of Fleiss, Cohen and Everitt (1969): 1, 0, .4444 / 0, 1, .6667 / .4444, .6667, 1 with the exact fractions 4/9 and 2/3
    /// and, in the second case, four printed digits.
    /// </summary>
    [Theory]
    [InlineData("kappa_fce1969_weighted_n200", 4 / 9.0, 2 / 3.0)]
    [InlineData("kappa_fce1969_weighted_n200_w4dp", .4444, .6667)]
    public void Kappa_with_own_weights(string name, double outer, double inner)
    {
        JsonElement expected = Expected.GetProperty(name);
        Kappa kappa = Table(expected).CohenKappa(KappaWeights.Own([1, 0, outer, 0, 1, inner, outer, inner, 1], 3));
        Assert.Equal(expected.GetProperty("kappa").GetDouble(), kappa.Value, 1e-10);
        Assert.Equal(expected.GetProperty("se").GetDouble(), kappa.StandardError.Value, 1e-10);
        Assert.Equal(expected.GetProperty("se0").GetDouble(), kappa.NullStandardError.Value, 1e-10);
    }

    [Fact]
    public void Printed_values()
    {
        Assert.Equal(.492, Table(Expected.GetProperty("kappa_cohen1960")).CohenKappa().Value, 5e-4);
        Kappa fleiss = Table(Expected.GetProperty("kappa_fleiss1981_diag")).CohenKappa();
        Assert.Equal(.68, fleiss.Value, 5e-3);
        Assert.Equal(.076, fleiss.NullStandardError.Value, 5e-4);
        Assert.Equal(.70, Table(Expected.GetProperty("kappa_feinstein_a")).CohenKappa().Value, 5e-3);
        Assert.Equal(.32, Table(Expected.GetProperty("kappa_feinstein_b")).CohenKappa().Value, 5e-3);
    }

    /// <summary>
    /// The table with which Gwet showed what a rare category does to kappa: kappa -.0234, AC1 .9408. Table and values from memory (grade M: the recomputation
    /// agrees to the printed digits).
    /// </summary>
    [Fact]
    public void First_order_agreement_where_kappa_is_negative()
    {
        RatingTable table = RatingTable.FromCounts([118, 5, 2, 0], 2);
        Assert.Equal(-.0234, table.CohenKappa().Value, 5e-5);
        Assert.Equal(.9408, table.FirstOrderAgreementCoefficient.Value, 5e-5);
    }

    /// <summary>The six tables of Chicco and Jurman, BMC Genomics 2020;21:6, rebuilt from memory (grade M): TP, FN, TN, FP.</summary>
    [Theory]
    [InlineData("A1", 90, 1, 0, 9)]
    [InlineData("A2", 5, 70, 19, 6)]
    [InlineData("B1", 47, 3, 5, 45)]
    [InlineData("B2", 10, 40, 46, 4)]
    [InlineData("C1", 9, 1, 1, 89)]
    [InlineData("C2", 2, 9, 88, 1)]
    public void Matthews_correlation_and_F1(string name, long tp, long fn, long tn, long fp)
    {
        JsonElement expected = Expected.GetProperty("chicco2020").GetProperty(name);
        ConfusionMatrix table = new(tp, fp, fn, tn);
        Assert.Equal(expected.GetProperty("acc").GetDouble(), table.Accuracy.Value, 1e-12);
        Assert.Equal(expected.GetProperty("f1").GetDouble(), table.F1.Value, 1e-12);
        Assert.Equal(expected.GetProperty("mcc").GetDouble(), table.MatthewsCorrelation.Value, 1e-12);
    }

    private static RatingTable Table(JsonElement expected)
    {
        JsonElement rows = expected.GetProperty("table");
        return RatingTable.FromCounts(
            [.. rows.EnumerateArray().SelectMany(row => row.EnumerateArray()).Select(cell => (long)cell.GetDouble())], rows.GetArrayLength());
    }
}
