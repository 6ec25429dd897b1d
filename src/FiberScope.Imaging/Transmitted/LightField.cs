using FiberScope.Imaging.Edges;
using OpenCvSharp;

namespace FiberScope.Imaging.Transmitted;

/// <summary>The share of the light that passes at each place: the picture over what the empty field would show.</summary>
/// <param name="Passed">Row by row; 1 in the empty field.</param>
/// <param name="Width">Columns.</param>
/// <param name="Height">Rows, without the information strip.</param>
internal sealed record LightField(float[] Passed, int Width, int Height)
{
    private const int Terms = 6, Rounds = 8, Stride = 3;

    /// <summary>Pixels this near to the fitted light are taken for the empty field; a share of it.</summary>
    private const double Near = 0.04;

    /// <summary>Finds the empty field's light and divides by it; null when the picture is black.</summary>
    /// <remarks>
    /// A lamp lights a field smoothly: a surface of second order, fitted to the pixels near it and fitted again, starting from the
    /// brighter end of the picture's light. Shades of fibres out of focus pull less the further they lie from it.
    /// </remarks>
    public static LightField? Of(Micrograph micrograph)
    {
        var (width, height) = (micrograph.Width, micrograph.UsableHeight);
        var grey = micrograph.Grey[..(width * height)].ToArray();
        var smooth = Smooth(grey, width, height);
        var sample = smooth.Where((_, i) => i % 17 == 0).Order().ToArray();
        if (width < 32 || height < 32 || sample[(int)(0.8 * sample.Length)] < 0.02)
        {
            return null;
        }

        double[] surface = [sample[(int)(0.75 * sample.Length)], 0, 0, 0, 0, 0];
        for (var round = 0; round < Rounds; round++)
        {
            // The first rounds reach further, so that uneven lighting is caught.
            surface = Fit(smooth, width, height, surface, Near * (round < 3 ? 4 - round : 1));
        }

        for (var i = 0; i < grey.Length; i++)
        {
            var empty = Math.Max(0.01, At(surface, i % width, i / width, width, height));
            (grey[i], smooth[i]) = ((float)(grey[i] / empty), (float)(smooth[i] / empty));
        }

        var usual = Usual(smooth);
        for (var i = 0; i < grey.Length; i++)
        {
            grey[i] /= usual;
        }

        return new LightField(grey, width, height);
    }

    /// <summary>The most frequent light near 1: faint shades make the mean of what is near the empty field too dark.</summary>
    private static float Usual(float[] light)
    {
        const int Bins = 81;
        const double Narrow = 0.001, Kernel = 5;
        var count = new double[Bins];
        foreach (var value in light)
        {
            var bin = (int)Math.Round((value - 1) / Narrow) + (Bins / 2);
            count[Math.Clamp(bin, 0, Bins - 1)] += bin is >= 0 and < Bins ? 1 : 0;
        }

        var best = (Count: -1.0, Bin: Bins / 2);
        for (var b = 0; b < Bins; b++)
        {
            var sum = count.Select((c, i) => c * Math.Exp(-0.5 * Math.Pow((i - b) / Kernel, 2))).Sum();
            best = sum > best.Count ? (sum, b) : best;
        }

        return (float)(1 + ((best.Bin - (Bins / 2)) * Narrow));
    }

    private static float[] Smooth(float[] grey, int width, int height)
    {
        using var source = Mat.FromPixelData(height, width, MatType.CV_32FC1, grey);
        using var smooth = new Mat();
        Cv2.GaussianBlur(source, smooth, new Size(0, 0), 1.5);
        smooth.GetArray(out float[] values);
        return values;
    }

    private static double[] Fit(float[] smooth, int width, int height, double[] before, double near)
    {
        Span<double> matrix = stackalloc double[Terms * Terms];
        Span<double> right = stackalloc double[Terms];
        Span<double> terms = stackalloc double[Terms];
        var count = 0;
        for (var y = 0; y < height; y += Stride)
        {
            for (var x = 0; x < width; x += Stride)
            {
                double value = smooth[(y * width) + x];
                var expected = At(before, x, y, width, height);
                if (Math.Abs(value - expected) > near * expected)
                {
                    continue;
                }

                count++;
                Basis(x, y, width, height, terms);
                for (var i = 0; i < Terms; i++)
                {
                    right[i] += terms[i] * value;
                    for (var j = 0; j <= i; j++)
                    {
                        matrix[(i * Terms) + j] += terms[i] * terms[j];
                    }
                }
            }
        }

        if (count < 200)
        {
            return before;
        }

        SmallSystem.Factorise(matrix, Terms);
        SmallSystem.Solve(matrix, right, Terms);
        return right.ToArray();
    }

    private static double At(double[] surface, int x, int y, int width, int height)
    {
        Span<double> terms = stackalloc double[Terms];
        Basis(x, y, width, height, terms);
        var sum = 0.0;
        for (var i = 0; i < Terms; i++)
        {
            sum += surface[i] * terms[i];
        }

        return sum;
    }

    private static void Basis(int x, int y, int width, int height, Span<double> terms)
    {
        var (u, v) = ((2.0 * x / width) - 1, (2.0 * y / height) - 1);
        (terms[0], terms[1], terms[2], terms[3], terms[4], terms[5]) = (1, u, v, u * u, u * v, v * v);
    }
}
