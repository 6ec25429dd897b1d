using FiberScope.Fibres;
using FiberScope.Filtration.Mechanisms;
using UnitsNet;

namespace FiberScope.Filtration;

/// <summary>Closed forms for the most-penetrating size and the efficiency there, to check a numerical search by.</summary>
/// <remarks>
/// Lee and Liu (1980), printed as Hinds (1999), eqs. 9.34–9.35 (from memory; exponents derived anew). Diffusion and interception only, slip
/// correction as 3.53 √(λ/dp); within about 15 % of the numerical minimum of the same model.
/// </remarks>
public static class LeeLiuClosedForm
{
    /// <summary>dp = 0.885 [(Ku/(1 − α)) (√λ k T/μ) (df²/U)]^(2/9).</summary>
    public static Length MostPenetratingSize(Length fibre, Solidity solidity, Speed faceVelocity, AirProperties air)
    {
        var df = fibre.Meters;
        return Length.FromMeters(0.885 * Math.Pow(ThermalTerm(air) * df * df / (KuwabaraCell.WallFactor(solidity.Fraction) * faceVelocity.MetersPerSecond), 2.0 / 9));
    }

    /// <summary>E = 1.44 [((1 − α)/Ku)⁵ (√λ k T/μ)⁴ / (U⁴ df¹⁰)]^(1/9).</summary>
    public static double LeastEfficiency(Length fibre, Solidity solidity, Speed faceVelocity, AirProperties air) =>
        1.44 * Math.Pow(
            Math.Pow(KuwabaraCell.WallFactor(solidity.Fraction), 5) * Math.Pow(ThermalTerm(air), 4)
            / (Math.Pow(faceVelocity.MetersPerSecond, 4) * Math.Pow(fibre.Meters, 10)),
            1.0 / 9);

    private static double ThermalTerm(AirProperties air) => Math.Sqrt(air.MeanFreePathMetres) * Particle.Boltzmann * air.Kelvins / air.PascalSeconds;
}
