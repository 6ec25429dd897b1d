using FiberScope.Filtration.Mechanisms;

namespace FiberScope.Filtration.Drag;

/// <summary>Published laws of a mat's resistance, as the dimensionless f = Δp df² / (μ U t).</summary>
/// <remarks>
/// α is the solidity, U the face velocity, Kn = 2 λ / df the fibre's Knudsen number. All hold for creeping flow, fibre Reynolds
/// number below 1, and give the same f for every fluid without slip.
/// </remarks>
public static class DragLaw
{
    /// <summary>64 α^1.5 (1 + 56 α³); Davies (1952), fitted to real pads; range 0.006 to 0.3 (Davies 1973, from memory). No slip.</summary>
    public static double Davies(double solidity) => 64 * Math.Pow(solidity, 1.5) * (1 + (56 * solidity * solidity * solidity));

    /// <summary>
    /// Kuwabara's cell with slip, 16 α (1 + 1.996 Kn) / [Ku + 1.996 Kn (−½ ln α − ¼ + ¼ α²)]; parallel fibres across the flow. Slip of the first
    /// order, accurate to Kn ≈ 0.25.
    /// </summary>
    public static double Kuwabara(double solidity, double fibreKnudsen = 0)
    {
        var slip = 1.996 * fibreKnudsen;
        var room = (-0.5 * Math.Log(solidity)) - 0.25 + (0.25 * solidity * solidity);
        return 16 * solidity * (1 + slip) / (KuwabaraCell.HydrodynamicFactor(solidity) + (slip * room));
    }

    /// <summary>Happel's cell, 16 α / (−½ ln α − ½ + α² / (1 + α²)); Happel (1959). No slip.</summary>
    public static double Happel(double solidity)
    {
        var square = solidity * solidity;
        return 16 * solidity / ((-0.5 * Math.Log(solidity)) - 0.5 + (square / (1 + square)));
    }

    /// <summary>The fan model's k = −½ ln α − 0.52 + 0.64 α + 1.43 (1 − α) Kn; Kirsch, Stechkina and Fuchs (1973), from memory.</summary>
    public static double FanFactor(double solidity, double fibreKnudsen = 0) =>
        (-0.5 * Math.Log(solidity)) - 0.52 + (0.64 * solidity) + (1.43 * (1 - solidity) * fibreKnudsen);

    /// <summary>Fan model, 16 α / k: homogeneous layers turned at random; Kirsch and Stechkina (1978). Right trend to Kn = 20.</summary>
    public static double Fan(double solidity, double fibreKnudsen = 0) => 16 * solidity / FanFactor(solidity, fibreKnudsen);

    /// <summary>80 α / [3 (−ln α − 0.931)]; Jackson and James (1986), fibres at random in space, α below 0.25. No slip.</summary>
    public static double JacksonJames(double solidity) => 80 * solidity / (3 * (-Math.Log(solidity) - 0.931));

    /// <summary>32 α / (−ln α − 1.476 + 2 α − 1.774 α² + 4.076 α³); Drummond and Tahir (1984), square array across the flow (from memory). No slip.</summary>
    public static double DrummondTahir(double solidity)
    {
        var a = solidity;
        return 32 * a / (-Math.Log(a) - 1.476 + (2 * a) - (1.774 * a * a) + (4.076 * a * a * a));
    }
}
