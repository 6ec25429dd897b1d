using FiberScope.Statistics;
using UnitsNet;

namespace FiberScope.Filtration;

/// <summary>A log-normal aerosol sent against a medium, and how what passes is counted.</summary>
public sealed record ChallengeAerosol
{
    private const double RefractiveIndexOfSalt = 1.544;
    private const double PhotometerMetres = 780e-9;
    private const int Nodes = 61;
    private const double Reach = 4.5;

    /// <summary>Makes an aerosol.</summary>
    /// <param name="countMedian">The median diameter by count; above zero.</param>
    /// <param name="geometricStandardDeviation">GSD; dimensionless, 1 (one size) to 20.</param>
    /// <param name="countedBy">What the instrument sums up.</param>
    /// <exception cref="ArgumentOutOfRangeException">An argument is out of its range.</exception>
    public ChallengeAerosol(Length countMedian, double geometricStandardDeviation, AerosolBasis countedBy)
    {
        Require.Positive(countMedian.Meters, nameof(countMedian));
        CountMedian = countMedian;
        GeometricStandardDeviation = Require.Within(geometricStandardDeviation, 1, 20);
        CountedBy = countedBy;
    }

    /// <summary>The median diameter by count.</summary>
    public Length CountMedian { get; }

    /// <summary>The geometric standard deviation.</summary>
    public double GeometricStandardDeviation { get; }

    /// <summary>What the instrument sums up.</summary>
    public AerosolBasis CountedBy { get; }

    /// <summary>Density of the particles; rock salt (from memory) unless told otherwise.</summary>
    public Density ParticleDensity { get; init; } = Density.FromKilogramsPerCubicMeter(2165);

    /// <summary>Relative permittivity of the particles; rock salt (from memory) unless told otherwise.</summary>
    public double ParticlePermittivity { get; init; } = 6.1;

    /// <summary>Real refractive index at the photometer's light; rock salt's 1.544 unless told otherwise.</summary>
    public double RefractiveIndex { get; init; } = RefractiveIndexOfSalt;

    /// <summary>Sizes and what each counts for; the shares sum to one.</summary>
    /// <remarks>
    /// Even steps in ln d over ±4.5 standard deviations of the weighted distribution; for a smooth curve the trapezoid sum is as good as exact.
    /// </remarks>
    internal (double Metres, double Share)[] Shares()
    {
        var sigma = Math.Log(GeometricStandardDeviation);
        if (sigma < 1e-9)
        {
            return [(CountMedian.Meters, 1)];
        }

        var exponent = CountedBy switch { AerosolBasis.Mass => 3, AerosolBasis.ScatteredLight => 4, _ => 0 };
        var middle = Math.Log(CountMedian.Meters) + (exponent * sigma * sigma);
        var reach = CountedBy == AerosolBasis.ScatteredLight ? Reach + (2 * sigma) : Reach;
        var nodes = Enumerable.Range(0, Nodes).Select(i => reach * ((2.0 * i / (Nodes - 1)) - 1)).ToArray();
        var raw = nodes.Select(z => (Metres: Math.Exp(middle + (sigma * z)), Share: Weight(z, exponent, middle, sigma))).ToArray();
        var sum = raw.Sum(r => r.Share);
        return [.. raw.Select(r => (r.Metres, r.Share / sum))];
    }

    private double Weight(double z, int exponent, double middle, double sigma)
    {
        var shifted = Math.Exp(-0.5 * z * z);
        if (CountedBy != AerosolBasis.ScatteredLight)
        {
            return shifted;
        }

        // Scattered light per particle in place of the d⁴ that the nodes were shifted by.
        var metres = Math.Exp(middle + (sigma * z));
        var light = metres * metres * LightScattering.Efficiency(Math.PI * metres / PhotometerMetres, RefractiveIndex);
        return shifted * light / Math.Pow(metres, exponent);
    }
}
