using DiagnosticAccuracy.Numerics;

namespace DiagnosticAccuracy.Proportions;

/// <summary>Puts together an interval from limits that are governed by a standard normal quantile.</summary>
internal static class NormalInterval
{
    /// <summary>The interval, with the ends of the parameter space on a side that is not asked for.</summary>
    public static ConfidenceInterval Of<TLimits>(TLimits limits, Confidence confidence, double spaceLower, double spaceUpper, string name)
        where TLimits : struct, INormalLimits
    {
        // A one-sided level below one half has a negative z: its limit lies on the other side of the estimate.
        double z = StandardNormal.UpperQuantile(confidence.Tail);
        double lower = spaceLower;
        double upper = spaceUpper;
        if (confidence.HasLower)
        {
            lower = z >= 0 ? limits.Lower(z) : limits.Upper(-z);
        }

        if (confidence.HasUpper)
        {
            upper = z >= 0 ? limits.Upper(z) : limits.Lower(-z);
        }

        return new ConfidenceInterval(
            Math.Min(spaceUpper, Math.Max(spaceLower, lower)), Math.Min(spaceUpper, Math.Max(spaceLower, upper)), confidence, name);
    }
}
