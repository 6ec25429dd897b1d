using System.Collections.Immutable;
using FiberScope.Conformity;
using FiberScope.Filtration;

namespace FiberScope.Assessment.Input;

/// <summary>What a swatch file tells, checked and with its units understood.</summary>
public sealed record SwatchFile
{
    /// <summary>The file as the user named it.</summary>
    public required string Name { get; init; }

    /// <summary>The folder that its relative paths start from.</summary>
    public required string Folder { get; init; }

    /// <summary>Which piece of which material.</summary>
    public required SwatchIdentity Identity { get; init; }

    /// <summary>The layers, upstream first; at least one.</summary>
    public required ImmutableArray<SwatchLayer> Layers { get; init; }

    /// <summary>How the medium is used; null when no face velocity was told and no forecast is wanted.</summary>
    public required OperatingPoint? Operation { get; init; }

    /// <summary>What is asked of the forecast beside its curve.</summary>
    public ForecastRequest Request { get; init; } = new();

    /// <summary>The correlations asked for; null for the default.</summary>
    public required CorrelationSet? Correlations { get; init; }

    /// <summary>What a rig measured; may be empty.</summary>
    public required ImmutableArray<RigTest> RigTests { get; init; }

    /// <summary>The limits to judge by; null when none are named.</summary>
    public required Grade? Grade { get; init; }

    /// <summary>Every value of the file with its line, for the record.</summary>
    public required ImmutableArray<RecipeEntry> Entries { get; init; }

    /// <summary>SHA-256 by name of this file and the text files that it leads to.</summary>
    public required ImmutableSortedDictionary<string, string> FileHashes { get; init; }

    /// <summary>Reads and checks a swatch file.</summary>
    /// <exception cref="InputException">The file cannot be read or something in it is wrong; every problem is listed.</exception>
    public static SwatchFile Read(string path) => SwatchFileReader.Read(InputText.FromFile(path), Path.GetDirectoryName(Path.GetFullPath(path))!);

    /// <summary>Reads and checks the text of a swatch file.</summary>
    /// <param name="text">The YAML text.</param>
    /// <param name="name">The name to use in messages.</param>
    /// <param name="folder">The folder that relative paths start from.</param>
    /// <exception cref="InputException">Something in the text is wrong; every problem is listed.</exception>
    public static SwatchFile Parse(string text, string name, string folder) => SwatchFileReader.Read(new InputText(name, text), folder);
}
