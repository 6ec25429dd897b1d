namespace FiberScope.Imaging;

/// <summary>The native image library cannot load; the message says what is missing and how to install it.</summary>
public sealed class NativeImagingMissingException : Exception
{
    /// <summary>Makes the exception with its one-line message for people.</summary>
    public NativeImagingMissingException(string message)
        : base(message)
    {
    }

    /// <summary>Makes the exception with its one-line message and what caused it.</summary>
    public NativeImagingMissingException(string message, Exception innerException)
        : base(message, innerException)
    {
    }

    /// <summary>Makes the exception without a message of its own.</summary>
    public NativeImagingMissingException()
    {
    }
}
