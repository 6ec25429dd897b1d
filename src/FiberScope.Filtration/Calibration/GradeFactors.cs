using UnitsNet;

namespace FiberScope.Filtration;

/// <summary>What a calibration puts into the layers of a grade.</summary>
/// <param name="Inhomogeneity">ε, the fan model's drag over the mat's own.</param>
/// <param name="Variation">Coefficient of variation of the basis weight.</param>
/// <param name="OpenArea">Share of the area in holes.</param>
/// <param name="CoulombsPerSquareMetre">Fibre charge.</param>
internal readonly record struct GradeFactors(double Inhomogeneity, double Variation, double OpenArea, double CoulombsPerSquareMetre)
{
    /// <summary>Diameter of the holes that stand for thin spots and pinholes; an assumption, as only what they let through is fitted.</summary>
    public const double HoleMetres = 2e-4;

    /// <summary>The layer with these factors in place of its own.</summary>
    public MediaLayer PutInto(MediaLayer layer) => layer with
    {
        InhomogeneityFactor = Inhomogeneity,
        BasisWeightVariation = Variation,
        Holes = OpenArea > 0 ? [new Pinholes(Length.FromMeters(HoleMetres), OpenArea)] : [],
        Charge = CoulombsPerSquareMetre > 0
            ? new FibreCharge(ElectricSurfaceChargeDensity.FromCoulombsPerSquareMeter(CoulombsPerSquareMetre), layer.Charge?.FibrePermittivity ?? 2.3)
            : null,
    };
}
