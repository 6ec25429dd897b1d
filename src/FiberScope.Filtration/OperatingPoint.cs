using System.Collections.Immutable;
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
}
