using FiberScope.Imaging.Masks;
using OpenCvSharp;

namespace FiberScope.Imaging.Sections;

/// <summary>Which pixels of a section are cut fibre.</summary>
internal sealed class SectionMask : IDisposable
{
    private SectionMask(Mat excess, Mat mask, double variance) => (Excess, Mask, Variance) = (excess, mask, variance);

    /// <summary>The smoothed picture less the level half-way between fibre and resin about each place: the outlines lie at 0.</summary>
    public Mat Excess { get; }

    /// <summary>255 in cut fibre, 0 in resin.</summary>
    public Mat Mask { get; }

    /// <summary>Variance of the Gaussian that blurs the outlines, the smoothing's own included; square pixels.</summary>
    public double Variance { get; }

    /// <summary>Tells fibre from resin; null when the picture shows no two kinds of grey.</summary>
    /// <remarks>
    /// A first cut by N. Otsu, IEEE Trans. Syst. Man Cybern. 9 (1979) 62-66, then twice the level half-way between the means of either
    /// kind near by, so that uneven lighting and fibres of different brightness do not shift the outlines. Fibre is the rarer kind.
    /// </remarks>
    public static SectionMask? Of(Micrograph micrograph, SectionSettings settings)
    {
        using var whole = Mat.FromPixelData(micrograph.Height, micrograph.Width, MatType.CV_32FC1, micrograph.Grey.ToArray());
        using var field = new Mat(whole, new Rect(0, 0, micrograph.Width, micrograph.UsableHeight));
        using var smooth = new Mat();
        Cv2.GaussianBlur(field, smooth, new Size(0, 0), settings.SmoothingPixels);
        using var bytes = new Mat();
        smooth.ConvertTo(bytes, MatType.CV_8UC1, 255);
        using var cut = new Mat();
        Cv2.Threshold(bytes, cut, 0, 255, ThresholdTypes.Binary | ThresholdTypes.Otsu);
        var inverted = Cv2.CountNonZero(cut) > cut.Total() / 2;
        if (inverted)
        {
            Cv2.BitwiseNot(cut, cut);
            Cv2.Subtract(new Scalar(1), smooth, smooth);
        }

        if (Contrast(smooth, cut) < 0.03)
        {
            return null;
        }

        var excess = new Mat();
        for (var round = 0; round < 2; round++)
        {
            Relevel(smooth, cut, excess);
            Cv2.Compare(excess, new Scalar(0), cut, CmpTypes.GT);
        }

        return new SectionMask(excess, cut.Clone(), Blur(smooth, cut));
    }

    /// <inheritdoc/>
    public void Dispose()
    {
        Excess.Dispose();
        Mask.Dispose();
    }

    private static double Contrast(Mat smooth, Mat cut)
    {
        using var resin = new Mat();
        Cv2.BitwiseNot(cut, resin);
        return Cv2.Mean(smooth, cut).Val0 - Cv2.Mean(smooth, resin).Val0;
    }

    /// <summary>From the steepness at the outlines: a step of height h blurred by σ rises by h / (σ √(2π)) per pixel in its middle.</summary>
    private static double Blur(Mat smooth, Mat cut)
    {
        using var inner = new Mat();
        using var outer = new Mat();
        Cv2.Erode(cut, inner, null);
        Cv2.Dilate(cut, outer, null);
        using var rim = new Mat();
        Cv2.Subtract(outer, inner, rim);
        using var right = new Mat();
        using var down = new Mat();
        using var steepness = new Mat();
        Cv2.Sobel(smooth, right, MatType.CV_32FC1, 1, 0, 1, 0.5);
        Cv2.Sobel(smooth, down, MatType.CV_32FC1, 0, 1, 1, 0.5);
        Cv2.Magnitude(right, down, steepness);
        steepness.GetArray(out float[] values);
        rim.GetArray(out byte[] there);
        var slopes = values.Where((_, i) => there[i] != 0).Order().ToArray();
        var slope = slopes.Length == 0 ? 1 : slopes[slopes.Length / 2];
        var sigma = Contrast(smooth, cut) / Math.Max(slope, 1e-6) / Math.Sqrt(2 * Math.PI);

        // The difference of two pixels two apart blurs by a third of a square pixel of its own.
        return Math.Clamp((sigma * sigma) - (1 / 3.0), 0.1, 25);
    }

    private static void Relevel(Mat smooth, Mat cut, Mat excess)
    {
        using var resin = new Mat();
        Cv2.BitwiseNot(cut, resin);

        // Pixels on the outlines belong to neither kind.
        using var inner = new Mat();
        using var outer = new Mat();
        Cv2.Erode(cut, inner, null, iterations: 2);
        using var core = new Mat();
        Cv2.Erode(cut, core, null, iterations: 5);
        Cv2.Erode(resin, outer, null, iterations: 3);
        // Charged or relief-polished edges are brighter than the core: the step at the outline is what the half-way level halves.
        Cv2.Subtract(inner, core, inner);
        using var distance = new Mat();
        Cv2.DistanceTransform(cut, distance, DistanceTypes.L2, DistanceTransformMasks.Mask5);
        var radius = Math.Max(3, Cv2.Mean(distance, cut).Val0 * 3);
        using var fibreLevel = LocalLevel.Of(smooth, inner, radius);
        using var resinLevel = LocalLevel.Of(smooth, outer, 4 * radius);
        Cv2.AddWeighted(fibreLevel, -0.5, resinLevel, -0.5, 0, excess);
        Cv2.Add(excess, smooth, excess);
    }
}
