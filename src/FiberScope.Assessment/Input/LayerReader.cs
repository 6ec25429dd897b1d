using System.Collections.Immutable;
using FiberScope.Fibres;
using YamlDotNet.RepresentationModel;

namespace FiberScope.Assessment.Input;

/// <summary>Reads what a swatch file tells of one layer.</summary>
internal static class LayerReader
{
    /// <summary>The keys that belong to a layer and stand at the top only when there is a single one.</summary>
    public static readonly ImmutableArray<string> Keys = ["images", "imaging", "basis_weight", "thickness", "polymer", "solidity", .. LayerTraitReader.Keys];

    /// <summary>Reads a layer; problems are reported to the file.</summary>
    /// <param name="map">The mapping that holds the layer's keys.</param>
    /// <param name="name">What people call it; empty for the only layer.</param>
    /// <param name="forForecast">Whether a forecast is wanted, which needs solidity and thickness.</param>
    public static SwatchLayer Read(MapReader map, string name, bool forForecast)
    {
        var solidity = map.InsideStated("solidity", 0, 1);
        var layer = new SwatchLayer
        {
            Name = name,
            Imaging = map.Choice("imaging", Words.ImagingModes) ?? Imaging.ImagingMode.SecondaryElectron,
            Images = Images(map),
            BasisWeight = map.Positive("basis_weight", Kinds.BasisWeight),
            Thickness = map.Positive("thickness", Kinds.Length),
            Material = Material(map),
            Solidity = solidity?.Value,
            SolidityUncertainty = solidity?.RelativeUncertainty,
            Traits = LayerTraitReader.Read(map),
        };
        CheckWeighing(map);
        CheckSolidity(map, layer);
        if (forForecast)
        {
            CheckForecast(map, layer);
        }

        return layer;
    }

    /// <summary>The material behind <c>polymer:</c>, a short name of the table or a density; null when absent or wrong.</summary>
    public static FibreMaterial? Material(MapReader map)
    {
        if (map.Text("polymer") is not { } text)
        {
            return null;
        }

        if (Polymer.Find(text) is { } polymer)
        {
            return FibreMaterial.Of(polymer);
        }

        if (!text.Any(char.IsAsciiDigit) || QuantityText.Read(text, Kinds.Density, out _) is not null && char.IsLetter(text.TrimStart()[0]))
        {
            var nearest = Spelling.Nearest(text, Polymer.Known.Select(p => p.Key));
            map.Complain("polymer", $"'{text}' is not in the polymer table{(nearest is null ? "" : $"; did you mean '{nearest}'?")}; known: {string.Join(", ", Polymer.Known.Select(p => p.Key))}; or give a density such as 0.905 g/cm3");
            return null;
        }

        return map.Positive("polymer", Kinds.Density) is { } density ? FibreMaterial.Of(density) : null;
    }

    /// <summary>Reports weighing that is incomplete: weight, thickness and density go together.</summary>
    public static void CheckWeighing(MapReader map)
    {
        if (!map.Has("basis_weight"))
        {
            return;
        }

        if (!map.Has("thickness"))
        {
            map.Complain("basis_weight", "needs 'thickness' beside it: solidity = basis weight / (fibre density x thickness)");
        }

        if (!map.Has("polymer"))
        {
            map.Complain("basis_weight", "needs 'polymer' beside it, a name such as pp or a density such as 0.905 g/cm3");
        }
    }

    private static void CheckSolidity(MapReader map, SwatchLayer layer)
    {
        if (layer is not { BasisWeight: { } weight, Thickness: { } thickness, Material: { } material })
        {
            return;
        }

        var solidity = weight.Value.KilogramsPerSquareMeter / (material.Density.KilogramsPerCubicMeter * thickness.Value.Meters);
        if (solidity >= 1)
        {
            map.Complain("basis_weight", FormattableString.Invariant($"with this thickness and polymer the solidity would be {solidity:G3}; it must be below 1, so one of the three is wrong"));
        }
    }

    private static void CheckForecast(MapReader map, SwatchLayer layer)
    {
        var byImage = layer.Imaging is not Imaging.ImagingMode.SecondaryElectron || layer.Images.Any(g => g.Imaging is not (null or Imaging.ImagingMode.SecondaryElectron));
        if (!map.Has("basis_weight") && !map.Has("solidity") && !map.Has("thickness") && !byImage)
        {
            map.Complain("images", "a forecast (face_velocity) needs the layer's solidity: add basis_weight with thickness and polymer, solidity with thickness, or cross-section images with thickness; or delete face_velocity to measure diameters only");
        }
        else if (!map.Has("thickness") && !map.Has("basis_weight"))
        {
            map.Complain("images", "a forecast (face_velocity) needs the layer's 'thickness'; or delete face_velocity to measure diameters only");
        }
    }

    private static ImmutableArray<ImageGroup> Images(MapReader map)
    {
        var items = map.Items("images");
        if (items.Count == 0)
        {
            map.Complain("images", "missing; name the micrographs, such as 'images: fields/*.tif'");
        }

        var plain = items.OfType<YamlScalarNode>().ToArray();
        var groups = ImmutableArray.CreateBuilder<ImageGroup>();
        if (plain.Length > 0)
        {
            groups.Add(new ImageGroup { Patterns = [.. plain.Select(p => p.Value ?? "")], Line = (int)plain[0].Start.Line });
        }

        foreach (var item in items.Where(i => i is not YamlScalarNode))
        {
            if (map.AsMap(item, "images") is { } group && Group(group) is { } read)
            {
                groups.Add(read);
            }
        }

        return groups.ToImmutable();
    }

    private static ImageGroup? Group(MapReader map)
    {
        var patterns = map.Items("files");
        if (patterns.Count == 0 || patterns.Any(p => p is not YamlScalarNode { Value.Length: > 0 }))
        {
            map.Complain("files", "name one path or glob, or a list of them, such as 'files: fields/*.tif'");
        }

        var pixelSize = map.Positive("pixel_size", Kinds.Length);
        var scaleBar = map.Positive("scale_bar", Kinds.Length);
        var imaging = map.Choice("imaging", Words.ImagingModes);
        map.RejectUnknownKeys();
        return new ImageGroup
        {
            Imaging = imaging,
            Patterns = [.. patterns.OfType<YamlScalarNode>().Select(p => p.Value!)],
            PixelSize = pixelSize,
            ScaleBar = scaleBar?.Value,
            Line = map.Line,
        };
    }
}
