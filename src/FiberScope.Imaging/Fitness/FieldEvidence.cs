using System.Collections.Immutable;

namespace FiberScope.Imaging.Fitness;

/// <summary>What the measurement found that also tells about the field's fitness; all of it optional.</summary>
public sealed record FieldEvidence
{
    /// <summary>Nothing was measured: the picture alone speaks.</summary>
    public static FieldEvidence None { get; } = new();

    /// <summary>The readings; empty when unknown.</summary>
    public ImmutableArray<PixelReading> Readings { get; init; } = [];

    /// <summary>The defects; empty when unknown.</summary>
    public ImmutableArray<DefectRegion> Defects { get; init; } = [];

    /// <summary>The length-weighted median diameter of the readings; pixels; null without readings.</summary>
    internal double? MedianDiameter
    {
        get
        {
            var total = Readings.Sum(reading => reading.RepresentedLength);
            var sum = 0.0;
            foreach (var reading in Readings.OrderBy(reading => reading.Diameter))
            {
                sum += reading.RepresentedLength;
                if (sum >= total / 2)
                {
                    return reading.Diameter;
                }
            }

            return null;
        }
    }
}
