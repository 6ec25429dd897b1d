using System.Collections.Immutable;
using UnitsNet;

namespace FiberScope.Fibres;

/// <summary>Readings of several magnifications, brought to one footing.</summary>
/// <param name="Readings">The readings kept, their represented lengths scaled to one common area.</param>
/// <param name="OutsideEveryRange">The share of the pooled length that no magnification shows without favour; dimensionless, 0 to 1.</param>
/// <param name="LeftOut">How many readings were left out because another magnification shows their diameter better.</param>
public sealed record MagnificationPool(ImmutableArray<DiameterReading> Readings, double OutsideEveryRange, int LeftOut)
{
    /// <summary>Pools groups of fields by visible length per area.</summary>
    /// <remarks>
    /// What a mat has of a diameter is its visible length per area, seen by every group whose valid range holds that diameter;
    /// so a reading's length counts as length × (area of all) / (area of the groups that can see it). Readings outside their own
    /// group's range are left out where another group can see them, and kept with their own group where none can.
    /// </remarks>
    /// <param name="groups">The groups, at least one.</param>
    /// <exception cref="ArgumentException">There are no groups, or an area is not above zero.</exception>
    public static MagnificationPool Of(IEnumerable<MagnificationGroup> groups)
    {
        ImmutableArray<MagnificationGroup> all = [.. groups];
        if (all.IsEmpty || all.Any(g => !(g.SeenArea.SquareMeters > 0)))
        {
            throw new ArgumentException("Needs at least one group of fields, each with an area above zero.", nameof(groups));
        }

        var total = all.Sum(g => g.SeenArea.SquareMeters);
        var kept = ImmutableArray.CreateBuilder<DiameterReading>();
        double length = 0, outside = 0;
        var leftOut = 0;
        foreach (var group in all)
        {
            foreach (var reading in group.Readings)
            {
                var seeing = all.Where(g => g.ValidDiameters.Contains(reading.Diameter)).Sum(g => g.SeenArea.SquareMeters);
                if (seeing > 0 && !group.ValidDiameters.Contains(reading.Diameter))
                {
                    leftOut++;
                    continue;
                }

                var scaled = reading with { RepresentedLength = reading.RepresentedLength * (total / (seeing > 0 ? seeing : group.SeenArea.SquareMeters)) };
                kept.Add(scaled);
                length += scaled.RepresentedLength.Meters;
                outside += seeing > 0 ? 0 : scaled.RepresentedLength.Meters;
            }
        }

        return new MagnificationPool(kept.ToImmutable(), length > 0 ? outside / length : 0, leftOut);
    }
}
