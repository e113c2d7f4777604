namespace DiagnosticAccuracy.Proportions;

/// <summary>The first proportion less the ratio times the second one, and the variance of that under the hypothesis.</summary>
internal readonly record struct RatioScoreParts(double Difference, double Variance);
