namespace FiberScope.Imaging.Tracing;

/// <summary>The best wider ribbons that share one of a track's edges all along, against the track's own score.</summary>
/// <remarks>A fibre is equally wide along its length: an edge of another fibre that happens to run beside it for a bit is no rival.</remarks>
/// <param name="Share">Score of the best one over the track's own.</param>
/// <param name="BodyLeft">The same for ribbons several times as wide that share the right edge of the strip: the body would lie left.</param>
/// <param name="BodyRight">The same with the body to the right.</param>
internal readonly record struct Rival(double Share, double BodyLeft, double BodyRight)
{
    private const int Stations = 3;
    private const double MuchWider = 3.5;

    public static Rival Of(RibbonTracker[] trackers, List<TrackPoint> track, int level, double width, double widest)
    {
        var own = new List<(TrackPoint At, double Score)>();
        for (var s = 0; s < Stations; s++)
        {
            var at = track[track.Count * ((2 * s) + 1) / (2 * Stations)];
            if (trackers[level].Score(at.X, at.Y, at.Normal, at.HalfWidth) is var score and > 0)
            {
                own.Add((at, score));
            }
        }

        if (own.Count == 0)
        {
            return new Rival(1, 0, 0);
        }

        double best = 0, left = 0, right = 0;
        for (var wide = 2.2 * width; wide < Math.Min(widest, 20 * width); wide *= 1.3)
        {
            // A strip's right is to the left of a track's normal.
            var (bodyLeft, bodyRight) = (OverOwn(trackers, own, wide, -1), OverOwn(trackers, own, wide, 1));
            best = wide < 10 * width ? Math.Max(best, Math.Max(bodyLeft, bodyRight)) : best;
            (left, right) = wide < MuchWider * width ? (left, right) : (Math.Max(left, bodyLeft), Math.Max(right, bodyRight));
        }

        return new Rival(best, left, right);
    }

    private static double OverOwn(RibbonTracker[] trackers, List<(TrackPoint At, double Score)> own, double wide, int side) =>
        Series.Median([.. own.Select(s => Wider(trackers, s.At, wide, side) / s.Score)]);

    /// <summary>The score of a wider ribbon that shares the edge on one side.</summary>
    private static double Wider(RibbonTracker[] trackers, TrackPoint at, double wide, int side)
    {
        var (sin, cos) = Math.SinCos(at.Normal);
        var (edgeX, edgeY) = (at.X + (side * at.HalfWidth * cos), at.Y + (side * at.HalfWidth * sin));
        var level = 0;
        while (level < trackers.Length - 1 && wide / (1 << level) > 13)
        {
            level++;
        }

        return trackers[level].Score(edgeX - (side * wide / 2 * cos), edgeY - (side * wide / 2 * sin), at.Normal, wide / 2);
    }
}
