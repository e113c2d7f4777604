namespace DiagnosticAccuracy;

/// <summary>Methods for the confidence interval of the area under an empirical curve.</summary>
/// <remarks>
/// The DeLong variance is zero when all placements agree (at an area of 0 or 1, or when all subjects tie) and is undefined with one subject in
/// a group. There the methods that rest on it have no limits; the limits are then those of <see cref="NewcombeScore"/>, and the
/// interval names it.
/// </remarks>
public enum AreaMethod
{
    /// <summary>
    /// A normal interval of the log odds of the area with the DeLong variance, transformed back: the default. Its measured coverage is in
    /// docs/evidence/area-coverage.md: near its level up to an area of .90, short of it near 1.
    /// </summary>
    Logit = 0,

    /// <summary>The area plus and minus a multiple of its DeLong standard error, cut at 0 and 1. It is too short near 1.</summary>
    Wald,

    /// <summary>
    /// The score-type interval of Newcombe (Stat Med 2006;25:559, method 5): all areas that do not differ from the observed one
    /// by more than a multiple of the standard error they would have under exponential scores. It needs the area and the group
    /// sizes only, and has limits at every area.
    /// </summary>
    NewcombeScore,

    /// <summary>
    /// The area plus and minus a multiple of the exponential standard error of Hanley and McNeil (Radiology 1982;143:29), cut at 0 and 1. It needs the
    /// area and the group sizes only.
    /// </summary>
    HanleyMcNeilWald,
}
