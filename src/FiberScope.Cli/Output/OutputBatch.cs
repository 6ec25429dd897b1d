namespace FiberScope.Cli.Output;

/// <summary>
/// Files that appear together or not at all: each is written under a temporary name, and only when all are whole do they take their
/// own names. What is not published is removed again, folders made for it included.
/// </summary>
public sealed class OutputBatch : IDisposable
{
    private readonly List<(string Temporary, string Final)> _files = [];
    private readonly Stack<string> _madeFolders = new();
    private bool _published;

    /// <summary>Makes sure, before long work begins, that a folder can be written to; leaves nothing behind.</summary>
    /// <exception cref="NotWritableException">It cannot.</exception>
    public static void Probe(string folder)
    {
        var existing = Path.GetFullPath(folder);
        while (!Directory.Exists(existing))
        {
            if (File.Exists(existing))
            {
                throw new NotWritableException($"Cannot write to '{folder}': '{existing}' is a file, not a folder; choose another --out.");
            }

            existing = Path.GetDirectoryName(existing) ?? throw new NotWritableException($"Cannot write to '{folder}': no such place; choose another --out.");
        }

        var probe = Path.Combine(existing, FormattableString.Invariant($".fiberscope-{Environment.ProcessId}.probe"));
        Guarded(folder, () =>
        {
            using var stream = new FileStream(probe, FileMode.CreateNew, FileAccess.Write, FileShare.None, 1, FileOptions.DeleteOnClose);
        });
    }

    /// <summary>Makes sure that the folder of a file can be written to; leaves nothing behind.</summary>
    /// <exception cref="NotWritableException">It cannot, or the name is a folder's.</exception>
    public static void ProbeFile(string path)
    {
        if (Directory.Exists(path))
        {
            throw new NotWritableException($"Cannot write to '{path}': it is a folder; name a file.");
        }

        Probe(Path.GetDirectoryName(Path.GetFullPath(path))!);
    }

    /// <summary>Writes a file under a temporary name.</summary>
    /// <param name="path">The name it takes when the batch is published.</param>
    /// <param name="write">Writes its bytes.</param>
    /// <exception cref="NotWritableException">It cannot be written.</exception>
    public void Add(string path, Action<Stream> write)
    {
        var final = Path.GetFullPath(path);
        var temporary = FormattableString.Invariant($"{final}.{Environment.ProcessId}.part");
        Guarded(path, () =>
        {
            MakeFolder(Path.GetDirectoryName(final)!);
            using var stream = new FileStream(temporary, FileMode.Create, FileAccess.Write, FileShare.None);
            _files.Add((temporary, final));
            write(stream);
        });
    }

    /// <summary>Gives every file its own name; files of those names are replaced.</summary>
    /// <exception cref="NotWritableException">A name cannot be taken.</exception>
    public void Publish()
    {
        foreach (var (temporary, final) in _files)
        {
            Guarded(final, () => File.Move(temporary, final, overwrite: true));
        }

        _published = true;
    }

    /// <summary>Removes what was not published.</summary>
    public void Dispose()
    {
        if (_published)
        {
            return;
        }

        foreach (var (temporary, _) in _files)
        {
            File.Delete(temporary);
        }

        while (_madeFolders.TryPop(out var folder))
        {
            if (Directory.Exists(folder) && !Directory.EnumerateFileSystemEntries(folder).Any())
            {
                Directory.Delete(folder);
            }
        }
    }

    private static void Guarded(string path, Action action)
    {
        try
        {
            action();
        }
        catch (Exception e) when (e is IOException or UnauthorizedAccessException)
        {
            throw new NotWritableException($"Cannot write to '{path}': {e.Message.Split('\n')[0].TrimEnd('.', '\r')}.", e);
        }
    }

    private void MakeFolder(string folder)
    {
        if (Directory.Exists(folder))
        {
            return;
        }

        MakeFolder(Path.GetDirectoryName(folder)!);
        Directory.CreateDirectory(folder);
        _madeFolders.Push(folder);
    }
}
