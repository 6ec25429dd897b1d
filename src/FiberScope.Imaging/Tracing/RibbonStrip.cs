using System.Numerics.Tensors;

namespace FiberScope.Imaging.Tracing;

/// <summary>A followed fibre, straightened: rows along it, columns across, and its two edges on every row.</summary>
internal sealed class RibbonStrip
{
    private readonly Plane _picture;
    private readonly double _width;

    private RibbonStrip(Plane picture, double width, double[] x, double[] y, double[] half, double step, double columnStep)
    {
        _picture = picture;
        _width = width;
        (X, Y, Half, Step) = (x, y, half, step);
        Rows = x.Length;
        ColumnStep = columnStep;
        Reach = (int)Math.Ceiling(((0.85 * width) + 4) / ColumnStep);
        Columns = (2 * Reach) + 1;
        (Nx, Ny) = (new double[Rows], new double[Rows]);
        Values = new float[Rows * Columns];
        Smooth = new float[Rows * Columns];
        Slope = new float[Rows * Columns];
        (Left, Right) = (new EdgeTrack(Rows), new EdgeTrack(Rows));
    }

    public double[] X { get; }

    public double[] Y { get; }

    public double[] Half { get; private set; }

    public double[] Nx { get; }

    public double[] Ny { get; }

    /// <summary>Distance between rows; pixels.</summary>
    public double Step { get; }

    /// <summary>How far <see cref="Smooth"/> is smoothed along the fibre; sigma in pixels.</summary>
    public double Along { get; private set; }

    public double ColumnStep { get; }

    public int Rows { get; }

    public int Columns { get; }

    /// <summary>The column of the centre line.</summary>
    public int Reach { get; }

    /// <summary>Grey values, row by row.</summary>
    public float[] Values { get; }

    /// <summary>Grey values smoothed along the fibre.</summary>
    public float[] Smooth { get; }

    /// <summary>Change of <see cref="Smooth"/> across the fibre, per pixel.</summary>
    public float[] Slope { get; }

    /// <summary>Distance of the left edge from the centre line, to the left; pixels.</summary>
    public EdgeTrack Left { get; }

    /// <summary>Distance of the right edge from the centre line, to the right; pixels.</summary>
    public EdgeTrack Right { get; }

    /// <summary>Straightens a track and finds both edges; null when it is too short or shows no edges.</summary>
    public static RibbonStrip? Of(Plane picture, List<TrackPoint> track, double width, GreyNoise noise)
    {
        var step = Math.Max(1, width / 12);
        var (x, y, half) = Resample(track, step);
        if (x.Length < 6)
        {
            return null;
        }

        var k = Math.Max(1, 0.35 * width / step);
        var columnStep = Math.Max(0.25, width / 48);

        // The first look only finds the middle: half as many columns do.
        var first = new RibbonStrip(picture, width, Series.Smooth(x, k), Series.Smooth(y, k), Series.Smooth(half, 2 * k), step, 2 * columnStep);
        first.Cut();
        first.SmoothAlong(1.5 * first.Quiet(noise));
        first.FindEdges(1);
        if (!first.Recentre())
        {
            return null;
        }

        var strip = new RibbonStrip(picture, width, first.X, first.Y, first.Half, step, columnStep);
        strip.Cut();
        strip.SmoothAlong(strip.Quiet(noise));
        strip.FindEdges(0.7);
        return strip;
    }

    /// <summary>The grey of the picture beside a row's centre, neither smoothed nor resampled; pixels.</summary>
    public float Grey(int row, double offset) => _picture.Sample((float)(X[row] + (offset * Nx[row])), (float)(Y[row] + (offset * Ny[row])));

    /// <summary>How far along the fibre to smooth for its contrast to stand clear of the noise; sigma in pixels.</summary>
    /// <remarks>Thin, dim fibres need more; a seventh of the width is always averaged, a little more than the width or 5 px at most.</remarks>
    private double Quiet(GreyNoise noise)
    {
        const double Clear = 10;
        var mean = new float[Columns];
        for (var r = 0; r < Rows; r++)
        {
            TensorPrimitives.MultiplyAdd(Values.AsSpan(r * Columns, Columns), 1f / Rows, mean, mean);
        }

        var half = _width / 2;
        var inside = Range(mean, -half, half).Average();
        var outside = 0.5 * (Range(mean, half, half + Math.Max(2, 0.3 * half)).Min() + Range(mean, -half - Math.Max(2, 0.3 * half), -half).Min());
        var ratio = noise.At(inside) / Math.Max(1e-3, inside - outside);
        return Math.Clamp(Clear * ratio * ratio, Math.Max(0.7, 0.15 * _width), Math.Max(5, 1.2 * _width));
    }

