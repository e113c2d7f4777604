namespace DiagnosticAccuracy.Examples;

/// <summary>Something in the file or the options that cannot be used; its message is one line for the person who ran the program.</summary>
public sealed class StudyException : Exception
{
    public StudyException()
    {
    }

    public StudyException(string message)
        : base(message)
    {
    }

    public StudyException(string message, Exception innerException)
        : base(message, innerException)
    {
    }
}
