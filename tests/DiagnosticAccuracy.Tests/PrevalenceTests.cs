namespace DiagnosticAccuracy.Tests;

public class PrevalenceTests
{
    [Theory]
    [InlineData(0, "0 %")]
    [InlineData(1, "100 %")]
    [InlineData(0.002, "0.2 %")]
    [InlineData(0.07, "7 %")]
    [InlineData(1 - 0.003, "99.7 %")]
    [InlineData(1e-17, "0.000000000000001 %")]
    [InlineData(1e-20, "0.000000000000000001 %")]
    [InlineData(1e-300, "1E-298 %")]
    [InlineData(0.9999999999999999, "1 - 1.1102230246251565E-16")]
    public void Only_nobody_is_shown_as_0_and_only_everybody_as_100(double share, string expected) =>
        Assert.Equal(expected, new Prevalence(share).ToString());
}
