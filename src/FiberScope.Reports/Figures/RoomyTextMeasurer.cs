using OxyPlot;

namespace FiberScope.Reports.Figures;

/// <summary>Measures text for the layout with built-in metrics, and leaves room for wider faces.</summary>
/// <remarks>
/// Which sans-serif face a reader's machine has is unknown; the common ones differ by up to a fifth in width. Built-in metrics, and not
/// those of an installed font, keep the drawing the same everywhere.
/// </remarks>
internal sealed class RoomyTextMeasurer : PdfRenderContext
{
    /// <summary>The metrics are in points of 1/72 inch, the drawing in pixels of 1/96 inch; a tenth more is room for wider faces.</summary>
    private const double Room = 96.0 / 72.0 * 1.1;

    /// <summary>Makes a measurer; nothing is drawn with it.</summary>
    public RoomyTextMeasurer()
        : base(1, 1, OxyColors.White)
    {
    }

    /// <inheritdoc/>
    public override OxySize MeasureText(string text, string fontFamily, double fontSize, double fontWeight)
    {
        var size = base.MeasureText(text, fontFamily, fontSize, fontWeight);
        return new OxySize(size.Width * Room, size.Height * Room);
    }
}
