namespace FiberScope.Imaging.Files;

/// <summary>Finds the band of text and scale bar that microscopes burn into the bottom of a picture.</summary>
/// <remarks>
/// A strip is drawn, a specimen is seen. In a strip most pixels have one and the same grey, its ground, and neighbours are exactly
/// equal; where it begins, over the full width, that ends. Two tests look for this: one for strips with flat margins, whatever
/// greys their boxes have, and one for a single ground, which also holds when JPEG has ruffled everything about the letters.
/// </remarks>
internal static class InformationStrip
{
    /// <summary>A row with this share of equal neighbours is a margin or a line.</summary>
    private const double FlatRow = 0.97;

    /// <summary>Rows of text still have this share of equal neighbours, or of ground.</summary>
    private const double DrawnRow = 0.42;

    /// <summary>A strip is at most this share of the picture's height.</summary>
    private const double TallestShare = 0.4;

    /// <summary>A strip thinner than this could not hold text; rows.</summary>
    private const int ShortestRows = 8;

    /// <summary>The tallest dividing line above a strip; rows.</summary>
    private const int LineRows = 4;

    /// <summary>The number of rows at the bottom that hold the strip; 0 when there is none.</summary>
    public static int Find(ReadOnlySpan<float> grey, int width, int height)
    {
        var rows = new StripRows(grey, width, height);
        var first = (int)(height * (1 - TallestShare));
        var (flat, plain) = (height, height);
        for (var top = first; top <= height - ShortestRows && (flat == height || plain == height); top++)
        {
            flat = flat == height && BeginsFlat(rows, top) && EdgeOrChange(grey, rows, top) ? top : flat;
            plain = plain == height && BeginsPlain(rows, top) ? top : plain;
        }

        var start = Math.Min(flat, plain);
        return start == height ? 0 : height - IncludeLine(rows, start);
    }

    /// <summary>A margin begins here and all below is drawn.</summary>
    private static bool BeginsFlat(StripRows rows, int top) =>
        rows.Equal[top] >= FlatRow && rows.MeanEqual(top, rows.Height) >= 0.72 && DrawnShare(rows.Equal, top) >= 0.93;

    /// <summary>The ground begins here from one row to the next or two, and all below lies on it.</summary>
    private static bool BeginsPlain(StripRows rows, int top)
    {
        var below = rows.MeanGround(top, rows.Height);
        return below >= 0.65
            && rows.Ground[top] >= 0.5
            && rows.MeanGround(top, top + 3) - rows.MeanGround(top - 5, top - 1) >= 0.35
            && below - rows.MeanGround(top - (rows.Height / 8), top - 1) >= 0.35
            && DrawnShare(rows.Ground, top) >= 0.93
            && rows.GroundIsFlat(top);
    }

    /// <summary>Whether the rows above are of another kind: less flat, or divided from the strip by an edge over the full width.</summary>
    private static bool EdgeOrChange(ReadOnlySpan<float> grey, StripRows rows, int top)
    {
        var above = rows.MeanEqual(top - (rows.Height / 6), top);
        var below = rows.MeanEqual(top, rows.Height);
        return (above <= below - 0.25 && above < 0.75) || (above < below && EdgeShare(grey, rows.Width, top) >= 0.9);
    }

    /// <summary>The share of columns that jump, all the same way, from a little above a row to a little below it.</summary>
    private static double EdgeShare(ReadOnlySpan<float> grey, int width, int top)
    {
        const float jump = 10f / 255;
        var (up, down) = (0, 0);
        for (var x = 0; x < width; x++)
        {
            var change = grey[((top + 1) * width) + x] - grey[((top - 3) * width) + x];
            up += change > jump ? 1 : 0;
            down += change < -jump ? 1 : 0;
        }

        return Math.Max(up, down) / (double)width;
    }

    private static double DrawnShare(double[] shares, int top) => shares.AsSpan(top).ToArray().Count(share => share >= DrawnRow) / (double)(shares.Length - top);

    /// <summary>A line that divides the strip from the picture belongs to the strip; resampling and JPEG blur its rows.</summary>
    private static int IncludeLine(StripRows rows, int top)
    {
        var first = top;
        for (var y = top - 1; y >= Math.Max(0, top - LineRows); y--)
        {
            first = rows.OneGrey[y] >= 0.9 ? y : first;
        }

        return first;
    }
}
