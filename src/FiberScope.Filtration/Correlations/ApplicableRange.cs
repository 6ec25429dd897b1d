using FiberScope.Statistics;

namespace FiberScope.Filtration.Correlations;

/// <summary>Where a correlation set was fitted or tested.</summary>
/// <param name="Name">The set as people cite it.</param>
/// <param name="Solidity">α; dimensionless.</param>
/// <param name="FibreMetres">Fibre diameters, m.</param>
/// <param name="ParticleMetres">Particle diameters, m.</param>
/// <param name="MetresPerSecond">Face velocities, m/s.</param>
/// <param name="LargestFibreKnudsen">The largest Kn = 2 λ / df.</param>
internal sealed record ApplicableRange(
    string Name,
    Interval Solidity,
    Interval FibreMetres,
    Interval ParticleMetres,
    Interval MetresPerSecond,
    double LargestFibreKnudsen);
