using FiberScope.Statistics;
using UnitsNet;

namespace FiberScope.Filtration;

/// <summary>The charge of an electret layer: as much plus as minus, in lines along the fibres.</summary>
/// <remarks>
/// It cannot be seen in a micrograph: give it, or infer it from penetration measured as received and discharged. Typical: 10 to
/// 100 µC/m² (from memory); heat, solvents and oil lower it.
/// </remarks>
public sealed record FibreCharge
{
    /// <summary>Makes the charge.</summary>
    /// <param name="surfaceDensity">σ, charge per fibre surface; zero or above.</param>
    /// <param name="fibrePermittivity">εf, relative; 1 or above. 2.3 is polypropylene.</param>
    /// <exception cref="ArgumentOutOfRangeException">An argument is out of its range.</exception>
    public FibreCharge(ElectricSurfaceChargeDensity surfaceDensity, double fibrePermittivity = 2.3)
    {
        CoulombsPerSquareMetre = Require.NotNegative(surfaceDensity.CoulombsPerSquareMeter, nameof(surfaceDensity));
        FibrePermittivity = Require.Within(fibrePermittivity, 1, 1e4);
    }

    /// <summary>σ, charge per fibre surface.</summary>
    public ElectricSurfaceChargeDensity SurfaceDensity => ElectricSurfaceChargeDensity.FromCoulombsPerSquareMeter(CoulombsPerSquareMetre);

    /// <summary>εf, the fibre's relative permittivity.</summary>
    public double FibrePermittivity { get; }

    internal double CoulombsPerSquareMetre { get; }
}
