namespace DiagnosticAccuracy.Roc;

/// <summary>One axis of an empirical curve read at a fixed value of the other.</summary>
/// <remarks>
/// Of all points that reach the fixed value the best one is taken; between it and the next the curve is a straight line. The variance is
/// v (1 - v) / n + slope^2 p (1 - p) / m: the binomial variance on the axis that is read, and that of the axis held fixed carried over by the slope
/// of the curve there (Linnet, Clin Chem 1987;33:15). The slope is a ratio of two densities; it is estimated by the
/// difference of the curve over p - h to p + h with h = sqrt(p (1 - p) / m), one standard error of the cutoff on that axis, cut at 0 and 1.
/// </remarks>
internal static class FixedPoints
{
    public static FixedPoint Of(RocCurve curve, FixedPointKind kind, double at)
    {
        ScoredSample sample = curve.Sample;
        if (sample.MissingGroup is { } reason)
        {
            return new FixedPoint(kind, at, Quantity.Undefined(reason), Quantity.Undefined(reason), Quantity.Undefined(reason), 0, null, null);
        }

        bool ofSensitivity = kind == FixedPointKind.SensitivityAtSpecificity;
        long read = ofSensitivity ? sample.WithCondition : sample.WithoutCondition;
        long held = ofSensitivity ? sample.WithoutCondition : sample.WithCondition;
        double value = Read(curve, kind, at, out int reaching, out int beyond);
        (Quantity slope, Quantity cutoffVariance) = Slope(curve, kind, at, held);
        return new FixedPoint(
            kind, at, Quantity.Of(value), slope, cutoffVariance, read, curve.PointAt(reaching), beyond < 0 ? null : curve.PointAt(beyond));
    }

    private static (Quantity Slope, Quantity CutoffVariance) Slope(RocCurve curve, FixedPointKind kind, double at, long held)
    {
        if (at is 0 or 1)
        {
            Quantity none = Quantity.Undefined(
                UndefinedCause.MethodHasNoLimit, "the cutoff is at the most extreme score, where its sampling error is not normal");
            return (none, none);
        }

        double variance = at * (1 - at) / held;
        double h = Math.Sqrt(variance);
        double low = Math.Max(0, at - h);
        double high = Math.Min(1, at + h);
        double slope = (Read(curve, kind, low, out _, out _) - Read(curve, kind, high, out _, out _)) / (high - low);
        return (Quantity.Of(slope), Quantity.Of(slope * slope * variance));
    }

    /// <summary>The value read at a fixed one; the last point that reaches it, and the next one where the curve is read between the two (else -1).</summary>
    public static double Read(RocCurve curve, FixedPointKind kind, double at, out int reaching, out int beyond)
    {
        // Counted from the end where the fixed value is 1, it falls: the last step at which it is still reached.
        int levels = curve.Sample.LevelCount;
        bool ofSensitivity = kind == FixedPointKind.SensitivityAtSpecificity;
        int low = 0;
        int high = levels;
        while (low < high)
        {
            int middle = low + ((high - low + 1) / 2);
            if (Held(curve, ofSensitivity, Positive(middle)) >= at)
            {
                low = middle;
            }
            else
            {
                high = middle - 1;
            }
        }

        reaching = Positive(low);
        double reached = Held(curve, ofSensitivity, reaching);
        double value = Held(curve, !ofSensitivity, reaching);
        beyond = reached == at || low == levels ? -1 : Positive(low + 1);
        if (beyond < 0)
        {
            return value;
        }

        double next = Held(curve, !ofSensitivity, beyond);
        double share = (reached - at) / (reached - Held(curve, ofSensitivity, beyond));
        return Math.Min(next, value + ((next - value) * share));

        int Positive(int step) => ofSensitivity ? step : levels - step;
    }

    private static double Held(RocCurve curve, bool specificity, int levelsPositive) => specificity
        ? (curve.Sample.WithoutCondition - curve.FalsePositives(levelsPositive)) / (double)curve.Sample.WithoutCondition
        : curve.TruePositives(levelsPositive) / (double)curve.Sample.WithCondition;
}
