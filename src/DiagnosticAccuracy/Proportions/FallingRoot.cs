using DiagnosticAccuracy.Numerics;

namespace DiagnosticAccuracy.Proportions;

/// <summary>The root of a falling function on the whole line, bracketed from a starting point outward.</summary>
internal static class FallingRoot
{
    // exp leaves the range of a double beyond these.
    private const double Farthest = 745;

    /// <summary>The root; minus or plus 745 when it lies beyond.</summary>
    public static double Find<TFunction>(TFunction f, double start, double step)
        where TFunction : struct, IFunction
    {
        double near = start;
        double atStart = f.Value(start);
        if (atStart == 0)
        {
            return start;
        }

        double direction = atStart > 0 ? 1 : -1;
        for (double stride = Math.Max(step, 1e-12); ; stride *= 2)
        {
            double far = near + (direction * stride);
            if (Math.Abs(far) >= Farthest)
            {
                far = direction * Farthest;
                if (f.Value(far) * direction > 0)
                {
                    return far;
                }
            }

            if (f.Value(far) * direction <= 0)
            {
                return RootFinding.Find(f, Math.Min(near, far), Math.Max(near, far), RootFinding.DefaultRelativeAccuracy, 1e-16);
            }

            near = far;
        }
    }
}
