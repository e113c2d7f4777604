using DiagnosticAccuracy.Numerics;

namespace DiagnosticAccuracy.Roc;

/// <summary>Partial areas of samples by their definitions.</summary>
internal static class PartialAreas
{
    public static PartialArea Of(ScoredSample sample, PartialAreaRange range)
    {
        if (sample.MissingGroup is { } reason)
        {
            return new PartialArea(range, Quantity.Undefined(reason), Quantity.Undefined(reason));
        }

        PartialInfluence influence = Influence(sample, range, out double value);
        bool mirrored = range.Kind == PartialAreaKind.OverSensitivity;
        Quantity variance = sample.WithCondition < 2 || sample.WithoutCondition < 2
            ? Quantity.Undefined(UndefinedCause.TooFewSubjects, "one subject in a group gives no variance")
            : Quantity.Of(influence.Variance(sample.LevelCount, mirrored ? sample.Without : sample.With, mirrored ? sample.With : sample.Without));
        return new PartialArea(range, Quantity.Of(value), variance);
    }

    /// <summary>What each subject contributes; the area over both ranges is less than that of its influence by the rectangle below the least sensitivity.</summary>
    public static PartialInfluence Influence(ScoredSample sample, PartialAreaRange range, out double value)
    {
        if (range.Kind == PartialAreaKind.OverSensitivity)
        {
            PartialInfluence mirrored = PartialInfluence.Of(sample.LevelCount, sample.Without, sample.With, true, 1 - range.To, 1 - range.From, 0.5);
            value = Clip(mirrored.Value, range.LargestPossible);
            return mirrored;
        }

        // Where the curve passes the least sensitivity the height over it is zero, so that the place can be taken as fixed.
        double from = range.From;
        double share = 0.5;
        double below = 0;
        if (range.Kind == PartialAreaKind.Both)
        {
            from = Math.Min(range.To, Crossing(sample, range.From, out share));
            below = range.From * (range.To - from);
        }

        PartialInfluence influence = PartialInfluence.Of(sample.LevelCount, sample.With, sample.Without, false, from, range.To, share);
        value = Clip(influence.Value - below, range.LargestPossible);
        return influence;
    }

    private static double Clip(double value, double largest) => Math.Min(largest, Math.Max(0, value));

    // The least false-positive rate at which the straight-line curve reaches a sensitivity, and how much of a vertical step there lies above it.
    private static double Crossing(ScoredSample sample, double sensitivity, out double shareAbove)
    {
        double lastSensitivity = 0;
        double lastRate = 0;
        for (int i = sample.LevelCount - 1; i >= 0; i--)
        {
            double next = (sample.WithCondition - sample.With.Below(i)) / (double)sample.WithCondition;
            double rate = (sample.WithoutCondition - sample.Without.Below(i)) / (double)sample.WithoutCondition;
            if (next >= sensitivity && next > lastSensitivity)
            {
                double crossing = lastRate + ((rate - lastRate) * Math.Max(0, (sensitivity - lastSensitivity) / (next - lastSensitivity)));
                shareAbove = ShareAbove(sample, crossing, sensitivity);
                return crossing;
            }

            lastSensitivity = next;
            lastRate = rate;
        }

        shareAbove = 0;
        return 1;
    }

    private static double ShareAbove(ScoredSample sample, double rate, double sensitivity)
    {
        double bottom = rate == 0 ? 0 : 1;
        double top = 0;
        for (int i = 0; i < sample.LevelCount; i++)
        {
            if ((sample.WithoutCondition - sample.Without.Below(i)) / (double)sample.WithoutCondition == rate)
            {
                double at = (sample.WithCondition - sample.With.Below(i)) / (double)sample.WithCondition;
                bottom = Math.Min(bottom, at);
                top = Math.Max(top, at);
            }
        }

        return top > bottom ? Math.Min(1, Math.Max(0, (top - sensitivity) / (top - bottom))) : 0.5;
    }

    /// <summary>The variance of the difference of two partial areas on the same subjects.</summary>
    public static double VarianceOfDifference(Placements first, Placements second, PartialAreaRange range)
    {
        PartialInfluence one = Influence(first.Sample, range, out _);
        PartialInfluence other = Influence(second.Sample, range, out _);
        bool mirrored = range.Kind == PartialAreaKind.OverSensitivity;
        return Part(first.With, second.With, with: true) + Part(first.Without, second.Without, with: false);

        double Part(long[] firstPlacements, long[] secondPlacements, bool with)
        {
            double[] differences = BySubject(first.Sample, one, firstPlacements, with, mirrored);
            double[] others = BySubject(second.Sample, other, secondPlacements, with, mirrored);
            CompensatedSum sum = default;
            for (int i = 0; i < differences.Length; i++)
            {
                differences[i] -= others[i];
                sum.Add(differences[i]);
            }

            double n = differences.Length;
            double mean = sum.Value / n;
            CompensatedSum squares = default;
            foreach (double difference in differences)
            {
                squares.Add((difference - mean) * (difference - mean));
            }

            return PartialInfluence.WithoutRounding(squares.Value / (n - 1) / n);
        }
    }

    // Subjects of a group with the same placement contribute the same, so the level is found by it.
    private static double[] BySubject(ScoredSample sample, PartialInfluence influence, long[] placements, bool with, bool mirrored)
    {
        Dictionary<long, double> contribution = [];
        for (int i = 0; i < sample.LevelCount; i++)
        {
            if ((with ? sample.With : sample.Without).At(i) > 0)
            {
                long placement = with
                    ? (2 * sample.Without.Below(i)) + sample.Without.At(i)
                    : (2 * (sample.WithCondition - sample.With.Below(i))) - sample.With.At(i);
                contribution[placement] = with != mirrored ? influence.OfCase(i) : influence.OfControl(i);
            }
        }

        return Array.ConvertAll(placements, placement => contribution[placement]);
    }
}
