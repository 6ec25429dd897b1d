using System.Collections.Immutable;
using FiberScope.Statistics;
using UnitsNet;

namespace FiberScope.Filtration;

/// <summary>How the medium is used or tested.</summary>
public sealed record OperatingPoint
{
    /// <summary>Face velocity: flow divided by media area; above zero.</summary>
    public required Speed FaceVelocity { get; init; }

    /// <summary>The state of the air.</summary>
    public AirState Air { get; init; } = AirState.Standard;

    /// <summary>Density of the particles; above zero. Unit density unless told otherwise.</summary>
    public Density ParticleDensity { get; init; } = Density.FromKilogramsPerCubicMeter(1000);

    /// <summary>The particle diameters (physical, sphere) of the curve; empty asks for the usual range, 10 nm to 10 µm.</summary>
    public ImmutableArray<Length> Particles { get; init; } = [];

    /// <summary>Which way the air flows; across unless told otherwise.</summary>
    public FlowDirection Direction { get; init; } = FlowDirection.Horizontal;

    /// <summary>How the particles are charged; matters to electret layers only.</summary>
    public ParticleCharging Charging { get; init; } = ParticleCharging.Equilibrium;

    /// <summary>Relative permittivity of the particles, above 1; 6.1 (rock salt, from memory) unless told otherwise. Oils: about 2.3.</summary>
    public double ParticlePermittivity { get; init => field = Require.Within(value, 1, 1e6, nameof(ParticlePermittivity)); } = 6.1;

    /// <summary>A gap past the whole medium; null for none.</summary>
    public EdgeLeak? Leak { get; init; }

    /// <summary>How well the conditions are known; null when nothing is said.</summary>
    public OperatingUncertainty? Uncertainty { get; init; }
}
