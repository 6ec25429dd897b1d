using System.Collections.Immutable;
using FiberScope.Specimens.Mats;
using FiberScope.Specimens.Rendering;

namespace FiberScope.Specimens.Visibility;

/// <summary>Counts the defects that a picture shows, and marks where they are uppermost.</summary>
internal static class DefectCensus
{
    public static (byte[] Mask, ImmutableArray<TrueDefect> Defects) Take(MatModel mat, Scene scene, float[] grey)
    {
        var mask = new byte[scene.TopFibre.Length];
        var areas = new Dictionary<int, int>();
        for (var i = 0; i < mask.Length; i++)
        {
            var id = scene.TopFibre[i];
            if (id < TileRaster.Ground && grey[i] - mat.Scale.Recipe.Camera.BlackLevel >= SpecimenTruth.VisibleSignal)
            {
                var (kind, group) = Identity(mat, -2 - id);
                mask[i] = (byte)kind;
                areas[group] = areas.GetValueOrDefault(group) + 1;
            }
        }

        foreach (var rope in mat.Ropes)
        {
            areas[rope.Group] = MarkRope(mat, scene, rope, mask);
        }

        return (mask, [.. Defects(mat, areas)]);
    }

    private static IEnumerable<TrueDefect> Defects(MatModel mat, Dictionary<int, int> areas)
    {
        foreach (var rope in mat.Ropes.Where(r => areas[r.Group] > 0))
        {
            yield return new TrueDefect(DefectForm.Rope, areas[rope.Group], [.. RopeOutline(rope)]);
        }

        foreach (var group in mat.Bodies.GroupBy(b => b.Group).Where(g => areas.ContainsKey(g.Key)))
        {
            yield return new TrueDefect(group.First().Kind, areas[group.Key], Hull.Of(group.SelectMany(Rim)));
        }

        foreach (var film in mat.Films.Where(f => areas.ContainsKey(f.Group)))
        {
            yield return new TrueDefect(DefectForm.Film, areas[film.Group], [.. Circle(72).Select(c => Edge(film, c))]);
        }
    }

    private static (DefectForm Kind, int Group) Identity(MatModel mat, int index) => index < mat.Bodies.Length
        ? (mat.Bodies[index].Kind, mat.Bodies[index].Group)
        : (DefectForm.Film, mat.Films[index - mat.Bodies.Length].Group);

    private static int MarkRope(MatModel mat, Scene scene, RopeStretch rope, byte[] mask)
    {
        var (width, height, area) = (mat.Scale.Width, mat.Scale.Height, 0);
        for (var i = 1; i < rope.Leader.Length; i++)
        {
            var (a, b) = (rope.Leader[i - 1], rope.Leader[i]);
            for (var share = 0.0; share < 1; share += 0.05)
            {
                for (var lateral = -rope.Right; lateral <= rope.Left; lateral += 0.5)
                {
                    var y = a.Y + (share * (b.Y - a.Y)) + (lateral * a.TangentX);
                    var row = (int)Math.Floor(y);
                    var x = a.X + (share * (b.X - a.X)) - (lateral * a.TangentY) - (row >= 0 && row < height ? scene.LineShift[row] : 0);
                    var column = (int)Math.Floor(x);
                    if (row < 0 || column < 0 || row >= height || column >= width)
                    {
                        continue;
                    }

                    var top = scene.TopFibre[(row * width) + column];
                    if (top >= 0 && mat.Fibres[top].Rope == rope.Group && mask[(row * width) + column] == 0)
                    {
                        mask[(row * width) + column] = (byte)DefectForm.Rope;
                        area++;
                    }
                }
            }
        }

        return area;
    }

    private static IEnumerable<(double X, double Y)> RopeOutline(RopeStretch rope)
    {
        var every = Math.Max(1, rope.Leader.Length / 40);
        var nodes = rope.Leader.Where((_, i) => i % every == 0).ToArray();
        return nodes.Select(n => (n.X - (rope.Left * n.TangentY), n.Y + (rope.Left * n.TangentX)))
            .Concat(nodes.Reverse().Select(n => (n.X + (rope.Right * n.TangentY), n.Y - (rope.Right * n.TangentX))));
    }

    private static IEnumerable<(double X, double Y)> Rim(SolidBody body) => Circle(24).Select(c =>
        (body.X + (body.Along * c.X * body.Cos) - (body.Across * c.Y * body.Sin), body.Y + (body.Along * c.X * body.Sin) + (body.Across * c.Y * body.Cos)));

    private static (double X, double Y) Edge(FilmPatch film, (double X, double Y) unit)
    {
        var radius = 1 / film.Closeness((float)unit.X, (float)unit.Y);
        return (film.X + (radius * unit.X), film.Y + (radius * unit.Y));
    }

    private static IEnumerable<(double X, double Y)> Circle(int count) =>
        Enumerable.Range(0, count).Select(i => (Math.Cos(2 * Math.PI * i / count), Math.Sin(2 * Math.PI * i / count)));
}
