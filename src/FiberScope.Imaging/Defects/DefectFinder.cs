using System.Collections.Immutable;
using OpenCvSharp;

namespace FiberScope.Imaging.Defects;

/// <summary>Finds shot and beads, ropes, film and debris: bright places, wider than the fibres, without a fibre's edges.</summary>
/// <remarks>
/// Wherever there is a single fibre, an edge lies within half its diameter. A bright place from which the next edge is further off than
/// half a usual diameter is no single fibre of this mat, unless a fibre was measured right there: thick fibres vouch for themselves.
/// </remarks>
public static class DefectFinder
{
    /// <summary>Finds the defects of a field.</summary>
    /// <param name="micrograph">The picture.</param>
    /// <param name="readings">The readings; they tell how wide fibres are here, and where. None, no defects.</param>
    /// <param name="settings">Every threshold.</param>
    public static ImmutableArray<DefectRegion> Find(Micrograph micrograph, ImmutableArray<PixelReading> readings, DefectSettings settings)
    {
        ArgumentNullException.ThrowIfNull(micrograph);
        if (micrograph.Mode != ImagingMode.SecondaryElectron || MedianDiameter(readings) is not { } diameter || micrograph.UsableHeight < 8 * diameter)
        {
            return [];
        }

        using var whole = Mat.FromPixelData(micrograph.Height, micrograph.Width, MatType.CV_32FC1, micrograph.Grey.ToArray());
        using var field = new Mat(whole, new Rect(0, 0, micrograph.Width, micrograph.UsableHeight));
        using var free = FreePlaces(field, diameter, settings);
        using var distance = new Mat();
        Cv2.DistanceTransform(free, distance, DistanceTypes.L2, DistanceTransformMasks.Mask5);
        using var seeds = new Mat();
        Cv2.Compare(distance, new Scalar(settings.LeastRadius * diameter), seeds, CmpTypes.GT);
        DropFibres(seeds, distance, diameter, settings);
        using var regions = Grown(seeds, (settings.LeastRadius * diameter) + 1);
        using var fibres = Ribbons(readings, field.Size());
        return Regions(regions, fibres, distance, diameter, settings);
    }

    private static double? MedianDiameter(ImmutableArray<PixelReading> readings)
    {
        var evidence = new Fitness.FieldEvidence { Readings = readings };
        return evidence.MedianDiameter;
    }

    /// <summary>255 where it is bright and no edge is near.</summary>
    private static Mat FreePlaces(Mat field, double diameter, DefectSettings settings)
    {
        var sigma = Math.Max(0.7, settings.SmoothingShare * diameter);
        using var smooth = new Mat();
        Cv2.GaussianBlur(field, smooth, new Size(0, 0), sigma);
        Cv2.Subtract(smooth, new Scalar(Darkest(smooth)), smooth);
        using var near = new Mat();
        var reach = (2 * (int)Math.Ceiling(diameter / 2)) + 1;
        using var square = Cv2.GetStructuringElement(MorphShapes.Rect, new Size(reach, reach));
        Cv2.Dilate(smooth, near, square);
        Cv2.GaussianBlur(near, near, new Size(0, 0), diameter);
        Cv2.Max(near, new Scalar(1e-3), near);
        using var right = new Mat();
        using var down = new Mat();
        using var steepness = new Mat();
        Cv2.Sobel(smooth, right, MatType.CV_32FC1, 1, 0, 1, 0.5);
        Cv2.Sobel(smooth, down, MatType.CV_32FC1, 0, 1, 1, 0.5);
        Cv2.Magnitude(right, down, steepness);
        Cv2.Divide(steepness, near, steepness);
        Cv2.Divide(smooth, near, smooth);
        var free = new Mat();
        using var bright = new Mat();
        Cv2.Compare(steepness, new Scalar(settings.FreeSteepness / sigma), free, CmpTypes.LT);
        Cv2.Compare(smooth, new Scalar(settings.LeastBrightness), bright, CmpTypes.GT);
        Cv2.BitwiseAnd(free, bright, free);
        return free;
    }

