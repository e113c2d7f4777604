namespace DiagnosticAccuracy.Proportions;

/// <summary>The two limits of an interval that is governed by a standard normal quantile.</summary>
internal interface INormalLimits
{
    /// <summary>The lower limit.</summary>
    /// <param name="z">The normal quantile, 0 or more.</param>
    /// <returns>The limit, not above the estimate.</returns>
    double Lower(double z);

    /// <summary>The upper limit.</summary>
    /// <param name="z">The normal quantile, 0 or more.</param>
    /// <returns>The limit, not below the estimate.</returns>
    double Upper(double z);
}
