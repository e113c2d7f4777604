namespace DiagnosticAccuracy.Tables;

/// <summary>Counts pairs of results, one subject at a time.</summary>
internal struct PairedCounter
{
    private long _both;
    private long _first;
    private long _second;
    private long _neither;

    public void Count(bool first, bool second)
    {
        if (first)
        {
            if (second)
            {
                _both++;
            }
            else
            {
                _first++;
            }
        }
        else if (second)
        {
            _second++;
        }
        else
        {
            _neither++;
        }
    }

    public readonly PairedTable ToTable() => new(_both, _first, _second, _neither);
}
