using System.Collections.Immutable;
using UnitsNet;

namespace FiberScope.Assessment.Input;

/// <summary>Images that share a scale.</summary>
public sealed record ImageGroup
{
    /// <summary>Paths and globs, relative to the swatch file; empty only when images are given as found.</summary>
    public required ImmutableArray<string> Patterns { get; init; }

    /// <summary>Images that need no finding, such as one from standard input; they come first.</summary>
    public ImmutableArray<FoundImage> Given { get; init; } = [];

    /// <summary>The side of a pixel on the specimen; null when the images must tell it.</summary>
    public Stated<Length>? PixelSize { get; init; }

    /// <summary>The length of the scale bar to be found in the information strip; null when there is none to look for.</summary>
    public Length? ScaleBar { get; init; }

    /// <summary>How these micrographs were made; null when as the layer's others.</summary>
    public Imaging.ImagingMode? Imaging { get; init; }

    /// <summary>The line of the swatch file, from 1; 0 when the group comes from elsewhere.</summary>
    public int Line { get; init; }
}
