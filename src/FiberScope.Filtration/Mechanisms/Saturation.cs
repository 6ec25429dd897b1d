namespace FiberScope.Filtration.Mechanisms;

/// <summary>The limit that no fibre passes: all the air of its cell, E = α^−½.</summary>
public static class Saturation
{
    /// <summary>E / (1 + (E √α)^q)^(1/q).</summary>
    /// <param name="efficiency">E as the sum of the mechanisms; dimensionless, 0 or above.</param>
    /// <param name="solidity">α; dimensionless, 0 &lt; α &lt; 1.</param>
    /// <param name="sharpness">
    /// q. 2.1 is fitted for this project to a numerical solution at small Pe, within 3 %; larger is a sharper bend that leaves E alone
    /// longer.
    /// </param>
    /// <returns>E, below α^−½.</returns>
    public static double Limit(double efficiency, double solidity, double sharpness)
    {
        var share = efficiency * Math.Sqrt(solidity);
        return share < 1e-4 ? efficiency : efficiency / Math.Pow(1 + Math.Pow(share, sharpness), 1 / sharpness);
    }
}
