using System.Collections.Immutable;
using FiberScope.Fibres;
using FiberScope.Statistics;
using UnitsNet;

namespace FiberScope.Filtration;

/// <summary>One layer of a medium, as the filtration model sees it.</summary>
public sealed record MediaLayer
{
    /// <summary>What people call the layer; may be empty.</summary>
    public string Name { get; init; } = "";

    /// <summary>The length-weighted fibre diameters.</summary>
    public required DiameterDistribution Diameters { get; init; }

    /// <summary>The layer's solidity.</summary>
    public required Solidity Solidity { get; init; }

    /// <summary>The layer's thickness; above zero.</summary>
    public required Length Thickness { get; init; }

    /// <summary>
    /// How uneven the mat is: the fan model's drag over the mat's own, ε; above zero, usually 1 to 2.2. Null takes the ε that turns the fan
    /// model into Davies' law for real pads. It divides drag and non-inertial efficiency alike in every correlation set.
    /// </summary>
    public double? InhomogeneityFactor { get; init => field = value is { } given ? Require.Positive(given, nameof(InhomogeneityFactor)) : null; }

    /// <summary>The layer's charge; null for none (as discharged).</summary>
    public FibreCharge? Charge { get; init; }

    /// <summary>
    /// Coefficient of variation of the local basis weight, from place to place; dimensionless, 0 to 0.9. Thin places let more air through,
    /// and more particles with it.
    /// </summary>
    public double BasisWeightVariation { get; init => field = Require.Within(value, 0, 0.9, nameof(BasisWeightVariation)); }

    /// <summary>Share of the area that point bonds or film close; dimensionless, 0 to below 1.</summary>
    public double BondedArea { get; init => field = Require.Within(value, 0, 0.95, nameof(BondedArea)); }

    /// <summary>Holes through the layer; empty for none.</summary>
    public ImmutableArray<Pinholes> Holes { get; init; } = [];

    /// <summary>The openings between its fibres; null leaves straining out.</summary>
    public MatOpenings? Openings { get; init; }

    /// <summary>How well the layer's structure is known; null when nothing is said.</summary>
    public LayerUncertainty? Uncertainty { get; init; }
}
