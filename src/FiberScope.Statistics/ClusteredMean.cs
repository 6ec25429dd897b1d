using MathNet.Numerics.Distributions;

namespace FiberScope.Statistics;

/// <summary>A weighted mean of values that come in clusters, and how sure it is.</summary>
/// <remarks>
/// The mean is a ratio Σ w x / Σ w of two totals that both vary from cluster to cluster. Its variance is that of the
/// cluster totals of the linearised residual w (x − mean) / Σ w, with the factor m / (m − 1) for m clusters.
/// Source: Cochran (1977), Sampling Techniques, 3rd ed., section 6.4 and chapter 9 (from memory).
/// </remarks>
public sealed record ClusteredMean
{
    private ClusteredMean(double mean, double standardError, int clusters)
    {
        Mean = mean;
        StandardError = standardError;
        Clusters = clusters;
    }

    /// <summary>The weighted mean.</summary>
    public double Mean { get; }

    /// <summary>Its standard error from the spread between clusters; zero when there is only one cluster (unknown).</summary>
    public double StandardError { get; }

    /// <summary>How many clusters there are; at least 1.</summary>
    public int Clusters { get; }

    /// <summary>Degrees of freedom of the standard error, clusters − 1.</summary>
    public int DegreesOfFreedom => Clusters - 1;

    /// <summary>Works out the mean of values with weights in clusters.</summary>
    /// <param name="values">The values.</param>
    /// <param name="weights">As many weights, above zero.</param>
    /// <param name="clusters">For each value the name of its cluster.</param>
    /// <exception cref="ArgumentException">The lists are empty or differ in length.</exception>
    public static ClusteredMean Of(ReadOnlySpan<double> values, ReadOnlySpan<double> weights, ReadOnlySpan<int> clusters)
    {
        if (values.Length == 0 || values.Length != weights.Length || values.Length != clusters.Length)
        {
            throw new ArgumentException("Needs at least one value, and one weight and one cluster for each.", nameof(values));
        }

        double total = 0, sum = 0;
        for (var i = 0; i < values.Length; i++)
        {
            total += weights[i];
            sum += weights[i] * values[i];
        }

        var mean = sum / total;
        var residuals = new SortedDictionary<int, double>();
        for (var i = 0; i < values.Length; i++)
        {
            residuals[clusters[i]] = residuals.GetValueOrDefault(clusters[i]) + (weights[i] * (values[i] - mean) / total);
        }

        var m = residuals.Count;
        var variance = m == 1 ? 0 : residuals.Values.Sum(e => e * e) * m / (m - 1);
        return new ClusteredMean(mean, Math.Sqrt(variance), m);
    }

    /// <summary>Student's t for a two-sided 95 % interval.</summary>
    /// <param name="degreesOfFreedom">Above zero; may be fractional, or infinite for the normal law.</param>
    public static double StudentFactor95(double degreesOfFreedom) =>
        degreesOfFreedom > 1e6 ? Normal.InvCDF(0, 1, 0.975) : StudentT.InvCDF(0, 1, Math.Max(1, degreesOfFreedom), 0.975);
}
