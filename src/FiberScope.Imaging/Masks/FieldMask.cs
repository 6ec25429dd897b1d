using OpenCvSharp;

namespace FiberScope.Imaging.Masks;

/// <summary>Writes what was found in a field as grey pictures of the field's own size, for other programs.</summary>
public static class FieldMask
{
    /// <summary>The value of a pixel on a centre line.</summary>
    private const int OnTrace = 255;

    /// <summary>Writes an 8-bit PNG with the defect regions: 0 outside, else the number of the <see cref="DefectKind"/>.</summary>
    /// <param name="field">The field.</param>
    /// <param name="destination">Where to; left open.</param>
    public static void WriteDefects(FieldMeasurement field, Stream destination)
    {
        using var mask = Blank(field);
        foreach (var defect in field.Defects.Where(d => d.Outline.Length > 0).OrderByDescending(d => d.AreaPixels))
        {
            Point[] corners = [.. defect.Outline.Select(c => new Point(c.X, c.Y))];
            Cv2.FillPoly(mask, [corners], new Scalar((int)defect.Kind));
        }

        Write(mask, destination);
    }

    /// <summary>Writes an 8-bit PNG with the centre lines of the traces: 0 outside, 255 on a line.</summary>
    /// <param name="field">The field.</param>
    /// <param name="destination">Where to; left open.</param>
    public static void WriteTraces(FieldMeasurement field, Stream destination)
    {
        using var mask = Blank(field);
        foreach (var trace in field.Traces)
        {
            Point[] line = [.. trace.CentreLine.Select(p => new Point((int)Math.Floor(p.X), (int)Math.Floor(p.Y)))];
            Cv2.Polylines(mask, [line], isClosed: false, new Scalar(OnTrace));
        }

        Write(mask, destination);
    }

    private static Mat Blank(FieldMeasurement field) => new(field.Micrograph.Height, field.Micrograph.Width, MatType.CV_8UC1, Scalar.Black);

    private static void Write(Mat mask, Stream destination) => destination.Write(mask.ToBytes(".png"));
}
