using System.Collections.Immutable;
using FiberScope.Filtration;

namespace FiberScope.Assessment.Input;

/// <summary>What a media file tells: layers and how they are used, ready for the filtration model.</summary>
public sealed record MediaFile
{
    /// <summary>The file as the user named it.</summary>
    public required string Name { get; init; }

    /// <summary>The layers, upstream first; at least one.</summary>
    public required ImmutableArray<MediaLayer> Layers { get; init; }

    /// <summary>How the medium is used.</summary>
    public required OperatingPoint Operation { get; init; }

    /// <summary>What is asked beside the curve.</summary>
    public ForecastRequest Request { get; init; } = new();

    /// <summary>The correlations asked for; null for the default.</summary>
    public required CorrelationSet? Correlations { get; init; }

    /// <summary>Reads and checks a media file.</summary>
    /// <exception cref="InputException">The file cannot be read or something in it is wrong; every problem is listed.</exception>
    public static MediaFile Read(string path) => MediaFileReader.Read(InputText.FromFile(path), Path.GetDirectoryName(Path.GetFullPath(path))!);

    /// <summary>Reads and checks the text of a media file.</summary>
    /// <param name="text">The YAML text.</param>
    /// <param name="name">The name to use in messages.</param>
    /// <param name="folder">The folder that relative paths start from.</param>
    /// <exception cref="InputException">Something in the text is wrong; every problem is listed.</exception>
    public static MediaFile Parse(string text, string name, string folder) => MediaFileReader.Read(new InputText(name, text), folder);
}
