using FiberScope.Imaging.Tracing;

namespace FiberScope.Imaging.Transmitted;

/// <summary>The light across one fibre, both halves laid on one another and averaged along it.</summary>
/// <param name="Light">The share of light passed, from the axis outwards, every <see cref="Step"/> pixels.</param>
/// <param name="Near">How many of the values lie so near that the edges are found from them; those beyond show the surroundings.</param>
/// <param name="Half">Half the traced width, median over the rows; pixels.</param>
/// <param name="Noise">Standard deviation of one value.</param>
internal sealed record RimProfile(double[] Light, int Near, double Half, double Noise)
{
    /// <summary>Distance between values; pixels.</summary>
    public const double Step = 0.4;

    /// <summary>The profile of a traced fibre; null when too few of its rows were accepted.</summary>
    public static RimProfile? Of(Ribbon ribbon, Plane passed)
    {
        var strip = ribbon.Strip;
        var half = ribbon.Width / 2;
        var near = (int)Math.Ceiling((half + Math.Max(4, 0.4 * half)) / Step);
        var count = near + (int)Math.Ceiling(Math.Max(5, 0.3 * half) / Step);
        var (sum, squares) = (new double[count], new double[count]);
        var rows = 0;
        for (var r = 0; r < strip.Rows; r++)
        {
            if (!ribbon.Accepted[r])
            {
                continue;
            }

            rows++;
            for (var side = -1; side <= 1; side += 2)
            {
                var edge = side < 0 ? strip.Left.Offset[r] : strip.Right.Offset[r];
                for (var i = 0; i < count; i++)
                {
                    var across = side * (edge - half + (Step * i));
                    double value = passed.Sample((float)(strip.X[r] + (across * strip.Nx[r])), (float)(strip.Y[r] + (across * strip.Ny[r])));
                    sum[i] += value;
                    squares[i] += value * value;
                }
            }
        }

        if (rows < 8)
        {
            return null;
        }

        var n = 2.0 * rows;
        var noise = Series.Median([.. squares.Select((s, i) => Math.Sqrt(Math.Max(1e-8, (s / n) - (sum[i] * sum[i] / n / n))))]);

        // Rows nearer than a quarter of the width tell the same.
        var independent = Math.Max(2, n * strip.Step / Math.Max(2, half / 2));
        return new RimProfile([.. sum.Select(s => s / n)], near, half, Math.Max(1e-4, noise / Math.Sqrt(independent)));
    }
}
