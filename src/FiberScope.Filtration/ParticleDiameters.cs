using FiberScope.Statistics;
using UnitsNet;

namespace FiberScope.Filtration;

/// <summary>Turns the diameters that instruments report into each other.</summary>
/// <remarks>
/// Aerodynamic: the unit-density sphere that settles alike. Mobility: the sphere that drifts alike in an electric field; equal to
/// the physical diameter for a sphere. Volume-equivalent: the sphere of the same volume. Dynamic shape factor χ, 1 for spheres,
/// about 1.08 for cubic salt crystals (from memory). Relations: Hinds (1999), sections 3.5–3.6 (from memory).
/// </remarks>
public static class ParticleDiameters
{
    private const double UnitDensity = 1000;

    /// <summary>The aerodynamic diameter of a particle of known volume: da² Cc(da) ρ₀ χ = dv² Cc(dv) ρ.</summary>
    /// <param name="volumeEquivalent">dv; above zero.</param>
    /// <param name="density">ρ of the particle; above zero.</param>
    /// <param name="air">The air.</param>
    /// <param name="shapeFactor">χ; dimensionless, 1 or above.</param>
    public static Length AerodynamicFromVolume(Length volumeEquivalent, Density density, AirProperties air, double shapeFactor = 1)
    {
        Require.Within(shapeFactor, 1, 10);
        var wanted = SlipSquare(volumeEquivalent.Meters, air) * density.KilogramsPerCubicMeter / (UnitDensity * shapeFactor);
        return Solve(d => SlipSquare(d, air), wanted, volumeEquivalent.Meters);
    }

    /// <summary>The volume-equivalent diameter of a particle of known aerodynamic diameter.</summary>
    /// <param name="aerodynamic">da; above zero.</param>
    /// <param name="density">ρ of the particle; above zero.</param>
    /// <param name="air">The air.</param>
    /// <param name="shapeFactor">χ; dimensionless, 1 or above.</param>
    public static Length VolumeFromAerodynamic(Length aerodynamic, Density density, AirProperties air, double shapeFactor = 1)
    {
        Require.Within(shapeFactor, 1, 10);
        var wanted = SlipSquare(aerodynamic.Meters, air) * UnitDensity * shapeFactor / density.KilogramsPerCubicMeter;
        return Solve(d => SlipSquare(d, air), wanted, aerodynamic.Meters);
    }

    /// <summary>The volume-equivalent diameter of a particle of known mobility diameter: dm / Cc(dm) = χ dv / Cc(dv).</summary>
    /// <param name="mobility">dm; above zero.</param>
    /// <param name="air">The air.</param>
    /// <param name="shapeFactor">χ; dimensionless, 1 or above.</param>
    public static Length VolumeFromMobility(Length mobility, AirProperties air, double shapeFactor = 1)
    {
        Require.Within(shapeFactor, 1, 10);
        return Solve(d => d / Slip(d, air), mobility.Meters / (Slip(mobility.Meters, air) * shapeFactor), mobility.Meters);
    }

    private static double Slip(double metres, AirProperties air) => SlipCorrection.AllenRaabe(2 * air.MeanFreePathMetres / metres);

    private static double SlipSquare(double metres, AirProperties air) => metres * metres * Slip(metres, air);

    /// <summary>Bisection in ln d over six decades around a guess; every relation here rises with d.</summary>
    private static Length Solve(Func<double, double> rising, double wanted, double guessMetres)
    {
        Require.Positive(wanted);
        var (low, high) = (Math.Log(guessMetres) - Math.Log(1000), Math.Log(guessMetres) + Math.Log(1000));
        for (var i = 0; i < 60; i++)
        {
            var middle = 0.5 * (low + high);
            (low, high) = rising(Math.Exp(middle)) < wanted ? (middle, high) : (low, middle);
        }

        return Length.FromMeters(Math.Exp(0.5 * (low + high)));
    }
}
