using OpenCvSharp;

namespace FiberScope.Imaging.Masks;

/// <summary>Which pixels of a mat seen from above show the foremost fibres.</summary>
/// <remarks>
/// A first cut by N. Otsu, IEEE Trans. Syst. Man Cybern. 9 (1979) 62-66, then the level half-way between fibre and ground near by, again
/// and again, so that uneven lighting and fibres of different brightness do not shift the outlines.
/// </remarks>
internal static class ForegroundMask
{
    private const int Rounds = 3;

    /// <summary>255 on the foremost fibres, 0 between them; null when the picture shows no two kinds of grey.</summary>
    /// <param name="smooth">The picture, smoothed; 32-bit, 0 to 1.</param>
    public static Mat? Of(Mat smooth)
    {
        var cut = FirstCut(smooth);
        for (var round = 0; round < Rounds; round++)
        {
            if (!Relevel(smooth, cut))
            {
                cut.Dispose();
                return null;
            }
        }

        return cut;
    }

    private static Mat FirstCut(Mat smooth)
    {
        using var bytes = new Mat();
        smooth.ConvertTo(bytes, MatType.CV_8UC1, 255);
        var cut = new Mat();
        Cv2.Threshold(bytes, cut, 0, 255, ThresholdTypes.Binary | ThresholdTypes.Otsu);
        return cut;
    }

    private static bool Relevel(Mat smooth, Mat cut)
    {
        using var open = new Mat();
        Cv2.BitwiseNot(cut, open);
        using var inner = new Mat();
        using var outer = new Mat();
        Cv2.Erode(cut, inner, null, iterations: 2);
        Cv2.Erode(open, outer, null, iterations: 3);
        if (Cv2.CountNonZero(inner) < 100 || Cv2.CountNonZero(outer) < 100)
        {
            return false;
        }

        using var distance = new Mat();
        Cv2.DistanceTransform(cut, distance, DistanceTypes.L2, DistanceTransformMasks.Mask5);
        var radius = Math.Max(3, Cv2.Mean(distance, cut).Val0 * 3);
        using var fibre = LocalLevel.Of(smooth, inner, radius);
        using var ground = LocalLevel.Of(smooth, outer, 4 * radius);
        using var level = new Mat();
        Cv2.AddWeighted(fibre, 0.5, ground, 0.5, 0, level);
        Cv2.Compare(smooth, level, cut, CmpTypes.GT);
        return true;
    }
}
