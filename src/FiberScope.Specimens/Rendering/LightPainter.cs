using FiberScope.Specimens.Mats;
using FiberScope.Specimens.Numbers;

namespace FiberScope.Specimens.Rendering;

/// <summary>Paints a thin layer in transmitted light: every fibre dims the field behind it by its own profile, blurred by its own defocus.</summary>
internal static class LightPainter
{
    public static Scene Paint(MatModel mat, ulong seed, CancellationToken cancellation)
    {
        var (width, height) = (mat.Scale.Width, mat.Scale.Height);
        var shift = ElectronPainter.LineShifts(mat.Scale.Recipe.Camera, height, seed);
        var profiles = mat.Fibres.Select(f => LensProfile.Of(f, mat.Scale)).ToArray();
        var reach = profiles.Select(p => p.Reach).DefaultIfEmpty().Max();
        var set = SegmentSet.Of(mat, reach, shift.Max(Math.Abs));
        var light = Field(mat.Scale, seed);
        var (top, sharpest) = (new int[light.Length], new float[light.Length]);
        Array.Fill(top, -1);
        Array.Fill(sharpest, float.MaxValue);
        Parallel.For(0, set.Tiles.Length, new ParallelOptions { CancellationToken = cancellation }, index =>
        {
            var (left, upper) = (index % set.Columns * SegmentSet.TileWidth, index / set.Columns * SegmentSet.TileHeight);
            var (right, lower) = (Math.Min(width, left + SegmentSet.TileWidth), Math.Min(height, upper + SegmentSet.TileHeight));
            foreach (var segment in set.Tiles[index])
            {
                Dim(set.Segments[segment], profiles[set.Segments[segment].Fibre], (left, upper, right, lower), shift, width, light, top, sharpest);
            }
        });
        return new Scene(light, top, shift, depth => LensProfile.SigmaAt(mat.Scale, depth * mat.Scale.MeanDepth));
    }

    private static float[] Field(MatScale scale, ulong seed)
    {
        var look = scale.Recipe.Light;
        var random = new SeededRandom(seed, 51);
        var (cx, cy) = (scale.Width * random.Between(0.3, 0.7), scale.Height * random.Between(0.3, 0.7));
        var half = ((double)scale.Width * scale.Width) + ((double)scale.Height * scale.Height);
        var dust = new ValueNoise(seed ^ 0x33UL, 40);
        var light = new float[scale.Width * scale.Height];
        Parallel.For(0, scale.Height, y =>
        {
            for (var x = 0; x < scale.Width; x++)
            {
                var square = (((x - cx) * (x - cx)) + ((y - cy) * (y - cy))) / half;
                light[(y * scale.Width) + x] = (float)(look.Field * (1 - (2 * look.Vignette * square)) * (1 + (0.012 * dust.At(x, y))));
            }
        });
        return light;
    }

    private static void Dim(
        Segment segment, LensProfile profile, (int Left, int Top, int Right, int Bottom) tile, float[] shift, int width, float[] light, int[] top, float[] sharpest)
    {
        var (a, b) = (segment.From, segment.To);
        var (dx, dy) = (b.X - a.X, b.Y - a.Y);
        var length = MathF.Sqrt((dx * dx) + (dy * dy));
        var (nx, ny) = (-dy / length, dx / length);
        var pad = profile.Reach * 1.1f;
        var firstRow = Math.Max(tile.Top, (int)MathF.Floor(Math.Min(a.Y, b.Y) - pad));
        var lastRow = Math.Min(tile.Bottom - 1, (int)MathF.Floor(Math.Max(a.Y, b.Y) + pad));
        for (var row = firstRow; row <= lastRow; row++)
        {
            var first = Math.Max(tile.Left, (int)MathF.Floor(Math.Min(a.X, b.X) - pad - shift[row]));
            var last = Math.Min(tile.Right - 1, (int)MathF.Floor(Math.Max(a.X, b.X) + pad - shift[row]));
            for (var column = first; column <= last; column++)
            {
                var (x, y) = (column + 0.5f + shift[row], row + 0.5f);
                var across = Math.Abs(((x - a.X) * nx) + ((y - a.Y) * ny));
                if (across > pad || ((x - a.X) * a.TangentX) + ((y - a.Y) * a.TangentY) < 0 || ((b.X - x) * b.TangentX) + ((b.Y - y) * b.TangentY) <= 0)
                {
                    continue;
                }

                var pixel = (row * width) + column;
                light[pixel] *= profile.At(across, a.Radius);
                if (across < a.Radius && profile.Sigma < sharpest[pixel])
                {
                    (top[pixel], sharpest[pixel]) = (segment.Fibre, profile.Sigma);
                }
            }
        }
    }
}
