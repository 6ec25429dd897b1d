namespace FiberScope.Imaging.Tracing;

/// <summary>The best path of outward fall along a strip.</summary>
/// <remarks>Source: boundary paths by dynamic programming, Geiger, Gupta, Costa and Vlontzos (1995), IEEE PAMI 17(3), 294–302.</remarks>
internal static class EdgePath
{
    private const float TurnCost = 0.04f;

    /// <summary>Farther from the wanted offset than this many tolerances no edge is looked for.</summary>
    private const float Widest = 1.6f;

    /// <summary>The median over rows of the strongest outward fall near the wanted offsets.</summary>
    public static double TypicalFall(RibbonStrip strip)
    {
        var best = new double[strip.Rows];
        for (var r = 0; r < strip.Rows; r++)
        {
            var tolerance = Tolerance(strip, r, tightness: 1);
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
        var (first, last) = Band(strip, tightness);
        var columns = last - first + 1;
        var fall = new float[strip.Rows * columns];
        var merit = new float[strip.Rows * columns];
        var share = (float)(1 / typical);
        for (var r = 0; r < strip.Rows; r++)
        {
            var scale = (float)(1 / Tolerance(strip, r, tightness));
            var (step, half) = ((float)strip.ColumnStep, (float)strip.Half[r]);
            for (var c = 0; c < columns; c++)
            {
                var at = (r * columns) + c;
                var value = -side * strip.Slope[(r * strip.Columns) + strip.Reach + (side * (first + c))];
                var off = (((first + c) * step) - half) * scale;
                fall[at] = value;
                merit[at] = Math.Abs(off) > Widest ? -4 : Math.Min(value * share, 1.5f) - (0.5f * off * off);
            }
        }

        var path = Best(merit, strip.Rows, columns);
        for (var r = 0; r < strip.Rows; r++)
        {
            var reach = Math.Max((int)Math.Ceiling(0.6 / strip.ColumnStep), (int)(0.35 * Tolerance(strip, r, tightness) / strip.ColumnStep));
            Climb(fall.AsSpan(r * columns, columns), first, path[r], reach, strip.ColumnStep, edge, r);
        }
    }

    /// <summary>How far from its wanted offset an edge may be, about; pixels.</summary>
    private static double Tolerance(RibbonStrip strip, int row, double tightness) => Math.Max(0.9, 0.32 * strip.Half[row]) * tightness;

    /// <summary>The columns out from the centre line that any row's edge may lie in, with room to climb to the steepest.</summary>
    private static (int First, int Last) Band(RibbonStrip strip, double tightness)
    {
        var (low, high) = (double.PositiveInfinity, 0.0);
        for (var r = 0; r < strip.Rows; r++)
        {
            var away = (Widest + 0.5) * Tolerance(strip, r, tightness);
            (low, high) = (Math.Min(low, strip.Half[r] - away), Math.Max(high, strip.Half[r] + away));
        }

        var first = Math.Clamp((int)(low / strip.ColumnStep) - 2, 0, strip.Reach - 4);
        return (first, Math.Clamp((int)(high / strip.ColumnStep) + 2, first + 4, strip.Reach));
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
    private static void Climb(ReadOnlySpan<float> fall, int first, int start, int reach, double columnStep, EdgeTrack edge, int row)
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
        edge.Offset[row] = (first + j + shift) * columnStep;
        edge.Fall[row] = fall[j];
        edge.Found[row] = found;
    }
}
