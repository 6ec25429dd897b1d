using FiberScope.Specimens.Mats;
using FiberScope.Specimens.Numbers;

namespace FiberScope.Specimens.Rendering;

/// <summary>Paints a mat as secondary electrons see it: heights first, then light sampled eight times a pixel, then blur by depth.</summary>
internal static class ElectronPainter
{
    public static Scene Paint(MatModel mat, ulong seed, CancellationToken cancellation)
    {
        var (width, height) = (mat.Scale.Width, mat.Scale.Height);
        var camera = mat.Scale.Recipe.Camera;
        var shift = LineShifts(camera, height, seed);
        var set = SegmentSet.Of(mat, 1, shift.Max(Math.Abs));
        var (heights, top) = Heights(mat, set, shift, cancellation);
        var shader = new ElectronShader(mat, set, heights, seed);
        var blur = new DepthBlur(camera, width, height);
        var pattern = SamplePattern.Scattered(seed);
        EachTile(mat, set, pattern, shift, (tile, left, upper, columns, rows) =>
        {
            for (var row = upper; row < upper + rows; row++)
            {
                for (var column = left; column < left + columns; column++)
                {
                    Light(mat, tile, shader, blur, pattern.Count, column, row);
                }
            }
        }, cancellation);
        var light = blur.Compose();
        Glow(light, mat);
        return new Scene(light, top, shift, blur.SigmaAt);
    }

    /// <summary>Drift bends the picture slowly, jitter shifts each line by itself.</summary>
    public static float[] LineShifts(CameraRecipe camera, int height, ulong seed)
    {
        var random = new SeededRandom(seed, 31);
        var bend = random.Between(-0.5, 0.5);
        var shifts = new float[height];
        for (var row = 0; row < height; row++)
        {
            var t = (double)row / Math.Max(1, height - 1);
            shifts[row] = (float)((camera.DriftPixels * (t + (bend * t * (1 - t)))) + (camera.JitterPixels * random.Normal()));
        }

        return shifts;
    }

    private static (float[] Heights, int[] Top) Heights(MatModel mat, SegmentSet set, float[] shift, CancellationToken cancellation)
    {
        var width = mat.Scale.Width;
        var heights = new float[width * mat.Scale.Height];
        var top = new int[heights.Length];
        EachTile(mat, set, SamplePattern.Centre, shift, (tile, left, upper, columns, rows) =>
        {
            for (var row = upper; row < upper + rows; row++)
            {
                for (var column = left; column < left + columns; column++)
                {
                    var sample = tile.Sample(column, row);
                    heights[(row * width) + column] = Math.Max(0, tile.Z[sample]);
                    top[(row * width) + column] = tile.Id[sample] >= 0 ? set.Segments[tile.Id[sample]].Fibre : tile.Id[sample];
                }
            }
        }, cancellation);
        return (heights, top);
    }

    private static void Light(MatModel mat, TileRaster tile, ElectronShader shader, DepthBlur blur, int count, int column, int row)
    {
        var pixel = (row * mat.Scale.Width) + column;
        var first = tile.Sample(column, row);
        var mottle = shader.MottleAt(column, row);
        for (var k = first; k < first + count; k++)
        {
            var depth = (mat.Scale.LaidDepth - Math.Max(0, tile.Z[k])) / mat.Scale.MeanDepth;
            blur.Add(pixel, (float)depth, shader.Shade(tile, k, pixel, mottle), 1f / count);
        }
    }

    private static void EachTile(
        MatModel mat, SegmentSet set, SamplePattern pattern, float[] shift, Action<TileRaster, int, int, int, int> use, CancellationToken cancellation)
    {
        var options = new ParallelOptions { CancellationToken = cancellation };
        Parallel.For(0, set.Tiles.Length, options, () => new TileRaster(mat, set, pattern, shift), (index, _, tile) =>
        {
            var (left, top) = (index % set.Columns * SegmentSet.TileWidth, index / set.Columns * SegmentSet.TileHeight);
            var columns = Math.Min(SegmentSet.TileWidth, mat.Scale.Width - left);
            var rows = Math.Min(SegmentSet.TileHeight, mat.Scale.Height - top);
            tile.Draw(left, top, columns, rows, set.Tiles[index]);
            use(tile, left, top, columns, rows);
            return tile;
        }, _ => { });
    }

    private static void Glow(float[] light, MatModel mat)
    {
        var share = (float)mat.Scale.Recipe.Electrons.Glow;
        if (share <= 0)
        {
            return;
        }

        var spread = (float[])light.Clone();
        Smoothing.Gaussian(spread, mat.Scale.Width, mat.Scale.Height, Math.Min(120, 15 * mat.Scale.MeanDiameter));
        for (var i = 0; i < light.Length; i++)
        {
            light[i] += share * (spread[i] - light[i]);
        }
    }
}
