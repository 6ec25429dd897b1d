namespace FiberScope.Imaging.Tests;

/// <summary>Finds real micrographs in a folder <c>shared/real-fields</c> somewhere above the tests; they are not part of the project.</summary>
internal static class RealFields
{
    /// <summary>The micrographs, by name; empty when there is no such folder.</summary>
    public static string[] Files(string pattern = "*")
    {
        for (var folder = new DirectoryInfo(AppContext.BaseDirectory); folder is not null; folder = folder.Parent)
        {
            var fields = Path.Combine(folder.FullName, "shared", "real-fields");
            if (Directory.Exists(fields))
            {
                return [.. Directory.GetFiles(fields, pattern).Where(file => Path.GetExtension(file) is ".tif" or ".png").Order(StringComparer.Ordinal)];
            }
        }

        return [];
    }
}
