using DiagnosticAccuracy.Numerics;

namespace DiagnosticAccuracy.Roc;

/// <summary>Confidence intervals of an area under a curve.</summary>
internal static class AreaIntervals
{
    private const string LogitName = "logit with DeLong variance";
    private const string WaldName = "Wald with DeLong variance";
    private const string HanleyMcNeilName = "Wald with Hanley-McNeil exponential variance";
    private const string NewcombeName = "score-type (Newcombe 2006, method 5)";

    public static ConfidenceInterval Interval(AreaUnderCurve area, Confidence confidence, AreaMethod method)
    {
        string name = method switch
        {
            AreaMethod.Logit => LogitName,
            AreaMethod.Wald => WaldName,
            AreaMethod.NewcombeScore => NewcombeName,
            AreaMethod.HanleyMcNeilWald => HanleyMcNeilName,
            _ => throw Guard.UnknownOption(method),
        };
        if (!area.IsDefined)
        {
            return ConfidenceInterval.Undefined(area.WhyUndefined!, confidence, name);
        }

        if (method == AreaMethod.NewcombeScore)
        {
            return NewcombeScore(area, confidence, name);
        }

        bool exponential = method == AreaMethod.HanleyMcNeilWald;
        Quantity variance = exponential ? area.VarianceBy(AreaVarianceMethod.HanleyMcNeilExponential) : area.Variance;
        string which = exponential ? "Hanley-McNeil" : "DeLong";
        if (!variance.IsDefined)
        {
            return NewcombeScore(area, confidence, $"{NewcombeName}, the {which} variance being undefined");
        }

        if (variance.Value == 0)
        {
            return NewcombeScore(area, confidence, $"{NewcombeName}, the {which} variance being zero");
        }

        double margin = StandardNormal.UpperQuantile(confidence.Tail) * Math.Sqrt(variance.Value);
        return method == AreaMethod.Logit
            ? Logit(area.Value, area.Complement, margin, confidence, name)
            : Wald(area.Value, margin, confidence, name);
    }

    // odds * exp(-+ z se / (A (1 - A))), back on the scale of the area without forming the odds.
    private static ConfidenceInterval Logit(double area, double complement, double margin, Confidence confidence, string name)
    {
        double factor = Math.Exp(margin / (area * complement));
        double lower = confidence.HasLower ? area / (area + (complement * factor)) : 0;
        double upper = confidence.HasUpper ? area * factor / ((area * factor) + complement) : 1;
        if (double.IsInfinity(factor))
        {
            upper = 1;
        }

        return new ConfidenceInterval(lower, upper, confidence, name);
    }

    private static ConfidenceInterval Wald(double area, double margin, Confidence confidence, string name)
    {
        double lower = confidence.HasLower ? Math.Min(1, Math.Max(0, area - margin)) : 0;
        double upper = confidence.HasUpper ? Math.Max(0, Math.Min(1, area + margin)) : 1;
        return new ConfidenceInterval(lower, upper, confidence, name);
    }

    private static ConfidenceInterval NewcombeScore(AreaUnderCurve area, Confidence confidence, string name)
    {
        double z = StandardNormal.UpperQuantile(confidence.Tail);
        double lower = 0;
        double upper = 1;
        if (confidence.HasLower)
        {
            lower = z >= 0 ? NewcombeLimit(area, z, below: true) : NewcombeLimit(area, -z, below: false);
        }

        if (confidence.HasUpper)
        {
            upper = z >= 0 ? NewcombeLimit(area, z, below: false) : NewcombeLimit(area, -z, below: true);
        }

        return new ConfidenceInterval(lower, upper, confidence, name);
    }

    /// <summary>
    /// The root of |A - t| = z sqrt(V(t)) on one side of A, with
    /// V(t) = t (1 - t) (1 + n* (1 - t) / (2 - t) + n* t / (1 + t)) / (n1 n0) and n* = (n1 + n0) / 2 - 1.
    /// </summary>
    /// <remarks>The formula is from memory; it is the variance of Hanley and McNeil (1982) with both sizes replaced by their mean.</remarks>
    private static double NewcombeLimit(AreaUnderCurve area, double z, bool below)
    {
        // Worked on the scale whose zero is the end of the space on that side, so that a limit near the end keeps its digits.
        double distance = below ? area.Value : area.Complement;
        double opposite = below ? area.Complement : area.Value;
        if (distance == 0)
        {
            return below ? 0 : 1;
        }

        double pairs = (double)area.WithCondition * area.WithoutCondition;
        double half = ((area.WithCondition + (double)area.WithoutCondition) / 2) - 1;
        double Excess(double t)
        {
            // V is the same at t and at 1 - t.
            double rest = 1 - t;
            double inflation = t * (1 + (half * rest / (1 + rest)) + (half * t / (1 + t))) / pairs;

            // At the end of the space both sides have the root of the gap in common, which is taken out.
            return opposite == 0 ? rest - (z * z * inflation) : distance - t - (z * Math.Sqrt(inflation * rest));
        }

        double root = RootFinding.Find(Excess, 0, distance);
        return below ? root : 1 - root;
    }
}
