using DiagnosticAccuracy.Numerics;

namespace DiagnosticAccuracy.Roc;

/// <summary>The rank sum test of two groups, with ties.</summary>
internal static class RankSumTest
{
    // Elementary steps of the exact distribution: about two seconds.
    private const double MostSteps = 2e9;

    public static ChanceTest Of(ScoredSample sample, AreaUnderCurve area, ChanceTestMethod method, Alternative alternative)
    {
        if (alternative is not (Alternative.TwoSided or Alternative.Greater or Alternative.Less))
        {
            throw Guard.UnknownOption(alternative);
        }

        if (method is not (ChanceTestMethod.Normal or ChanceTestMethod.NormalWithContinuity or ChanceTestMethod.Exact))
        {
            throw Guard.UnknownOption(method);
        }

        if (area.WhyUndefined is { } reason)
        {
            return new ChanceTest(method, alternative, Quantity.Undefined(reason), Quantity.Undefined(reason));
        }

        return method == ChanceTestMethod.Exact ? Exact(sample, alternative) : Normal(sample, area, method, alternative);
    }

    /// <summary>
    /// z = (U - n1 n0 / 2) / sqrt(n1 n0 / 12 (N + 1 - sum(t^3 - t) / (N (N - 1)))), t the sizes of the ties.
    /// </summary>
    private static ChanceTest Normal(ScoredSample sample, AreaUnderCurve area, ChanceTestMethod method, Alternative alternative)
    {
        double n = sample.Total;
        CompensatedSum ties = default;
        for (int i = 0; i < sample.LevelCount; i++)
        {
            double t = sample.With.At(i) + (double)sample.Without.At(i);
            ties.Add(((t * t) - 1) * t);
        }

        double pairs = (double)area.WithCondition * area.WithoutCondition;
        double variance = pairs / 12 * (n + 1 - (ties.Value / n / (n - 1)));
        if (sample.LevelCount == 1 || !(variance > 0))
        {
            Quantity none = Quantity.Undefined(UndefinedCause.ZeroVariance, "all scores are equal");
            return new ChanceTest(method, alternative, none, none);
        }

        // The area is rounded once; U - n1 n0 / 2 is taken from the integers behind it.
        double gap = (double)(area.Moments.Sum - area.Pairs) / 2;
        if (method == ChanceTestMethod.NormalWithContinuity)
        {
            gap -= alternative switch
            {
                Alternative.Greater => 0.5,
                Alternative.Less => -0.5,
                _ => Math.Sign(gap) * Math.Min(0.5, Math.Abs(gap)),
            };
        }

        double z = gap / Math.Sqrt(variance);
        double p = alternative switch
        {
            Alternative.Greater => StandardNormal.Upper(z),
            Alternative.Less => StandardNormal.Lower(z),
            _ => StandardNormal.TwoSided(z),
        };
        return new ChanceTest(method, alternative, Quantity.Of(z), Quantity.Of(p));
    }

    /// <summary>
    /// Counts, level by level, in how many ways k subjects can be chosen with a given sum of doubled mid-ranks: the shift algorithm, for the smaller
    /// group. Counts are all positive doubles, so their relative error stays that of the additions.
    /// </summary>
    private static ChanceTest Exact(ScoredSample sample, Alternative alternative)
    {
        Quantity notStandardised = Quantity.Undefined(UndefinedCause.NotPartOfMethod, "the exact test does not standardise");
        bool smallerIsWith = sample.WithCondition <= sample.WithoutCondition;
        long size = Math.Min(sample.WithCondition, sample.WithoutCondition);

        // Doubled mid-ranks above the lowest one, in units of their common divisor.
        int levels = sample.LevelCount;
        long[] tied = new long[levels];
        long[] rank = new long[levels];
        long below = 0;
        long divisor = 0;
        long highest = 0;
        for (int i = 0; i < levels; i++)
        {
            tied[i] = sample.With.At(i) + sample.Without.At(i);
            rank[i] = (2 * below) + tied[i] - tied[0];
            below += tied[i];
            divisor = GreatestCommonDivisor(divisor, rank[i]);
            highest = rank[i];
        }

        divisor = Math.Max(1, divisor);
        double steps = (double)size * sample.Total * size * highest / divisor;
        if (steps > MostSteps || sample.Total > 1000)
        {
            return new ChanceTest(method: ChanceTestMethod.Exact, alternative, notStandardised, Quantity.Undefined(
                UndefinedCause.MethodHasNoLimit, "the sample is too large for the exact distribution; ChanceTestMethod.Normal agrees with it at such sizes"));
        }

        long observed = 0;
        long total = 0;
        for (int i = 0; i < levels; i++)
        {
            rank[i] /= divisor;
            observed += (smallerIsWith ? sample.With.At(i) : sample.Without.At(i)) * rank[i];
            total += tied[i] * rank[i];
        }

        double[] ways = Distribution(tied, rank, (int)size);

        // Greater means that those with the condition score more towards it: a high sum of theirs, or a low one of the others.
        bool high = alternative == Alternative.Greater == smallerIsWith;
        double all = 0;
        double extreme = 0;
        double distance = Math.Abs(((double)observed * sample.Total) - ((double)total * size));
        for (int sum = 0; sum < ways.Length; sum++)
        {
            all += ways[sum];
            bool counts = alternative == Alternative.TwoSided
                ? Math.Abs(((double)sum * sample.Total) - ((double)total * size)) >= distance
                : high ? sum >= observed : sum <= observed;
            extreme += counts ? ways[sum] : 0;
        }

        return new ChanceTest(ChanceTestMethod.Exact, alternative, notStandardised, Quantity.Of(Math.Min(1, extreme / all)));
    }

    private static double[] Distribution(long[] tied, long[] rank, int size)
    {
        int most = 0;
        foreach (long r in rank)
        {
            most = Math.Max(most, checked((int)r));
        }

        int length = checked((most * size) + 1);
        double[][] ways = new double[size + 1][];
        for (int k = 0; k <= size; k++)
        {
            ways[k] = new double[length];
        }

        ways[0][0] = 1;
        int chosen = 0;
        for (int level = 0; level < rank.Length; level++)
        {
            int shift = (int)rank[level];
            chosen = (int)Math.Min(size, chosen + tied[level]);

            // One subject of the tie after the other: from the top, so that each is used once.
            for (long subject = 0; subject < tied[level]; subject++)
            {
                for (int k = chosen; k >= 1; k--)
                {
                    double[] from = ways[k - 1];
                    double[] to = ways[k];
                    for (int sum = length - 1; sum >= shift; sum--)
                    {
                        to[sum] += from[sum - shift];
                    }
                }
            }
        }

        return ways[size];
    }

    private static long GreatestCommonDivisor(long left, long right)
    {
        while (right != 0)
        {
            long rest = left % right;
            left = right;
            right = rest;
        }

        return left;
    }
}
