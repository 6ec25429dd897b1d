using System.Collections.Immutable;
using UnitsNet;

namespace FiberScope.Filtration.Drag;

/// <summary>The pressure drop of even layers by every law of resistance, side by side.</summary>
public static class PressureDropLaws
{
    private static readonly (string Name, Func<double, double, double> Factor)[] Laws =
    [
        ("davies-1952", (alpha, _) => DragLaw.Davies(alpha)),
        ("davies-1952-with-fan-slip", (alpha, kn) => DragLaw.Davies(alpha) * DragLaw.Fan(alpha, kn) / DragLaw.Fan(alpha)),
        ("fan-kirsch-stechkina-1978", DragLaw.Fan),
        ("kuwabara-1959-with-slip", DragLaw.Kuwabara),
        ("happel-1959", (alpha, _) => DragLaw.Happel(alpha)),
        ("layered-spielman-goren-1968", (alpha, _) => BrinkmanMat.Layered(alpha)),
        ("random-in-space-spielman-goren-1968", (alpha, _) => BrinkmanMat.RandomInSpace(alpha)),
    ];

    /// <summary>Pressure drop by each law, by its stable name; laws without slip overstate fine fibres.</summary>
    /// <param name="layers">The layers. Only diameters, solidity and thickness count: no inhomogeneity, holes, bonds or unevenness.</param>
    /// <param name="point">Face velocity and air.</param>
    public static ImmutableSortedDictionary<string, Pressure> All(IReadOnlyList<MediaLayer> layers, OperatingPoint point)
    {
        var air = point.Air.Properties;
        return Laws.ToImmutableSortedDictionary(
            law => law.Name,
            law => Pressure.FromPascals(point.FaceVelocity.MetersPerSecond * layers.Sum(layer => Resistance(layer, air, law.Factor))),
            StringComparer.Ordinal);
    }

    private static double Resistance(MediaLayer layer, AirProperties air, Func<double, double, double> factor)
    {
        var solidity = layer.Solidity.Fraction;
        var drag = layer.Diameters.Classes.Sum(c => c.LengthFraction * factor(solidity, 2 * air.MeanFreePathMetres / c.Diameter.Meters));
        var square = layer.Diameters.RootMeanSquare.Meters * layer.Diameters.RootMeanSquare.Meters;
        return air.PascalSeconds * layer.Thickness.Meters * drag / square;
    }
}
