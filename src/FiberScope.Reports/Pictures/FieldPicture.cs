using System.Globalization;
using System.Text;
using FiberScope.Imaging;
using SixLabors.ImageSharp;
using SixLabors.ImageSharp.Formats.Jpeg;
using SixLabors.ImageSharp.PixelFormats;
using SixLabors.ImageSharp.Processing;

namespace FiberScope.Reports.Pictures;

/// <summary>A field as it was measured: the picture, and on it as sharp lines the traces, readings, defects and excluded rows.</summary>
/// <remarks>The picture is made smaller and compressed for the page; the lines keep the full picture's coordinates.</remarks>
internal static class FieldPicture
{
    private const double TraceStep = 6;

    /// <summary>Bars stand at least this many pixels apart, or this share of the diameter where that is more.</summary>
    private const double BarStep = 9;
    private const double BarStepPerDiameter = 0.5;

    /// <summary>The picture as an inline SVG element.</summary>
    public static string Svg(FieldMeasurement field, PictureBudget budget)
    {
        var picture = field.Micrograph;
        var stroke = Math.Max(1.2, picture.Width / 900.0);
        var svg = new StringBuilder();
        svg.Append(CultureInfo.InvariantCulture, $"<svg class=\"field\" xmlns=\"http://www.w3.org/2000/svg\" viewBox=\"0 0 {picture.Width} {picture.Height}\" role=\"img\" aria-label=\"The field with its traces and readings\">");
        svg.Append(CultureInfo.InvariantCulture, $"<image width=\"{picture.Width}\" height=\"{picture.Height}\" preserveAspectRatio=\"none\" href=\"data:image/jpeg;base64,{Convert.ToBase64String(Jpeg(picture, budget))}\"/>");
        Path(svg, "trace", stroke, field.Traces.Select(TraceLine));
        Path(svg, "reading", stroke * 1.3, Spaced(field.Readings).Select(ReadingBar));
        foreach (var kind in field.Defects.Select(d => d.Kind).Distinct().Order())
        {
            Path(svg, "defect " + kind.ToString().ToLowerInvariant(), stroke * 1.6, field.Defects.Where(d => d.Kind == kind).Select(Outline));
        }

        if (picture.ExcludedBottomRows > 0)
        {
            svg.Append(CultureInfo.InvariantCulture, $"<rect class=\"excluded\" x=\"0\" y=\"{picture.UsableHeight}\" width=\"{picture.Width}\" height=\"{picture.ExcludedBottomRows}\" stroke-width=\"{stroke:F1}\"/>");
        }

        return svg.Append("</svg>").ToString();
    }

    private static void Path(StringBuilder svg, string style, double stroke, IEnumerable<string> parts)
    {
        svg.Append(CultureInfo.InvariantCulture, $"<path class=\"{style}\" stroke-width=\"{stroke:F1}\" d=\"");
        svg.AppendJoin("", parts).Append("\"/>");
    }

    /// <summary>A centre line, thinned to points some pixels apart.</summary>
    private static string TraceLine(Trace trace)
    {
        var line = new StringBuilder();
        var last = trace.CentreLine[0];
        line.Append(CultureInfo.InvariantCulture, $"M{last.X:F0} {last.Y:F0}L");
        for (var i = 1; i < trace.CentreLine.Length; i++)
        {
            var point = trace.CentreLine[i];
            if (i == trace.CentreLine.Length - 1 || Math.Abs(point.X - last.X) + Math.Abs(point.Y - last.Y) >= TraceStep)
            {
                line.Append(CultureInfo.InvariantCulture, $"{point.X:F0} {point.Y:F0} ");
                last = point;
            }
        }

        return line.ToString();
    }

    /// <summary>
    /// Readings far enough apart to be told from each other; where a fibre is read at every pixel, drawing all would hide it.
    /// </summary>
    private static IEnumerable<PixelReading> Spaced(IEnumerable<PixelReading> readings)
    {
        PixelReading? last = null;
        foreach (var reading in readings)
        {
            if (last is not { } before
                || before.Trace != reading.Trace
                || Math.Abs(reading.X - before.X) + Math.Abs(reading.Y - before.Y) >= Math.Max(BarStep, BarStepPerDiameter * reading.Diameter))
            {
                last = reading;
                yield return reading;
            }
        }
    }

    /// <summary>A bar across the fibre from edge to edge.</summary>
    private static string ReadingBar(PixelReading reading)
    {
        var (dx, dy) = (-Math.Sin(reading.Direction) * reading.Diameter / 2, Math.Cos(reading.Direction) * reading.Diameter / 2);
        return string.Create(CultureInfo.InvariantCulture, $"M{reading.X - dx:F1} {reading.Y - dy:F1}l{2 * dx:F1} {2 * dy:F1}");
    }

    private static string Outline(DefectRegion defect) => defect.Outline.IsDefaultOrEmpty
        ? ""
        : string.Create(CultureInfo.InvariantCulture, $"M{string.Join(' ', defect.Outline.Select(p => string.Create(CultureInfo.InvariantCulture, $"{p.X} {p.Y}")))}Z");

    private static byte[] Jpeg(Micrograph picture, PictureBudget budget)
    {
        using var image = new Image<L8>(picture.Width, picture.Height);
        var grey = picture.GreyMemory;
        image.ProcessPixelRows(rows =>
        {
            for (var y = 0; y < rows.Height; y++)
            {
                var from = grey.Span.Slice(y * picture.Width, picture.Width);
                var to = rows.GetRowSpan(y);
                for (var x = 0; x < from.Length; x++)
                {
                    to[x] = new L8((byte)Math.Clamp((from[x] * 255) + 0.5f, 0, 255));
                }
            }
        });
        if (picture.Width > budget.MostColumns)
        {
            image.Mutate(operation => operation.Resize(budget.MostColumns, 0, KnownResamplers.Box));
        }

        return Encode(image, budget);
    }

    /// <summary>The best quality that keeps to the budget; noisy pictures compress badly.</summary>
    private static byte[] Encode(Image<L8> image, PictureBudget budget)
    {
        int[] qualities = [80, 65, 50, 35];
        using var stream = new MemoryStream();
        foreach (var quality in qualities)
        {
            stream.SetLength(0);
            image.Save(stream, new JpegEncoder { Quality = quality, ColorType = JpegColorType.Luminance });
            if (stream.Length <= budget.MostBytes)
            {
                break;
            }
        }

        return stream.ToArray();
    }
}
