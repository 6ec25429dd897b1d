using UnitsNet;

namespace FiberScope.Specimens;

/// <summary>How the visible fibre length is oriented.</summary>
/// <param name="PrincipalDirection">From the picture's x axis towards its y axis (downwards), in [0°, 180°).</param>
/// <param name="Order">⟨cos 2θ⟩ about it, length-weighted; dimensionless, 0 to 1.</param>
public sealed record TrueOrientation(Angle PrincipalDirection, double Order)
{
    /// <summary>The orientation of directions (radians), each with its length.</summary>
    public static TrueOrientation Of(IEnumerable<(double Direction, double Length)> pieces)
    {
        double cos = 0, sin = 0, total = 0;
        foreach (var (direction, length) in pieces)
        {
            cos += length * Math.Cos(2 * direction);
            sin += length * Math.Sin(2 * direction);
            total += length;
        }

        var principal = Math.Atan2(sin, cos) / 2;
        var order = total > 0 ? Math.Sqrt((cos * cos) + (sin * sin)) / total : 0;
        return new TrueOrientation(Angle.FromDegrees(((principal * 180 / Math.PI) + 180) % 180), order);
    }
}
