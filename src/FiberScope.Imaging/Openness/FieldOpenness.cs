using System.Collections.Immutable;
using FiberScope.Imaging.Masks;
using OpenCvSharp;

namespace FiberScope.Imaging.Openness;

/// <summary>What a field shows between its foremost fibres: openings, and how evenly the fibres cover it.</summary>
public sealed record FieldOpenness
{
    private const int SmallestWindow = 16, WindowsAcross = 3;

    /// <summary>A circle's centre lies inside a larger one's share of this radius: the same opening.</summary>
    private const double SameOpening = 1;

    /// <summary>Diameters of the largest circles that fit between the foremost fibres, largest first; pixels. Those cut by the border are left out.</summary>
    public required ImmutableArray<double> Diameters { get; init; }

    /// <summary>The share of the field that is open between the foremost fibres; dimensionless, 0 to 1.</summary>
    public required double OpenShare { get; init; }

    /// <summary>The cover of windows of growing size.</summary>
    public required ImmutableArray<LocalCover> Cover { get; init; }

    /// <summary>Looks at a field seen from above; null when it shows no fibres to look between.</summary>
    /// <param name="micrograph">The picture.</param>
    /// <param name="fibreDiameter">The usual diameter of its fibres; pixels, above zero.</param>
    public static FieldOpenness? Of(Micrograph micrograph, double fibreDiameter)
    {
        ArgumentNullException.ThrowIfNull(micrograph);
        if (Math.Min(micrograph.Width, micrograph.UsableHeight) < WindowsAcross * SmallestWindow)
        {
            return null;
        }

        using var whole = Mat.FromPixelData(micrograph.Height, micrograph.Width, MatType.CV_32FC1, micrograph.Grey.ToArray());
        using var field = new Mat(whole, new Rect(0, 0, micrograph.Width, micrograph.UsableHeight));
        using var smooth = new Mat();
        Cv2.GaussianBlur(field, smooth, new Size(0, 0), Math.Max(1, 0.15 * fibreDiameter));
        using var fibres = ForegroundMask.Of(smooth);
        if (fibres is null)
        {
            return null;
        }

        using var open = new Mat();
        Cv2.BitwiseNot(fibres, open);
        return new FieldOpenness
        {
            Diameters = Circles(open, Math.Max(4, 0.5 * fibreDiameter)),
            OpenShare = Cv2.CountNonZero(open) / (double)open.Total(),
            Cover = Windows(fibres),
        };
    }

    /// <summary>Largest circles first, each on ground that no larger one holds the centre of.</summary>
    private static ImmutableArray<double> Circles(Mat open, double smallest)
    {
        using var distance = new Mat();
        Cv2.DistanceTransform(open, distance, DistanceTypes.L2, DistanceTransformMasks.Precise);
        using var highest = new Mat();
        Cv2.Dilate(distance, highest, null);
        distance.GetArray(out float[] far);
        highest.GetArray(out float[] top);
        var width = open.Width;
        var peaks = Enumerable.Range(0, far.Length).Where(i => far[i] >= smallest / 2 && far[i] >= top[i]).OrderByDescending(i => far[i]).ThenBy(i => i);
        var taken = new bool[far.Length];
        var found = ImmutableArray.CreateBuilder<double>();
        foreach (var i in peaks)
        {
            var (x, y, radius) = (i % width, i / width, far[i]);
            if (taken[i])
            {
                continue;
            }

            Take(taken, width, open.Height, x, y, SameOpening * radius);
            if (Math.Min(Math.Min(x, width - 1 - x), Math.Min(y, open.Height - 1 - y)) >= radius)
            {
                // The nearest fibre pixel's centre lies half a pixel beyond its edge.
                found.Add((2 * radius) - 1);
            }
        }

        return found.ToImmutable();
    }

    private static void Take(bool[] taken, int width, int height, int x, int y, double radius)
    {
        for (var row = Math.Max(0, (int)(y - radius)); row <= Math.Min(height - 1, (int)(y + radius)); row++)
        {
            var half = (int)Math.Sqrt(Math.Max(0, (radius * radius) - ((row - y) * (row - y))));
            for (var column = Math.Max(0, x - half); column <= Math.Min(width - 1, x + half); column++)
            {
                taken[(row * width) + column] = true;
            }
        }
    }

    private static ImmutableArray<LocalCover> Windows(Mat fibres)
    {
        var windows = ImmutableArray.CreateBuilder<LocalCover>();
        var (width, height) = (fibres.Width, fibres.Height);
        for (var side = SmallestWindow; side * WindowsAcross <= Math.Min(width, height); side *= 2)
        {
            using var inside = new Mat(fibres, new Rect(0, 0, width / side * side, height / side * side));
            using var means = new Mat();
            Cv2.Resize(inside, means, new Size(width / side, height / side), 0, 0, InterpolationFlags.Area);
            using var shares = new Mat();
            means.ConvertTo(shares, MatType.CV_32FC1, 1 / 255.0);
            shares.GetArray(out float[] values);
            windows.Add(new LocalCover(side, [.. values.Select(v => (double)v)]));
        }

        return windows.ToImmutable();
    }
}
