using DiagnosticAccuracy.Numerics;

namespace DiagnosticAccuracy.Roc;

/// <summary>
/// A partial area over false-positive rates, and what each subject contributes to it.
/// </summary>
/// <remarks>
/// <para>The partial area over [f, t] is the mean, over those with the condition, of h(s) with s the false-positive rate at their score and
/// h(s) = min(max(t - s, 0), t - f). A subject tied with others is spread evenly over the step from s0 (above its score) to s1 (at or above).</para>
/// <para>The contribution of one without the condition is the derivative of that mean when its weight grows: it moves s0 and s1 of every level by
/// (is it above) - s0 and (is it at or above) - s1. The variance is the sum of the sample variances of both contributions over the group sizes; with
/// f = 0 and t = 1 these are the placements of DeLong.</para>
/// <para>Sensitivity ranges are taken on the mirrored curve: the groups change places and the order of levels turns round.</para>
/// </remarks>
internal sealed class PartialInfluence
{
    private readonly double[] _ofCases;
    private readonly double[] _ofControls;

    // By level, in the order of the (perhaps mirrored) curve; what a subject of a level contributes.
    private PartialInfluence(double value, double[] ofCases, double[] ofControls)
    {
        Value = value;
        _ofCases = ofCases;
        _ofControls = ofControls;
    }

    /// <summary>Gets the partial area.</summary>
    public double Value { get; }

    /// <summary>What a subject of the group whose share is on the vertical axis contributes, by level.</summary>
    public double OfCase(int level) => _ofCases[level];

    /// <summary>What a subject of the group whose share is on the horizontal axis contributes, by level.</summary>
    public double OfControl(int level) => _ofControls[level];

    /// <summary>The partial area over horizontal positions from f to t of the curve with these groups.</summary>
    /// <param name="levels">The number of levels, in the order from least to most positive.</param>
    /// <param name="cases">How many cases there are at or below each level.</param>
    /// <param name="controls">How many controls there are at or below each level.</param>
    /// <param name="mirrored">Whether cases and controls have changed places, so that levels count from the other end.</param>
    /// <param name="f">The lower end.</param>
    /// <param name="t">The upper end.</param>
    /// <param name="shareAtLowerEnd">Which share of the cases that stand exactly at f gains when they move to the left: one half for an end that is
    /// fixed; for an end where the curve passes a sensitivity, the share of the vertical step above it.</param>
    public static PartialInfluence Of(
        int levels, CumulativeCounts cases, CumulativeCounts controls, bool mirrored, double f, double t, double shareAtLowerEnd)
    {
        double allCases = cases.Through(levels - 1);
        double allControls = controls.Through(levels - 1);
        double[] ofCases = new double[levels];
        double[] ofControls = new double[levels];
        CompensatedSum value = default;

        // From the most positive level down: what all cases seen so far lend to a control that is above them is the sum over cases below it, so
        // the slopes are kept by level first and summed up from the least positive end afterwards.
        double[] atOrAbove = new double[levels];
        double[] above = new double[levels];
        CompensatedSum fixedPart = default;
        for (int i = 0; i < levels; i++)
        {
            double weight = cases.At(i) / allCases;
            double s0 = (mirrored ? controls.Below(i) : allControls - controls.Through(i)) / allControls;
            double s1 = (mirrored ? controls.Through(i) : allControls - controls.Below(i)) / allControls;
            double mean;
            if (s1 > s0)
            {
                mean = (Primitive(s1, f, t) - Primitive(s0, f, t)) / (s1 - s0);
                atOrAbove[i] = weight * ((Height(s1, f, t) - mean) / (s1 - s0));
                above[i] = weight * ((mean - Height(s0, f, t)) / (s1 - s0));
            }
            else
            {
                mean = Height(s0, f, t);
                above[i] = weight * Slope(s0, f, t, shareAtLowerEnd);
            }

            ofCases[i] = mean;
            value.Add(weight * mean);
            fixedPart.Add((atOrAbove[i] * s1) + (above[i] * s0));
        }

        // A control at level i is at or above every level up to i and above every level before it (the other way round when mirrored).
        CompensatedSum reached = default;
        for (int step = 0; step < levels; step++)
        {
            int i = mirrored ? levels - 1 - step : step;
            reached.Add(atOrAbove[i]);
            ofControls[i] = reached.Value - fixedPart.Value;
            reached.Add(above[i]);
        }

        return new PartialInfluence(value.Value, ofCases, ofControls);
    }

    /// <summary>The variance: both groups have at least two subjects.</summary>
    public double Variance(int levels, CumulativeCounts cases, CumulativeCounts controls) =>
        GroupVariance(levels, cases, _ofCases) + GroupVariance(levels, controls, _ofControls);

    private static double GroupVariance(int levels, CumulativeCounts group, double[] contributions)
    {
        double n = group.Through(levels - 1);
        CompensatedSum sum = default;
        for (int i = 0; i < levels; i++)
        {
            sum.Add(group.At(i) * contributions[i]);
        }

        double mean = sum.Value / n;
        CompensatedSum squares = default;
        for (int i = 0; i < levels; i++)
        {
            double gap = contributions[i] - mean;
            squares.Add(group.At(i) * gap * gap);
        }

        return WithoutRounding(squares.Value / (n - 1) / n);
    }

    // Contributions lie within -1 to 1; those that are all equal on paper differ by rounding, some 1e-16.
    internal static double WithoutRounding(double variance) => variance <= 1e-30 ? 0 : variance;

    private static double Height(double s, double f, double t) => Math.Min(Math.Max(t - s, 0), t - f);

    // The integral of the height from 0 to s.
    private static double Primitive(double s, double f, double t)
    {
        if (s <= f)
        {
            return s * (t - f);
        }

        double inside = Math.Min(s, t);
        return (f * (t - f)) + ((inside - f) * (t - ((inside + f) / 2)));
    }

    private static double Slope(double s, double f, double t, double shareAtLowerEnd)
    {
        if (s == f)
        {
            return f > 0 ? -shareAtLowerEnd : -1;
        }

        if (s == t)
        {
            return t < 1 ? -0.5 : -1;
        }

        return s > f && s < t ? -1 : 0;
    }
}
