using System.Collections.Immutable;
using FiberScope.Fibres;
using UnitsNet;

namespace FiberScope.Assessment;

/// <summary>One layer of a swatch: its fields, its fibre diameters, its solidity.</summary>
public sealed record LayerFinding
{
    /// <summary>What people call the layer; empty for the only layer of a swatch.</summary>
    public required string Name { get; init; }

    /// <summary>The fields, in the order of the swatch file.</summary>
    public required ImmutableArray<FieldFinding> Fields { get; init; }

    /// <summary>The pooled diameters of the included fields.</summary>
    public required DiameterSurvey Survey { get; init; }

    /// <summary>The layer's solidity by every route at hand; null when nothing told it.</summary>
    public required SolidityFinding? Solidity { get; init; }

    /// <summary>What the fields that count show besides diameters; null when not looked at.</summary>
    public MatStructure? Structure { get; init; }

    /// <summary>What the fibres are made of, for people; null when not told.</summary>
    public required string? PolymerName { get; init; }

    /// <summary>The density of the fibre polymer; null when not told.</summary>
    public required Density? FibreDensity { get; init; }

    /// <summary>Mass per area; null when not told.</summary>
    public required AreaDensity? BasisWeight { get; init; }

    /// <summary>Thickness; null when not told.</summary>
    public required Length? Thickness { get; init; }

    /// <summary>The relative standard uncertainty of <see cref="BasisWeight"/>; dimensionless.</summary>
    public double BasisWeightUncertainty { get; init; } = Measuring.SolidityRoutes.BasisWeightUncertainty;

    /// <summary>The relative standard uncertainty of <see cref="Thickness"/>; dimensionless.</summary>
    public double ThicknessUncertainty { get; init; } = Measuring.SolidityRoutes.ThicknessUncertainty;
}
