namespace FiberScope.Imaging.Tracing;

/// <summary>The best path of outward fall along a strip.</summary>
/// <remarks>Source: boundary paths by dynamic programming, Geiger, Gupta, Costa and Vlontzos (1995), IEEE PAMI 17(3), 294–302.</remarks>
internal static class EdgePath
{
    private const float TurnCost = 0.04f;

    /// <summary>The median over rows of the strongest outward fall near the wanted offsets.</summary>
    public static double TypicalFall(RibbonStrip strip)
    {
        var best = new double[strip.Rows];
        for (var r = 0; r < strip.Rows; r++)
        {
            var tolerance = Math.Max(0.9, 0.32 * strip.Half[r]);
            for (var side = -1; side <= 1; side += 2)
            {
                var (from, to) = (strip.Column(side * (strip.Half[r] - tolerance)), strip.Column(side * (strip.Half[r] + tolerance)));
                for (var c = Math.Min(from, to); c <= Math.Max(from, to); c++)
                {
                    best[r] = Math.Max(best[r], -side * strip.Slope[(r * strip.Columns) + c]);
                }
            }
        }

        return Math.Max(1e-6, Series.Median(best));
    }

    /// <param name="strip">The strip.</param>
    /// <param name="edge">Filled with what is found.</param>
    /// <param name="side">−1 for left, 1 for right.</param>
    /// <param name="tightness">How close to the wanted offset the path must stay; 1 is the first look.</param>
    /// <param name="typical">The usual fall, from <see cref="TypicalFall"/>.</param>
    public static void Find(RibbonStrip strip, EdgeTrack edge, int side, double tightness, double typical)
    {
        var columns = strip.Reach + 1;
        var fall = new float[strip.Rows * columns];
        var merit = new float[strip.Rows * columns];
        for (var r = 0; r < strip.Rows; r++)
        {
            var tolerance = Math.Max(0.9, 0.32 * strip.Half[r]) * tightness;
            for (var c = 0; c < columns; c++)
            {
                var at = (r * columns) + c;
                fall[at] = -side * strip.Slope[(r * strip.Columns) + strip.Reach + (side * c)];
                var off = ((c * strip.ColumnStep) - strip.Half[r]) / tolerance;
                merit[at] = Math.Abs(off) > 1.6 ? -4 : (float)(Math.Min(fall[at] / typical, 1.5) - (0.5 * off * off));
            }
        }

        var path = Best(merit, strip.Rows, columns);
        for (var r = 0; r < strip.Rows; r++)
        {
            var tolerance = Math.Max(0.9, 0.32 * strip.Half[r]) * tightness;
            var reach = Math.Max((int)Math.Ceiling(0.6 / strip.ColumnStep), (int)(0.35 * tolerance / strip.ColumnStep));
            Climb(fall.AsSpan(r * columns, columns), path[r], reach, strip.ColumnStep, edge, r);
        }
    }

    private static int[] Best(float[] merit, int rows, int columns)
    {
        var sum = new float[rows * columns];
        var back = new sbyte[rows * columns];
        Array.Copy(merit, sum, columns);
        for (var r = 1; r < rows; r++)
        {
            for (var c = 0; c < columns; c++)
            {
                var above = ((r - 1) * columns) + c;
                var (best, turn) = (sum[above], (sbyte)0);
                if (c > 0 && sum[above - 1] - TurnCost > best)
                {
                    (best, turn) = (sum[above - 1] - TurnCost, -1);
                }

                if (c < columns - 1 && sum[above + 1] - TurnCost > best)
                {
                    (best, turn) = (sum[above + 1] - TurnCost, 1);
                }

                sum[(r * columns) + c] = best + merit[(r * columns) + c];
                back[(r * columns) + c] = turn;
            }
        }

        var path = new int[rows];
        var at = sum.AsSpan((rows - 1) * columns, columns).IndexOf(sum.AsSpan((rows - 1) * columns, columns).ToArray().Max());
        for (var r = rows - 1; r >= 0; r--)
        {
            path[r] = at;
            at += back[(r * columns) + at];
        }

        return path;
    }

    /// <summary>From the path to the nearest local maximum, then a parabola through three samples.</summary>
    private static void Climb(ReadOnlySpan<float> fall, int start, int reach, double columnStep, EdgeTrack edge, int row)
    {
        var j = Math.Clamp(start, 1, fall.Length - 2);
        var found = false;
        for (var k = 0; k <= reach && j > 0 && j < fall.Length - 1; k++)
        {
            if (fall[j + 1] > fall[j] && fall[j + 1] >= fall[j - 1])
            {
                j++;
            }
            else if (fall[j - 1] > fall[j])
            {
                j--;
            }
            else
            {
                found = true;
                break;
            }
        }

        j = Math.Clamp(j, 1, fall.Length - 2);
        var bend = fall[j - 1] - (2 * fall[j]) + fall[j + 1];
        var shift = found && bend < 0 ? 0.5 * (fall[j - 1] - fall[j + 1]) / bend : 0;
        edge.Offset[row] = (j + shift) * columnStep;
        edge.Fall[row] = fall[j];
        edge.Found[row] = found;
    }
}
