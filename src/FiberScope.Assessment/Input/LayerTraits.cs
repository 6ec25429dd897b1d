using System.Collections.Immutable;
using FiberScope.Filtration;
using UnitsNet;

namespace FiberScope.Assessment.Input;

/// <summary>What a file tells of a layer beside its fibres, solidity and thickness: how uneven, charged, bonded or holed it is.</summary>
public sealed record LayerTraits
{
    /// <summary>The fan model's drag over the mat's own; above zero; null to follow Davies' law.</summary>
    public Stated<double>? InhomogeneityFactor { get; init; }

    /// <summary>Charge per fibre surface; null for none.</summary>
    public Stated<ElectricSurfaceChargeDensity>? Charge { get; init; }

    /// <summary>The fibre's relative permittivity; 1 or above; 2.3, polypropylene, unless told.</summary>
    public double FibrePermittivity { get; init; } = 2.3;

    /// <summary>Coefficient of variation of the local basis weight; dimensionless, 0 to 0.9; null when not told.</summary>
    public double? BasisWeightVariation { get; init; }

    /// <summary>Share of the area that bonds close; dimensionless, 0 to 0.95; null when not told.</summary>
    public double? BondedArea { get; init; }

    /// <summary>Holes through the layer; default when not told.</summary>
    public ImmutableArray<Pinholes> Holes { get; init; }

    /// <summary>The openings between the fibres, for straining; null when not told.</summary>
    public MatOpenings? Openings { get; init; }

    /// <summary>The layer with what was told put in; what was not told stays as it is.</summary>
    public MediaLayer PutInto(MediaLayer layer)
    {
        var known = layer.Uncertainty ?? new LayerUncertainty();
        var uncertainty = known with
        {
            Inhomogeneity = InhomogeneityFactor?.RelativeUncertainty ?? known.Inhomogeneity,
            Charge = Charge?.RelativeUncertainty ?? known.Charge,
        };
        return layer with
        {
            InhomogeneityFactor = InhomogeneityFactor?.Value ?? layer.InhomogeneityFactor,
            Charge = Charge is { } charge ? new FibreCharge(charge.Value, FibrePermittivity) : layer.Charge,
            BasisWeightVariation = BasisWeightVariation ?? layer.BasisWeightVariation,
            BondedArea = BondedArea ?? layer.BondedArea,
            Holes = Holes.IsDefault ? layer.Holes : Holes,
            Openings = Openings ?? layer.Openings,
            Uncertainty = uncertainty == new LayerUncertainty() ? layer.Uncertainty : uncertainty,
        };
    }
}
