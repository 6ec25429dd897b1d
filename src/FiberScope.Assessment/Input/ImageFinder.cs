using System.Collections.Immutable;
using Microsoft.Extensions.FileSystemGlobbing;

namespace FiberScope.Assessment.Input;

/// <summary>Finds the files behind paths and globs.</summary>
public static class ImageFinder
{
    private static readonly char[] Wildcards = ['*', '?'];

    /// <summary>The files of one group, globs in the order of their names.</summary>
    /// <param name="group">The patterns.</param>
    /// <param name="folder">The folder that relative patterns start from.</param>
    /// <param name="problems">Takes what is wrong, with the pattern: no such file, nothing found.</param>
    public static ImmutableArray<FoundImage> Find(ImageGroup group, string folder, Action<string> problems)
    {
        var found = ImmutableArray.CreateBuilder<FoundImage>();
        var seen = new HashSet<string>(StringComparer.Ordinal);
        found.AddRange(group.Given);
        foreach (var pattern in group.Patterns)
        {
            var files = Expand(pattern.Replace('\\', '/'), folder, problems);
            found.AddRange(files.Where(f => seen.Add(Path.GetFullPath(f.Path))));
        }

        return found.ToImmutable();
    }

    private static IEnumerable<FoundImage> Expand(string pattern, string folder, Action<string> problems)
    {
        if (pattern.IndexOfAny(Wildcards) < 0)
        {
            var path = Path.Combine(folder, pattern);
            if (File.Exists(path))
            {
                return [new FoundImage(pattern, path)];
            }

            problems(Directory.Exists(path) ? $"'{pattern}' is a folder; name its images, such as '{pattern.TrimEnd('/')}/*.tif'" : $"no such image: '{pattern}'");
            return [];
        }

        // The part before the first wildcard is a plain folder; it may be absolute or climb with '..'.
        var cut = pattern.LastIndexOf('/', pattern.IndexOfAny(Wildcards)) + 1;
        var (prefix, rest) = (pattern[..cut], pattern[cut..]);
        var start = Path.Combine(folder, prefix);
        string[] files = Directory.Exists(start)
            ? [.. new Matcher(StringComparison.OrdinalIgnoreCase).AddInclude(rest).GetResultsInFullPath(start).Order(StringComparer.Ordinal)]
            : [];
        if (files.Length == 0)
        {
            problems($"no image matches '{pattern}'");
        }

        return files.Select(f => new FoundImage(prefix + Path.GetRelativePath(start, f).Replace('\\', '/'), f));
    }
}
