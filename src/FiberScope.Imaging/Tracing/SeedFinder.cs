namespace FiberScope.Imaging.Tracing;

/// <summary>A place that looks like a fibre: two facing edges with nothing between them.</summary>
/// <param name="X">Middle; level pixels.</param>
/// <param name="Y">Middle; level pixels.</param>
/// <param name="Normal">Direction across, radians.</param>
/// <param name="HalfWidth">Half the distance of the edges; level pixels.</param>
/// <param name="Score">The weaker edge less a share of the strongest edge between; gradient units.</param>
/// <param name="Level">The level it was found on.</param>
internal readonly record struct Seed(float X, float Y, float Normal, float HalfWidth, float Score, int Level);

/// <summary>Pairs edges that face each other.</summary>
internal static class SeedFinder
{
    /// <summary>The cosine beyond which two edges count as facing: within 30 degrees.</summary>
    private const float Facing = -0.86f;

    public static List<Seed> Find(EdgeMap map, int level, float narrowest, float widest, double insideWeight, double significance)
    {
        var seeds = new List<Seed>();
        foreach (var point in map.Points)
        {
            if (Best(map, point, level, narrowest, widest, (float)insideWeight) is { } seed && seed.Score > significance * map.Noise)
            {
                seeds.Add(seed);
            }
        }

        return Strongest(seeds, map.Strength.Width);
    }

    /// <summary>Walks inwards from an edge and takes the facing edge that makes the best pair.</summary>
    private static Seed? Best(EdgeMap map, EdgePoint from, int level, float narrowest, float widest, float insideWeight)
    {
        Seed? best = null;
        Span<float> inside = stackalloc float[(int)(2 * widest) + 4];
        for (var k = 2; k < (2 * widest) + 2; k++)
        {
            var t = 0.5f * k;
            var (i, j) = ((int)MathF.Round(from.X + (t * from.Nx)), (int)MathF.Round(from.Y + (t * from.Ny)));
            if (i < 2 || j < 2 || i >= map.Strength.Width - 2 || j >= map.Strength.Height - 2)
            {
                break;
            }

            inside[k] = Lateral(map, i, j, from);
            if (map.Index[(j * map.Strength.Width) + i] is var other and >= 0)
            {
                var to = map.Points[other];
                var width = ((to.X - from.X) * from.Nx) + ((to.Y - from.Y) * from.Ny);
                if ((to.Nx * from.Nx) + (to.Ny * from.Ny) < Facing && width >= narrowest && width <= widest)
                {
                    var score = Math.Min(from.Strength, to.Strength) - (insideWeight * Strongest(inside, width));
                    if (score > (best?.Score ?? 0))
                    {
                        best = Between(from, to, score, level);
                    }
                }
            }
        }

        return best;
    }

    /// <summary>The strongest lateral edge between two edges, clear of both flanks and of the rims beside them.</summary>
    private static float Strongest(ReadOnlySpan<float> inside, float width)
    {
        var margin = Math.Max(2.2f, 0.2f * width);
        var strongest = 0f;
        for (var k = (int)MathF.Ceiling(2 * margin); k <= (int)(2 * (width - margin)); k++)
        {
            strongest = Math.Max(strongest, inside[k]);
        }

        return strongest;
    }

    private static Seed Between(EdgePoint from, EdgePoint to, float score, int level)
    {
        var normal = MathF.Atan2(from.Ny - to.Ny, from.Nx - to.Nx);
        var (sin, cos) = MathF.SinCos(normal);
        var half = 0.5f * (((to.X - from.X) * cos) + ((to.Y - from.Y) * sin));
        return new Seed(0.5f * (from.X + to.X), 0.5f * (from.Y + to.Y), normal, half, score, level);
    }

    /// <summary>The part of a gradient that runs across the would-be fibre.</summary>
    private static float Lateral(EdgeMap map, int i, int j, EdgePoint from)
    {
        var at = (j * map.Strength.Width) + i;
        var (sin, cos) = EdgeMap.Climbs[map.Direction[at]];
        return map.Strength.Data[at] * Math.Abs((cos * from.Nx) + (sin * from.Ny));
    }

    /// <summary>The strongest seed in each small cell; the same whatever the order of the list.</summary>
    private static List<Seed> Strongest(List<Seed> seeds, int width)
    {
        const int Cell = 3;
        return
        [
            .. seeds
                .GroupBy(s => (((int)s.Y / Cell) * ((width / Cell) + 1)) + ((int)s.X / Cell))
                .Select(cell => cell.MaxBy(s => s.Score)),
        ];
    }
}
