namespace FiberScope.Statistics;

/// <summary>The largest vertical distance between two cumulative distributions.</summary>
public static class KolmogorovSmirnov
{
    /// <summary>The distance between two weighted samples; dimensionless, 0 (alike) to 1 (apart).</summary>
    public static double Distance(WeightedSample first, WeightedSample second) =>
        first.Values.Concat(second.Values).Distinct().Max(x => Math.Abs(first.ShareAtOrBelow(x) - second.ShareAtOrBelow(x)));

    /// <summary>The distance between a weighted sample and a continuous distribution given by its cumulative function.</summary>
    public static double Distance(WeightedSample sample, Func<double, double> cumulative)
    {
        var largest = 0.0;
        var below = 0.0;
        for (var i = 0; i < sample.Values.Length; i++)
        {
            var expected = cumulative(sample.Values[i]);
            var above = below + (sample.Weights[i] / sample.TotalWeight);
            largest = Math.Max(largest, Math.Max(Math.Abs(expected - below), Math.Abs(above - expected)));
            below = above;
        }

        return largest;
    }
}
