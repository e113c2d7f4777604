namespace DiagnosticAccuracy.Numerics;

/// <summary>A running sum of doubles whose rounding errors are carried along (Neumaier, Z Angew Math Mech 1974;54:39).</summary>
internal struct CompensatedSum
{
    private double _sum;
    private double _compensation;

    /// <summary>Gets the sum so far.</summary>
    public readonly double Value => _sum + _compensation;

    /// <summary>Adds a finite number.</summary>
    public void Add(double value)
    {
        double sum = _sum + value;
        _compensation += Math.Abs(_sum) >= Math.Abs(value) ? (_sum - sum) + value : (value - sum) + _sum;
        _sum = sum;
    }
}
