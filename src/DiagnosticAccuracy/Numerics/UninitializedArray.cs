namespace DiagnosticAccuracy.Numerics;

/// <summary>Arrays whose every element is written before it is read, so that they need not be cleared first.</summary>
internal static class UninitializedArray
{
    public static T[] Of<T>(int length)
        where T : unmanaged
    {
#if NET
        return GC.AllocateUninitializedArray<T>(length);
#else
        return new T[length];
#endif
    }
}
