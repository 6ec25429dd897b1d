namespace FiberScope.Imaging.Files;

/// <summary>Measures the length of a stroke to a fraction of a pixel.</summary>
internal static class StrokeMeter
{
    /// <summary>From end to end, or from tick to tick; pixels.</summary>
    public static double LengthPixels(StripImage strip, Stroke stroke)
    {
        var left = Tick(strip, stroke, stroke.Left);
        var right = Tick(strip, stroke, stroke.Right);
        return left is { } from && right is { } to ? to - from : PlainLength(strip, stroke);
    }

    /// <summary>The ink along the stroke's middle rows, in pixels' worth: grey pixels at the ends count by their share.</summary>
    private static double PlainLength(StripImage strip, Stroke stroke)
    {
        var (top, bottom) = stroke.Thickness >= 3 ? (stroke.Top + 1, stroke.Bottom - 1) : (stroke.Top, stroke.Bottom);
        var best = 0.0;
        for (var y = top; y <= bottom; y++)
        {
            var full = 0.0;
            for (var x = stroke.Left + 3; x <= stroke.Right - 3; x++)
            {
                full += strip[x, y] - strip.Ground;
            }

            full /= stroke.Length - 6;
            var ink = 0.0;
            for (var x = Math.Max(0, stroke.Left - 2); x <= Math.Min(strip.Width - 1, stroke.Right + 2); x++)
            {
                ink += Math.Clamp((strip[x, y] - strip.Ground) / full, 0, 1);
            }

            best = Math.Max(best, ink);
        }

        return best;
    }

    /// <summary>The middle of the tick at one end, to the right from the strip's edge; null when there is none.</summary>
    private static double? Tick(StripImage strip, Stroke stroke, int end)
    {
        var reach = Math.Max(3, stroke.Thickness + 2);
        double weight = 0, moment = 0;
        foreach (var y in Enumerable.Range(stroke.Top - reach, reach - 1).Concat(Enumerable.Range(stroke.Bottom + 2, reach - 1)))
        {
            for (var x = Math.Max(0, end - 6); x <= Math.Min(strip.Width - 1, end + 6) && y >= 0 && y < strip.Rows; x++)
            {
                var ink = Math.Clamp((strip[x, y] - strip.Ground) / (stroke.Ink - strip.Ground), 0, 1);
                if (ink > 0.15)
                {
                    weight += ink;
                    moment += ink * (x + 0.5);
                }
            }
        }

        // A tick is at least two rows of one pixel on one side.
        return weight >= 2 ? moment / weight : null;
    }
}
