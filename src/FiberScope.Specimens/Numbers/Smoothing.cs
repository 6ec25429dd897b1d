using System.Numerics;

namespace FiberScope.Specimens.Numbers;

/// <summary>Gaussian blur of whole pictures; rows and columns are shared out over the processors without changing a bit of the result.</summary>
internal static class Smoothing
{
    /// <summary>Blurs in place with a Gaussian of the given sigma; edges are mirrored.</summary>
    public static void Gaussian(float[] picture, int width, int height, double sigma)
    {
        if (sigma < 0.05)
        {
            return;
        }

        if (sigma > 8)
        {
            Boxes(picture, width, height, sigma);
            return;
        }

        var kernel = Kernel(sigma);
        var middle = new float[picture.Length];
        Parallel.For(0, height, y => Row(picture.AsSpan(y * width, width), middle.AsSpan(y * width, width), kernel));
        Parallel.For(0, height, y => Column(middle, picture, width, height, y, kernel));
    }

    /// <summary>Half of a normalised Gaussian kernel; its first value is the centre's.</summary>
    public static float[] Kernel(double sigma)
    {
        var radius = Math.Max(1, (int)Math.Ceiling(4 * sigma));
        var half = new double[radius + 1];
        double Density(double x) => PortableMath.Exp(-x * x / (2 * sigma * sigma));
        var total = 0.0;
        for (var i = 0; i <= radius; i++)
        {
            half[i] = Density(i);
            total += i == 0 ? half[i] : 2 * half[i];
        }

        return [.. half.Select(h => (float)(h / total))];
    }

    private static void Row(ReadOnlySpan<float> from, Span<float> to, float[] kernel)
    {
        var last = from.Length - 1;
        var reach = kernel.Length - 1;
        var (first, end) = (Math.Min(reach, from.Length), Math.Max(Math.Min(reach, from.Length), from.Length - reach));
        for (var x = 0; x <= last; x++)
        {
            if (x == first)
            {
                x = end;
                if (x > last)
                {
                    break;
                }
            }

            var sum = kernel[0] * from[x];
            for (var k = 1; k < kernel.Length; k++)
            {
                sum += kernel[k] * (from[Mirror(x - k, last)] + from[Mirror(x + k, last)]);
            }

            to[x] = sum;
        }

        if (end <= first)
        {
            return;
        }

        var middle = to[first..end];
        Scale(from[first..end], kernel[0], middle);
        for (var k = 1; k < kernel.Length; k++)
        {
            AddPair(from[(first - k)..(end - k)], from[(first + k)..(end + k)], kernel[k], middle);
        }
    }

    private static void Column(float[] from, float[] to, int width, int height, int y, float[] kernel)
    {
        var target = to.AsSpan(y * width, width);
        Scale(from.AsSpan(y * width, width), kernel[0], target);
        for (var k = 1; k < kernel.Length; k++)
        {
            var above = from.AsSpan(Mirror(y - k, height - 1) * width, width);
            var below = from.AsSpan(Mirror(y + k, height - 1) * width, width);
            AddPair(above, below, kernel[k], target);
        }
    }

    private static void Scale(ReadOnlySpan<float> from, float factor, Span<float> to)
    {
        for (var i = 0; i < to.Length; i++)
        {
            to[i] = factor * from[i];
        }
    }

    // Element by element the same operations whatever the width of the machine's vectors, hence the same bits.
    private static void AddPair(ReadOnlySpan<float> first, ReadOnlySpan<float> second, float weight, Span<float> to)
    {
        var (i, lanes) = (0, Vector<float>.Count);
        for (; i <= to.Length - lanes; i += lanes)
        {
            var pair = new Vector<float>(first[i..]) + new Vector<float>(second[i..]);
            (new Vector<float>(to[i..]) + (pair * weight)).CopyTo(to[i..]);
        }

        for (; i < to.Length; i++)
        {
            to[i] += weight * (first[i] + second[i]);
        }
    }

    private static int Mirror(int i, int last)
    {
        i = i < 0 ? -i : i;
        i = i > last ? (2 * last) - i : i;
        return Math.Clamp(i, 0, last);
    }

    // Three passes of a moving average come within 3 % of a Gaussian; good enough for shadows and glow.
    private static void Boxes(float[] picture, int width, int height, double sigma)
    {
        var radius = Math.Max(1, (int)Math.Floor(Math.Sqrt((4 * sigma * sigma) + 1) / 2));
        var middle = new float[picture.Length];
        for (var pass = 0; pass < 3; pass++)
        {
            Parallel.For(0, height, y => Box(picture, middle, y * width, 1, width, radius));
            Parallel.For(0, width, x => Box(middle, picture, x, width, height, radius));
        }
    }

    private static void Box(float[] from, float[] to, int start, int stride, int count, int radius)
    {
        double sum = 0;
        for (var k = -radius; k <= radius; k++)
        {
            sum += from[start + (Math.Clamp(k, 0, count - 1) * stride)];
        }

        var scale = 1.0 / ((2 * radius) + 1);
        for (var i = 0; i < count; i++)
        {
            to[start + (i * stride)] = (float)(sum * scale);
            sum += from[start + (Math.Min(i + radius + 1, count - 1) * stride)] - from[start + (Math.Max(i - radius, 0) * stride)];
        }
    }
}
