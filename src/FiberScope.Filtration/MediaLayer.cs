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
}
