namespace DiagnosticAccuracy.Tables;

/// <summary>What a pooled ratio compares.</summary>
internal enum PooledKind
{
    /// <summary>The positive share with the condition over that without it.</summary>
    PositiveLikelihoodRatio,

    /// <summary>The negative share with the condition over that without it.</summary>
    NegativeLikelihoodRatio,

    /// <summary>The odds of a positive result with the condition over those without it.</summary>
    OddsRatio,
}
