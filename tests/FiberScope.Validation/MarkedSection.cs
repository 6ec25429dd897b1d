namespace FiberScope.Validation;

/// <summary>One part of a document that a program keeps up to date, between two markers that stay invisible when rendered.</summary>
/// <remarks>
/// Several programs write to one document: each replaces what lies between its own markers and leaves the rest as it is.
/// A document without the markers gets the section at its end; a document that does not exist is begun with a title.
/// </remarks>
internal static class MarkedSection
{
    /// <summary>Replaces the section <paramref name="name"/> of a document on disk; the file is never left half written.</summary>
    public static void Write(string path, string name, string body, string titleOfNewDocument)
    {
        var document = File.Exists(path) ? File.ReadAllText(path) : $"# {titleOfNewDocument}\n";
        var folder = Path.GetDirectoryName(Path.GetFullPath(path))!;
        Directory.CreateDirectory(folder);
        var draft = path + ".draft";
        File.WriteAllText(draft, Replace(document, name, body));
        File.Move(draft, path, overwrite: true);
    }

    /// <summary>The document with the section <paramref name="name"/> replaced by <paramref name="body"/>.</summary>
    /// <exception cref="InvalidDataException">The end marker is missing or stands before its begin marker.</exception>
    public static string Replace(string document, string name, string body)
    {
        var begin = $"<!-- {name}:begin -->";
        var end = $"<!-- {name}:end -->";
        var section = $"{begin}\n\n{body.Trim()}\n\n{end}";
        var from = document.IndexOf(begin, StringComparison.Ordinal);
        if (from < 0)
        {
            return $"{document.TrimEnd()}\n\n{section}\n";
        }

        var to = document.IndexOf(end, from, StringComparison.Ordinal);
        return to < 0
            ? throw new InvalidDataException($"The document has '{begin}' without a later '{end}': add the end marker.")
            : string.Concat(document.AsSpan(0, from), section, document.AsSpan(to + end.Length));
    }
}
