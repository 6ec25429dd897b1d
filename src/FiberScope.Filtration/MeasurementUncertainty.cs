using System.Collections.Immutable;
using FiberScope.Fibres;
using FiberScope.Statistics;

namespace FiberScope.Filtration;

/// <summary>What the uncertain inputs leave open in a forecast; apart from the spread between models.</summary>
public sealed record MeasurementUncertainty
{
    /// <summary>How many times the inputs were drawn.</summary>
    public required int Draws { get; init; }

    /// <summary>The seed of the draws.</summary>
    public required int Seed { get; init; }

    /// <summary>95 % interval of the pressure drop, Pa.</summary>
    public required Interval PressureDropPascals { get; init; }

    /// <summary>95 % interval of the most-penetrating size; null where fewer than nine draws in ten have one.</summary>
    public required LengthInterval? MostPenetratingSize { get; init; }

    /// <summary>95 % interval of the penetration at the most-penetrating size; dimensionless.</summary>
    public required Interval PenetrationAtMostPenetratingSize { get; init; }

    /// <summary>95 % interval of the quality factor, 1/Pa.</summary>
    public required Interval QualityFactorPerPascal { get; init; }

    /// <summary>Which input costs the forecast most, the costliest first.</summary>
    public required ImmutableArray<InputContribution> Ranking { get; init; }
}
