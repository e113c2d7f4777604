namespace DiagnosticAccuracy;

/// <summary>
/// Which end of the scale speaks for the condition. It is always stated by the caller: a direction taken from the same
/// data that are then judged makes every area at least one half.
/// </summary>
/// <remarks>The default of the type is neither, and is refused wherever a direction is asked for.</remarks>
public enum ScoreDirection
{
    /// <summary>Higher scores speak for the condition: positive means at or above the cutoff.</summary>
    HigherIsPositive = 1,

    /// <summary>Lower scores speak for the condition: positive means at or below the cutoff.</summary>
    LowerIsPositive = 2,
}
