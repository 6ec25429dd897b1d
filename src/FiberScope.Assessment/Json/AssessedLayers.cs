using System.Collections.Immutable;
using System.Text.Json;
using FiberScope.Assessment.Input;
using FiberScope.Fibres;
using FiberScope.Filtration;
using UnitsNet;

namespace FiberScope.Assessment.Json;

/// <summary>Reads the layers of an assessment file back as the filtration model takes them.</summary>
internal static class AssessedLayers
{
    /// <summary>The layers, upstream first.</summary>
    /// <exception cref="InputException">The file is missing, is no assessment, or a layer has no solidity or thickness.</exception>
    public static ImmutableArray<MediaLayer> Read(string path) => JsonFile.Read(path, $"an assessment of schema {Schemas.Assessment}", root =>
        root.GetProperty("schema").GetString() == Schemas.Assessment
            ? root.GetProperty("layers").EnumerateArray().Select(layer => Layer(layer, path)).ToImmutableArray()
            : throw new FormatException("Another schema."));

    private static MediaLayer Layer(JsonElement layer, string path)
    {
        var name = layer.GetProperty("name").GetString() ?? "";
        var measurement = layer.GetProperty("measurement");
        var solidity = measurement.GetProperty("solidity");
        var thickness = layer.GetProperty("thickness_um");
        if (solidity.ValueKind == JsonValueKind.Null || thickness.ValueKind == JsonValueKind.Null)
        {
            throw new InputException($"{path}: layer '{name}' has no {(thickness.ValueKind == JsonValueKind.Null ? "thickness" : "solidity")}; tell it in the swatch file and assess it again");
        }

        var diameters = MeasurementFile.Diameters(measurement, path);
        var value = solidity.GetProperty("value").GetDouble();
        return new MediaLayer
        {
            Name = name,
            Diameters = diameters.Distribution,
            Solidity = new Solidity(value),
            Thickness = Length.FromMicrometers(thickness.GetDouble()),
            Uncertainty = new LayerUncertainty
            {
                DiameterScale = diameters.ScaleUncertainty,
                IndependentFibres = diameters.IndependentFibres,
                Solidity = Math.Min(1, solidity.GetProperty("u").GetDouble() / value),
            },
        };
    }
}
