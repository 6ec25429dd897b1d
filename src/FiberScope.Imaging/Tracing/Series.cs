namespace FiberScope.Imaging.Tracing;

/// <summary>Smoothing and ranks of short series.</summary>
internal static class Series
{
    public static double Median(double[] values)
    {
        if (values.Length == 0)
        {
            return 0;
        }

        var sorted = (double[])values.Clone();
        Array.Sort(sorted);
        return sorted.Length % 2 == 1 ? sorted[sorted.Length / 2] : 0.5 * (sorted[(sorted.Length / 2) - 1] + sorted[sorted.Length / 2]);
    }

    /// <summary>Standard deviation over median.</summary>
    public static double Spread(double[] values)
    {
        var mean = values.Average();
        return Math.Sqrt(values.Average(v => (v - mean) * (v - mean))) / Math.Max(1e-9, Median(values));
    }

    /// <summary>A Gaussian mean; beyond the ends the end values go on, or nothing.</summary>
    public static double[] Smooth(double[] values, double sigma, bool zeroOutside = false)
    {
        var kernel = Kernel(sigma);
        var reach = kernel.Length / 2;
        var result = new double[values.Length];
        for (var i = 0; i < values.Length; i++)
        {
            var sum = 0.0;
            for (var k = -reach; k <= reach; k++)
            {
                var at = i + k;
                sum += zeroOutside && (at < 0 || at >= values.Length) ? 0 : kernel[k + reach] * values[Math.Clamp(at, 0, values.Length - 1)];
            }

            result[i] = sum;
        }

        return result;
    }

    public static void SmoothRows(float[] from, float[] to, int rows, int columns, double sigma)
    {
        var kernel = Kernel(sigma);
        var reach = kernel.Length / 2;
        Array.Clear(to);
        for (var r = 0; r < rows; r++)
        {
            var target = to.AsSpan(r * columns, columns);
            for (var k = -reach; k <= reach; k++)
            {
                var source = from.AsSpan(Math.Clamp(r + k, 0, rows - 1) * columns, columns);
                System.Numerics.Tensors.TensorPrimitives.MultiplyAdd(source, (float)kernel[k + reach], target, target);
            }
        }
    }

    public static void SmoothColumns(float[] values, int rows, int columns, double sigma)
    {
        var kernel = Kernel(sigma);
        var reach = kernel.Length / 2;
        var padded = new float[columns + (2 * reach)];
        for (var r = 0; r < rows; r++)
        {
            var row = values.AsSpan(r * columns, columns);
            row.CopyTo(padded.AsSpan(reach));
            padded.AsSpan(0, reach).Fill(row[0]);
            padded.AsSpan(reach + columns).Fill(row[^1]);
            row.Clear();
            for (var k = 0; k < kernel.Length; k++)
            {
                System.Numerics.Tensors.TensorPrimitives.MultiplyAdd(padded.AsSpan(k, columns), (float)kernel[k], row, row);
            }
        }
    }

    private static double[] Kernel(double sigma)
    {
        var reach = Math.Max(1, (int)Math.Ceiling(3 * sigma));
        var kernel = new double[(2 * reach) + 1];
        for (var k = -reach; k <= reach; k++)
        {
            kernel[k + reach] = Math.Exp(-0.5 * k * k / (sigma * sigma));
        }

        var sum = kernel.Sum();
        return [.. kernel.Select(v => v / sum)];
    }
}
