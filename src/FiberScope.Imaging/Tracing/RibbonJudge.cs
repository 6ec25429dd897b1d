namespace FiberScope.Imaging.Tracing;

/// <summary>Decides where a straightened fibre may be read, and whether it is one fibre at all.</summary>
internal sealed class RibbonJudge(TracingSettings settings, GreyNoise noise)
{
    /// <summary>The wider the claim, the more evidence it needs: two fibres side by side look wide, one fibre never looks like two thin ones.</summary>
    private const double WidthDoubt = 0.4;

    private readonly SortedDictionary<string, int> _refused = new(StringComparer.Ordinal);

    /// <summary>How many stations were refused, by reason.</summary>
    public IReadOnlyDictionary<string, int> Refused => _refused;

    public Ribbon? Judge(RibbonStrip strip, Rival rival, double[] texture)
    {
        var rows = strip.Rows;
        var width = 2 * Series.Median([.. Enumerable.Range(0, rows).Select(r => strip.Half[r])]);
        var looks = StripLook.Of(strip, width, noise);
        var accepted = new bool[rows];
        for (var r = 0; r < rows; r++)
        {
            var reason = texture[r] > settings.LargestTexture ? "edges-across-inside" : Reason(strip, looks, r, width);
            accepted[r] = reason is null;
            Count(reason);
        }

        var least = Math.Max(7, 0.6 * width) / strip.Step;
        Runs.Keep(accepted, (int)(0.5 * width / strip.Step), least);
        var widths = new double[rows];
        for (var r = 0; r < rows; r++)
        {
            widths[r] = strip.Left.Offset[r] + strip.Right.Offset[r];
        }

        var median = Runs.Median(widths, accepted, 3 * width / strip.Step);
        // Half a pixel of edge noise over the length of the line is no taper.
        var largestTaper = settings.LargestTaper + (0.5 / (WidthTaper.Reach(strip.Step, width) * strip.Step));
        var taper = WidthTaper.Of(widths, accepted, strip.Step, width);
        for (var r = 0; r < rows; r++)
        {
            if (accepted[r] && Math.Abs(taper[r]) > largestTaper)
            {
                accepted[r] = false;
                Count("edges-not-parallel");
            }
            else if (accepted[r] && Math.Abs(widths[r] - median[r]) > (settings.LargestStep * median[r]) + 0.4)
            {
                accepted[r] = false;
                Count("uneven-width");
            }
        }

        Runs.Keep(accepted, (int)(0.5 * width / strip.Step), least);
        Runs.Trim(accepted, (int)Math.Round(0.5 * strip.Along / strip.Step));
        return Whole(strip, looks, accepted, widths, width, rival);
    }

    private Ribbon? Whole(RibbonStrip strip, StripLook looks, bool[] accepted, double[] widths, double width, Rival rival)
    {
        var count = accepted.Count(a => a);
        var length = count * strip.Step;
        var share = count / (double)accepted.Length;
        var contrast = count == 0 ? 0 : Series.Median([.. Enumerable.Range(0, accepted.Length).Where(r => accepted[r]).Select(r => Math.Min(looks.ContrastLeft[r], looks.ContrastRight[r]))]);
        var peak = Series.Median([.. looks.Peak.Where((_, r) => accepted[r])]);
        var asymmetry = Series.Median([.. looks.Asymmetry.Where((_, r) => accepted[r])]);
        var sure = settings.RibbonSignificance * noise.At(peak) * GreyNoise.LevelShare(strip.Along, Math.Max(0.5, 0.015 * width));
        var why = count > 0 && contrast < sure ? "faint"
            : count > 0 && Series.Median([.. widths.Where((_, r) => accepted[r])]) < settings.Narrowest ? "too-thin"
            : length < Math.Max(12, width) ? "too-short"
            : share < settings.LeastAccepted ? "mostly-hidden"
            : rival.Share + Math.Abs(asymmetry) + 1 - share > 0.95 ? "rim-or-gap"
            : Series.Spread([.. widths.Where((_, r) => accepted[r])]) > 0.25 ? "uneven-width"
            : null;
        if (why is not null)
        {
            _refused[why] = _refused.GetValueOrDefault(why) + Math.Max(1, count);
            return null;
        }

        return new Ribbon(strip, accepted, Runs.Median(widths, accepted, 4 * width / strip.Step), contrast, contrast * Math.Sqrt(length) * Math.Pow(width, -WidthDoubt) * (1 - (0.5 * rival.Share)))
        {
            Asymmetry = asymmetry,
            Body = asymmetry > 0 ? rival.BodyRight : rival.BodyLeft,
        };
    }

    private string? Reason(RibbonStrip strip, StripLook looks, int r, double width)
    {
        var (low, high) = (Math.Min(looks.ContrastLeft[r], looks.ContrastRight[r]), Math.Max(looks.ContrastLeft[r], looks.ContrastRight[r]));
        var found = strip.Left.Offset[r] + strip.Right.Offset[r];
        return !strip.Left.Found[r] || !strip.Right.Found[r] || found < 1.5 ? "no-edge"
            : low < settings.LeastFlankRatio * high || low < settings.FlankSignificance * noise.At(looks.Peak[r]) * GreyNoise.LevelShare(strip.Along, Math.Max(0.5, 0.015 * width)) ? "one-edge-hidden"
            : Math.Abs(strip.Right.Offset[r] - strip.Left.Offset[r]) > 0.4 * found ? "off-centre"
            : looks.Swing[r] >= settings.LargestSwing ? "edge-inside"
            : looks.Middle[r] - looks.Outside[r] <= settings.LeastSolid * Math.Max(looks.Peak[r] - looks.Outside[r], 1e-6) ? "dark-middle"
            : null;
    }

    private void Count(string? reason)
    {
        if (reason is not null)
        {
            _refused[reason] = _refused.GetValueOrDefault(reason) + 1;
        }
    }
}
