using FiberScope.Statistics;
using UnitsNet;

namespace FiberScope.Filtration;

/// <summary>The openings between the fibres of a layer, as measured on it; log-normal by number.</summary>
public sealed record MatOpenings
{
    /// <summary>Makes the openings.</summary>
    /// <param name="median">The median opening by number; above zero.</param>
    /// <param name="geometricStandardDeviation">Their GSD; dimensionless, 1.01 to 20.</param>
    /// <exception cref="ArgumentOutOfRangeException">An argument is out of its range.</exception>
    public MatOpenings(Length median, double geometricStandardDeviation)
    {
        Require.Positive(median.Meters, nameof(median));
        Median = median;
        GeometricStandardDeviation = Require.Within(geometricStandardDeviation, 1.01, 20);
    }

    /// <summary>The median opening by number.</summary>
    public Length Median { get; }

    /// <summary>The geometric standard deviation.</summary>
    public double GeometricStandardDeviation { get; }
}
