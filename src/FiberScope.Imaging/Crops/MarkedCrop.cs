using OpenCvSharp;

namespace FiberScope.Imaging.Crops;

/// <summary>Cuts a piece out of a micrograph and marks a place in it for a person to measure, without showing what was found there.</summary>
/// <remarks>
/// The marks stand far from the fibre and at fixed places of the crop: a ring about the fibre, and two strokes on the line across it along
/// which to measure. The size of a crop comes in a few steps only, so that it tells next to nothing of the diameter.
/// </remarks>
public static class MarkedCrop
{
    /// <summary>Sides of a crop in pixels of the micrograph.</summary>
    private static readonly int[] Sides = [64, 128, 256, 512, 1024];

    /// <summary>A crop shows at least this many diameters.</summary>
    private const double DiametersShown = 7;

    private const int DrawnSide = 768;
    private const double RingShare = 0.2;
    private const double StrokeFrom = 0.2;
    private const double StrokeTo = 0.31;
    private const int SubpixelBits = 6;

    /// <summary>Grey values beyond these shares of the pixels become black and white.</summary>
    private const double ClippedShare = 0.002;

    private static readonly Scalar Mark = new(0, 176, 255);
    private static readonly Scalar Halo = new(30, 30, 30);

    /// <summary>How many pixels of the crop make one of the micrograph.</summary>
    /// <param name="diameterPixels">The diameter found, in pixels of the micrograph; above zero.</param>
    public static double Zoom(double diameterPixels) => (double)DrawnSide / Side(diameterPixels);

    /// <summary>Writes the crop as an 8-bit colour PNG.</summary>
    /// <param name="micrograph">The picture.</param>
    /// <param name="x">The place, in pixels from the left; the first pixel's centre is 0.5.</param>
    /// <param name="y">The place, in pixels from the top.</param>
    /// <param name="direction">The fibre's direction there, rad from the x axis towards the y axis.</param>
    /// <param name="diameterPixels">The diameter found, which sets the size of the crop; above zero.</param>
    /// <param name="destination">Where to; left open.</param>
    public static void Write(Micrograph micrograph, double x, double y, double direction, double diameterPixels, Stream destination)
    {
        var side = Math.Min(Side(diameterPixels), Math.Min(micrograph.Width, micrograph.UsableHeight));
        var left = Math.Clamp((int)Math.Round(x - (side / 2.0)), 0, micrograph.Width - side);
        var top = Math.Clamp((int)Math.Round(y - (side / 2.0)), 0, micrograph.UsableHeight - side);
        var zoom = Zoom(diameterPixels);
        using var grey = Cut(micrograph, left, top, side);
        using var large = new Mat();
        Cv2.Resize(grey, large, default, zoom, zoom, InterpolationFlags.Cubic);
        using var colour = new Mat();
        Cv2.CvtColor(large, colour, ColorConversionCodes.GRAY2BGR);
        Draw(colour, (x - left) * zoom, (y - top) * zoom, direction);
        destination.Write(colour.ToBytes(".png"));
    }

    private static int Side(double diameterPixels) => Sides.FirstOrDefault(s => s >= DiametersShown * diameterPixels, Sides[^1]);

    /// <summary>The piece, its greys stretched to the full range: contrast moves no edge.</summary>
    private static Mat Cut(Micrograph micrograph, int left, int top, int side)
    {
        var grey = micrograph.Grey;
        var values = new float[side * side];
        for (var row = 0; row < side; row++)
        {
            grey.Slice(((top + row) * micrograph.Width) + left, side).CopyTo(values.AsSpan(row * side));
        }

        var sorted = (float[])values.Clone();
        Array.Sort(sorted);
        var clipped = (int)(ClippedShare * sorted.Length);
        var (low, high) = (sorted[clipped], sorted[^(clipped + 1)]);
        var scale = high > low ? 255 / (high - low) : 0;
        return Mat.FromPixelData(side, side, MatType.CV_8UC1, Array.ConvertAll(values, v => (byte)Math.Clamp((v - low) * scale, 0, 255))).Clone();
    }

    private static void Draw(Mat crop, double x, double y, double direction)
    {
        var reach = DrawnSide;
        Point At(double along) => Fixed(x - (along * Math.Sin(direction)), y + (along * Math.Cos(direction)));
        foreach (var (colour, width) in new[] { (Halo, 5), (Mark, 2) })
        {
            Cv2.Circle(crop, Fixed(x, y), (int)(RingShare * reach * (1 << SubpixelBits)), colour, width, LineTypes.AntiAlias, SubpixelBits);
            foreach (var sign in new[] { -1, 1 })
            {
                Cv2.Line(crop, At(sign * StrokeFrom * reach), At(sign * StrokeTo * reach), colour, width, LineTypes.AntiAlias, SubpixelBits);
            }
        }
    }

    /// <summary>A place in the fixed-point numbers of the drawing library, whose first pixel's centre is 0.</summary>
    private static Point Fixed(double x, double y) => new((int)Math.Round((x - 0.5) * (1 << SubpixelBits)), (int)Math.Round((y - 0.5) * (1 << SubpixelBits)));
}
