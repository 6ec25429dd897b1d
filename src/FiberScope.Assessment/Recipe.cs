using System.Collections.Immutable;

namespace FiberScope.Assessment;

/// <summary>Everything needed to repeat an assessment: inputs, settings, versions, and the identity of every file.</summary>
public sealed record Recipe
{
    /// <summary>The version of this program, with its source revision where known.</summary>
    public required string Software { get; init; }

    /// <summary>When the assessment was made.</summary>
    public required DateTimeOffset MadeAt { get; init; }

    /// <summary>The swatch file as the user named it.</summary>
    public required string SwatchFile { get; init; }

    /// <summary>SHA-256 of the swatch file and of every file it leads to besides images: 64 lower-case hexadecimal digits by name.</summary>
    public required ImmutableSortedDictionary<string, string> FileHashes { get; init; }

    /// <summary>What the files told, in their order.</summary>
    public required ImmutableArray<RecipeEntry> Inputs { get; init; }

    /// <summary>Every setting that changes a number, the ones left at their default included.</summary>
    public required ImmutableArray<RecipeEntry> Settings { get; init; }

    /// <summary>Every image measured.</summary>
    public required ImmutableArray<ImageRecord> Images { get; init; }
}
