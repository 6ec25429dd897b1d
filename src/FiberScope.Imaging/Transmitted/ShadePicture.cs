using OpenCvSharp;

namespace FiberScope.Imaging.Transmitted;

/// <summary>The light that fibres take away, as a picture that the tracer of bright fibres can follow.</summary>
internal static class ShadePicture
{
    /// <summary>Sigmas of the neighbourhoods whose shade is added; pixels. Each fills the cores of fibres two to four times as wide.</summary>
    private static readonly double[] Neighbourhoods = [1.5, 3, 6, 12];

    /// <summary>Where the empty field lies in the picture: above black, or the tracer's square root would stretch its noise.</summary>
    private const float FieldLevel = 0.15f;

    /// <summary>The picture to trace.</summary>
    public static Micrograph Of(LightField light, Micrograph original, double coreFill)
    {
        using var passed = Mat.FromPixelData(light.Height, light.Width, MatType.CV_32FC1, light.Passed);
        using var taken = new Mat();
        Cv2.Subtract(new Scalar(1), passed, taken);
        using var sum = taken.Clone();
        using var smooth = new Mat();
        foreach (var sigma in Neighbourhoods)
        {
            Cv2.GaussianBlur(taken, smooth, new Size(0, 0), sigma);
            Cv2.Max(smooth, new Scalar(0), smooth);
            Cv2.AddWeighted(sum, 1, smooth, coreFill / Neighbourhoods.Length * 2, 0, sum);
        }

        sum.GetArray(out float[] shade);
        for (var i = 0; i < shade.Length; i++)
        {
            shade[i] = Math.Clamp(FieldLevel + (0.6f * shade[i]), 0, 1);
        }

        return new Micrograph(shade, light.Width, light.Height, original.PixelSize, ImagingMode.Transmitted, original.Source);
    }
}
