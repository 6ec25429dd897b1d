using FiberScope.Imaging.Tracing;
using MathNet.Numerics.Distributions;
using MathNet.Numerics.Random;
using OpenCvSharp;

namespace FiberScope.Imaging.Selection;

/// <summary>A part of a picture with its fibres made thinner, as sharp and as noisy as before.</summary>
internal sealed class ShrunkenCopy
{
    /// <summary>How much thinner.</summary>
    public const double Shrink = 1.5;

    private const int LargestSide = 800;

    private ShrunkenCopy(Micrograph picture, int left, int top, int width, int height)
    {
        Picture = picture;
        (Left, Top, Width, Height) = (left, top, width, height);
    }

    /// <summary>The thinner picture.</summary>
    public Micrograph Picture { get; }

    /// <summary>The part of the original that it shows; pixels.</summary>
    public int Left { get; }

    public int Top { get; }

    public int Width { get; }

    public int Height { get; }

    /// <summary>Makes the copy of the middle of a picture.</summary>
    /// <param name="micrograph">The original.</param>
    /// <param name="blur">Its blur as the sigma of a Gaussian; pixels.</param>
    /// <param name="noise">Standard deviation of its noise on the square-root scale, grey from 0 to 1.</param>
    /// <param name="seed">Seed of the noise that is added.</param>
    public static ShrunkenCopy Of(Micrograph micrograph, double blur, double noise, int seed)
    {
        var (width, height) = (Math.Min(LargestSide, micrograph.Width), Math.Min(LargestSide, micrograph.UsableHeight));
        var (left, top) = ((micrograph.Width - width) / 2, (micrograph.UsableHeight - height) / 2);
        var part = new Plane(width, height);
        for (var y = 0; y < height; y++)
        {
            micrograph.Grey.Slice(((top + y) * micrograph.Width) + left, width).CopyTo(part.Data.AsSpan(y * width));
        }

        var small = Resized(part, blur);
        AddNoise(small, noise, seed);
        var picture = new Micrograph(small.Data, small.Width, small.Height, micrograph.PixelSize, micrograph.Mode, micrograph.Source);
        return new ShrunkenCopy(picture, left, top, width, height);
    }

    private static Plane Resized(Plane part, double blur)
    {
        using var native = new ResourcesTracker();
        var source = native.T(part.ToMat());
        var small = native.T(new Mat());
        Cv2.Resize(source, small, new Size((int)(part.Width / Shrink), (int)(part.Height / Shrink)), 0, 0, InterpolationFlags.Area);
        var even = native.T(new Mat());

        // Shrinking sharpens: the blur that is missing is put back.
        Cv2.GaussianBlur(small, even, new Size(0, 0), Math.Max(0.3, blur * Math.Sqrt(1 - (1 / (Shrink * Shrink)))));
        return Plane.FromMat(even);
    }

    /// <summary>Shrinking and blurring average the noise away: it is put back, even on the square-root scale.</summary>
    private static void AddNoise(Plane plane, double noise, int seed)
    {
        var random = new Xoshiro256StarStar(seed, threadSafe: false);
        var normal = new Normal(0, noise, random);
        for (var i = 0; i < plane.Data.Length; i++)
        {
            var root = Math.Sqrt(Math.Max(0, plane.Data[i])) + normal.Sample();
            plane.Data[i] = (float)Math.Clamp(root * Math.Abs(root), 0, 1);
        }
    }
}
