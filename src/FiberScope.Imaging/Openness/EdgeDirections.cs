using System.Collections.Immutable;
using OpenCvSharp;

namespace FiberScope.Imaging.Openness;

/// <summary>How the visible edges of fibres run, every pixel of edge by its contrast.</summary>
/// <remarks>
/// A gradient stands across its edge, and its sum across an edge is the edge's contrast, however blurred. Unlike readings, which are
/// rare where fibres lie close and nearly parallel, edges show in every direction alike.
/// </remarks>
public static class EdgeDirections
{
    /// <summary>Classes of direction, equally wide, from 0 to 180 degrees.</summary>
    public const int Classes = 180;

    private const double Smoothing = 2;

    /// <summary>The least gradient, over the standard deviation of the noise's.</summary>
    private const double Significance = 8;

    private const double NormalMedian = 0.6745;

    /// <summary>The share of edge by direction, from the x axis towards the y axis (downwards); adds up to 1; empty when there is none.</summary>
    /// <param name="micrograph">The picture, seen from above.</param>
    public static ImmutableArray<double> Of(Micrograph micrograph)
    {
        ArgumentNullException.ThrowIfNull(micrograph);
        using var whole = Mat.FromPixelData(micrograph.Height, micrograph.Width, MatType.CV_32FC1, micrograph.Grey.ToArray());
        using var field = new Mat(whole, new Rect(0, 0, micrograph.Width, micrograph.UsableHeight));
        using var root = new Mat();

        // The square root makes the noise of counted electrons even (Bartlett 1936).
        Cv2.Max(field, new Scalar(0), root);
        Cv2.Add(root, new Scalar(0.02), root);
        Cv2.Sqrt(root, root);
        var noise = Noise(root) / (Math.Sqrt(8 * Math.PI) * Smoothing * Smoothing);
        Cv2.GaussianBlur(root, root, new Size(0, 0), Smoothing);
        using var right = new Mat();
        using var down = new Mat();
        Cv2.Sobel(root, right, MatType.CV_32FC1, 1, 0, 3, 0.125);
        Cv2.Sobel(root, down, MatType.CV_32FC1, 0, 1, 3, 0.125);
        right.GetArray(out float[] x);
        down.GetArray(out float[] y);
        var shares = new double[Classes];
        var total = 0.0;
        for (var i = 0; i < x.Length; i++)
        {
            var steepness = Math.Sqrt((x[i] * (double)x[i]) + (y[i] * (double)y[i]));
            if (steepness > Math.Max(1e-5, Significance * noise))
            {
                var along = (Math.Atan2(y[i], x[i]) / Math.PI) + 0.5;
                shares[(int)((along - Math.Floor(along)) * Classes) % Classes] += steepness;
                total += steepness;
            }
        }

        return total > 0 ? [.. shares.Select(s => s / total)] : [];
    }

    /// <summary>Noise from the median absolute response of a second-difference mask (Immerkaer 1996, CVIU 64, 300–302, with a median).</summary>
    private static double Noise(Mat root)
    {
        using var kernel = Mat.FromPixelData(3, 3, MatType.CV_32FC1, new float[] { 1, -2, 1, -2, 4, -2, 1, -2, 1 });
        using var response = new Mat();
        Cv2.Filter2D(root, response, MatType.CV_32F, kernel);
        response.GetArray(out float[] values);
        float[] sample = [.. values.Where((_, i) => i % 7 == 0).Select(Math.Abs).Order()];
        return sample[sample.Length / 2] / NormalMedian / 6;
    }
}
