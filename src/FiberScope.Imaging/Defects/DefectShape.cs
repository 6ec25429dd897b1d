using OpenCvSharp;

namespace FiberScope.Imaging.Defects;

/// <summary>The size and shape of a region.</summary>
/// <param name="Length">Four standard deviations of its pixels along its long axis; pixels.</param>
/// <param name="Width">The same along its short axis; pixels.</param>
/// <param name="Farthest">The largest distance of its pixels from an edge; pixels.</param>
internal readonly record struct DefectShape(double Length, double Width, double Farthest)
{
    /// <summary>The shape of every numbered region; entry 0 stands for none.</summary>
    public static DefectShape[] All(int[] numbers, float[] distances, int width, int count)
    {
        var sums = new double[count + 1, 7];
        for (var i = 0; i < numbers.Length; i++)
        {
            if (numbers[i] is var n and > 0)
            {
                var (x, y) = ((double)(i % width), (double)(i / width));
                sums[n, 0]++;
                sums[n, 1] += x;
                sums[n, 2] += y;
                sums[n, 3] += x * x;
                sums[n, 4] += y * y;
                sums[n, 5] += x * y;
                sums[n, 6] = Math.Max(sums[n, 6], distances[i]);
            }
        }

        return [.. Enumerable.Range(0, count + 1).Select(n => Of(sums, n))];
    }

    /// <summary>What a region most likely is.</summary>
    /// <remarks>
    /// Film is wide and large; a rope is long; shot is round and smooth-edged; the rest is debris. The borders between the kinds are
    /// common practice without a source.
    /// </remarks>
    public static DefectKind Kind(Point[] outline, double area, double farthest, double diameter)
    {
        var box = Cv2.MinAreaRect(outline);
        var (shorter, longer) = (Math.Min(box.Size.Width, box.Size.Height) + 1, Math.Max(box.Size.Width, box.Size.Height) + 1);
        var hull = Cv2.ContourArea(Cv2.ConvexHull(outline));
        var filled = hull > 0 ? Cv2.ContourArea(outline) / hull : 1;
        return farthest > 2 * diameter && area > 60 * diameter * diameter ? DefectKind.Film
            : longer > 3 * shorter ? DefectKind.Rope
            : longer < 2.2 * shorter && filled > 0.88 ? DefectKind.Shot
            : DefectKind.Debris;
    }

    private static DefectShape Of(double[,] sums, int n)
    {
        var count = sums[n, 0];
        if (count == 0)
        {
            return default;
        }

        var (mx, my) = (sums[n, 1] / count, sums[n, 2] / count);
        var (xx, yy, xy) = ((sums[n, 3] / count) - (mx * mx), (sums[n, 4] / count) - (my * my), (sums[n, 5] / count) - (mx * my));
        var (half, spread) = ((xx + yy) / 2, Math.Sqrt((Math.Pow(xx - yy, 2) / 4) + (xy * xy)));
        return new DefectShape(4 * Math.Sqrt(Math.Max(0, half + spread)), 4 * Math.Sqrt(Math.Max(0, half - spread)), sums[n, 6]);
    }
}
