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
        for (var k = 0; k < Directions; k++)
        {
            var (sin, cos) = Math.SinCos(Math.PI * k / Directions);
            using var mixed = new Mat();
            Cv2.AddWeighted(gx, cos, gy, sin, 0, mixed);
            using var kernel = Kernel(cos, sin, along);
            using var smoothed = new Mat();
            Cv2.Filter2D(mixed, smoothed, MatType.CV_32F, kernel, borderType: BorderTypes.Replicate);
            Keep(Plane.FromMat(smoothed).Data, k, strength.Data, direction);
        }
    }

    private static void Keep(float[] smoothed, int k, float[] strength, byte[] direction)
    {
        for (var i = 0; i < smoothed.Length; i++)
        {
            var value = smoothed[i];
            if (Math.Abs(value) > strength[i])
            {
                strength[i] = Math.Abs(value);
                direction[i] = (byte)(value > 0 ? k : k + Directions);
            }
        }
    }

    private static Mat Kernel(double cos, double sin, double along)
    {
        var reach = (int)Math.Ceiling(2 * along);
        var size = (2 * reach) + 1;
        var weights = new float[size * size];
        var sum = 0.0;
        for (var y = -reach; y <= reach; y++)
        {
            for (var x = -reach; x <= reach; x++)
            {
                var (a, b) = ((x * cos) + (y * sin), (-x * sin) + (y * cos));
                var weight = Math.Exp((-0.5 * b * b / (along * along)) - (0.5 * a * a / 0.25));
                weights[((y + reach) * size) + x + reach] = (float)weight;
                sum += weight;
            }
        }

        for (var i = 0; i < weights.Length; i++)
        {
            weights[i] /= (float)sum;
        }

        using var view = Mat.FromPixelData(size, size, MatType.CV_32FC1, weights);
        return view.Clone();
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

                var (sin, cos) = MathF.SinCos(MathF.PI * direction[at] / Directions);
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
