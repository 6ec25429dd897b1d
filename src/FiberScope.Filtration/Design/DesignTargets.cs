using UnitsNet;

namespace FiberScope.Filtration;

/// <summary>What a structure must reach; null where nothing is asked.</summary>
public sealed record DesignTargets
{
    /// <summary>The most that may pass at the most-penetrating size; dimensionless.</summary>
    public double? PenetrationAtMostPenetratingSize { get; init; }

    /// <summary>The aerosol of <see cref="AerosolPenetration"/>.</summary>
    public ChallengeAerosol? Aerosol { get; init; }

    /// <summary>The most that may pass of <see cref="Aerosol"/>; dimensionless.</summary>
    public double? AerosolPenetration { get; init; }

    /// <summary>The highest pressure drop.</summary>
    public Pressure? PressureDrop { get; init; }

    /// <summary>The highest basis weight of all layers.</summary>
    public AreaDensity? BasisWeight { get; init; }

    /// <summary>The greatest thickness of all layers.</summary>
    public Length? Thickness { get; init; }
}
