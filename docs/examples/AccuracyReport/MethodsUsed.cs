namespace DiagnosticAccuracy.Examples;

/// <summary>The interval methods that a statement used, each once, in the order in which kinds of figures first came.</summary>
internal sealed class MethodsUsed
{
    private readonly List<(string Kind, string Method)> _used = [];

    public IEnumerable<string> Lines =>
        _used.GroupBy(used => used.Kind).SelectMany(kind => kind.Select(used => $"{used.Kind}: {used.Method}"));

    public void Add(string kind, string method)
    {
        if (!_used.Contains((kind, method)))
        {
            _used.Add((kind, method));
        }
    }
}
