using System.Collections.Immutable;
using FiberScope.Filtration;
using UnitsNet;

namespace FiberScope.Assessment.Input;

/// <summary>Reads a layer's traits: the same keys in swatch files and media files.</summary>
internal static class LayerTraitReader
{
    /// <summary>The keys read here.</summary>
    public static readonly ImmutableArray<string> Keys =
        ["inhomogeneity_factor", "charge", "fibre_permittivity", "basis_weight_variation", "bonded_area", "pinholes", "openings"];

    /// <summary>The largest share of holes that the model takes.</summary>
    private const double MostOpenArea = 0.99;

    /// <summary>Reads the traits; problems are reported to the file.</summary>
    public static LayerTraits Read(MapReader map)
    {
        var charge = map.Quantity("charge", Kinds.SurfaceCharge);
        if (charge?.Value.CoulombsPerSquareMeter < 0)
        {
            map.Complain("charge", "counts plus and minus alike and cannot be below zero, such as 40 uC/m2");
            charge = null;
        }

        var permittivity = map.Within("fibre_permittivity", 1, 1e4);
        if (map.Has("fibre_permittivity") && !map.Has("charge"))
        {
            map.Complain("fibre_permittivity", "matters only beside 'charge'; add the charge or delete this line");
        }

        return new LayerTraits
        {
            InhomogeneityFactor = map.WithinStated("inhomogeneity_factor", 0.1, 20),
            Charge = charge,
            FibrePermittivity = permittivity ?? new LayerTraits().FibrePermittivity,
            BasisWeightVariation = map.Within("basis_weight_variation", 0, 0.9),
            BondedArea = map.Within("bonded_area", 0, 0.95),
            Holes = Holes(map),
            Openings = map.Map("openings") is { } openings ? Openings(openings) : null,
        };
    }

    private static ImmutableArray<Pinholes> Holes(MapReader map)
    {
        if (!map.Has("pinholes"))
        {
            return default;
        }

        var holes = ImmutableArray.CreateBuilder<Pinholes>();
        foreach (var item in map.Items("pinholes"))
        {
            if (map.AsMap(item, "pinholes") is { } inner && Hole(inner) is { } hole)
            {
                holes.Add(hole);
            }
        }

        if (holes.Sum(h => h.OpenArea) > MostOpenArea)
        {
            map.Complain("pinholes", "together open more than 99 % of the area; one of them is wrong");
        }

        return holes.ToImmutable();
    }

    private static Pinholes? Hole(MapReader map)
    {
        var diameter = map.Positive("diameter", Kinds.Length)?.Value;
        var share = map.Within("open_area", 0, MostOpenArea);
        var count = map.Quantity("count", Kinds.CountPerArea)?.Value;
        map.RejectUnknownKeys();
        if (!map.Has("diameter") || map.Has("open_area") == map.Has("count"))
        {
            map.File.Report(map.Line, "pinholes: give the diameter of each, and their open_area or their count, such as {diameter: 80 um, count: 5 per cm2}");
            return null;
        }

        if (diameter is not { } d || (share is null && count is null))
        {
            return null;
        }

        var open = share ?? count!.Value.InverseSquareMeters * Math.PI / 4 * d.Meters * d.Meters;
        if (open is >= 0 and <= MostOpenArea)
        {
            return new Pinholes(d, open);
        }

        map.Complain("count", FormattableString.Invariant($"so many holes of that diameter would open {open:P0} of the area; it must be 0 to 99 %"));
        return null;
    }

    private static MatOpenings? Openings(MapReader map)
    {
        var median = map.Positive("median", Kinds.Length);
        var gsd = map.Within("gsd", 1.01, 20);
        map.RejectUnknownKeys();
        if (!map.Has("median") || !map.Has("gsd"))
        {
            map.File.Report(map.Line, "openings: median and gsd go together, such as {median: 12 um, gsd: 1.6}; the median is by number");
        }

        return median is null || gsd is null ? null : new MatOpenings(median.Value, gsd.Value);
    }
}
