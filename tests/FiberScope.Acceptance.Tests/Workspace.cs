namespace FiberScope.Acceptance.Tests;

/// <summary>A folder of a test's own that goes when the test ends.</summary>
public sealed class Workspace : IDisposable
{
    public string Root { get; } = Directory.CreateTempSubdirectory("fiberscope-acceptance-").FullName;

    public string PathTo(params string[] parts) => Path.Combine([Root, .. parts]);

    public string Write(string name, string text)
    {
        File.WriteAllText(PathTo(name), text);
        return PathTo(name);
    }

    public string Write(string name, byte[] bytes)
    {
        File.WriteAllBytes(PathTo(name), bytes);
        return PathTo(name);
    }

    /// <summary>Every file below the folder, for comparing before and after.</summary>
    public string[] Everything() => [.. Directory.EnumerateFileSystemEntries(Root, "*", SearchOption.AllDirectories).Order(StringComparer.Ordinal)];

    public void Dispose() => Directory.Delete(Root, recursive: true);
}
