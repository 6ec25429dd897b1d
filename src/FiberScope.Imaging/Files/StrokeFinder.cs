namespace FiberScope.Imaging.Files;

/// <summary>Finds the strokes of an information strip that could be its scale bar.</summary>
internal static class StrokeFinder
{
    /// <summary>Ink differs from the ground by at least this much; grey.</summary>
    private const float LeastContrast = 0.15f;

    /// <summary>Strokes that have this share of the picture's width or more are lines of the frame.</summary>
    private const double FullWidth = 0.9;

    /// <summary>The candidates, the left-most first; more than one when the strip is ambiguous.</summary>
    public static IReadOnlyList<Stroke> Find(StripImage strip)
    {
        var shortest = Math.Max(16, strip.Width / 50);
        var strokes = Merge(Runs(strip, shortest))
            .Where(stroke => stroke.Length < FullWidth * strip.Width
                && stroke.Left > 0 && stroke.Right < strip.Width - 1
                && stroke.Thickness <= Math.Max(3, strip.Rows / 2)
                && stroke.Length >= 4 * stroke.Thickness)
            .ToList();
        var bars = strokes.Where(stroke => !IsBoxSide(stroke, strokes) && StandsAlone(strip, stroke)).ToList();
        return bars.Count <= 1 ? bars : Prominent(bars);
    }

    /// <summary>Strokes of letters and dashes are short: what is under a third of the longest is none of the bar's rivals.</summary>
    private static List<Stroke> Prominent(List<Stroke> bars)
    {
        var longest = bars.Max(bar => bar.Length);
        return bars.Where(bar => 3 * bar.Length >= longest).OrderBy(bar => bar.Left).ToList();
    }

    private static List<Stroke> Runs(StripImage strip, int shortest)
    {
        var runs = new List<Stroke>();
        for (var y = 0; y < strip.Rows; y++)
        {
            var x = 0;
            while (x < strip.Width)
            {
                var left = x;
                var ink = strip[x, y];
                while (x + 1 < strip.Width && Math.Abs(strip[x + 1, y] - ink) < 0.12f && Math.Abs(ink - strip.Ground) >= LeastContrast)
                {
                    x++;
                    ink += (strip[x, y] - ink) / Math.Min(x - left + 1, 32);
                }

                if (x - left + 1 >= shortest)
                {
                    runs.Add(new Stroke(y, y, left, x, ink));
                }

                x++;
            }
        }

        return runs;
    }

    /// <summary>Joins runs of neighbouring rows that have the same ends to within two pixels and the same ink.</summary>
    private static List<Stroke> Merge(List<Stroke> runs)
    {
        var merged = new List<Stroke>();
        foreach (var run in runs)
        {
            var index = merged.FindLastIndex(stroke => stroke.Bottom == run.Top - 1
                && Math.Abs(stroke.Left - run.Left) <= 2 && Math.Abs(stroke.Right - run.Right) <= 2
                && Math.Sign(stroke.Ink - run.Ink) * (stroke.Ink - run.Ink) < 0.35f);
            if (index < 0)
            {
                merged.Add(run);
            }
            else
            {
                var stroke = merged[index];
                merged[index] = new Stroke(stroke.Top, run.Bottom, Math.Min(stroke.Left, run.Left), Math.Max(stroke.Right, run.Right), Stronger(stroke.Ink, run.Ink));
            }
        }

        return merged;

        static float Stronger(float a, float b) => Math.Abs(a - 0.5f) > Math.Abs(b - 0.5f) ? a : b;
    }

    private static bool IsBoxSide(Stroke stroke, List<Stroke> all) => all.Any(other =>
        other != stroke && Math.Abs(other.Left - stroke.Left) <= 3 && Math.Abs(other.Right - stroke.Right) <= 3 && Math.Abs(other.Top - stroke.Top) > 3);

    /// <summary>Whether there is ground above and below the stroke, between its end ticks: letters and filled boxes have none.</summary>
    private static bool StandsAlone(StripImage strip, Stroke stroke)
    {
        var margin = Math.Max(4, stroke.Length / 12);
        return Clear(stroke.Top - 2) && Clear(stroke.Bottom + 2);

        bool Clear(int y)
        {
            if (y < 0 || y >= strip.Rows)
            {
                return true;
            }

            var ground = 0;
            for (var x = stroke.Left + margin; x <= stroke.Right - margin; x++)
            {
                ground += Math.Abs(strip[x, y] - strip.Ground) < 0.5f * Math.Abs(stroke.Ink - strip.Ground) ? 1 : 0;
            }

            return ground >= 0.8 * (stroke.Length - (2 * margin));
        }
    }
}