    private float[] Range(float[] profile, double from, double to) => profile[Column(from)..(Column(to) + 1)];

    /// <summary>The smoothed value at an offset from the centre line; pixels.</summary>
    public float At(int row, double offset) => Smooth[(row * Columns) + Column(offset)];

    public int Column(double offset) => Math.Clamp((int)Math.Round(offset / ColumnStep) + Reach, 0, Columns - 1);

    private static (double[] X, double[] Y, double[] Half) Resample(List<TrackPoint> track, double step)
    {
        var length = new double[track.Count];
        for (var i = 1; i < track.Count; i++)
        {
            length[i] = length[i - 1] + Math.Sqrt(Math.Pow(track[i].X - track[i - 1].X, 2) + Math.Pow(track[i].Y - track[i - 1].Y, 2));
        }

        var count = Math.Max(2, (int)(length[^1] / step) + 1);
        var (x, y, half) = (new double[count], new double[count], new double[count]);
        var j = 0;
        for (var i = 0; i < count; i++)
        {
            var at = Math.Min(i * step, length[^1]);
            while (j < track.Count - 2 && length[j + 1] < at)
            {
                j++;
            }

            var share = Math.Clamp((at - length[j]) / Math.Max(1e-9, length[j + 1] - length[j]), 0, 1);
            x[i] = track[j].X + (share * (track[j + 1].X - track[j].X));
            y[i] = track[j].Y + (share * (track[j + 1].Y - track[j].Y));
            half[i] = track[j].HalfWidth + (share * (track[j + 1].HalfWidth - track[j].HalfWidth));
        }

        return (x, y, half);
    }

    private void Cut()
    {
        for (var r = 0; r < Rows; r++)
        {
            var (a, b) = (Math.Max(0, r - 1), Math.Min(Rows - 1, r + 1));
            var (tx, ty) = (X[b] - X[a], Y[b] - Y[a]);
            var norm = Math.Max(1e-9, Math.Sqrt((tx * tx) + (ty * ty)));
            (Nx[r], Ny[r]) = (-ty / norm, tx / norm);
            var (stepX, stepY) = (ColumnStep * Nx[r], ColumnStep * Ny[r]);
            _picture.SampleLine((float)(X[r] - (Reach * stepX)), (float)(Y[r] - (Reach * stepY)), (float)stepX, (float)stepY, Values.AsSpan(r * Columns, Columns));
        }
    }

    private void SmoothAlong(double sigma)
    {
        Along = sigma;
        Series.SmoothRows(Values, Smooth, Rows, Columns, Math.Max(0.7, sigma / Step));
        Series.SmoothColumns(Smooth, Rows, Columns, Math.Max(0.5, 0.015 * _width) / ColumnStep);
        for (var r = 0; r < Rows; r++)
        {
            var at = r * Columns;
            for (var c = 1; c < Columns - 1; c++)
            {
                Slope[at + c] = (float)((Smooth[at + c + 1] - Smooth[at + c - 1]) / (2 * ColumnStep));
            }
        }
    }

    private void FindEdges(double tightness)
    {
        var typical = EdgePath.TypicalFall(this);
        EdgePath.Find(this, Left, -1, tightness, typical);
        EdgePath.Find(this, Right, 1, tightness, typical);
    }

    /// <summary>Moves the centre line into the middle of the two edges where both are seen.</summary>
    private bool Recentre()
    {
        var typical = EdgePath.TypicalFall(this);
        var good = new double[Rows];
        for (var r = 0; r < Rows; r++)
        {
            good[r] = Left.Found[r] && Right.Found[r] && Math.Min(Left.Fall[r], Right.Fall[r]) > 0.25 * typical ? 1 : 0;
        }

        if (good.Sum() < 5)
        {
            return false;
        }

        var sigma = Math.Max(1, _width / Step);
        var weight = Series.Smooth(good, sigma, zeroOutside: true);
        var shift = Series.Smooth([.. good.Select((g, r) => g * (Right.Offset[r] - Left.Offset[r]) / 2)], sigma, zeroOutside: true);
        var half = Series.Smooth([.. good.Select((g, r) => g * (Right.Offset[r] + Left.Offset[r]) / 2)], sigma, zeroOutside: true);
        var usual = Series.Median([.. Enumerable.Range(0, Rows).Where(r => good[r] > 0).Select(r => (Right.Offset[r] + Left.Offset[r]) / 2)]);
        for (var r = 0; r < Rows; r++)
        {
            var near = weight[r] > 0.02;
            X[r] += near ? shift[r] / weight[r] * Nx[r] : 0;
            Y[r] += near ? shift[r] / weight[r] * Ny[r] : 0;
            Half[r] = near ? half[r] / weight[r] : usual;
        }

        return true;
    }
}
