namespace FiberScope.Cli.Output;

/// <summary>A place that cannot be written to; the message says which and why.</summary>
public sealed class NotWritableException : Exception
{
    /// <summary>Makes the exception with its one-line message and what caused it.</summary>
    public NotWritableException(string message, Exception? innerException)
        : base(message, innerException)
    {
    }

    /// <summary>Makes the exception with its one-line message.</summary>
    public NotWritableException(string message)
        : base(message)
    {
    }

    /// <summary>Makes the exception without a message of its own.</summary>
    public NotWritableException()
    {
    }
}
