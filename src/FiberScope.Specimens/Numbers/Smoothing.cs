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
        for (var x = 0; x <= last; x++)
        {
            var sum = kernel[0] * from[x];
            var inside = x >= kernel.Length && x + kernel.Length <= last;
            for (var k = 1; k < kernel.Length; k++)
            {
                sum += inside
                    ? kernel[k] * (from[x - k] + from[x + k])
                    : kernel[k] * (from[Mirror(x - k, last)] + from[Mirror(x + k, last)]);
            }

            to[x] = sum;
        }
    }

    private static void Column(float[] from, float[] to, int width, int height, int y, float[] kernel)
    {
        var target = to.AsSpan(y * width, width);
        var centre = from.AsSpan(y * width, width);
        for (var x = 0; x < width; x++)
        {
            target[x] = kernel[0] * centre[x];
        }

        for (var k = 1; k < kernel.Length; k++)
        {
            var above = from.AsSpan(Mirror(y - k, height - 1) * width, width);
            var below = from.AsSpan(Mirror(y + k, height - 1) * width, width);
            var weight = kernel[k];
            for (var x = 0; x < target.Length; x++)
            {
                target[x] += weight * (above[x] + below[x]);
            }
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
