using System.Collections.Immutable;
using OpenCvSharp;

namespace FiberScope.Imaging.Defects;

/// <summary>The defects of a field as a picture.</summary>
public static class DefectMask
{
    /// <summary>Per pixel 0 for none, else the <see cref="DefectKind"/>'s number; height × width values, row by row from the top left.</summary>
    public static byte[] Of(Micrograph micrograph, ImmutableArray<DefectRegion> defects)
    {
        using var mask = new Mat(micrograph.Height, micrograph.Width, MatType.CV_8UC1, Scalar.Black);
        foreach (var defect in defects)
        {
            Cv2.FillPoly(mask, [defect.Outline.Select(corner => new Point(corner.X, corner.Y))], new Scalar((int)defect.Kind));
        }

        mask.GetArray(out byte[] values);
        return values;
    }

    /// <summary>The readings that lie on no defect.</summary>
    public static ImmutableArray<PixelReading> Off(Micrograph micrograph, ImmutableArray<DefectRegion> defects, ImmutableArray<PixelReading> readings)
    {
        if (defects.IsEmpty)
        {
            return readings;
        }

        var mask = Of(micrograph, defects);
        return [.. readings.Where(reading => mask[(Math.Clamp((int)reading.Y, 0, micrograph.Height - 1) * micrograph.Width) + Math.Clamp((int)reading.X, 0, micrograph.Width - 1)] == 0)];
    }
}
