namespace FiberScope.TestKit;

/// <summary>Finds the project's own folders from wherever the tests run.</summary>
public static class Repository
{
    /// <summary>The folder that holds the solution.</summary>
    /// <exception cref="DirectoryNotFoundException">The tests do not run inside a checkout.</exception>
    public static string Root { get; } = Upwards("FiberScope.sln")
        ?? throw new DirectoryNotFoundException("FiberScope.sln was not found in any folder above the tests.");

    /// <summary>A path inside the checkout.</summary>
    public static string PathTo(params string[] parts) => Path.Combine([Root, .. parts]);

    /// <summary>
    /// A folder of material that may stand beside the checkout but is no part of it; null when it is absent, and the test skips.
    /// </summary>
    public static string? Beside(params string[] parts)
    {
        for (var folder = new DirectoryInfo(Root); folder is not null; folder = folder.Parent)
        {
            var candidate = Path.Combine([folder.FullName, .. parts]);
            if (Directory.Exists(candidate))
            {
                return candidate;
            }
        }

        return null;
    }

    private static string? Upwards(string file)
    {
        for (var folder = new DirectoryInfo(AppContext.BaseDirectory); folder is not null; folder = folder.Parent)
        {
            if (File.Exists(Path.Combine(folder.FullName, file)))
            {
                return folder.FullName;
            }
        }

        return null;
    }
}
