using System.Collections.Immutable;
using FiberScope.Fibres;
using FiberScope.Filtration;
using UnitsNet;
using YamlDotNet.RepresentationModel;

namespace FiberScope.Assessment.Input;

/// <summary>Turns the text of a media file into a <see cref="MediaFile"/>, gathering every problem on the way.</summary>
internal sealed class MediaFileReader
{
    private readonly InputText _file;
    private readonly string _folder;

    private MediaFileReader(InputText file, string folder)
    {
        _file = file;
        _folder = folder;
    }

    public static MediaFile Read(InputText file, string folder) => new MediaFileReader(file, folder).Read();

    private MediaFile Read()
    {
        var map = new MapReader(_file, _file.Root);
        var operation = OperatingReader.Read(map);
        var correlations = map.Choice("correlations", Words.Correlations);
        if (!map.Has("face_velocity") && !map.Has("flow"))
        {
            _file.Report(1, "face_velocity is missing; add it, such as 'face_velocity: 5.3 cm/s'");
        }

        var items = map.Items("layers");
        if (items.Count == 0)
        {
            _file.Report(1, "layers is missing or empty; list at least one layer, upstream first");
        }

        MediaLayer[] layers = [.. items.Select((item, i) => Layer(map, item, i)).OfType<MediaLayer>()];
        map.RejectUnknownKeys();
        _file.ThrowIfProblems();
        return new MediaFile { Name = _file.Name, Layers = [.. layers], Operation = operation!, Correlations = correlations };
    }

    private MediaLayer? Layer(MapReader map, YamlNode item, int index)
    {
        if (map.AsMap(item, "layers") is not { } inner)
        {
            return null;
        }

        var name = inner.Text("name") ?? FormattableString.Invariant($"layer {index + 1}");
        var diameters = Diameters(inner);
        var thickness = inner.Positive("thickness", Kinds.Length);
        if (!inner.Has("thickness"))
        {
            _file.Report(inner.Line, $"{name}: thickness is missing; add it, such as 'thickness: 310 um'");
        }

        var solidity = SolidityOf(inner, name, thickness?.Value);
        inner.RejectUnknownKeys();
        return diameters is null || thickness is null || solidity is null
            ? null
            : new MediaLayer { Name = name, Diameters = diameters, Thickness = thickness.Value, Solidity = solidity };
    }

    private Solidity? SolidityOf(MapReader map, string name, Length? thickness)
    {
        var told = map.Inside("solidity", 0, 1);
        var weight = map.Positive("basis_weight", Kinds.BasisWeight);
        var material = LayerReader.Material(map);
        if (map.Has("solidity") == map.Has("basis_weight"))
        {
            _file.Report(map.Line, $"{name}: give either solidity, or basis_weight with polymer");
        }

        if (map.Has("basis_weight") && !map.Has("polymer"))
        {
            map.Complain("basis_weight", "needs 'polymer' beside it, a name such as pp or a density such as 0.905 g/cm3");
        }

        if (told is not null)
        {
            return new Solidity(told.Value);
        }

        if (weight is null || material is null || thickness is null)
        {
            return null;
        }

        var fraction = weight.Value.KilogramsPerSquareMeter / (material.Density.KilogramsPerCubicMeter * thickness.Value.Meters);
        if (fraction < 1)
        {
            return new Solidity(fraction);
        }

        map.Complain("basis_weight", FormattableString.Invariant($"with this thickness and polymer the solidity would be {fraction:G3}; it must be below 1, so one of the three is wrong"));
        return null;
    }

    private DiameterDistribution? Diameters(MapReader map)
    {
        switch (map.Find("fibre_diameter"))
        {
            case null:
                _file.Report(map.Line, "fibre_diameter is missing; add it, such as 'fibre_diameter: {median: 1.8 um, gsd: 1.6}'");
                return null;
            case YamlScalarNode:
                return map.Positive("fibre_diameter", Kinds.Length) is { } one ? DiameterDistribution.OfOneDiameter(one.Value) : null;
            default:
                return map.Map("fibre_diameter") is { } inner ? Distribution(inner) : null;
        }
    }

    private DiameterDistribution? Distribution(MapReader map)
    {
        var measurement = map.Text("measurement");
        var layer = map.Text("layer");
        var components = map.Items("components");
        var single = map.Has("median") || map.Has("gsd");
        if ((measurement is not null ? 1 : 0) + (components.Count > 0 ? 1 : 0) + (single ? 1 : 0) != 1)
        {
            _file.Report(map.Line, "fibre_diameter: give one of: a diameter; median with gsd; components; measurement");
            return null;
        }

        var result = measurement is not null ? Measured(map, measurement, layer)
            : single ? Component(map, fraction: 1) is { } one ? DiameterDistribution.Mixture([one]) : null
            : Mixture(map, components);
        map.RejectUnknownKeys();
        return result;
    }

    private DiameterDistribution? Measured(MapReader map, string path, string? layer)
    {
        try
        {
            return DiameterDistribution.FromReadings(Json.MeasurementFile.Readings(Path.Combine(_folder, path), layer));
        }
        catch (InputException e)
        {
            map.Complain("measurement", e.Message);
            return null;
        }
    }

    private static DiameterDistribution? Mixture(MapReader map, IReadOnlyList<YamlNode> items)
    {
        var parts = ImmutableArray.CreateBuilder<LogNormalComponent>();
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

        var sum = parts.Sum(p => p.Fraction);
        if (parts.Count == items.Count && Math.Abs(sum - 1) > 0.01)
        {
            map.Complain("components", FormattableString.Invariant($"the fractions sum to {sum:G4}; they must sum to 1"));
        }

        return parts.Count == items.Count ? DiameterDistribution.Mixture(parts) : null;
    }

    private static LogNormalComponent? Component(MapReader map, double fraction)
    {
        var median = map.Positive("median", Kinds.Length);
        var gsd = map.Within("gsd", 1, 20);
        if (!map.Has("median") || !map.Has("gsd"))
        {
            map.File.Report(map.Line, "median and gsd go together, such as {median: 1.8 um, gsd: 1.6}; the median is length-weighted");
        }

        return median is null || gsd is null ? null : new LogNormalComponent(fraction, median.Value, gsd.Value);
    }
}
