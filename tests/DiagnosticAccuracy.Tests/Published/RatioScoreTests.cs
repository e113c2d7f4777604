using System.Text.Json;
using DiagnosticAccuracy.Tests.Data;

namespace DiagnosticAccuracy.Tests.Published;

/// <summary>
/// Score intervals of a ratio: Koopman, Biometrics 1984;40:513 (grade M, from memory and confirmed by recomputation); Gart and Nam, Biometrics
/// 1988;44:323 (grade S2). Log intervals and further digits: grade R.
/// </summary>
public class RatioScoreTests
{
    [Fact]
    public void Koopman_1984_36_of_40_over_16_of_80()
    {
        ProportionRatio ratio = new(new Proportion(36, 40), new Proportion(16, 80));
        ConfidenceInterval interval = ratio.Interval(default, RatioMethod.Koopman);
        Assert.Equal(4.5, ratio.Value, 1e-15);
        Assert.Equal(2.94, interval.Lower, 0.5e-2);
        Assert.Equal(7.15, interval.Upper, 0.5e-2);
    }

    [Theory]
    [InlineData(8, 15, 4, 15, 0.815, 5.336)]
    [InlineData(6, 10, 6, 20, 0.844, 4.594)]
    public void Gart_and_Nam_1988(long x1, long n1, long x2, long n2, double lower, double upper)
    {
        ConfidenceInterval interval = new ProportionRatio(new Proportion(x1, n1), new Proportion(x2, n2)).Interval(default, RatioMethod.Koopman);
        Assert.Equal(lower, interval.Lower, 0.5e-3);
        Assert.Equal(upper, interval.Upper, 0.5e-3);
    }

    [Theory]
    [InlineData("weiner1979_EST", 815, 1023, 115, 442)]
    [InlineData("koopman1984", 36, 40, 16, 80)]
    [InlineData("gart_nam1988_a", 8, 15, 4, 15)]
    [InlineData("gart_nam1988_b", 6, 10, 6, 20)]
    public void Recomputed_score_limits_agree_to_ten_digits(string name, long x1, long n1, long x2, long n2)
    {
        JsonElement tables = ReferenceData.Json("tables.json");
        ProportionRatio ratio = new(new Proportion(x1, n1), new Proportion(x2, n2));
        AssertRow(tables.GetProperty(name + "_ratio_score_koopman"), ratio, RatioMethod.Koopman);
        AssertRow(tables.GetProperty(name + "_ratio_score_MN"), ratio, RatioMethod.MiettinenNurminen);
    }

    [Theory]
    [InlineData("weiner1979_EST")]
    [InlineData("altman_bland_1994_liver_scan")]
    public void Recomputed_log_limits_agree_to_ten_digits(string name)
    {
        JsonElement table = ReferenceData.Json("tables.json").GetProperty(name);
        JsonElement counts = table.GetProperty("counts");
        long tp = counts.GetProperty("tp").GetInt64();
        long fn = counts.GetProperty("fn").GetInt64();
        long fp = counts.GetProperty("fp").GetInt64();
        long tn = counts.GetProperty("tn").GetInt64();
        Proportion sensitivity = new(tp, tp + fn);
        Proportion falsePositives = new(fp, fp + tn);
        AssertRow(table.GetProperty("lr_pos"), new ProportionRatio(sensitivity, falsePositives), RatioMethod.Log);
        AssertRow(table.GetProperty("lr_neg"), new ProportionRatio(sensitivity.Complement, falsePositives.Complement), RatioMethod.Log);

        double[] odds = [.. table.GetProperty("dor").EnumerateArray().Select(e => e.GetDouble())];
        OddsRatio oddsRatio = new(tp, fn, fp, tn);
        Assert.Equal(odds[0], oddsRatio.Value, 1e-10 * odds[0]);
        Assert.Equal(odds[1], oddsRatio.Interval().Lower, 1e-10 * odds[1]);
        Assert.Equal(odds[2], oddsRatio.Interval().Upper, 1e-10 * odds[2]);
    }

    private static void AssertRow(JsonElement row, ProportionRatio ratio, RatioMethod method)
    {
        double[] values = [.. row.EnumerateArray().Select(e => e.GetDouble())];
        ConfidenceInterval interval = ratio.Interval(default, method);
        Assert.Equal(values[0], ratio.Value, 1e-10 * values[0]);
        Assert.Equal(values[1], interval.Lower, 1e-10 * values[1]);
        Assert.Equal(values[2], interval.Upper, 1e-10 * values[2]);
    }
}
