using FiberScope.Specimens.Numbers;

namespace FiberScope.Specimens.Rendering;

/// <summary>Turns light into grey values: gain, charging, shot and reading noise, clipping to 8 bits.</summary>
internal static class Camera
{
    /// <summary>The noise-free grey picture (0 black to 1 white; above 1 clips) that the noise is added to.</summary>
    public static float[] Expose(float[] light, CameraRecipe camera)
    {
        var white = Percentile(light, 1 - camera.ClippedShare);
        var black = (float)camera.BlackLevel;
        var grey = new float[light.Length];
        for (var i = 0; i < light.Length; i++)
        {
            grey[i] = black + ((1 - black) * light[i] / white);
        }

        return grey;
    }

    /// <summary>Adds what a charging specimen shows: streaks along the lines, dark trails behind bright places, uneven lines.</summary>
    public static void Charge(float[] grey, int width, int height, CameraRecipe camera, ulong seed)
    {
        if (camera.Charging <= 0)
        {
            return;
        }

        var strength = (float)camera.Charging;
        var random = new SeededRandom(seed, 41);
        var streaks = 4 + (int)(camera.Charging * 60);
        for (var s = 0; s < streaks; s++)
        {
            var (row, rows, start) = (random.Below(height), 1 + random.Below(6), random.Below(width));
            var (amplitude, fade) = (strength * (float)random.Between(-0.4, 1), random.Between(60, width));
            for (var y = row; y < Math.Min(height, row + rows); y++)
            {
                for (var x = start; x < width; x++)
                {
                    grey[(y * width) + x] += amplitude * (float)PortableMath.Exp((start - x) / fade);
                }
            }
        }

        for (var y = 0; y < height; y++)
        {
            var (line, trail) = (0.06f * strength * (float)random.Normal(), 0f);
            for (var x = 0; x < width; x++)
            {
                var value = grey[(y * width) + x];
                trail += (Math.Max(0, value - 0.75f) - trail) / 40;
                grey[(y * width) + x] = value + line - (strength * trail);
            }
        }
    }

    /// <summary>Counts electrons and rounds to 8 bits.</summary>
    public static byte[] Detect(float[] grey, int width, int height, CameraRecipe camera, ulong seed)
    {
        var bytes = new byte[grey.Length];
        var black = camera.BlackLevel;
        Parallel.For(0, height, y =>
        {
            var random = new SeededRandom(seed, 1_000_000UL + (ulong)y);
            for (var x = 0; x < width; x++)
            {
                double value = grey[(y * width) + x];
                if (camera.ElectronsPerPixel > 0)
                {
                    var signal = Math.Max(0, value - black) * camera.ElectronsPerPixel;
                    value = Math.Min(black, value) + (random.Poisson(signal) / camera.ElectronsPerPixel);
                }

                value += camera.ReadNoise > 0 ? camera.ReadNoise * random.Normal() : 0;
                bytes[(y * width) + x] = (byte)Math.Clamp((int)Math.Floor((value * 255) + 0.5), 0, 255);
            }
        });
        return bytes;
    }

    private static float Percentile(float[] light, double share)
    {
        const int bins = 1 << 14;
        var largest = Math.Max(1e-6f, light.Max());
        var counts = new int[bins + 1];
        foreach (var value in light)
        {
            counts[(int)(Math.Clamp(value / largest, 0, 1) * bins)]++;
        }

        long below = 0;
        for (var b = 0; b <= bins; b++)
        {
            below += counts[b];
            if (below >= share * light.Length)
            {
                return Math.Max(1e-6f, largest * (b + 1) / bins);
            }
        }

        return largest;
    }
}
