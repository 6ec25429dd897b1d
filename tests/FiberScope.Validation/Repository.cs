namespace FiberScope.Validation;

/// <summary>Where the project's own files are, found upwards from where the program stands.</summary>
internal static class Repository
{
    /// <summary>The folder that holds <c>FiberScope.sln</c>.</summary>
    /// <exception cref="DirectoryNotFoundException">The program does not stand inside the project.</exception>
    public static string Root { get; } = Find(AppContext.BaseDirectory) ?? Find(Environment.CurrentDirectory)
        ?? throw new DirectoryNotFoundException("FiberScope.sln was not found in any folder above this program: run it from inside the project.");

    /// <summary>A file or folder of the project by its path from the root.</summary>
    public static string Locate(params ReadOnlySpan<string> parts) => Path.Combine([Root, .. parts]);

    private static string? Find(string start)
    {
        for (var folder = new DirectoryInfo(start); folder is not null; folder = folder.Parent)
        {
            if (File.Exists(Path.Combine(folder.FullName, "FiberScope.sln")))
            {
                return folder.FullName;
            }
        }

        return null;
    }
}
