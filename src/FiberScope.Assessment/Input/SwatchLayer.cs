using System.Collections.Immutable;
using FiberScope.Imaging;
using UnitsNet;

namespace FiberScope.Assessment.Input;

/// <summary>One layer of a swatch as the swatch file tells it.</summary>
public sealed record SwatchLayer
{
    /// <summary>What people call the layer; empty for the only layer of a swatch.</summary>
    public string Name { get; init; } = "";

    /// <summary>How its micrographs were made.</summary>
    public ImagingMode Imaging { get; init; } = ImagingMode.SecondaryElectron;

    /// <summary>Its images; at least one group.</summary>
    public required ImmutableArray<ImageGroup> Images { get; init; }

    /// <summary>Mass per area; null when not told.</summary>
    public Stated<AreaDensity>? BasisWeight { get; init; }

    /// <summary>Thickness; null when not told.</summary>
    public Stated<Length>? Thickness { get; init; }

    /// <summary>What the fibres are made of; null when not told.</summary>
    public FibreMaterial? Material { get; init; }

    /// <summary>Solidity as told, in (0, 1); null when not told.</summary>
    public double? Solidity { get; init; }

    /// <summary>Relative standard uncertainty of <see cref="Solidity"/>; null when not told.</summary>
    public double? SolidityUncertainty { get; init; }

    /// <summary>What else is told of it.</summary>
    public LayerTraits Traits { get; init; } = new();
}
