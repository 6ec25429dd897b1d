using FiberScope.Statistics;
using MathNet.Numerics.Distributions;
using UnitsNet;

namespace FiberScope.Fibres;

/// <summary>One log-normal part of a diameter distribution.</summary>
public sealed record LogNormalComponent
{
    /// <summary>Makes the part.</summary>
    /// <param name="fraction">Its share of the fibre length; dimensionless, in (0, 1].</param>
    /// <param name="median">Its length-weighted median diameter; above zero.</param>
    /// <param name="geometricStandardDeviation">Its GSD; dimensionless, 1 or above.</param>
    /// <exception cref="ArgumentOutOfRangeException">An argument is out of its range.</exception>
    public LogNormalComponent(double fraction, Length median, double geometricStandardDeviation)
    {
        Fraction = Require.Within(Require.Positive(fraction), 0, 1);
        Require.Positive(median.Meters, nameof(median));
        Median = median;
        GeometricStandardDeviation = Require.Within(geometricStandardDeviation, 1, 20);
    }

    /// <summary>The share of the fibre length; dimensionless, in (0, 1].</summary>
    public double Fraction { get; }

    /// <summary>The length-weighted median diameter.</summary>
    public Length Median { get; }

    /// <summary>The geometric standard deviation; dimensionless, 1 or above.</summary>
    public double GeometricStandardDeviation { get; }

    /// <summary>Slices of equal length share, each at its root-mean-square diameter.</summary>
    /// <remarks>
    /// The partial second moment of a log-normal between two quantiles is that of a normal shifted by 2σ:
    /// E[d²; z₁..z₂] = m² exp(2σ²) (Φ(z₂ − 2σ) − Φ(z₁ − 2σ)), an identity of the log-normal distribution.
    /// </remarks>
    internal IEnumerable<DiameterClass> Slices(int count)
    {
        var sigma = Math.Log(GeometricStandardDeviation);
        if (sigma == 0)
        {
            return [new DiameterClass(Median, Fraction)];
        }

        var scale = Median.Meters * Math.Exp(sigma * sigma) * Math.Sqrt(count);
        double Shifted(int edge) => edge == 0 ? 0 : edge == count ? 1 : Normal.CDF(0, 1, Normal.InvCDF(0, 1, (double)edge / count) - (2 * sigma));
        return Enumerable.Range(0, count).Select(i =>
            new DiameterClass(Length.FromMeters(scale * Math.Sqrt(Shifted(i + 1) - Shifted(i))), Fraction / count));
    }
}
