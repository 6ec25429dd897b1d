using System.Numerics.Tensors;
using OpenCvSharp;

namespace FiberScope.Imaging.Tracing;

/// <summary>A place where brightness climbs most steeply.</summary>
/// <param name="X">Sub-pixel place; level pixels.</param>
/// <param name="Y">Sub-pixel place; level pixels.</param>
/// <param name="Nx">The direction in which it gets brighter.</param>
/// <param name="Ny">The direction in which it gets brighter.</param>
/// <param name="Strength">The climb per pixel, smoothed along the edge.</param>
internal readonly record struct EdgePoint(float X, float Y, float Nx, float Ny, float Strength);

/// <summary>The edges of one level: gradients in sixteen directions, each smoothed along its edge, thinned to ridges.</summary>
/// <remarks>
/// Smoothing along the edge before anything is decided is where noise is beaten. Source: Lindeberg (1998), Int. J. Comput.
/// Vision 30(2), 117–154, for gradients at a scale; non-maximum suppression after Canny (1986), IEEE PAMI 8(6), 679–698.
/// </remarks>
internal sealed class EdgeMap
{
    public const int Directions = 16;
    private const double Across = 0.9;

    /// <summary>Sine and cosine of every direction of climb, as <see cref="Direction"/> numbers them.</summary>
    public static readonly (float Sin, float Cos)[] Climbs = [.. Enumerable.Range(0, 2 * Directions).Select(k => MathF.SinCos(MathF.PI * k / Directions))];

    private EdgeMap(Plane strength, byte[] direction, double noise, EdgePoint[] points, int[] index)
    {
        Strength = strength;
        Direction = direction;
        Noise = noise;
        Points = points;
        Index = index;
    }

    /// <summary>The largest smoothed gradient over the directions.</summary>
    public Plane Strength { get; }

    /// <summary>Its direction, in steps of π / 16 from 0 to 31; brightness climbs that way.</summary>
    public byte[] Direction { get; }

    /// <summary>The standard deviation of the smoothed gradient where there is nothing but noise.</summary>
    public double Noise { get; }

    public EdgePoint[] Points { get; }

    /// <summary>For each pixel its edge point, or −1.</summary>
    public int[] Index { get; }

    public static EdgeMap Of(Plane level, double noise, double along, double threshold)
    {
        var strength = new Plane(level.Width, level.Height);
        var direction = new byte[strength.Data.Length];
        Fill(level, along, strength, direction);

        // The noise of a Gaussian derivative of white noise, smoothed along the edge.
        var sigma = noise / (2 * Math.Sqrt(2 * Math.PI) * Across * Across) / Math.Sqrt(2 * Math.Sqrt(Math.PI) * along) * Math.Sqrt(2 * Math.Sqrt(Math.PI) * Across);
        var index = new int[strength.Data.Length];
        Array.Fill(index, -1);
        var points = Thin(strength, direction, (float)Math.Max(threshold * sigma, 0.004), index);
        return new EdgeMap(strength, direction, sigma, points, index);
    }

    private static void Fill(Plane level, double along, Plane strength, byte[] direction)
    {
        using var native = new ResourcesTracker();
        var source = native.T(level.ToMat());
        var smooth = native.T(new Mat());
        Cv2.GaussianBlur(source, smooth, new Size(0, 0), Across);
        var (gx, gy) = (native.T(new Mat()), native.T(new Mat()));
        Cv2.Sobel(smooth, gx, MatType.CV_32F, 1, 0, 1, 0.5);
        Cv2.Sobel(smooth, gy, MatType.CV_32F, 0, 1, 1, 0.5);
        var (climbX, climbY) = (Plane.FromMat(gx), Plane.FromMat(gy));
        var mixed = new Plane(level.Width, level.Height);
        for (var k = 0; k < Directions; k++)
        {
            var (sin, cos) = Math.SinCos(Math.PI * k / Directions);
            TensorPrimitives.Multiply(climbX.Data, (float)cos, mixed.Data);
            TensorPrimitives.MultiplyAdd(climbY.Data, (float)sin, mixed.Data, mixed.Data);
            SmoothLine(mixed, Taps(cos, sin, along), k, strength, direction);
        }
    }

