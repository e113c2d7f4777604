namespace DiagnosticAccuracy;

/// <summary>How to compute a confidence interval of a sensitivity at a fixed specificity, or the reverse.</summary>
/// <remarks>
/// Measured coverage at a nominal 95 % over three shapes of scores, four areas, three specificities and 50 to 500 in a group: logit 91.7 to 98.1 %, pseudo counts 91.5
/// to 98.6 %, Wald 84.9 to 96.8 %; an interval that takes the cutoff as fixed beforehand 67.4 to 95.8 %. See docs/evidence/fixed-point-coverage.md.
/// </remarks>
public enum FixedPointMethod
{
    /// <summary>Normal on the log odds, cutoff estimated: the default; <see cref="Adjusted"/>, and named so, where the estimate is 0 or 1.</summary>
    Logit = 0,

    /// <summary>Normal about the proportion with z^2/2 pseudo counts added to both outcomes, cutoff estimated. It has limits at 0 and 1 too.</summary>
    Adjusted,

    /// <summary>The estimate plus and minus a multiple of its standard error, cutoff estimated, cut at 0 and 1.</summary>
    Wald,
}
