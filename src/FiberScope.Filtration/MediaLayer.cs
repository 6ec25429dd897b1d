using FiberScope.Fibres;
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
}
