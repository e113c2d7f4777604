using System.Numerics;

namespace DiagnosticAccuracy.Cutoffs;

/// <summary>Searches along the points of an empirical curve that has both groups.</summary>
internal static class CurveSearch
{
    public static OperatingPoint SensitivityAtLeast(RocCurve curve, double target)
    {
        // Sensitivity grows along the points and specificity falls: the first point that reaches the target, then on to the last one
        // with the same false positives.
        int points = curve.Sample.LevelCount + 1;
        double withCondition = curve.Sample.WithCondition;
        int chosen = FirstFrom(0, points, i => curve.TruePositives(i) / withCondition >= target);
        long falsePositives = curve.FalsePositives(chosen);
        return curve.PointAt(FirstFrom(chosen, points, i => curve.FalsePositives(i) > falsePositives) - 1);
    }

    public static OperatingPoint SpecificityAtLeast(RocCurve curve, double target)
    {
        // The last point that reaches the target, then back to the first one with the same true positives.
        int points = curve.Sample.LevelCount + 1;
        double withoutCondition = curve.Sample.WithoutCondition;
        long trueNegativesAtStart = curve.Sample.WithoutCondition;
        int chosen = FirstFrom(0, points, i => (trueNegativesAtStart - curve.FalsePositives(i)) / withoutCondition < target) - 1;
        long truePositives = curve.TruePositives(chosen);
        return curve.PointAt(FirstFrom(0, points, i => curve.TruePositives(i) >= truePositives));
    }

    public static IReadOnlyList<OperatingPoint> LargestYoudenIndex(RocCurve curve)
    {
        // J times both group sizes is an integer, so ties are exact.
        int points = curve.Sample.LevelCount + 1;
        long n1 = curve.Sample.WithCondition;
        long n0 = curve.Sample.WithoutCondition;
        List<int> best = curve.Sample.Total <= int.MaxValue
            ? WhereLargest(points, i => (curve.TruePositives(i) * n0) - (curve.FalsePositives(i) * n1))
            : WhereLargest(points, i => ((BigInteger)curve.TruePositives(i) * n0) - ((BigInteger)curve.FalsePositives(i) * n1));
        return best.ConvertAll(curve.PointAt);
    }

    private static List<int> WhereLargest<T>(int points, Func<int, T> value)
        where T : struct, IComparable<T>
    {
        List<int> best = [0];
        T largest = value(0);
        for (int i = 1; i < points; i++)
        {
            T candidate = value(i);
            int order = candidate.CompareTo(largest);
            if (order > 0)
            {
                best.Clear();
                largest = candidate;
            }

            if (order >= 0)
            {
                best.Add(i);
            }
        }

        return best;
    }

    // The first index from start on, below end, at which a condition holds that stays true once it is; end when it never does.
    private static int FirstFrom(int start, int end, Func<int, bool> holds)
    {
        while (start < end)
        {
            int middle = start + ((end - start) / 2);
            if (holds(middle))
            {
                end = middle;
            }
            else
            {
                start = middle + 1;
            }
        }

        return start;
    }
}
