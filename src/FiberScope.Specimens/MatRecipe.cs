using System.Collections.Immutable;
using FiberScope.Statistics;
using UnitsNet;

namespace FiberScope.Specimens;

/// <summary>The mat itself: which fibres, how densely packed, how they lie.</summary>
public sealed record MatRecipe
{
    /// <summary>The fibres, one or more log-normal parts.</summary>
    public required ImmutableArray<FibrePopulation> Fibres { get; init; }

    /// <summary>Fibre volume over mat volume; dimensionless, from 0.001 to 0.6.</summary>
    public double Solidity { get; init => field = Require.Within(value, 0.001, 0.6, nameof(Solidity)); } = 0.08;

    /// <summary>The mat's thickness; above zero.</summary>
    public Length Thickness { get; init; } = Length.FromMicrometers(200);

    /// <summary>Density of the fibres' polymer; above zero. With solidity and thickness it gives the basis weight.</summary>
    public Density FibreDensity { get; init; } = Density.FromGramsPerCubicCentimeter(0.91);

    /// <summary>⟨cos 2θ⟩ about the preferred direction: 0 random in the plane, towards 1 all alike; from 0 to 0.98.</summary>
    public double OrientationOrder { get; init => field = Require.Within(value, 0, 0.98, nameof(OrientationOrder)); }

    /// <summary>The preferred (machine) direction, from the picture's x axis towards its y axis (downwards).</summary>
    public Angle PreferredDirection { get; init; } = Angle.FromDegrees(90);

    /// <summary>Root-mean-square wander of a fibre's direction about its mean; from 0 to 1.</summary>
    public Angle Wander { get; init; } = Angle.FromRadians(0.08);

    /// <summary>The length over which a fibre's direction wanders once to and fro; above zero.</summary>
    public Length WanderLength { get; init; } = Length.FromMicrometers(100);

    /// <summary>Relative standard deviation of a fibre's diameter along its own length; from 0 to 0.2.</summary>
    public double DiameterUnevenness { get; init => field = Require.Within(value, 0, 0.2, nameof(DiameterUnevenness)); } = 0.02;

    /// <summary>Share of the fibres that lie alongside another, touching it over a stretch; from 0 to 0.6.</summary>
    public double PairedShare { get; init => field = Require.Within(value, 0, 0.6, nameof(PairedShare)); } = 0.03;

    /// <summary>
    /// How deep the mat is laid for the picture, as optical cover (expected number of fibres over a point); from 0.02 to 12.
    /// A cover of 6 leaves 1 point in 400 open. A thinner mat ends earlier.
    /// </summary>
    public double DeepestCover { get; init => field = Require.Within(value, 0.02, 12, nameof(DeepestCover)); } = 6;

    /// <summary>Mass of mat per area: solidity × density × thickness.</summary>
    public AreaDensity BasisWeight => AreaDensity.FromKilogramsPerSquareMeter(Solidity * FibreDensity.KilogramsPerCubicMeter * Thickness.Meters);

    /// <inheritdoc/>
    public bool Equals(MatRecipe? other) => other is not null && Fibres.SequenceEqual(other.Fibres) && Numbers.SequenceEqual(other.Numbers);

    /// <inheritdoc/>
    public override int GetHashCode() => HashCode.Combine(Fibres.Length, Solidity, OrientationOrder, DeepestCover);

    private double[] Numbers =>
    [
        Solidity, Thickness.Meters, FibreDensity.KilogramsPerCubicMeter, OrientationOrder, PreferredDirection.Radians,
        Wander.Radians, WanderLength.Meters, DiameterUnevenness, PairedShare, DeepestCover,
    ];
}
