using OpenCvSharp;

namespace FiberScope.Imaging.Sections;

/// <summary>Reads the ellipse of one piece of the mask, from the part of its outline that borders on resin.</summary>
internal sealed class EllipseReader
{
    private const int Rays = 96;
    private readonly float[] _excess;
    private readonly int[] _labels;
    private readonly int _width;
    private readonly int _height;

    public EllipseReader(Mat excess, int[] labels)
    {
        excess.GetArray(out _excess);
        (_labels, _width, _height) = (labels, excess.Width, excess.Height);
    }

    /// <summary>The ellipse of a piece, and the share of its outline that was seen; null when too little of it shows.</summary>
    public (SectionEllipse Ellipse, double Seen)? Read(int label, double x, double y, double reach)
    {
        var points = new List<Point2f>();
        for (var ray = 0; ray < Rays; ray++)
        {
            var angle = 2 * Math.PI * ray / Rays;
            if (Edge(label, x, y, Math.Cos(angle), Math.Sin(angle), reach) is { } edge)
            {
                points.Add(edge);
            }
        }

        var seen = points.Count / (double)Rays;
        return points.Count < 12 || Fit(points) is not { } ellipse ? null : (ellipse, seen);
    }

    /// <summary>Where a ray leaves the piece for the resin; null when it meets another piece or the picture's border first.</summary>
    private Point2f? Edge(int label, double x, double y, double dx, double dy, double reach)
    {
        const double step = 0.5;
        var before = At(x, y);
        for (var r = step; r < reach; r += step)
        {
            var (px, py) = (x + (r * dx), y + (r * dy));
            if (px < 1 || py < 1 || px >= _width - 1 || py >= _height - 1)
            {
                return null;
            }

            var now = At(px, py);
            if (before > 0 && now <= 0)
            {
                var back = step * now / (before - now);
                var (ex, ey) = (px + (back * dx), py + (back * dy));
                return NearOther(label, ex, ey) ? null : new Point2f((float)ex, (float)ey);
            }

            var owner = _labels[((int)py * _width) + (int)px];
            if (owner > 0 && owner != label)
            {
                return null;
            }

            before = now;
        }

        return null;
    }

    /// <summary>Beside another piece the two outlines run together and neither is its own.</summary>
    private bool NearOther(int label, double x, double y)
    {
        for (var row = Math.Max(0, (int)y - 2); row <= Math.Min(_height - 1, (int)y + 2); row++)
        {
            for (var column = Math.Max(0, (int)x - 2); column <= Math.Min(_width - 1, (int)x + 2); column++)
            {
                var owner = _labels[(row * _width) + column];
                if (owner > 0 && owner != label)
                {
                    return true;
                }
            }
        }

        return false;
    }

    /// <summary>A direct least-squares fit (Fitzgibbon, Pilu &amp; Fisher 1999), made again without the points that lie furthest off.</summary>
    private static SectionEllipse? Fit(List<Point2f> points)
    {
        var ellipse = Of(points);
        for (var round = 0; round < 2; round++)
        {
            var away = points.Select(point => Math.Abs(Departure(ellipse, point))).ToArray();
            var limit = Math.Max(0.3, 2.5 * Math.Sqrt(away.Average(a => a * a)));
            var kept = points.Where((_, i) => away[i] <= limit).ToList();
            if (kept.Count < 12)
            {
                return null;
            }

            points = kept;
            ellipse = Of(points);
        }

        var rms = Math.Sqrt(points.Average(point => Math.Pow(Departure(ellipse, point), 2)));
        return double.IsFinite(ellipse.Minor) && ellipse.Minor > 0 ? ellipse with { Departure = rms, Points = points.Count } : null;
    }

    private static SectionEllipse Of(List<Point2f> points)
    {
        var box = Cv2.FitEllipseDirect(points);
        var wide = box.Size.Width >= box.Size.Height;
        var direction = (box.Angle + (wide ? 0 : 90)) * Math.PI / 180;
        direction -= Math.PI * Math.Floor(direction / Math.PI);
        return new SectionEllipse(box.Center.X, box.Center.Y, Math.Min(box.Size.Width, box.Size.Height), Math.Max(box.Size.Width, box.Size.Height), direction, 0, points.Count);
    }

    /// <summary>How far a point lies outside an ellipse, along the ray from its centre; pixels.</summary>
    private static double Departure(SectionEllipse ellipse, Point2f point)
    {
        var (dx, dy) = (point.X - ellipse.X, point.Y - ellipse.Y);
        var (cos, sin) = (Math.Cos(ellipse.Direction), Math.Sin(ellipse.Direction));
        var along = ((dx * cos) + (dy * sin)) / (ellipse.Major / 2);
        var across = ((dy * cos) - (dx * sin)) / (ellipse.Minor / 2);
        var level = Math.Sqrt((along * along) + (across * across));
        return level == 0 ? 0 : Math.Sqrt((dx * dx) + (dy * dy)) * (1 - (1 / level));
    }

    /// <summary>The excess between pixel centres; coordinates from the top left corner of the first pixel.</summary>
    private double At(double x, double y)
    {
        var (fx, fy) = (x - 0.5, y - 0.5);
        var (column, row) = (Math.Clamp((int)Math.Floor(fx), 0, _width - 2), Math.Clamp((int)Math.Floor(fy), 0, _height - 2));
        var (u, v) = (Math.Clamp(fx - column, 0, 1), Math.Clamp(fy - row, 0, 1));
        var at = (row * _width) + column;
        return ((1 - v) * (((1 - u) * _excess[at]) + (u * _excess[at + 1]))) + (v * (((1 - u) * _excess[at + _width]) + (u * _excess[at + _width + 1])));
    }
}
