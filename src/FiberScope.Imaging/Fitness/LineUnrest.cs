namespace FiberScope.Imaging.Fitness;

/// <summary>How much a scanned picture changes from one line to the next beyond what the specimen explains.</summary>
/// <param name="Steps">Standard deviation of whole lines' brightness about their neighbours', over the picture's standard deviation.</param>
/// <param name="JitterPixels">Standard deviation of the lines' sideways displacement; pixels.</param>
/// <remarks>
/// Charging lifts or lowers whole lines; vibration and drift push them sideways. Neither happens to columns, so what columns show is
/// the specimen's own share and is taken off in quadrature. A slow, even drift shears the picture and cannot be seen in one picture alone.
/// </remarks>
internal sealed record LineUnrest(double Steps, double JitterPixels)
{
    /// <summary>Looks along the lines and, for comparison, along the columns.</summary>
    public static LineUnrest Of(Micrograph micrograph)
    {
        var grey = micrograph.Grey;
        var (width, height) = (micrograph.Width, micrograph.UsableHeight);
        var lines = Unrest(grey, width, height, 1, width);
        var columns = Unrest(grey, height, width, width, 1);
        return new LineUnrest(Beyond(lines.Steps, columns.Steps) / Math.Max(Deviation(grey[..(width * height)]), 1e-6), Beyond(lines.Shifts, columns.Shifts));
    }

    private static double Beyond(double value, double control) => Math.Sqrt(Math.Max(0, (value * value) - (control * control)));

    /// <summary>Robust deviations of second differences of the lines' means and of neighbouring lines' displacements.</summary>
    private static (double Steps, double Shifts) Unrest(ReadOnlySpan<float> grey, int along, int count, int step, int next)
    {
        var means = new double[count];
        var shifts = new List<double>();
        for (var line = 0; line < count; line++)
        {
            double sum = 0, moved = 0, slope = 0;
            for (var i = 1; i < along - 1; i++)
            {
                var at = (line * next) + (i * step);
                sum += grey[at];
                if (line > 0 && line < count - 1)
                {
                    // How far this line lies beside the mean of its neighbours: least squares on the gradient along the line.
                    var gradient = 0.5 * (grey[at + step] - grey[at - step]);
                    moved += gradient * (grey[at] - (0.5 * (grey[at - next] + grey[at + next])));
                    slope += gradient * gradient;
                }
            }

            means[line] = sum / Math.Max(1, along - 2);
            if (slope > 0)
            {
                shifts.Add(moved / slope);
            }
        }

        var steps = Enumerable.Range(1, Math.Max(0, count - 2)).Select(i => means[i] - (0.5 * (means[i - 1] + means[i + 1])));

        // A line's own value less the mean of two independent ones has 1.5 times its variance.
        return (RobustDeviation([.. steps]) / Math.Sqrt(1.5), RobustDeviation([.. shifts]) / Math.Sqrt(1.5));
    }

    private static double RobustDeviation(double[] values)
    {
        if (values.Length == 0)
        {
            return 0;
        }

        Array.Sort(values);
        var median = values[values.Length / 2];
        var away = Array.ConvertAll(values, value => Math.Abs(value - median));
        Array.Sort(away);
        return away[away.Length / 2] / 0.6745;
    }

    private static double Deviation(ReadOnlySpan<float> values)
    {
        double sum = 0, squares = 0;
        foreach (var value in values)
        {
            sum += value;
            squares += value * value;
        }

        var mean = sum / values.Length;
        return Math.Sqrt(Math.Max(0, (squares / values.Length) - (mean * mean)));
    }
}
