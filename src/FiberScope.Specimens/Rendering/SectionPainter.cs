using FiberScope.Specimens.Mats;
using FiberScope.Specimens.Numbers;

namespace FiberScope.Specimens.Rendering;

/// <summary>Paints a polished section: cut fibres bright on resin, with mottle, seams at the edges and scratches.</summary>
internal static class SectionPainter
{
    public static float[] Paint(CutMat cut, ulong seed, CancellationToken cancellation)
    {
        var (width, height) = (cut.Scale.Width, cut.Scale.Height);
        var (light, cover) = (new float[width * height], new float[width * height]);
        var pattern = SamplePattern.Scattered(seed);
        foreach (var fibre in cut.Fibres)
        {
            cancellation.ThrowIfCancellationRequested();
            Disc(fibre, cut.Scale, pattern, light, cover);
        }

        var look = cut.Scale.Recipe.Section;
        var (fine, coarse, wide) = (new ValueNoise(seed ^ 0x11UL, 2.5f), new ValueNoise(seed ^ 0x12UL, 14), new ValueNoise(seed ^ 0x13UL, 350));
        Parallel.For(0, height, y =>
        {
            for (var x = 0; x < width; x++)
            {
                var i = (y * width) + x;
                var mottle = 1 + ((float)look.Mottle * (fine.At(x, y) + (0.8f * coarse.At(x, y)))) + (0.05f * wide.At(x, y));
                light[i] = (light[i] + ((1 - Math.Min(1, cover[i])) * (float)look.Resin)) * mottle;
            }
        });
        Scratch(light, cut.Scale, seed);
        Smoothing.Gaussian(light, width, height, cut.Scale.Recipe.Camera.BlurPixels);
        return light;
    }

    /// <summary>The share of each pixel that fibre covers, added up over the picture and divided by its area.</summary>
    public static double AreaShare(CutMat cut, ulong seed)
    {
        var (width, height) = (cut.Scale.Width, cut.Scale.Height);
        var (light, cover) = (new float[width * height], new float[width * height]);
        var pattern = SamplePattern.Scattered(seed);
        foreach (var fibre in cut.Fibres)
        {
            Disc(fibre, cut.Scale, pattern, light, cover);
        }

        return cover.Sum(c => (double)Math.Min(1, c)) / cover.Length;
    }

    private static void Disc(CutFibre fibre, MatScale scale, SamplePattern pattern, float[] light, float[] cover)
    {
        var (half, look) = (fibre.Major / 2, scale.Recipe.Section);
        for (var row = Math.Max(0, (int)(fibre.Y - half)); row <= Math.Min(scale.Height - 1, (int)(fibre.Y + half)); row++)
        {
            for (var column = Math.Max(0, (int)(fibre.X - half)); column <= Math.Min(scale.Width - 1, (int)(fibre.X + half)); column++)
            {
                var first = pattern.First(column, row);
                for (var k = 0; k < pattern.Count; k++)
                {
                    var level = fibre.Level(column + pattern.X[first + k], row + pattern.Y[first + k]);
                    if (level < 1)
                    {
                        var seam = look.Seam * Math.Max(0, (level - 0.7) / 0.3);
                        cover[(row * scale.Width) + column] += 1f / pattern.Count;
                        light[(row * scale.Width) + column] += (float)(look.Fibre * fibre.Brightness * (1 + seam) / pattern.Count);
                    }
                }
            }
        }
    }

    private static void Scratch(float[] light, MatScale scale, ulong seed)
    {
        var random = new SeededRandom(seed, 61);
        for (var s = 0; s < scale.Recipe.Section.Scratches; s++)
        {
            var (sin, cos) = PortableMath.SinCos(0.6 + (0.5 * random.Normal()));
            var (x, y, length) = (scale.Width * random.Next(), scale.Height * random.Next(), random.Between(0.05, 0.5) * scale.Width);
            var change = (float)random.Between(-0.12, 0.1);
            for (var t = 0.0; t < length; t += 0.7)
            {
                var (column, row) = ((int)Math.Floor(x + (t * cos)), (int)Math.Floor(y + (t * sin)));
                if (column >= 0 && row >= 0 && column < scale.Width && row < scale.Height)
                {
                    light[(row * scale.Width) + column] *= 1 + change;
                }
            }
        }
    }
}
