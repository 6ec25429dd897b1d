namespace FiberScope.Imaging.Files;

/// <summary>Finds the scale bar in the information strip and measures it to a fraction of a pixel.</summary>
/// <remarks>
/// A bar is a solid horizontal stroke, lighter or darker than its ground, shorter than the picture is wide, alone on its rows or
/// with end ticks. Strokes over the full width are lines of the frame, and two strokes one above the other with the same ends are
/// a box. A plain bar is measured from end to end; one with ticks from the middle of one tick to the middle of the other, as a pen
/// draws it.
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

/// <summary>The rows of the information strip and the grey of its ground.</summary>
internal sealed class StripImage
{
    private readonly float[] _grey;
    private readonly int _start;

    public StripImage(Picture picture, int rows)
    {
        _grey = picture.Grey;
        Width = picture.Width;
        Rows = rows;
        _start = (picture.Height - rows) * picture.Width;
        Ground = MostCommon(_grey.AsSpan(_start, rows * Width));
    }

    public int Width { get; }

    public int Rows { get; }

    /// <summary>The most common grey of the strip.</summary>
    public float Ground { get; }

    public float this[int x, int y] => _grey[_start + (y * Width) + x];

    private static float MostCommon(ReadOnlySpan<float> values)
    {
        var counts = new int[256];
        foreach (var value in values)
        {
            counts[Math.Clamp((int)Math.Round(value * 255), 0, 255)]++;
        }

        return Array.IndexOf(counts, counts.Max()) / 255f;
    }
}

/// <summary>A solid horizontal stroke in the strip: the rows and columns it covers, both ends included.</summary>
internal readonly record struct Stroke(int Top, int Bottom, int Left, int Right, float Ink)
{
    public int Length => Right - Left + 1;

    public int Thickness => Bottom - Top + 1;
}
