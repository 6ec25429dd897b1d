using FiberScope.Statistics;
using UnitsNet;

namespace FiberScope.Fibres;

/// <summary>Figures of resampled diameters, gathered draw by draw; in metres.</summary>
internal sealed class BootstrapFigures(int[] order, double[] diameters, double[] lengths, int replicates, int fields)
{
    private readonly List<Figures> _draws = new(replicates);

    public void Add(int[] counts)
    {
        double total = 0, sum = 0, squares = 0;
        foreach (var i in order)
        {
            var weight = counts[i] * lengths[i];
            total += weight;
            sum += weight * diameters[i];
            squares += weight * diameters[i] * diameters[i];
        }

        var mean = sum / total;
        var deviation = Math.Sqrt(Math.Max(0, (squares / total) - (mean * mean)));
        _draws.Add(new Figures(deviation, At(counts, 0.1 * total), At(counts, 0.5 * total), At(counts, 0.9 * total)));
    }

    /// <summary>
    /// The 2.5 to 97.5 percentile range of a figure, its distance from the estimate widened for few fields.
    /// </summary>
    /// <remarks>
    /// With m fields the bootstrap spread is too small by √((m − 1)/m) and the normal law too narrow against Student's t with
    /// m − 1 degrees of freedom; both are put right here. Source: Davison and Hinkley (1997), section 2.3 (from memory).
    /// </remarks>
    public LengthInterval Interval(Func<Figures, double> figure, double estimate)
    {
        var sample = WeightedSample.Even([.. _draws.Select(figure)]);
        var widening = fields > 1 ? Math.Sqrt(fields / (fields - 1.0)) * Math.Min(2, ClusteredMean.StudentFactor95(fields - 1) / 1.96) : 1;
        var low = Math.Min(0, sample.Quantile(0.025) - estimate) * widening;
        var high = Math.Max(0, sample.Quantile(0.975) - estimate) * widening;
        return new LengthInterval(Length.FromMeters(Math.Max(0, estimate + low)), Length.FromMeters(estimate + high));
    }

    private double At(int[] counts, double target)
    {
        // Where the target falls on the border of two readings, rounding must not choose between them.
        target *= 1 - 1e-9;
        var sum = 0.0;
        foreach (var i in order)
        {
            sum += counts[i] * lengths[i];
            if (sum >= target)
            {
                return diameters[i];
            }
        }

        return diameters[order[^1]];
    }

    internal readonly record struct Figures(double StandardDeviation, double D10, double D50, double D90);
}
