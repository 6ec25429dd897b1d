namespace FiberScope.Imaging;

/// <summary>An image file that cannot be read or measured; the message tells a person what, where and how to mend it.</summary>
public sealed class ImageRejectedException : Exception
{
    /// <summary>Makes the exception with its one-line message for people.</summary>
    public ImageRejectedException(string message)
        : base(message)
    {
    }

    /// <summary>Makes the exception with its one-line message and what caused it.</summary>
    public ImageRejectedException(string message, Exception innerException)
        : base(message, innerException)
    {
    }

    /// <summary>Makes the exception without a message of its own.</summary>
    public ImageRejectedException()
    {
    }
}
