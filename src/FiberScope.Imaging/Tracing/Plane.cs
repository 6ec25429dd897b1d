using System.Runtime.CompilerServices;
using System.Runtime.Intrinsics;
using System.Runtime.Intrinsics.X86;
using OpenCvSharp;

namespace FiberScope.Imaging.Tracing;

/// <summary>A grey picture in memory, sampled between its pixels; the centre of the first pixel is (0, 0) here.</summary>
internal sealed class Plane
{
    public Plane(int width, int height)
        : this(width, height, new float[width * height])
    {
    }

    public Plane(int width, int height, float[] data)
    {
        Width = width;
        Height = height;
        Data = data;
    }

    public int Width { get; }

    public int Height { get; }

    public float[] Data { get; }

    /// <summary>The value at (x, y) by straight-line interpolation; outside, that of the border.</summary>
    [MethodImpl(MethodImplOptions.AggressiveInlining)]
    public float Sample(float x, float y)
    {
        x = Math.Clamp(x, 0, Width - 1.001f);
        y = Math.Clamp(y, 0, Height - 1.001f);
        unchecked
        {
            int i = (int)x, j = (int)y;
            float fx = x - i, fy = y - j;
            var at = (j * Width) + i;
            ref var first = ref Data[at];
            var below = Unsafe.Add(ref first, Width);
            var belowNext = Unsafe.Add(ref first, Width + 1);
            var next = Unsafe.Add(ref first, 1);
            var top = first + (fx * (next - first));
            return top + (fy * (below + (fx * (belowNext - below)) - top));
        }
    }

    /// <summary>Samples a straight line of equally spaced places.</summary>
    public void SampleLine(float x, float y, float stepX, float stepY, Span<float> into)
    {
        var (endX, endY) = (x + (stepX * (into.Length - 1)), y + (stepY * (into.Length - 1)));
        if (Math.Min(x, endX) < 0.01f || Math.Min(y, endY) < 0.01f || Math.Max(x, endX) > Width - 1.01f || Math.Max(y, endY) > Height - 1.01f)
        {
            for (var k = 0; k < into.Length; k++)
            {
                into[k] = Sample(x + (k * stepX), y + (k * stepY));
            }

            return;
        }

        // All places are inside: no clamping, and the array's bounds need no second look.
        ref var origin = ref Data[0];
        unchecked
        {
            for (var k = Avx2.IsSupported ? SampleEights(x, y, stepX, stepY, into) : 0; k < into.Length; k++)
            {
                float px = x + (k * stepX), py = y + (k * stepY);
                int i = (int)px, j = (int)py;
                float fx = px - i, fy = py - j;
                ref var first = ref Unsafe.Add(ref origin, (j * Width) + i);
                ref var below = ref Unsafe.Add(ref first, Width);
                var top = first + (fx * (Unsafe.Add(ref first, 1) - first));
                var bottom = below + (fx * (Unsafe.Add(ref below, 1) - below));
                into[k] = top + (fy * (bottom - top));
            }
        }
    }

    /// <summary>Samples as many places as go eight at a time, in the same arithmetic as one at a time; how many that were.</summary>
    private unsafe int SampleEights(float x, float y, float stepX, float stepY, Span<float> into)
    {
        var done = 0;
        var number = Vector256<float>.Indices;
        var (x0, y0, dx, dy) = (Vector256.Create(x), Vector256.Create(y), Vector256.Create(stepX), Vector256.Create(stepY));
        var rowLength = Vector256.Create(Width);
        fixed (float* data = Data)
        {
            for (; done + 8 <= into.Length; done += 8)
            {
                var k = number + Vector256.Create((float)done);
                var (px, py) = (x0 + (k * dx), y0 + (k * dy));
                var (i, j) = (Avx.ConvertToVector256Int32WithTruncation(px), Avx.ConvertToVector256Int32WithTruncation(py));
                var (fx, fy) = (px - Avx.ConvertToVector256Single(i), py - Avx.ConvertToVector256Single(j));
                var at = (j * rowLength) + i;
                var (a, b) = (Avx2.GatherVector256(data, at, 4), Avx2.GatherVector256(data + 1, at, 4));
                var (c, d) = (Avx2.GatherVector256(data + Width, at, 4), Avx2.GatherVector256(data + Width + 1, at, 4));
                var (top, bottom) = (a + (fx * (b - a)), c + (fx * (d - c)));
                (top + (fy * (bottom - top))).CopyTo(into[done..]);
            }
        }

        return done;
    }

    /// <summary>A native copy; the caller disposes it.</summary>
    public Mat ToMat()
    {
        using var view = Mat.FromPixelData(Height, Width, MatType.CV_32FC1, Data);
        return view.Clone();
    }

    public static Plane FromMat(Mat native)
    {
        var plane = new Plane(native.Cols, native.Rows);
        System.Runtime.InteropServices.Marshal.Copy(native.Data, plane.Data, 0, plane.Data.Length);
        return plane;
    }
}
