namespace FiberScope.Imaging.Files;

/// <summary>Finds the band of text and scale bar that microscopes burn into the bottom of a picture.</summary>
/// <remarks>
/// A strip is drawn, a specimen is seen: in a strip most neighbouring pixels are exactly equal and whole rows are flat from edge to
/// edge (margins and lines); above it nothing is. The strip begins at the topmost flat row below which all is drawn and above
/// which the statistics change.
/// </remarks>
internal static class InformationStrip
{
    /// <summary>Neighbours closer than this are equal: a little more than half a step of 8 bits, so that 16-bit copies behave alike.</summary>
    private const float EqualWithin = 0.6f / 255;

    /// <summary>A row with this share of equal neighbours is a margin or a line.</summary>
    private const double FlatRow = 0.97;

    /// <summary>Rows of text still have this share of equal neighbours.</summary>
    private const double DrawnRow = 0.45;

    /// <summary>A strip is at most this share of the picture's height.</summary>
    private const double TallestShare = 0.4;

    /// <summary>A strip thinner than this could not hold text; rows.</summary>
    private const int ShortestRows = 6;

    /// <summary>The number of rows at the bottom that hold the strip; 0 when there is none.</summary>
    public static int Find(ReadOnlySpan<float> grey, int width, int height)
    {
        var equal = EqualShares(grey, width, height);
        for (var top = (int)(height * (1 - TallestShare)); top <= height - ShortestRows; top++)
        {
            if (equal[top] >= FlatRow && IsDrawn(equal.AsSpan(top)) && Differs(grey, width, height, top, equal))
            {
                return height - FirstRow(equal, top);
            }
        }

        return 0;
    }

    private static double[] EqualShares(ReadOnlySpan<float> grey, int width, int height)
    {
        var shares = new double[height];
        for (var y = 0; y < height; y++)
        {
            var row = grey.Slice(y * width, width);
            var count = 0;
            for (var x = 1; x < width; x++)
            {
                count += Math.Abs(row[x] - row[x - 1]) <= EqualWithin ? 1 : 0;
            }

            shares[y] = count / (double)(width - 1);
        }

        return shares;
    }

    private static bool IsDrawn(ReadOnlySpan<double> rows)
    {
        var sum = 0.0;
        var drawn = 0;
        foreach (var share in rows)
        {
            sum += share;
            drawn += share >= DrawnRow ? 1 : 0;
        }

        return sum / rows.Length >= 0.72 && drawn >= 0.93 * rows.Length;
    }

    /// <summary>Whether the rows above are of another kind: less flat, or divided from the strip by an edge over the full width.</summary>
    private static bool Differs(ReadOnlySpan<float> grey, int width, int height, int top, double[] equal)
    {
        var above = Mean(equal.AsSpan(Math.Max(0, top - (height / 6)), Math.Min(top, height / 6)));
        var below = Mean(equal.AsSpan(top));
        return above <= below - 0.25 && above < 0.75 || (above < below && EdgeShare(grey, width, top) >= 0.9);
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

    /// <summary>A line that was blurred by resampling or JPEG begins a row or two above the first flat row.</summary>
    private static int FirstRow(double[] equal, int top)
    {
        var first = top;
        while (top - first < 3 && first > 0 && equal[first - 1] >= DrawnRow + 0.1)
        {
            first--;
        }

        return first;
    }

    private static double Mean(ReadOnlySpan<double> values)
    {
        var sum = 0.0;
        foreach (var value in values)
        {
            sum += value;
        }

        return values.Length == 0 ? 0 : sum / values.Length;
    }
}
