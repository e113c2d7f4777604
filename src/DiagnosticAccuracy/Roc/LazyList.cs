using System.Collections;

namespace DiagnosticAccuracy.Roc;

/// <summary>A read-only list whose elements are made when they are asked for.</summary>
internal sealed class LazyList<T>(int count, Func<int, T> element) : IReadOnlyList<T>
{
    public int Count => count;

    public T this[int index]
    {
        get
        {
            if ((uint)index >= (uint)count)
            {
                throw Guard.OutOfRange(nameof(index), index, $"an index from 0 to {Display.Of(count - 1)}");
            }

            return element(index);
        }
    }

    public IEnumerator<T> GetEnumerator()
    {
        for (int i = 0; i < count; i++)
        {
            yield return element(i);
        }
    }

    IEnumerator IEnumerable.GetEnumerator() => GetEnumerator();
}
