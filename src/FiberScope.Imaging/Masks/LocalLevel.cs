using OpenCvSharp;

namespace FiberScope.Imaging.Masks;

/// <summary>The grey that one kind of pixel has near each place.</summary>
internal static class LocalLevel
{
    /// <summary>How much the overall mean counts where no pixel of the kind is near.</summary>
    private const double Prior = 1e-3;

    /// <summary>The mean grey of the masked pixels about each place, going over into their overall mean where there are none.</summary>
    /// <param name="grey">The picture; 32-bit.</param>
    /// <param name="mask">The kind of pixel; not zero where it is.</param>
    /// <param name="sigma">How far about; pixels.</param>
    public static Mat Of(Mat grey, Mat mask, double sigma)
    {
        using var weight = new Mat();
        mask.ConvertTo(weight, MatType.CV_32FC1, 1 / 255.0);
        using var weighted = new Mat();
        Cv2.Multiply(grey, weight, weighted);
        Spread(weighted, sigma);
        Spread(weight, sigma);
        Cv2.Add(weighted, new Scalar(Prior * Cv2.Mean(grey, mask).Val0), weighted);
        Cv2.Add(weight, new Scalar(Prior), weight);
        var mean = new Mat();
        Cv2.Divide(weighted, weight, mean);
        return mean;
    }

    /// <summary>A Gaussian mean in place. A wide one is made on a smaller picture: it holds nothing finer than a quarter of its width.</summary>
    private static void Spread(Mat values, double sigma)
    {
        var shrink = Math.Min((int)(sigma / 4), Math.Min(values.Width, values.Height) / 8);
        if (shrink < 2)
        {
            Cv2.GaussianBlur(values, values, new Size(0, 0), sigma);
            return;
        }

        using var small = new Mat();
        Cv2.Resize(values, small, new Size((values.Width + shrink - 1) / shrink, (values.Height + shrink - 1) / shrink), 0, 0, InterpolationFlags.Area);
        Cv2.GaussianBlur(small, small, new Size(0, 0), sigma / shrink);
        Cv2.Resize(small, values, values.Size(), 0, 0, InterpolationFlags.Linear);
    }
}
