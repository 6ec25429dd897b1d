using System.Collections.Immutable;
using UnitsNet;

namespace FiberScope.Filtration;

/// <summary>One structure that was tried.</summary>
public sealed record DesignCandidate
{
    /// <summary>The variables' values, in their order and SI units.</summary>
    public required ImmutableArray<double> Values { get; init; }

    /// <summary>The structure.</summary>
    public required ImmutableArray<MediaLayer> Layers { get; init; }

    /// <summary>Pressure drop.</summary>
    public required Pressure PressureDrop { get; init; }

    /// <summary>The most-penetrating size; null when there is none.</summary>
    public required Length? MostPenetratingSize { get; init; }

    /// <summary>Penetration there; dimensionless.</summary>
    public required double PenetrationAtMostPenetratingSize { get; init; }

    /// <summary>Penetration of the targets' aerosol; null when none was asked for.</summary>
    public required double? AerosolPenetration { get; init; }

    /// <summary>Quality factor −ln P / Δp at the most-penetrating size; 1/Pa.</summary>
    public required double QualityFactorPerPascal { get; init; }

    /// <summary>Basis weight of all layers.</summary>
    public required AreaDensity BasisWeight { get; init; }

    /// <summary>Thickness of all layers.</summary>
    public required Length Thickness { get; init; }

    /// <summary>Whether every target is met by the central set.</summary>
    public required bool MeetsTargets { get; init; }

    /// <summary>
    /// The probability that each target is met, by its name: published sets taken as equally likely, with the measurement uncertainty
    /// of the starting layers about them. Worked out for the best candidates only; empty for the others.
    /// </summary>
    public ImmutableSortedDictionary<string, double> Probabilities { get; init; } = ImmutableSortedDictionary<string, double>.Empty;
}
