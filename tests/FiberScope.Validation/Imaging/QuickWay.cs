using FiberScope.Imaging;
using OpenCvSharp;

namespace FiberScope.Validation.Imaging;

/// <summary>The quick way to measure fibres: threshold, skeleton, twice the distance to the ground along it. The one to beat.</summary>
/// <remarks>Otsu 1979 (threshold); Zhang and Suen 1984, CACM 27(3) (thinning, from memory); Borgefors 1986 (distance map).</remarks>
internal static class QuickWay
{
    public static IReadOnlyList<PixelReading> Measure(Micrograph picture)
    {
        using var native = new ResourcesTracker();
        var grey = native.T(Grey(picture));
        var smooth = native.NewMat();
        Cv2.MedianBlur(grey, smooth, 3);
        Cv2.GaussianBlur(smooth, smooth, new Size(0, 0), 1);
        var mask = native.NewMat();
        var dark = picture.Mode == ImagingMode.Transmitted ? ThresholdTypes.BinaryInv : ThresholdTypes.Binary;
        Cv2.Threshold(smooth, mask, 0, 255, dark | ThresholdTypes.Otsu);
        var distance = native.NewMat();
        Cv2.DistanceTransform(mask, distance, DistanceTypes.L2, DistanceTransformMasks.Precise);
        distance.GetArray(out float[] far);
        mask.GetArray(out byte[] inside);
        var skeleton = Thin(inside, picture.Width, picture.UsableHeight);
        var readings = new List<PixelReading>();
        for (var i = 0; i < skeleton.Length; i++)
        {
            if (skeleton[i] && far[i] >= 1)
            {
                readings.Add(new(i % picture.Width + 0.5, i / picture.Width + 0.5, double.NaN, (2 * far[i]) - 1, 0, 1, 0));
            }
        }

        return readings;
    }

    private static Mat Grey(Micrograph picture)
    {
        var bytes = new byte[picture.Width * picture.UsableHeight];
        for (var i = 0; i < bytes.Length; i++)
        {
            bytes[i] = (byte)Math.Clamp((picture.Grey[i] * 255) + 0.5f, 0, 255);
        }

        return Mat.FromPixelData(picture.UsableHeight, picture.Width, MatType.CV_8UC1, bytes).Clone();
    }

    private static bool[] Thin(byte[] inside, int width, int height)
    {
        var on = Array.ConvertAll(inside, v => v > 0);
        var removed = new List<int>();
        do
        {
            removed.Clear();
            for (var pass = 0; pass < 2; pass++)
            {
                var now = Removable(on, width, height, pass).ToArray();
                foreach (var i in now)
                {
                    on[i] = false;
                }

                removed.AddRange(now);
            }
        }
        while (removed.Count > 0);
        return on;
    }

    private static IEnumerable<int> Removable(bool[] on, int width, int height, int pass)
    {
        var ring = new bool[8];
        int[] steps = [-width, -width + 1, 1, width + 1, width, width - 1, -1, -width - 1];
        for (var y = 1; y < height - 1; y++)
        {
            for (var x = 1; x < width - 1; x++)
            {
                var i = (y * width) + x;
                if (!on[i])
                {
                    continue;
                }

                var (count, turns) = (0, 0);
                for (var k = 0; k < 8; k++)
                {
                    ring[k] = on[i + steps[k]];
                    count += ring[k] ? 1 : 0;
                }

                for (var k = 0; k < 8; k++)
                {
                    turns += !ring[k] && ring[(k + 1) & 7] ? 1 : 0;
                }

                var first = pass == 0 ? ring[0] && ring[2] && ring[4] : ring[0] && ring[2] && ring[6];
                var second = pass == 0 ? ring[2] && ring[4] && ring[6] : ring[0] && ring[4] && ring[6];
                if (count is >= 2 and <= 6 && turns == 1 && !first && !second)
                {
                    yield return i;
                }
            }
        }
    }
}
