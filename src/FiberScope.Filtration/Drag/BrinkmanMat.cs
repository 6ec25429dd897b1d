using MathNet.Numerics;

namespace FiberScope.Filtration.Drag;

/// <summary>Resistance of a mat in which each fibre sits in the average of the others; Spielman and Goren (1968), derived anew.</summary>
/// <remarks>
/// β = Rf / √k solves 1/(4α) = c₀ + c₁ K₁(β) / (β K₀(β)), and f = Δp df² / (μ U t) = 4 β². K₀, K₁ are modified Bessel functions. No slip.
/// </remarks>
public static class BrinkmanMat
{
    /// <summary>Fibres in layers across the flow, at random within each layer: c₀ = ½, c₁ = 1.</summary>
    public static double Layered(double solidity) => Solve(solidity, 0.5, 1);

    /// <summary>Fibres at random in space: c₀ = ⅓, c₁ = ⅚.</summary>
    public static double RandomInSpace(double solidity) => Solve(solidity, 1.0 / 3, 5.0 / 6);

    private static double Solve(double solidity, double constant, double factor)
    {
        var wanted = 1 / (4 * solidity);
        var (low, high) = (Math.Log(1e-4), Math.Log(1e4));
        for (var i = 0; i < 80; i++)
        {
            var middle = 0.5 * (low + high);
            var beta = Math.Exp(middle);
            // The scaled functions keep their ratio where both underflow.
            var right = constant + (factor * SpecialFunctions.BesselKScaled(1, beta) / (beta * SpecialFunctions.BesselKScaled(0, beta)));
            (low, high) = right > wanted ? (middle, high) : (low, middle);
        }

        var root = Math.Exp(0.5 * (low + high));
        return 4 * root * root;
    }
}
