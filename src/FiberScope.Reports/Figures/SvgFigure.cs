using System.Text.RegularExpressions;
using OxyPlot;

namespace FiberScope.Reports.Figures;

/// <summary>A finished figure as an inline SVG element: real text, no script, no font of its own, and a description for readers.</summary>
internal sealed partial record SvgFigure
{
    private SvgFigure(string svg) => Svg = svg;

    /// <summary>The SVG element.</summary>
    public string Svg { get; }

    /// <summary>Draws a plot.</summary>
    /// <param name="model">The plot.</param>
    /// <param name="id">A name, unique on the page; letters and hyphens.</param>
    /// <param name="description">What the figure shows, for those who cannot see it; one sentence.</param>
    /// <param name="width">Width of the drawing, in the units of its font size.</param>
    /// <param name="height">Height of the drawing.</param>
    /// <remarks>
    /// Text is laid out with the built-in metrics of one common face, so that the drawing has the same bytes on every machine, and
    /// is shown in whatever sans-serif face the reader's machine has.
    /// </remarks>
    public static SvgFigure Draw(PlotModel model, string id, string description, double width = 680, double height = 380)
    {
        var drawn = SvgExporter.ExportToString(model, width, height, isDocument: false, textMeasurer: new RoomyTextMeasurer(), useVerticalTextAlignmentWorkaround: false);
        var body = drawn[drawn.IndexOf("<svg", StringComparison.Ordinal)..];
        body = body[(body.IndexOf('>', StringComparison.Ordinal) + 1)..];
        body = body.Replace("clipPath", id + "-clip", StringComparison.Ordinal)
            .Replace($"<{id}-clip", "<clipPath", StringComparison.Ordinal)
            .Replace($"</{id}-clip", "</clipPath", StringComparison.Ordinal)
            .Replace($" font-family=\"{FigureStyle.MeasuringFont}\"", "", StringComparison.Ordinal);
        body = BetweenTags().Replace(body, "><");
        var open = FormattableString.Invariant($"<svg class=\"figure\" xmlns=\"http://www.w3.org/2000/svg\" viewBox=\"0 0 {width} {height}\" role=\"img\" aria-label=\"");
        return new SvgFigure(open + System.Net.WebUtility.HtmlEncode(description) + "\">" + body);
    }

    [GeneratedRegex(@">\s+<", RegexOptions.None, 60_000)]
    private static partial Regex BetweenTags();
}
