using FiberScope.Imaging.Tracing;

namespace FiberScope.Imaging.Transmitted;

/// <summary>Finds the fibres behind dark lines that run side by side: two rims with a bright core between.</summary>
/// <remarks>Two rims of one fibre stay equally far apart all along; lines of two fibres do so only by chance, and not for long.</remarks>
internal sealed class RimPairs(StabilisedPicture picture, Plane passed, RibbonJudge judge, double leastEvenFlanks)
{
    /// <summary>How deep a partner must be along the whole line, over the line's own depth.</summary>
    private const double LeastPartner = 0.4;

    /// <summary>How far the light must come back between two rims, over the shallower one's depth.</summary>
    private const double LeastCore = 0.2;

    private const double Step = 0.5, Tolerance = 0.25;

    /// <summary>The fibres of a picture, each on its own ground: pairs of rims first, then what is nobody's rim.</summary>
    public List<Ribbon> Fibres(IReadOnlyList<Ribbon> ribbons)
    {
        var (whole, single) = (new List<Ribbon>(), new List<Ribbon>());
        foreach (var ribbon in ribbons)
        {
            if (Partner(ribbon) is not { } apart)
            {
                if (Evenness(ribbon) >= leastEvenFlanks)
                {
                    single.Add(ribbon);
                }
            }
            else if (Between(ribbon, apart) is { } fibre)
            {
                whole.Add(fibre);
            }
        }

        var claims = new ClaimMap(passed.Width, passed.Height);
        return
        [
            .. whole.OrderByDescending(r => r.Evidence).Where(r => Keeps(r, claims)),
            .. single.OrderByDescending(r => r.Evidence).Where(r => Keeps(r, claims)),
        ];
    }

    /// <summary>How steep the less steep flank is over the other: a rim is steep towards the outside of its fibre and slopes to the core.</summary>
    private static double Evenness(Ribbon ribbon)
    {
        var left = Series.Median([.. ribbon.Strip.Left.Fall.Where((_, r) => ribbon.Accepted[r])]);
        var right = Series.Median([.. ribbon.Strip.Right.Fall.Where((_, r) => ribbon.Accepted[r])]);
        return Math.Min(left, right) / Math.Max(1e-9, Math.Max(left, right));
    }

    /// <summary>The signed distance to a parallel line that is as dark and lasts as long; null when there is none.</summary>
    private double? Partner(Ribbon ribbon)
    {
        var reach = Math.Max(24, 7 * ribbon.Width);
        var light = Across(ribbon, reach);
        var middle = light.Length / 2;
        var outside = Series.Median(light);
        var own = outside - light[middle];
        if (own <= 0)
        {
            return null;
        }

        double? best = null;
        var deepest = LeastPartner * own;
        for (var i = 1; i < light.Length - 1; i++)
        {
            var away = Math.Abs(i - middle) * Step;
            var depth = outside - light[i];
            if (away > 1.3 * ribbon.Width && depth > deepest && light[i] <= light[i - 1] && light[i] <= light[i + 1] && Core(light, middle, i) > Math.Min(own, depth) * LeastCore)
            {
                (best, deepest) = ((i - middle) * Step, depth);
            }
        }

        return best;
    }

    /// <summary>How far the light between two lines rises above the brighter of them.</summary>
    private static double Core(double[] light, int from, int to)
    {
        var brightest = double.NegativeInfinity;
        for (var i = Math.Min(from, to); i <= Math.Max(from, to); i++)
        {
            brightest = Math.Max(brightest, light[i]);
        }

        return brightest - Math.Max(light[from], light[to]);
    }

    /// <summary>The light along lines beside a ribbon, median over its rows so that crossing fibres do not count.</summary>
    private double[] Across(Ribbon ribbon, double reach)
    {
        var strip = ribbon.Strip;
        var half = (int)(reach / Step);
        var light = new double[(2 * half) + 1];
        int[] rows = [.. Enumerable.Range(0, strip.Rows).Where(r => ribbon.Accepted[r])];
        for (var i = -half; i <= half; i++)
        {
            light[i + half] = Series.Median([.. rows.Select(r =>
            {
                var across = (0.5 * (strip.Right.Offset[r] - strip.Left.Offset[r])) + (i * Step);
                return (double)passed.Sample((float)(strip.X[r] + (across * strip.Nx[r])), (float)(strip.Y[r] + (across * strip.Ny[r])));
            })]);
        }

        return light;
    }

    private Ribbon? Between(Ribbon rim, double apart)
    {
        var strip = rim.Strip;
        var track = new List<TrackPoint>(strip.Rows);
        var width = Math.Abs(apart) + rim.Width;
        for (var r = 0; r < strip.Rows; r++)
        {
            var across = (0.5 * (strip.Right.Offset[r] - strip.Left.Offset[r])) + (apart / 2);
            track.Add(new TrackPoint((float)(strip.X[r] + (across * strip.Nx[r])), (float)(strip.Y[r] + (across * strip.Ny[r])), (float)Math.Atan2(strip.Ny[r], strip.Nx[r]), (float)(width / 2), 1));
        }

        return RibbonStrip.Of(picture.Linear, track, width, picture.GreyNoise) is { } found ? judge.Judge(found, default(Rival), new double[found.Rows]) : null;
    }

    /// <summary>Whether most of a ribbon's ground is free in its direction; what is not is no longer accepted, what is gets taken.</summary>
    private static bool Keeps(Ribbon ribbon, ClaimMap claims)
    {
        var strip = ribbon.Strip;
        var (free, all) = (0, 0);
        for (var r = 0; r < strip.Rows; r++)
        {
            if (ribbon.Accepted[r])
            {
                var normal = Math.Atan2(strip.Ny[r], strip.Nx[r]);
                var place = (X: strip.X[r], Y: strip.Y[r]);
                ribbon.Accepted[r] = !new[] { -0.35, 0, 0.35 }.Any(share => claims.Holds(place.X + (share * ribbon.Width * strip.Nx[r]), place.Y + (share * ribbon.Width * strip.Ny[r]), normal, Tolerance));
                (free, all) = (free + (ribbon.Accepted[r] ? 1 : 0), all + 1);
            }
        }

        if (free < 0.5 * all || free * strip.Step < Math.Max(8, 0.6 * ribbon.Width))
        {
            return false;
        }

        for (var r = 0; r < strip.Rows; r++)
        {
            claims.Take(strip.X[r], strip.Y[r], Math.Atan2(strip.Ny[r], strip.Nx[r]), 0.55 * ribbon.Width, strip.Step);
        }

        return true;
    }
}
