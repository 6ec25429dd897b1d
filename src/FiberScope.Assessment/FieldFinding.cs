using FiberScope.Fibres;
using FiberScope.Imaging;

namespace FiberScope.Assessment;

/// <summary>One field of a layer: what was measured in it and whether it counts.</summary>
public sealed record FieldFinding
{
    /// <summary>The field's number within the swatch, from 1; readings in the pooled survey carry it.</summary>
    public required int Number { get; init; }

    /// <summary>The file as the user named it, with the page of a multi-page file: <c>images/a.tif</c>, <c>stack.tif#2</c>.</summary>
    public required string Name { get; init; }

    /// <summary>Everything measured: picture, traces, readings, fitness, defects.</summary>
    public required FieldMeasurement Measurement { get; init; }

    /// <summary>The length-weighted figures of this field alone; null without readings.</summary>
    public required DiameterStatistics? LengthWeighted { get; init; }

    /// <summary>The number-weighted figures of this field alone; null without readings.</summary>
    public required DiameterStatistics? NumberWeighted { get; init; }

    /// <summary>The relative standard uncertainty of its pixel size; dimensionless.</summary>
    public double PixelSizeUncertainty { get; init; } = 0.01;

    /// <summary>Why the field's readings are left out of the pooled figures, one sentence; null when they are in.</summary>
    public required string? LeftOutBecause { get; init; }

    /// <summary>Whether the field's readings are in the pooled figures.</summary>
    public bool IsIncluded => LeftOutBecause is null;
}
