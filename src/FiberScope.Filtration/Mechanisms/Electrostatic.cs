namespace FiberScope.Filtration.Mechanisms;

/// <summary>Collection by the charge of an electret fibre.</summary>
public static class Electrostatic
{
    /// <summary>
    /// Drift number of a neutral particle drawn in by the charge it mirrors: N = (2/3) ((εp − 1)/(εp + 2)) Cc dp² σ² / (μ ε₀ (1 + εf)² df U);
    /// Brown (1993), Air Filtration (from memory; the drift −N (Rf/r)⁵ U was derived anew).
    /// </summary>
    internal static double PolarisationNumber(double permittivity, double slip, double particleMetres, double coulombsPerSquareMetre, double fibrePermittivity, double pascalSeconds, double fibreMetres, double metresPerSecond)
    {
        var clausiusMossotti = (permittivity - 1) / (permittivity + 2);
        var charge = particleMetres * coulombsPerSquareMetre / (1 + fibrePermittivity);
        return 2.0 / 3 * clausiusMossotti * slip * charge * charge / (pascalSeconds * EquilibriumCharge.VacuumPermittivity * fibreMetres * metresPerSecond);
    }

    /// <summary>Drift number of one elementary charge: N = Cc e σ / (3 π μ dp ε₀ (1 + εf) U); Brown (1993), from memory.</summary>
    internal static double CoulombNumber(double secondsPerKilogram, double coulombsPerSquareMetre, double fibrePermittivity, double metresPerSecond) =>
        secondsPerKilogram * EquilibriumCharge.ElementaryCharge * coulombsPerSquareMetre / (EquilibriumCharge.VacuumPermittivity * (1 + fibrePermittivity) * metresPerSecond);

    /// <summary>Neutral particles: π N / (1 + 6.450 X + 0.6165 X²) with X = √(N/A).</summary>
    /// <param name="number">N of polarisation; dimensionless, fitted on 1e-4 to 10.</param>
    /// <param name="wallFactor">A = (1 − α) / Ku; fitted for α 0.02 to 0.2.</param>
    /// <remarks>
    /// Fitted for this project to limiting trajectories in the Kuwabara cell, within 2.4 %; tends to the exact π N. Published power
    /// laws (Lathrache and Fissan 1986; Brown 1981) agree with it only over part of their ranges.
    /// </remarks>
    public static double Polarisation(double number, double wallFactor)
    {
        var x = Math.Sqrt(number / wallFactor);
        return Math.PI * number / (1 + (6.450 * x) + (0.6165 * x * x));
    }

    /// <summary>
    /// Charged particles: 0.78 N below N = 1 and 0.59 N^0.83 from 1 to 10, Lathrache and Fissan (1986), from memory, joined smoothly:
    /// 0.78 N [1 + (N / 0.1936)²]^−0.085.
    /// </summary>
    /// <remarks>The printed forms jump by a quarter at N = 1; the join follows the upper one above 1 and lies up to 25 % below the lower one just under it.</remarks>
    /// <param name="number">N of the particle's charge; dimensionless, zero or above.</param>
    public static double Coulomb(double number)
    {
        var scaled = number / 0.1936;
        return 0.78 * number * Math.Pow(1 + (scaled * scaled), -0.085);
    }
}
