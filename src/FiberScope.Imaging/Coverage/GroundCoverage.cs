using FiberScope.Imaging.Masks;
using OpenCvSharp;

namespace FiberScope.Imaging.Coverage;

/// <summary>The coverage of a thin layer seen from above: the share of the field where fibres hide the ground.</summary>
/// <remarks>
/// Fibre is told from ground by the level half-way between both near by; how far those outlines lie off the fibres' true edges is
/// found where a fibre has been read, and taken off along all outlines.
/// </remarks>
internal sealed class GroundCoverage
{
    private readonly byte[] _mask;
    private readonly int _width, _height;

    private GroundCoverage(byte[] mask, int width, int height) => (_mask, _width, _height) = (mask, width, height);

    /// <summary>The coverage; null where the picture shows no ground, as of a thick mat.</summary>
    /// <param name="micrograph">The picture, seen from above.</param>
    /// <param name="readings">The readings, whose edges are known better than any threshold's.</param>
    /// <param name="settings">Thresholds.</param>
    public static double? Of(Micrograph micrograph, IReadOnlyList<PixelReading> readings, CoverageSettings settings)
    {
        if (readings.Count == 0 || micrograph.UsableHeight < 16)
        {
            return null;
        }

        using var whole = Mat.FromPixelData(micrograph.Height, micrograph.Width, MatType.CV_32FC1, micrograph.Grey.ToArray());
        using var field = new Mat(whole, new Rect(0, 0, micrograph.Width, micrograph.UsableHeight));
        using var smooth = new Mat();
        Cv2.GaussianBlur(field, smooth, new Size(0, 0), settings.SmoothingPixels);
        using var cut = ForegroundMask.Of(smooth);
        if (cut is null || !ShowsGround(field, smooth, cut, settings))
        {
            return null;
        }

        cut.GetArray(out byte[] mask);
        var share = Cv2.CountNonZero(cut) / (double)cut.Total();
        var outline = new GroundCoverage(mask, cut.Width, cut.Height).OutlineOff(readings);
        var coverage = share - (outline * Perimeter(cut) / cut.Total());
        return coverage > 0 && coverage <= settings.LargestCoverage ? coverage : null;
    }

    private static bool ShowsGround(Mat field, Mat smooth, Mat cut, CoverageSettings settings)
    {
        using var open = new Mat();
        Cv2.BitwiseNot(cut, open);
        using var far = new Mat();
        using var inner = new Mat();
        Cv2.Erode(open, far, null, iterations: 4);
        Cv2.Erode(cut, inner, null, iterations: 2);
        using var quiet = new Mat();
        Cv2.GaussianBlur(field, quiet, new Size(0, 0), 2.5 * settings.SmoothingPixels);
        quiet.GetArray(out float[] greys);
        far.GetArray(out byte[] there);
        var ground = greys.Where((_, i) => there[i] != 0).Order().ToArray();
        if (ground.Length < 400)
        {
            return false;
        }

        var contrast = Cv2.Mean(smooth, inner).Val0 - Cv2.Mean(smooth, far).Val0;
        return ground[(int)(0.95 * (ground.Length - 1))] - ground[(int)(0.05 * (ground.Length - 1))] < settings.WidestGround * contrast;
    }

    private static double Perimeter(Mat cut)
    {
        Cv2.FindContours(cut.Clone(), out Point[][] contours, out _, RetrievalModes.List, ContourApproximationModes.ApproxNone);

        // A chain of steps to the eight neighbours is longer than the smooth line by 8 (√2 - 1) / π, over all directions alike (Freeman 1970, from memory).
        return contours.Sum(c => Cv2.ArcLength(c, closed: true)) / (8 * (Math.Sqrt(2) - 1) / Math.PI);
    }

    /// <summary>How far the outlines lie outside the edges that were read; pixels, the median.</summary>
    private double OutlineOff(IReadOnlyList<PixelReading> readings)
    {
        double[] off = [.. readings.Select(Off).Where(double.IsFinite).Order()];
        return off.Length < 10 ? 0 : off[off.Length / 2];
    }

    private double Off(PixelReading reading)
    {
        var (nx, ny) = (-Math.Sin(reading.Direction), Math.Cos(reading.Direction));
        return (Reach(reading, nx, ny) + Reach(reading, -nx, -ny) - reading.Diameter) / 2;
    }

    private double Reach(PixelReading reading, double nx, double ny)
    {
        const double step = 0.1;
        var most = reading.Diameter + 3;
        for (var far = 0.0; far < most; far += step)
        {
            var (x, y) = ((int)Math.Floor(reading.X + (far * nx)), (int)Math.Floor(reading.Y + (far * ny)));
            if (x < 0 || y < 0 || x >= _width || y >= _height)
            {
                return double.NaN;
            }

            if (_mask[(y * _width) + x] == 0)
            {
                return far - (step / 2);
            }
        }

        return double.NaN;
    }
}
