using UnitsNet;

namespace FiberScope.Fibres;

/// <summary>The figures that describe a distribution of fibre diameters, and how it was weighted.</summary>
public sealed record DiameterStatistics
{
    /// <summary>What counts the same in these figures.</summary>
    public required Weighting Weighting { get; init; }

    /// <summary>The arithmetic mean.</summary>
    public required Length Mean { get; init; }

    /// <summary>The standard deviation of the distribution itself (weights sum to one; no n − 1), zero or above.</summary>
    public required Length StandardDeviation { get; init; }

    /// <summary>The geometric mean.</summary>
    public required Length GeometricMean { get; init; }

    /// <summary>The geometric standard deviation; dimensionless, 1 or above.</summary>
    public required double GeometricStandardDeviation { get; init; }

    /// <summary>The diameter below which a tenth lies.</summary>
    public required Length D10 { get; init; }

    /// <summary>The median.</summary>
    public required Length D50 { get; init; }

    /// <summary>The diameter below which nine tenths lie.</summary>
    public required Length D90 { get; init; }

    /// <summary>The coefficient of variation, SD / mean; dimensionless, zero or above.</summary>
    public double CoefficientOfVariation => StandardDeviation / Mean;
}
