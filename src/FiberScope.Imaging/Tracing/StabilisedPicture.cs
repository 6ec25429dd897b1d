using OpenCvSharp;

namespace FiberScope.Imaging.Tracing;

/// <summary>The part of a micrograph that shows the specimen, with even noise, at several scales.</summary>
internal sealed class StabilisedPicture
{
    private const double NormalMedian = 0.6745;

    private StabilisedPicture(Plane linear, Plane[] levels, double[] noise, double linearNoise)
    {
        Linear = linear;
        Levels = levels;
        Noise = noise;
        LinearNoise = linearNoise;
    }

    /// <summary>Brightness stretched so that 0.2 % of the pixels lie below 0 and 0.2 % above 1.</summary>
    public Plane Linear { get; }

    /// <summary>The square root of the brightness, full size first, then halved again and again.</summary>
    public Plane[] Levels { get; }

    /// <summary>The standard deviation of the noise at each level.</summary>
    public double[] Noise { get; }

    /// <summary>The standard deviation of the noise of <see cref="Linear"/>.</summary>
    public double LinearNoise { get; }

    /// <summary>How noisy the linear picture is at a brightness.</summary>
    public GreyNoise GreyNoise => new(LinearNoise, Noise[0]);

    /// <summary>Electron counts are Poisson: the square root makes their noise even (Bartlett 1936).</summary>
    public static StabilisedPicture? From(Micrograph micrograph, double widest)
    {
        var (width, height) = (micrograph.Width, micrograph.UsableHeight);
        if (width < 16 || height < 16)
        {
            return null;
        }

        var linear = Stretch(micrograph.Grey[..(width * height)], width, height);
        if (linear is null)
        {
            return null;
        }

        var root = new Plane(width, height);
        for (var i = 0; i < root.Data.Length; i++)
        {
            root.Data[i] = MathF.Sqrt(Math.Clamp(linear.Data[i], 0, 1.3f) + 0.02f);
        }

        var levels = new List<Plane> { root };
        while (12 * (1 << (levels.Count - 1)) < widest && Math.Min(levels[^1].Width, levels[^1].Height) > 64)
        {
            levels.Add(Halve(levels[^1]));
        }

        return new StabilisedPicture(linear, [.. levels], [.. levels.Select(NoiseOf)], NoiseOf(linear));
    }

    /// <summary>
    /// Noise from the median absolute response of a second-difference mask (Immerkaer 1996, CVIU 64, 300–302, with a median).
    /// </summary>
    private static double NoiseOf(Plane plane)
    {
        using var native = new ResourcesTracker();
        var source = native.T(plane.ToMat());
        using var kernel = Mat.FromPixelData(3, 3, MatType.CV_32FC1, new float[] { 1, -2, 1, -2, 4, -2, 1, -2, 1 });
        var response = native.T(new Mat());
        Cv2.Filter2D(source, response, MatType.CV_32F, kernel);
        var values = Plane.FromMat(response).Data;
        var sample = new float[(values.Length + 6) / 7];
        for (var i = 0; i < sample.Length; i++)
        {
            sample[i] = Math.Abs(values[7 * i]);
        }

        Array.Sort(sample);
        return Math.Max(1e-4, sample[sample.Length / 2] / NormalMedian / 6);
    }

    private static Plane? Stretch(ReadOnlySpan<float> grey, int width, int height)
    {
        var sample = new float[(grey.Length + 15) / 16];
        for (var i = 0; i < sample.Length; i++)
        {
            sample[i] = grey[i * 16];
        }

        Array.Sort(sample);
        var (low, high) = (sample[(int)(0.002 * (sample.Length - 1))], sample[(int)(0.998 * (sample.Length - 1))]);
        if (!(high - low > 1e-4f))
        {
            return null;
        }

        var plane = new Plane(width, height);
        for (var i = 0; i < plane.Data.Length; i++)
        {
            plane.Data[i] = (grey[i] - low) / (high - low);
        }

        return plane;
    }

    private static Plane Halve(Plane plane)
    {
        using var native = new ResourcesTracker();
        var source = native.T(plane.ToMat());
        var smooth = native.T(new Mat());
        Cv2.GaussianBlur(source, smooth, new Size(0, 0), 0.7);
        var even = native.T(new Mat(smooth, new Rect(0, 0, plane.Width / 2 * 2, plane.Height / 2 * 2)));
        var half = native.T(new Mat());
        Cv2.Resize(even, half, new Size(plane.Width / 2, plane.Height / 2), 0, 0, InterpolationFlags.Area);
        return Plane.FromMat(half);
    }
}
