using System.Collections.Immutable;
using UnitsNet;

namespace FiberScope.Fibres;

/// <summary>The openings between the foremost fibres, each by the largest circle that fits.</summary>
/// <remarks>Seen from above and only as deep as the foremost fibres: not the pore size that a bubble-point test finds.</remarks>
public sealed record OpeningSummary
{
    /// <summary>Diameters of the inscribed circles, smallest first.</summary>
    public required ImmutableArray<Length> Diameters { get; init; }

    /// <summary>How many openings were looked at.</summary>
    public int Count => Diameters.Length;

    /// <summary>The diameter that half of the open area lies below, each circle counting by its area; zero when there is none.</summary>
    public required Length AreaMedian { get; init; }

    /// <summary>The largest inscribed circle; zero when there is none.</summary>
    public required Length Largest { get; init; }

    /// <summary>The median diameter, every circle counting once; zero when there is none.</summary>
    public required Length Median { get; init; }

    /// <summary>The geometric standard deviation of the diameters, every circle counting once; 1 when there are none.</summary>
    public required double GeometricStandardDeviation { get; init; }

    /// <summary>The standard uncertainty of <see cref="Largest"/> as a typical largest one of so many fields, from field to field; zero with fewer than two.</summary>
    public required Length LargestUncertainty { get; init; }

    /// <summary>Openings far larger than the rest of this picture's would make likely.</summary>
    public required int Pinholes { get; init; }

    /// <summary>The share of the field that is open between the foremost fibres; dimensionless, 0 to 1.</summary>
    public required double OpenShare { get; init; }
}
