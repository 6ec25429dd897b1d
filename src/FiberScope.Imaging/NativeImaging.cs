using System.Text.RegularExpressions;
using OpenCvSharp;

namespace FiberScope.Imaging;

/// <summary>The native library that measures pictures: whether it is there, and what to do when it is not.</summary>
public static partial class NativeImaging
{
    /// <summary>Tries to load the native library.</summary>
    /// <exception cref="NativeImagingMissingException">It does not load; the message says what is missing and how to install it.</exception>
    public static void Check()
    {
        try
        {
            Cv2.GetVersionString();
        }
        catch (Exception cause) when (cause is DllNotFoundException or TypeInitializationException or BadImageFormatException or EntryPointNotFoundException or OpenCvSharpException)
        {
            throw new NativeImagingMissingException(Message(cause), cause);
        }
    }

    /// <summary>The line for people: the missing file, when the system names it, and the command that installs it.</summary>
    internal static string Message(Exception cause)
    {
        var text = string.Join(' ', Chain(cause).Select(exception => exception.Message));
        var missing = MissingFile().Match(text) is { Success: true } match ? $": {match.Groups["file"].Value} is missing" : string.Empty;
        return OperatingSystem.IsLinux()
            ? $"The image library (OpenCV) cannot load{missing}; install what it needs with: sudo apt-get install -y libgtk-3-0"
            : $"The image library (OpenCV) cannot load{missing}; reinstall FiberScope, and on Windows the Visual C++ runtime.";
    }

    private static IEnumerable<Exception> Chain(Exception? exception)
    {
        for (; exception is not null; exception = exception.InnerException)
        {
            yield return exception;
        }
    }

    // The library's own name stands first in the loader's message; what it needs is what "cannot open shared object" names.
    [GeneratedRegex(@"(?<file>lib(?!OpenCvSharpExtern)[\w.+-]+\.so[.\d]*): cannot open", RegexOptions.CultureInvariant, 60_000)]
    private static partial Regex MissingFile();
}
