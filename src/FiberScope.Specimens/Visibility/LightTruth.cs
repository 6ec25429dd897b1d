using FiberScope.Specimens.Mats;
using FiberScope.Specimens.Rendering;
using UnitsNet;

namespace FiberScope.Specimens.Visibility;

/// <summary>Finds out which fibres a picture in transmitted light shows in focus.</summary>
internal static class LightTruth
{
    public static SpecimenTruth Of(MatModel mat, Scene scene, ulong seed)
    {
        var stations = new List<TrueStation>();
        for (var f = 0; f < mat.Fibres.Length; f++)
        {
            var sigma = LensProfile.SigmaAt(mat.Scale, mat.Scale.LaidDepth - mat.Fibres[f].Level);
            if (sigma <= Math.Max(mat.Fibres[f].Diameter / 4, 2 * mat.Scale.Recipe.Camera.BlurPixels))
            {
                stations.AddRange(Walk(mat, scene, f, sigma));
            }
        }

        var laid = LaidLength.Of(mat).ToArray();
        return new SpecimenTruth
        {
            Recipe = mat.Scale.Recipe,
            Seed = seed,
            FibreDiameters = [.. mat.Fibres.Select(f => f.Diameter)],
            Stations = [.. stations],
            Sections = [],
            Visible = ElectronTruth.Figures(stations),
            BothEdges = ElectronTruth.Figures(stations.Where(s => s.BothEdges)),
            Mat = TrueDiameters.Of([.. laid.Select(l => l.Diameter)], [.. laid.Select(l => l.Length)]),
            Orientation = TrueOrientation.Of(stations.Select(s => ((double)s.Direction, (double)s.Length))),
            MatOrientation = TrueOrientation.Of(laid.Select(l => (l.Direction, l.Length))),
            Solidity = mat.Scale.Recipe.Mat.Solidity,
            LaidSolidity = LaidLength.Solidity(mat),
            Cover = scene.TopFibre.Count(f => f >= 0) / (double)scene.TopFibre.Length,
            Defects = [],
            VisibleDepth = Length.FromMeters(mat.Scale.LaidDepth * mat.Scale.Recipe.PixelSize.Meters),
        };
    }

    private static IEnumerable<TrueStation> Walk(MatModel mat, Scene scene, int fibre, double sigma)
    {
        var (width, height) = (mat.Scale.Width, mat.Scale.Height);
        var nodes = mat.Fibres[fibre].Nodes;
        for (var i = 1; i < nodes.Length; i++)
        {
            var (a, b) = (nodes[i - 1], nodes[i]);
            var (dx, dy) = ((double)b.X - a.X, (double)b.Y - a.Y);
            var length = Math.Sqrt((dx * dx) + (dy * dy));
            var pieces = Math.Max(1, (int)Math.Ceiling(length / 2));
            for (var p = 0; p < pieces; p++)
            {
                var share = (p + 0.5) / pieces;
                var (x, y) = (a.X + (share * dx), a.Y + (share * dy));
                var column = x - scene.LineShift[Math.Clamp((int)y, 0, height - 1)];
                if (y < 0 || y >= height || column < 0 || column >= width)
                {
                    continue;
                }

                var direction = Math.Atan2(dy, dx);
                direction = direction < 0 ? direction + Math.PI : direction;
                var beyond = a.Radius + Math.Max(1, 1.5 * sigma);
                var free = Free(column, y, -dy / length, dx / length, beyond) && Free(column, y, dy / length, -dx / length, beyond);
                yield return new(fibre, (float)column, (float)y, (float)direction, a.Radius + b.Radius, (float)(length / pieces), free);
            }
        }

        bool Free(double x, double y, double nx, double ny, double beyond)
        {
            for (var step = 0.3; step <= 1; step += 0.175)
            {
                var (px, py) = ((int)Math.Floor(x + (step * beyond * nx)), (int)Math.Floor(y + (step * beyond * ny)));
                if (px < 0 || py < 0 || px >= width || py >= height || (scene.TopFibre[(py * width) + px] is var top && top != fibre && top >= 0))
                {
                    return false;
                }
            }

            return true;
        }
    }
}
