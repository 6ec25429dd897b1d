namespace FiberScope.Imaging.Tracing;

/// <summary>Finds the fibres of a picture and measures them.</summary>
internal sealed class FibreTracer
{
    private readonly TracingSettings _settings;
    private readonly StabilisedPicture _picture;
    private readonly RibbonTracker[] _trackers;
    private readonly double _widest;
    private EdgeMap? _finest;

    public FibreTracer(StabilisedPicture picture, TracingSettings settings, double widest)
    {
        (_picture, _settings, _widest) = (picture, settings, widest);
        _trackers = [.. picture.Levels.Select((level, l) => new RibbonTracker(level, l, picture.Noise[l], settings.InsideWeight))];
        Judge = new RibbonJudge(settings, picture.GreyNoise);
    }

    public RibbonJudge Judge { get; }

    /// <summary>Whether bright rims are looked for, as in transmitted light, and not only whole fibres. Default no.</summary>
    public bool WantsRims { get; init; }

    /// <summary>The fibres, best evidence first; none of them claims another's ground.</summary>
    public List<Ribbon> Run(CancellationToken cancellation)
    {
        var candidates = new List<Ribbon>();
        var tried = new ClaimMap(_picture.Linear.Width, _picture.Linear.Height);
        foreach (var seed in Seeds(cancellation))
        {
            cancellation.ThrowIfCancellationRequested();
            if (Candidate(seed, tried) is { } ribbon)
            {
                candidates.Add(ribbon);
            }
        }

        return Choose(candidates);
    }

    private List<Seed> Seeds(CancellationToken cancellation)
    {
        const float Widest = 13, NarrowestHigher = 3.4f;
        var seeds = new List<Seed>();
        for (var l = 0; l < _picture.Levels.Length; l++)
        {
            cancellation.ThrowIfCancellationRequested();
            var map = EdgeMap.Of(_picture.Levels[l], _picture.Noise[l], _settings.SmoothingAlong, _settings.EdgeSignificance);
            _finest ??= map;
            var narrowest = l == 0 ? (float)_settings.Narrowest : NarrowestHigher;
            var last = l == _picture.Levels.Length - 1;
            seeds.AddRange(SeedFinder.Find(map, l, narrowest, last ? 2 * Widest : Widest, _settings.InsideWeight, _settings.SeedSignificance));
        }

        return [.. seeds.OrderByDescending(s => s.Score * (1 + (0.1 * s.Level))).ThenBy(s => s.Level).ThenBy(s => s.Y).ThenBy(s => s.X)];
    }

    private Ribbon? Candidate(Seed seed, ClaimMap tried)
    {
        var scale = 1 << seed.Level;
        var (x, y) = (((seed.X + 0.5) * scale) - 0.5, ((seed.Y + 0.5) * scale) - 0.5);
        if (tried.Holds(x, y, seed.Normal, 0.25))
        {
            return null;
        }

        var track = _trackers[seed.Level].Follow(seed);
        var width = 2 * Series.Median([.. track.Select(p => (double)p.HalfWidth)]);
        foreach (var point in track)
        {
            tried.Take(point.X, point.Y, point.Normal, Math.Max(1, 0.2 * width), 2 * scale);
        }

        if (Length(track) < Math.Max(6, width) || width > _widest)
        {
            return null;
        }

        var rival = Rival.Of(_trackers, track, seed.Level, width, _widest);
        return rival.Share < _settings.RivalShare && RibbonStrip.Of(_picture.Linear, track, width, _picture.GreyNoise) is { } strip
            ? Judge.Judge(strip, rival, InsideTexture.Of(strip, _finest!))
            : null;
    }

    private static double Length(List<TrackPoint> track)
    {
        var length = 0.0;
        for (var i = 1; i < track.Count; i++)
        {
            length += Math.Sqrt(Math.Pow(track[i].X - track[i - 1].X, 2) + Math.Pow(track[i].Y - track[i - 1].Y, 2));
        }

        return length;
    }

    /// <summary>Whether another fibre of the same direction holds ground anywhere between the edges: two fibres, or a part of one.</summary>
    private static bool Taken(ClaimMap claims, RibbonStrip strip, int r, double width)
    {
        var normal = Math.Atan2(strip.Ny[r], strip.Nx[r]);
        for (var share = -0.3; share <= 0.31; share += 0.15)
        {
            if (claims.Holds(strip.X[r] + (share * width * strip.Nx[r]), strip.Y[r] + (share * width * strip.Ny[r]), normal, 0.3))
            {
                return true;
            }
        }

        return false;
    }

    /// <summary>Takes candidates by their evidence, and refuses one whose ground is mostly taken in its direction.</summary>
    private List<Ribbon> Choose(List<Ribbon> candidates)
    {
        var claims = new ClaimMap(_picture.Linear.Width, _picture.Linear.Height);
        var chosen = new List<Ribbon>();
        foreach (var ribbon in candidates.OrderByDescending(r => r.Evidence))
        {
            var strip = ribbon.Strip;
            var (free, all) = (0, 0);
            for (var r = 0; r < strip.Rows; r++)
            {
                if (ribbon.Accepted[r])
                {
                    all++;
                    var taken = Taken(claims, strip, r, ribbon.Width);
                    free += taken ? 0 : 1;
                    ribbon.Accepted[r] = !taken;
                }
            }

            if (free * strip.Step < Math.Max(8, 0.6 * ribbon.Width) || free < 0.5 * all)
            {
                continue;
            }

            for (var r = 0; r < strip.Rows; r++)
            {
                claims.Take(strip.X[r], strip.Y[r], Math.Atan2(strip.Ny[r], strip.Nx[r]), 0.5 * ribbon.Width, strip.Step);
            }

            chosen.Add(ribbon);
        }

        var whole = Streaks.Removed(chosen, _picture.Linear.Width, _picture.Linear.Height);
        return SecondLook.At(whole, WantsRims);
    }
}
