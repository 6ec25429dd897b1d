using System.Text.Json;
using FiberScope.Assessment.Input;
using FiberScope.Fibres;
using UnitsNet;

namespace FiberScope.Assessment.Json;

/// <summary>Reads diameter readings back from measurement and assessment files.</summary>
public static class MeasurementFile
{
    /// <summary>The readings of a measurement file, or of one layer of an assessment file; fields that were left out give none.</summary>
    /// <param name="path">The JSON file.</param>
    /// <param name="layer">The layer's name in an assessment file; null for its only layer.</param>
    /// <exception cref="InputException">The file is missing, is no such file, or has no readings.</exception>
    public static IReadOnlyList<DiameterReading> Readings(string path, string? layer)
    {
        try
        {
            using var stream = File.OpenRead(path);
            using var document = JsonDocument.Parse(stream);
            var readings = Of(Measurement(document.RootElement, path, layer)).ToArray();
            return readings.Length > 0 ? readings : throw new InputException($"{path}: holds no readings");
        }
        catch (Exception e) when (e is IOException or UnauthorizedAccessException)
        {
            throw new InputException($"{path}: {(File.Exists(path) ? "cannot be read" : "no such file")}", e);
        }
        catch (Exception e) when (e is JsonException or KeyNotFoundException or InvalidOperationException or FormatException)
        {
            throw new InputException($"{path}: is not a measurement file of schema {Schemas.Measurement} or {Schemas.Assessment}", e);
        }
    }

    private static JsonElement Measurement(JsonElement root, string path, string? layer)
    {
        var schema = root.GetProperty("schema").GetString();
        switch (schema)
        {
            case Schemas.Measurement:
                return root;
            case Schemas.Assessment:
                var layers = root.GetProperty("layers").EnumerateArray().ToArray();
                var found = layer is null
                    ? layers.Length == 1 ? layers : throw new InputException($"{path}: has several layers; add 'layer: NAME', one of: {Names(layers)}")
                    : [.. layers.Where(l => l.GetProperty("name").GetString() == layer)];
                return found.Length > 0 ? found[0].GetProperty("measurement") : throw new InputException($"{path}: has no layer '{layer}'; it has: {Names(layers)}");
            default:
                throw new InputException($"{path}: has the schema '{schema}'; {Schemas.Measurement} or {Schemas.Assessment} is wanted");
        }
    }

    private static string Names(JsonElement[] layers) => string.Join(", ", layers.Select(l => $"'{l.GetProperty("name").GetString()}'"));

    private static IEnumerable<DiameterReading> Of(JsonElement measurement)
    {
        var number = 0;
        foreach (var field in measurement.GetProperty("fields").EnumerateArray())
        {
            number++;
            if (field.TryGetProperty("left_out_because", out var reason) && reason.ValueKind == JsonValueKind.String)
            {
                continue;
            }

            foreach (var reading in field.GetProperty("readings").EnumerateArray())
            {
                yield return new DiameterReading(
                    Length.FromMicrometers(reading.GetProperty("diameter_um").GetDouble()),
                    Length.FromMicrometers(reading.GetProperty("u_um").GetDouble()),
                    Length.FromMicrometers(reading.GetProperty("length_um").GetDouble()),
                    reading.GetProperty("trace").GetInt32(),
                    number);
            }
        }
    }
}
