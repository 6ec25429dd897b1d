using System.Collections.Immutable;
using FiberScope.Statistics;
using UnitsNet;

namespace FiberScope.Filtration;

/// <summary>Penetration at one particle size.</summary>
public sealed record CurvePoint
{
    /// <summary>Particle diameter (physical, sphere).</summary>
    public required Length Particle { get; init; }

    /// <summary>Penetration; dimensionless, 0 to 1.</summary>
    public required double Penetration { get; init; }

    /// <summary>The spread between the published correlations: lowest and highest penetration.</summary>
    public required Interval ModelBand { get; init; }

    /// <summary>The 95 % interval from the uncertainties of the measured inputs; null when none were given.</summary>
    public Interval? MeasurementBand { get; init; }

    /// <summary>
    /// Share of −ln P that each mechanism brings, by its stable name: <c>diffusion</c>, <c>interception</c>,
    /// <c>diffusion-interception</c>, <c>impaction</c>, <c>gravity</c>, <c>electrostatic</c>, <c>straining</c>; the shares sum to 1.
    /// </summary>
    public required ImmutableSortedDictionary<string, double> ByMechanism { get; init; }
}
