using FiberScope.Assessment.Input;
using FiberScope.Cli.Console;

namespace FiberScope.Cli.Commands;

/// <summary>An image from standard input, kept in a temporary file for as long as it is needed.</summary>
internal sealed class PipedImage(CommandConsole console) : IDisposable
{
    private string? _folder;

    /// <summary>Where the image is; standard input is read on the first call.</summary>
    /// <exception cref="InputException">Standard input is empty.</exception>
    public string Path
    {
        get
        {
            if (_folder is null)
            {
                _folder = Directory.CreateTempSubdirectory("fiberscope-").FullName;
                using var stream = File.Create(FilePath);
                console.Input.CopyTo(stream);
                if (stream.Length == 0)
                {
                    throw new InputException("standard input: holds no image");
                }
            }

            return FilePath;
        }
    }

    private string FilePath => System.IO.Path.Combine(_folder!, "standard-input");

    public void Dispose()
    {
        if (_folder is not null)
        {
            Directory.Delete(_folder, recursive: true);
        }
    }
}
