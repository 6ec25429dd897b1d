namespace FiberScope.Imaging.Files;

/// <summary>Finds the scale bar in the information strip and measures it to a fraction of a pixel.</summary>
/// <remarks>
/// A bar is a solid horizontal stroke, lighter or darker than its ground, shorter than the picture is wide, alone on its rows or
/// with end ticks. Strokes over the full width are lines of the frame, and two strokes one above the other with the same ends are
/// a box. The bar is measured over all, from outer edge to outer edge, its end ticks included.
/// </remarks>
internal static class ScaleBar
{
    /// <summary>The length of the bar; pixels.</summary>
    /// <exception cref="ImageRejectedException">There is no strip, no bar in it, or more than one stroke that could be it.</exception>
    public static double LengthPixels(Picture picture, int stripRows, string name)
    {
        if (stripRows == 0)
        {
            throw new ImageRejectedException($"{name}: no information strip was found at the bottom, so there is no scale bar to measure; give the pixel size instead.");
        }

        var strip = new StripImage(picture, stripRows);
        var bars = StrokeFinder.Find(strip);
        return bars.Count switch
        {
            0 => throw new ImageRejectedException($"{name}: no scale bar was found in the information strip; give the pixel size instead."),
            1 => StrokeMeter.LengthPixels(strip, bars[0]),
            _ => throw new ImageRejectedException(FormattableString.Invariant($"{name}: {bars.Count} strokes in the information strip could be the scale bar ({string.Join(", ", bars.Select(bar => FormattableString.Invariant($"{bar.Right - bar.Left + 1} px")))}); give the pixel size instead.")),
        };
    }
}
