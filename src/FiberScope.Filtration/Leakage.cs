using FiberScope.Statistics;

namespace FiberScope.Filtration;

/// <summary>What a leak does to protection.</summary>
public static class Leakage
{
    /// <summary>P = Pm (1 − φ) + φ: a leak lets all sizes through alike.</summary>
    /// <param name="mediumPenetration">Pm of the medium; dimensionless, 0 to 1.</param>
    /// <param name="leakShare">φ, the leak's share of all the air; dimensionless, 0 to 1.</param>
    public static double Total(double mediumPenetration, double leakShare) =>
        (Require.Within(mediumPenetration, 0, 1) * (1 - Require.Within(leakShare, 0, 1))) + leakShare;

    /// <summary>The leak's share of the air at which the penetration doubles, and protection is halved: Pm / (1 − Pm).</summary>
    /// <param name="mediumPenetration">Pm of the medium; dimensionless, 0 to 1.</param>
    /// <returns>φ, at most 1: a medium that lets half through cannot be made twice as bad.</returns>
    public static double HalvingShare(double mediumPenetration) => mediumPenetration >= 0.5 ? 1 : Require.Within(mediumPenetration, 0, 1) / (1 - mediumPenetration);

    /// <summary>Total inward leakage of a mask: what comes through its filter, its face seal and its exhalation valve.</summary>
    /// <param name="mediumPenetration">Pm of the medium; dimensionless, 0 to 1.</param>
    /// <param name="sealShare">The face seal's share of the inhaled air; dimensionless.</param>
    /// <param name="valveShare">The exhalation valve's share of the inhaled air; dimensionless.</param>
    /// <remarks>The seal dominates and cannot be foretold from the medium: fit testing decides.</remarks>
    public static double TotalInward(double mediumPenetration, double sealShare, double valveShare) =>
        Total(mediumPenetration, Require.Within(sealShare + valveShare, 0, 1));
}
