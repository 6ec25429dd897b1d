using FiberScope.Statistics;

namespace FiberScope.Filtration.Mechanisms;

/// <summary>The flow across one fibre in its cell without slip, and what follows from it in closed form.</summary>
/// <remarks>
/// Holds for creeping flow across parallel cylinders. Source: Kuwabara (1959), J. Phys. Soc. Jpn. 14(4), 527–532 (from memory,
/// confirmed by a numerical solution). The speed that scales the flow is the face velocity.
/// </remarks>
public static class KuwabaraCell
{
    /// <summary>The hydrodynamic factor, Ku = −½ ln α − ¾ + α − ¼ α².</summary>
    /// <param name="solidity">α; dimensionless, 0 &lt; α &lt; 1.</param>
    /// <returns>Ku; dimensionless, above zero, falling as the mat gets denser.</returns>
    /// <exception cref="ArgumentOutOfRangeException"><paramref name="solidity"/> is not in (0, 1).</exception>
    public static double HydrodynamicFactor(double solidity)
    {
        var alpha = Require.Inside(solidity, 0, 1);
        return (-0.5 * Math.Log(alpha)) - 0.75 + alpha - (0.25 * alpha * alpha);
    }

    /// <summary>A = (1 − α) / Ku: how fast the stream function rises from the fibre's surface, ψ ≈ A (r − 1)².</summary>
    public static double WallFactor(double solidity) => (1 - solidity) / HydrodynamicFactor(solidity);

    /// <summary>Exact interception, the stream function at 1 + R: what a fibre collects of particles that follow the air.</summary>
    /// <param name="solidity">α; dimensionless, 0 &lt; α &lt; 1.</param>
    /// <param name="ratio">R = dp / df; dimensionless, 0 or above. Has meaning while 1 + R &lt; α^−½.</param>
    /// <returns>E_R per projected fibre diameter; dimensionless.</returns>
    public static double ExactInterception(double solidity, double ratio)
    {
        var alpha = solidity;
        var r = 1 + Require.NotNegative(ratio);
        return r / (2 * HydrodynamicFactor(alpha))
            * ((2 * Math.Log(r)) - 1 + alpha + ((1 - (alpha / 2)) / (r * r)) - (alpha / 2 * r * r));
    }
}
