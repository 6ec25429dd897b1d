using OpenCvSharp;

namespace FiberScope.Imaging.Sections;

/// <summary>Gives every cut fibre its number, touching ones split at their necks.</summary>
internal static class SectionLabels
{
    /// <summary>Per pixel the number of its piece, from 1; 0 in resin.</summary>
    /// <remarks>
    /// Seeds are the peaks of the distance from the resin that stand higher than the neck to their neighbour by a share of their own
    /// height; the pieces grow from them downhill, the highest place first (F. Meyer's flooding, 1992), so that they meet at the neck.
    /// OpenCV's own watershed orders by differences between neighbours, which are the same everywhere on a distance.
    /// </remarks>
    public static int[] Split(Mat mask, SectionSettings settings, out int count)
    {
        using var distance = new Mat();
        Cv2.DistanceTransform(mask, distance, DistanceTypes.L2, DistanceTransformMasks.Precise);
        using var rounded = new Mat();
        Cv2.GaussianBlur(distance, rounded, new Size(0, 0), 1);
        using var lowered = new Mat();
        rounded.ConvertTo(lowered, MatType.CV_32FC1, 1 - settings.NeckDepth, -0.4);
        using var rebuilt = Rebuild(lowered, rounded);
        using var peaks = new Mat();
        Cv2.Subtract(rounded, rebuilt, peaks);
        using var seeds = new Mat();
        Cv2.Compare(peaks, new Scalar(0.35), seeds, CmpTypes.GT);
        Cv2.BitwiseAnd(seeds, mask, seeds);
        using var labels = new Mat();
        count = Cv2.ConnectedComponents(seeds, labels) - 1;
        labels.GetArray(out int[] result);
        rounded.GetArray(out float[] heights);
        Grow(result, heights, mask);
        return result;
    }

    /// <summary>Morphological reconstruction by dilation of a surface under a ceiling (L. Vincent, 1993).</summary>
    private static Mat Rebuild(Mat surface, Mat ceiling)
    {
        var current = surface.Clone();
        using var next = new Mat();
        using var change = new Mat();
        for (var round = 0; round < 1000; round++)
        {
            Cv2.Dilate(current, next, null);
            Cv2.Min(next, ceiling, next);
            Cv2.Absdiff(next, current, change);
            next.CopyTo(current);
            Cv2.MinMaxLoc(change, out _, out double most);
            if (most < 1e-3)
            {
                break;
            }
        }

        return current;
    }

    private static void Grow(int[] labels, float[] heights, Mat mask)
    {
        mask.GetArray(out byte[] inside);
        var (width, height) = (mask.Width, mask.Height);
        var front = new PriorityQueue<int, float>();
        for (var i = 0; i < labels.Length; i++)
        {
            if (labels[i] > 0)
            {
                front.Enqueue(i, -heights[i]);
            }
        }

        while (front.TryDequeue(out var at, out _))
        {
            var (x, y) = (at % width, at / width);
            Take(x > 0, at - 1, at);
            Take(x < width - 1, at + 1, at);
            Take(y > 0, at - width, at);
            Take(y < height - 1, at + width, at);
        }

        void Take(bool exists, int neighbour, int from)
        {
            if (exists && inside[neighbour] != 0 && labels[neighbour] == 0)
            {
                labels[neighbour] = labels[from];
                front.Enqueue(neighbour, -heights[neighbour]);
            }
        }
    }
}
