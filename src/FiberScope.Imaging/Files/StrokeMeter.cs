namespace FiberScope.Imaging.Files;

/// <summary>Measures the length of a stroke to a fraction of a pixel.</summary>
internal static class StrokeMeter
{
    /// <summary>How far beyond the ends grey pixels are looked for.</summary>
    private const int Fringe = 2;

    /// <summary>From end to end, end ticks included; pixels.</summary>
    /// <remarks>
    /// The ink along the stroke's middle rows in pixels' worth: a grey pixel at an end counts by its share, so that a bar that was
    /// drawn or scaled to a fraction of a pixel is measured to one.
    /// </remarks>
    public static double LengthPixels(StripImage strip, Stroke stroke)
    {
        var (top, bottom) = stroke.Thickness >= 3 ? (stroke.Top + 1, stroke.Bottom - 1) : (stroke.Top, stroke.Bottom);
        var sum = 0.0;
        for (var y = top; y <= bottom; y++)
        {
            sum += RowLength(strip, stroke, y);
        }

        return sum / (bottom - top + 1);
    }

    private static double RowLength(StripImage strip, Stroke stroke, int y)
    {
        var (from, to) = (stroke.Left + Fringe + 1, stroke.Right - Fringe - 1);
        var full = 0.0;
        for (var x = from; x <= to; x++)
        {
            full += strip[x, y] - strip.Ground;
        }

        full /= to - from + 1;
        var ink = 0.0;
        for (var x = Math.Max(0, stroke.Left - Fringe); x <= Math.Min(strip.Width - 1, stroke.Right + Fringe); x++)
        {
            ink += Math.Clamp((strip[x, y] - strip.Ground) / full, 0, 1);
        }

        return ink;
    }
}
