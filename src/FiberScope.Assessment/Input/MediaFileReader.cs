using System.Collections.Immutable;
using FiberScope.Assessment.Json;
using FiberScope.Fibres;
using FiberScope.Filtration;
using UnitsNet;
using YamlDotNet.RepresentationModel;

namespace FiberScope.Assessment.Input;

/// <summary>Turns the text of a media file into a <see cref="MediaFile"/>, gathering every problem on the way.</summary>
/// <param name="map">The mapping that holds the keys.</param>
/// <param name="folder">The folder that relative paths start from.</param>
internal sealed class MediaFileReader(MapReader map, string folder)
{
    private readonly List<FibreMaterial> _materials = [];

    /// <summary>The materials that the layers name; filled while they are read.</summary>
    public IReadOnlyList<FibreMaterial> Materials => _materials;

    public static MediaFile Read(InputText file, string folder)
    {
        var map = new MapReader(file, file.Root);
        var media = new MediaFileReader(map, folder).Read();
        map.RejectUnknownKeys();
        file.ThrowIfProblems();
        return media!;
    }

    /// <summary>The medium; null where something is wrong, and the file has been told what.</summary>
    public MediaFile? Read()
    {
        var operation = OperatingReader.Read(map);
        var request = RequestReader.Read(map);
        var correlations = map.Choice("correlations", Words.Correlations);
        if (!map.Has("face_velocity") && !map.Has("flow"))
        {
            map.File.Report(map.Line, "face_velocity is missing; add it, such as 'face_velocity: 5.3 cm/s'");
        }

        var layers = Layers();
        var calibration = CalibrationKey.Read(map, folder, correlations)?.Calibration;
        return operation is null
            ? null
            : new MediaFile { Name = map.File.Name, Layers = layers, Operation = operation, Request = request with { Calibration = calibration }, Correlations = correlations };
    }

    /// <summary>The layers that could be read.</summary>
    public ImmutableArray<MediaLayer> Layers()
    {
        if (map.Text("assessment") is { } assessment)
        {
            return Assessed(assessment);
        }

        var items = map.Items("layers");
        if (items.Count == 0)
        {
            map.File.Report(map.Line, "layers is missing or empty; list at least one layer, upstream first, or name an assessment: 'assessment: R-07/assessment.json'");
        }

        return [.. items.Select(Layer).OfType<MediaLayer>()];
    }

    private ImmutableArray<MediaLayer> Assessed(string path)
    {
        if (map.Has("layers"))
        {
            map.Complain("layers", "stands beside 'assessment'; give one of the two");
        }

        try
        {
            return AssessedLayers.Read(Path.Combine(folder, path));
        }
        catch (InputException e)
        {
            map.Complain("assessment", e.Message);
            return [];
        }
    }

    private MediaLayer? Layer(YamlNode item, int index)
    {
        if (map.AsMap(item, "layers") is not { } inner)
        {
            return null;
        }

        var name = inner.Text("name") ?? FormattableString.Invariant($"layer {index + 1}");
        var diameters = FibreDiameterReader.Read(inner, folder);
        var thickness = inner.Positive("thickness", Kinds.Length);
        if (!inner.Has("thickness"))
        {
            inner.File.Report(inner.Line, $"{name}: thickness is missing; add it, such as 'thickness: 310 um'");
        }

        var solidity = SolidityOf(inner, name, thickness?.Value);
        var traits = LayerTraitReader.Read(inner);
        inner.RejectUnknownKeys();
        if (diameters is null || thickness is null || solidity is null)
        {
            return null;
        }

        var known = new LayerUncertainty
        {
            DiameterScale = diameters.ScaleUncertainty,
            IndependentFibres = diameters.IndependentFibres,
            Solidity = solidity.RelativeUncertainty ?? 0,
            Thickness = thickness.RelativeUncertainty ?? 0,
            SolidityByWeighing = inner.Has("basis_weight"),
        };
        var isKnown = known with { SolidityByWeighing = false } != new LayerUncertainty();
        return traits.PutInto(new MediaLayer { Name = name, Diameters = diameters.Distribution, Thickness = thickness.Value, Solidity = solidity.Value, Uncertainty = isKnown ? known : null });
    }

    private Stated<Solidity>? SolidityOf(MapReader map, string name, Length? thickness)
    {
        var told = map.InsideStated("solidity", 0, 1);
        var weight = map.Positive("basis_weight", Kinds.BasisWeight);
        var material = LayerReader.Material(map);
        if (material is not null)
        {
            _materials.Add(material);
        }

        if (map.Has("solidity") == map.Has("basis_weight"))
        {
            map.File.Report(map.Line, $"{name}: give either solidity, or basis_weight with polymer");
        }

        if (map.Has("basis_weight") && !map.Has("polymer"))
        {
            map.Complain("basis_weight", "needs 'polymer' beside it, a name such as pp or a density such as 0.905 g/cm3");
        }

        if (told is not null)
        {
            return new Stated<Solidity>(new Solidity(told.Value), told.RelativeUncertainty);
        }

        if (weight is null || material is null || thickness is null)
        {
            return null;
        }

        var fraction = weight.Value.KilogramsPerSquareMeter / (material.Density.KilogramsPerCubicMeter * thickness.Value.Meters);
        if (fraction < 1)
        {
            return new Stated<Solidity>(new Solidity(fraction), Weighing(weight, material));
        }

        map.Complain("basis_weight", FormattableString.Invariant($"with this thickness and polymer the solidity would be {fraction:G3}; it must be below 1, so one of the three is wrong"));
        return null;
    }

    /// <summary>Of basis weight over density; the thickness has its own. A density counts only beside a weight whose uncertainty was told.</summary>
    private static double? Weighing(Stated<AreaDensity> weight, FibreMaterial material) => weight.RelativeUncertainty is { } w
        ? Math.Min(1, Math.Sqrt((w * w) + (material.RelativeUncertainty * material.RelativeUncertainty)))
        : null;
}