    /// <summary>Smooths along a slanted line, row by row, and keeps what is stronger than in the directions before.</summary>
    private static void SmoothLine(Plane mixed, (int X, int Y, float Weight)[] taps, int k, Plane strength, byte[] direction)
    {
        var (width, height) = (mixed.Width, mixed.Height);
        var sum = new float[width];
        for (var y = 0; y < height; y++)
        {
            Array.Clear(sum);
            foreach (var (x, down, weight) in taps)
            {
                var source = mixed.Data.AsSpan(Math.Clamp(y + down, 0, height - 1) * width, width);
                var (from, count) = (Math.Max(0, -x), Math.Max(0, width - Math.Abs(x)));
                var target = sum.AsSpan(from, count);
                TensorPrimitives.MultiplyAdd(source.Slice(Math.Max(0, x), count), weight, target, target);
            }

            Keep(sum, k, strength.Data.AsSpan(y * width, width), direction.AsSpan(y * width, width));
        }
    }

    private static void Keep(ReadOnlySpan<float> smoothed, int k, Span<float> strength, Span<byte> direction)
    {
        var (up, down) = ((byte)k, (byte)(k + Directions));
        for (var i = 0; i < smoothed.Length; i++)
        {
            var value = smoothed[i];
            var size = Math.Abs(value);
            if (size > strength[i])
            {
                strength[i] = size;
                direction[i] = value > 0 ? up : down;
            }
        }
    }

    /// <summary>A Gaussian along the edge: whole steps along the axis nearer to it, straight-line interpolation across that axis.</summary>
    private static (int X, int Y, float Weight)[] Taps(double cos, double sin, double along)
    {
        var (alongX, alongY) = (-sin, cos);
        var steep = Math.Abs(alongY) > Math.Abs(alongX);
        var (major, slant) = steep ? (Math.Abs(alongY), alongX / alongY) : (Math.Abs(alongX), alongY / alongX);
        var taps = new List<(int X, int Y, float Weight)>();
        var reach = (int)Math.Ceiling(2 * along * major);
        var sum = 0.0;
        for (var step = -reach; step <= reach; step++)
        {
            var length = step / major;
            var weight = Math.Exp(-0.5 * length * length / (along * along));
            sum += weight;
            var aside = step * slant;
            var whole = (int)Math.Floor(aside);
            foreach (var (place, share) in new[] { (whole, 1 - (aside - whole)), (whole + 1, aside - whole) })
            {
                if (share > 1e-3)
                {
                    taps.Add(steep ? (place, step, (float)(weight * share)) : (step, place, (float)(weight * share)));
                }
            }
        }

        return [.. taps.Select(t => (t.X, t.Y, (float)(t.Weight / sum)))];
    }

    private static EdgePoint[] Thin(Plane strength, byte[] direction, float threshold, int[] index)
    {
        var points = new List<EdgePoint>();
        for (var y = 2; y < strength.Height - 2; y++)
        {
            for (var x = 2; x < strength.Width - 2; x++)
            {
                var at = (y * strength.Width) + x;
                var value = strength.Data[at];
                if (value < threshold)
                {
                    continue;
                }

                var (sin, cos) = Climbs[direction[at]];
                var ahead = strength.Sample(x + cos, y + sin);
                var behind = strength.Sample(x - cos, y - sin);
                if (value >= ahead && value > behind)
                {
                    var bend = ahead - (2 * value) + behind;
                    var shift = bend < 0 ? Math.Clamp(0.5f * (behind - ahead) / bend, -0.5f, 0.5f) : 0;
                    index[at] = points.Count;
                    points.Add(new EdgePoint(x + (shift * cos), y + (shift * sin), cos, sin, value));
                }
            }
        }

        return [.. points];
    }
}
