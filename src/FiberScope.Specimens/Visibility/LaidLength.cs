using FiberScope.Specimens.Mats;

namespace FiberScope.Specimens.Visibility;

/// <summary>All fibre length that lies in the field, seen or not.</summary>
internal static class LaidLength
{
    /// <summary>Volume of the fibre laid in the field over the field's area and the depth laid.</summary>
    public static double Solidity(MatModel mat) =>
        Of(mat).Sum(l => Math.PI / 4 * l.Diameter * l.Diameter * l.Length) / ((double)mat.Scale.Width * mat.Scale.Height * mat.Scale.LaidDepth);

    /// <summary>Diameter, length (pixels) and direction (radians) of every stretch between two nodes whose middle lies in the field.</summary>
    public static IEnumerable<(double Diameter, double Length, double Direction)> Of(MatModel mat)
    {
        foreach (var fibre in mat.Fibres)
        {
            for (var i = 1; i < fibre.Nodes.Length; i++)
            {
                var (a, b) = (fibre.Nodes[i - 1], fibre.Nodes[i]);
                var (x, y) = ((a.X + b.X) / 2, (a.Y + b.Y) / 2);
                if (x >= 0 && y >= 0 && x < mat.Scale.Width && y < mat.Scale.Height)
                {
                    var (dx, dy) = (b.X - a.X, b.Y - a.Y);
                    yield return (a.Radius + b.Radius, Math.Sqrt((dx * dx) + (dy * dy)), Math.Atan2(dy, dx));
                }
            }
        }
    }
}
