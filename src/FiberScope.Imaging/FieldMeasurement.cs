using System.Collections.Immutable;
using FiberScope.Imaging.Openness;

namespace FiberScope.Imaging;

/// <summary>All that one field of view gave.</summary>
public sealed record FieldMeasurement
{
    /// <summary>The picture that was measured.</summary>
    public required Micrograph Micrograph { get; init; }

    /// <summary>Whether the field was fit for measuring.</summary>
    public required FieldFitness Fitness { get; init; }

    /// <summary>The centre lines found.</summary>
    public required ImmutableArray<Trace> Traces { get; init; }

    /// <summary>The accepted readings; empty when the field shows no measurable fibre.</summary>
    public required ImmutableArray<PixelReading> Readings { get; init; }

    /// <summary>How many stations along traces were refused, by reason (a short stable name such as <c>one-edge-hidden</c>).</summary>
    public required ImmutableSortedDictionary<string, int> Rejected { get; init; }

    /// <summary>Regions that are not single fibres.</summary>
    public required ImmutableArray<DefectRegion> Defects { get; init; }

    /// <summary>The smallest diameter that this picture's pixel size, blur and noise can show; pixels.</summary>
    public required double DetectionLimitPixels { get; init; }

    /// <summary>The estimated blur of the picture as the sigma of a Gaussian; pixels.</summary>
    public required double BlurPixels { get; init; }

    /// <summary>
    /// The share of the field that fibre takes: the area of cut fibre in a section, the coverage of a layer in transmitted light; null
    /// where it says nothing about solidity. Dimensionless, 0 to 1.
    /// </summary>
    public double? FibreShare { get; init; }

    /// <summary>Openings and evenness of cover; null for sections and transmitted light, and where there is nothing to look between.</summary>
    public FieldOpenness? Openness { get; init; }

    /// <summary>The share of visible edge by direction, see <see cref="EdgeDirections"/>; empty for sections and transmitted light.</summary>
    public ImmutableArray<double> EdgeShares { get; init; } = [];

    /// <summary>Name and version of the algorithms, kept with every result.</summary>
    public required string Algorithm { get; init; }
}
