namespace DiagnosticAccuracy.Tests.Tables;

/// <summary>
/// The type I error of the non-inferiority test of a difference by enumeration of every table of 30 subjects; docs/evidence has the whole table, made by
/// a program of its own.
/// </summary>
public class PairedTypeOneErrorTests
{
    [Theory]
    [InlineData(0.15, 1.29)]
    [InlineData(0.3, 2.13)]
    [InlineData(0.6, 2.43)]
    [InlineData(1, 2.71)]
    public void The_size_at_30_subjects_margin_5_points_and_one_sided_2_5_percent_is_the_documented_one(double discordant, double percent)
    {
        const int n = 30;
        const double margin = 0.05;
        double first = (discordant - margin) / 2;
        double second = (discordant + margin) / 2;
        double size = 0;
        for (int b = 0; b <= n; b++)
        {
            for (int c = 0; b + c <= n; c++)
            {
                if (DifferenceMargin.NonInferiority(margin).Test(new PairedTable(0, b, c, n - b - c).Difference).PValue.Value <= 0.025)
                {
                    // The first cell is binomial, the second binomial among the others.
                    size += SlowBinomial.Probability(b, n, first) * SlowBinomial.Probability(c, n - b, second / (1 - first));
                }
            }
        }

        Assert.Equal(percent, 100 * size, 0.005);
    }
}