    private static double Darkest(Mat smooth)
    {
        smooth.GetArray(out float[] values);
        Array.Sort(values);
        return values[values.Length / 50];
    }

    /// <summary>Takes away long narrow free places: the flat backs of single fibres a little wider than usual.</summary>
    private static void DropFibres(Mat seeds, Mat distance, double diameter, DefectSettings settings)
    {
        using var labels = new Mat();
        var count = Cv2.ConnectedComponents(seeds, labels, PixelConnectivity.Connectivity8) - 1;
        labels.GetArray(out int[] numbers);
        distance.GetArray(out float[] far);
        var shapes = DefectShape.All(numbers, far, seeds.Width, count);
        var width = 2 * settings.LeastRadius * diameter;
        seeds.GetArray(out byte[] kept);
        for (var i = 0; i < numbers.Length; i++)
        {
            if (numbers[i] > 0 && shapes[numbers[i]] is var shape
                && shape.Farthest <= settings.WideRadius * diameter && (shape.Length + width) / (shape.Width + width) >= settings.FibreElongation)
            {
                kept[i] = 0;
            }
        }

        seeds.SetArray(kept);
    }

    private static Mat Grown(Mat seeds, double by)
    {
        using var away = new Mat();
        Cv2.BitwiseNot(seeds, away);
        using var distance = new Mat();
        Cv2.DistanceTransform(away, distance, DistanceTypes.L2, DistanceTransformMasks.Mask5);
        var grown = new Mat();
        Cv2.Compare(distance, new Scalar(by), grown, CmpTypes.LE);
        return grown;
    }

    /// <summary>What the readings stand for, painted: pieces of fibre of their diameter and length.</summary>
    private static Mat Ribbons(ImmutableArray<PixelReading> readings, Size size)
    {
        var painted = new Mat(size, MatType.CV_8UC1, Scalar.Black);
        foreach (var reading in readings)
        {
            var half = Math.Max(1, Math.Min(reading.RepresentedLength, 2 * reading.Diameter) / 2);
            var (dx, dy) = (half * Math.Cos(reading.Direction), half * Math.Sin(reading.Direction));
            Cv2.Line(
                painted,
                new Point((int)(reading.X - dx), (int)(reading.Y - dy)),
                new Point((int)(reading.X + dx), (int)(reading.Y + dy)),
                Scalar.White,
                Math.Max(1, (int)Math.Round(reading.Diameter)));
        }

        return painted;
    }

    private static ImmutableArray<DefectRegion> Regions(Mat regions, Mat fibres, Mat distance, double diameter, DefectSettings settings)
    {
        Cv2.FindContours(regions, out var outlines, out _, RetrievalModes.External, ContourApproximationModes.ApproxNone);
        var found = ImmutableArray.CreateBuilder<DefectRegion>();
        foreach (var outline in outlines)
        {
            var box = Cv2.BoundingRect(outline);
            using var mask = new Mat(box.Size, MatType.CV_8UC1, Scalar.Black);
            Cv2.FillPoly(mask, [outline.Select(point => point - box.Location)], Scalar.White);
            var area = Cv2.CountNonZero(mask);
            using var there = new Mat(fibres, box);
            using var covered = new Mat();
            Cv2.BitwiseAnd(there, mask, covered);
            if (area == 0 || Cv2.CountNonZero(covered) > settings.FibreCover * area)
            {
                continue;
            }

            using var depth = new Mat(distance, box);
            Cv2.MinMaxLoc(depth, out _, out var farthest, out _, out _, mask);
            found.Add(new DefectRegion(DefectShape.Kind(outline, area, farthest, diameter), area, [.. outline.Select(point => (point.X, point.Y))]));
        }

        return found.ToImmutable();
    }
}
