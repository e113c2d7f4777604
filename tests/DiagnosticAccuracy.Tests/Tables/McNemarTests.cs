using System.Numerics;

namespace DiagnosticAccuracy.Tests.Tables;

public class McNemarTests
{
    /// <summary>The exact forms as ratios of integers: the binomial coefficients of b + c, over 2 to the power of it.</summary>
    [Fact]
    public void The_exact_forms_are_sums_of_binomial_coefficients()
    {
        for (int b = 0; b <= 60; b++)
        {
            for (int c = 0; c <= 60; c++)
            {
                int n = b + c;
                BigInteger coefficient = BigInteger.One;
                BigInteger tail = BigInteger.Zero;
                for (int k = 0; k <= Math.Min(b, c); k++)
                {
                    coefficient = k == 0 ? BigInteger.One : coefficient * (n - k + 1) / k;
                    tail += coefficient;
                }

                BigInteger whole = BigInteger.One << n;
                BigInteger exact = BigInteger.Min(2 * tail, whole);

                // Twice everything, so that half of a coefficient is an integer.
                BigInteger midTwice = n == 0 ? 2 * whole : b == c ? (2 * whole) - coefficient : 2 * ((2 * tail) - coefficient);
                PairedTable table = new(3, b, c, 5);
                Assert.Equal(1, table.McNemar(McNemarMethod.ExactConditional).PValue.Value / ((double)exact / (double)whole), 1e-13);
                Assert.Equal(1, table.McNemar(McNemarMethod.MidP).PValue.Value / ((double)midTwice / (double)(2 * whole)), 1e-13);
            }
        }
    }

    /// <summary>A mid-P value has the mean one half when there is no difference, whatever the number of discordant subjects.</summary>
    [Fact]
    public void The_mid_P_value_has_mean_one_half()
    {
        for (int n = 1; n <= 40; n++)
        {
            double mean = 0;
            for (int b = 0; b <= n; b++)
            {
                mean += SlowBinomial.Probability(b, n, 0.5) * new PairedTable(0, b, n - b, 0).McNemar(McNemarMethod.MidP).PValue.Value;
            }

            Assert.Equal(0.5, mean, 1e-13);
        }
    }

    /// <summary>The probability of a p-value at most 5 % when both outcomes of a discordant subject are as likely, given their number.</summary>
    [Fact]
    public void The_exact_form_never_rejects_more_often_than_its_level()
    {
        for (int n = 1; n <= 60; n++)
        {
            double size = 0;
            for (int b = 0; b <= n; b++)
            {
                size += new PairedTable(0, b, n - b, 0).McNemar(McNemarMethod.ExactConditional).PValue.Value <= 0.05 ? SlowBinomial.Probability(b, n, 0.5) : 0;
            }

            Assert.True(size <= 0.05, $"{n}: {size}");
        }
    }

    [Fact]
    public void Every_form_is_symmetric_and_blind_to_those_on_whom_the_tests_agree()
    {
        foreach (PairedTable table in PairedTables.UpTo(12))
        {
            foreach (McNemarMethod method in Enum.GetValues<McNemarMethod>())
            {
                PairedTest test = table.McNemar(method);
                Assert.InRange(test.PValue.Value, 0, 1);
                Assert.Equal(test, table.Swapped.McNemar(method));
                Assert.Equal(test, table.Complement.McNemar(method));
                Assert.Equal(test, new PairedTable(table.BothPositive + 100, table.FirstOnly, table.SecondOnly, table.BothNegative).McNemar(method));
            }

            Assert.True(table.McNemar(McNemarMethod.MidP).PValue.Value <= table.McNemar(McNemarMethod.ExactConditional).PValue.Value);
            Assert.True(table.McNemar().PValue.Value <= table.McNemar(McNemarMethod.ContinuityCorrected).PValue.Value);
        }
    }

    [Fact]
    public void Without_discordant_subjects_p_is_1_and_the_statistic_says_why_it_is_undefined()
    {
        PairedTable table = new(5, 0, 0, 9);
        foreach (McNemarMethod method in Enum.GetValues<McNemarMethod>())
        {
            Assert.Equal(1, table.McNemar(method).PValue.Value);
        }

        Assert.Equal(UndefinedCause.ZeroOverZero, table.McNemar().Statistic.WhyUndefined?.Cause);
        Assert.Equal(UndefinedCause.NotPartOfMethod, table.McNemar(McNemarMethod.MidP).Statistic.WhyUndefined?.Cause);
    }

    [Fact]
    public void Without_subjects_it_is_undefined()
    {
        foreach (McNemarMethod method in Enum.GetValues<McNemarMethod>())
        {
            Assert.Equal(UndefinedCause.NoSubjects, default(PairedTable).McNemar(method).PValue.WhyUndefined?.Cause);
        }

        Assert.Throws<ArgumentOutOfRangeException>("method", () => default(PairedTable).McNemar((McNemarMethod)9));
        Assert.Equal("none: p = undefined: this is an empty value that no computation produced", default(PairedTest).ToString());
    }

    /// <summary>Large counts: with b + c = N, the tails are those of the normal with a continuity correction, to the order 1/N.</summary>
    [Fact]
    public void Counts_of_1e12_neither_overflow_nor_lose_the_tail()
    {
        PairedTable table = new(1_000_000_000_000, 1_000_001_000_000, 1_000_000_000_000, 4_000_000_000_000_000_000);
        double z = 1_000_000 / Math.Sqrt(2_000_001_000_000);
        Assert.Equal(z * z, table.McNemar().Statistic.Value, 1e-12);
        double asymptotic = table.McNemar().PValue.Value;
        double corrected = table.McNemar(McNemarMethod.ContinuityCorrected).PValue.Value;
        Assert.Equal(0.4795, asymptotic, 1e-4);
        Assert.Equal(corrected, table.McNemar(McNemarMethod.ExactConditional).PValue.Value, 1e-11);
        Assert.Equal(asymptotic, table.McNemar(McNemarMethod.MidP).PValue.Value, 1e-11);

        // The longest counts there are.
        PairedTable longest = new(0, long.MaxValue / 2, long.MaxValue / 2, 0);
        Assert.Equal(1, longest.McNemar().PValue.Value);
        Assert.Equal(0, longest.Difference.Value);
        Assert.Equal(1, longest.Ratio.Value);
        Assert.True(longest.Difference.Interval().Width is > 0 and < 1e-8);
        Assert.True(longest.Ratio.Interval().Width is > 0 and < 1e-8);
    }

    [Fact]
    public void The_text_has_statistic_p_value_and_method()
    {
        PairedTable table = new(1, 1, 7, 12);
        Assert.Equal("McNemar, asymptotic: chi-squared 4.5 on 1 degree of freedom, p = 0.0338949", table.McNemar().ToString());
        Assert.Equal("McNemar, mid-P: p = 0.0390625", table.McNemar(McNemarMethod.MidP).ToString());
    }
}
