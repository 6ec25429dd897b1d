using FiberScope.Assessment.Json;
using FiberScope.Fibres;
using YamlDotNet.RepresentationModel;

namespace FiberScope.Assessment.Input;

/// <summary>Reads <c>fibre_diameter:</c>, told as one diameter, log-normal, a mixture or a measurement.</summary>
internal static class FibreDiameterReader
{
    private const double MostFibres = 1e7;

    /// <summary>The diameters; null, with a complaint, when absent or wrong.</summary>
    /// <param name="map">The layer's mapping.</param>
    /// <param name="folder">The folder that relative paths start from.</param>
    public static FibreDiameters? Read(MapReader map, string folder)
    {
        switch (map.Find("fibre_diameter"))
        {
            case null:
                map.File.Report(map.Line, "fibre_diameter is missing; add it, such as 'fibre_diameter: {median: 1.8 um, gsd: 1.6}'");
                return null;
            case YamlScalarNode:
                return map.Positive("fibre_diameter", Kinds.Length) is { } one
                    ? new FibreDiameters(DiameterDistribution.OfOneDiameter(one.Value), one.RelativeUncertainty ?? 0, null)
                    : null;
            default:
                return map.Map("fibre_diameter") is { } inner ? Distribution(inner, folder) : null;
        }
    }

    private static FibreDiameters? Distribution(MapReader map, string folder)
    {
        var measurement = map.Text("measurement");
        var layer = map.Text("layer");
        var fibres = map.Within("fibres", 2, MostFibres);
        var components = map.Items("components");
        var single = map.Has("median") || map.Has("gsd");
        if ((measurement is not null ? 1 : 0) + (components.Count > 0 ? 1 : 0) + (single ? 1 : 0) != 1)
        {
            map.File.Report(map.Line, "fibre_diameter: give one of: a diameter; median with gsd; components; measurement");
            return null;
        }

        if (measurement is not null && map.Has("fibres"))
        {
            map.Complain("fibres", "is told by the measurement; delete this line");
        }

        var result = measurement is not null ? Measured(map, Path.Combine(folder, measurement), layer)
            : single ? Component(map, fraction: 1) is var (part, scale) ? new FibreDiameters(DiameterDistribution.Mixture([part]), scale, fibres) : null
            : Mixture(map, components, fibres);
        map.RejectUnknownKeys();
        return result;
    }

    private static FibreDiameters? Measured(MapReader map, string path, string? layer)
    {
        try
        {
            return MeasurementFile.Diameters(path, layer);
        }
        catch (InputException e)
        {
            map.Complain("measurement", e.Message);
            return null;
        }
    }

    /// <summary>Uncertain medians count as wrong together, each with its share of the length: one scale made them all.</summary>
    private static FibreDiameters? Mixture(MapReader map, IReadOnlyList<YamlNode> items, double? fibres)
    {
        var parts = new List<(LogNormalComponent Part, double Scale)>();
        foreach (var item in items)
        {
            if (map.AsMap(item, "components") is not { } inner)
            {
                continue;
            }

            var fraction = inner.Within("fraction", 0, 1);
            if (fraction is null or 0)
            {
                inner.File.Report(inner.Line, "components: each needs a 'fraction' of the fibre length above 0, such as 0.3");
            }

            if (Component(inner, fraction is > 0 ? fraction.Value : 1) is { } part)
            {
                parts.Add(part);
            }

            inner.RejectUnknownKeys();
        }

        var sum = parts.Sum(p => p.Part.Fraction);
        if (parts.Count == items.Count && Math.Abs(sum - 1) > 0.01)
        {
            map.Complain("components", FormattableString.Invariant($"the fractions sum to {sum:G4}; they must sum to 1"));
        }

        return parts.Count == items.Count
            ? new FibreDiameters(DiameterDistribution.Mixture(parts.Select(p => p.Part)), Math.Min(1, parts.Sum(p => p.Part.Fraction * p.Scale)), fibres)
            : null;
    }

    private static (LogNormalComponent Part, double Scale)? Component(MapReader map, double fraction)
    {
        var median = map.Positive("median", Kinds.Length);
        var gsd = map.Within("gsd", 1, 20);
        if (!map.Has("median") || !map.Has("gsd"))
        {
            map.File.Report(map.Line, "median and gsd go together, such as {median: 1.8 um, gsd: 1.6}; the median is length-weighted");
        }

        return median is null || gsd is null ? null : (new LogNormalComponent(fraction, median.Value, gsd.Value), median.RelativeUncertainty ?? 0);
    }
}
