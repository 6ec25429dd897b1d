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
    public static IReadOnlyList<DiameterReading> Readings(string path, string? layer) => Read(path, layer, measurement => Readings(measurement, path));

    /// <summary>The diameters behind the readings, with the uncertainties that the file tells.</summary>
    /// <inheritdoc cref="Readings(string, string?)" path="/param|/exception"/>
    internal static FibreDiameters Diameters(string path, string? layer) => Read(path, layer, measurement => Diameters(measurement, path));

    /// <summary>The diameters of a measurement, with the uncertainties that it tells.</summary>
    internal static FibreDiameters Diameters(JsonElement measurement, string path)
    {
        var readings = Readings(measurement, path);
        var pooled = measurement.GetProperty("pooled");
        var mean = pooled.GetProperty("length_weighted").GetProperty("mean_um").GetDouble();

        // All of the budget moves the diameters together but the fibres' own spread, which the draws of a forecast make anew.
        var squares = pooled.GetProperty("budget").EnumerateArray().Where(p => p.GetProperty("name").GetString() != "fibres")
            .Sum(p => Math.Pow(p.GetProperty("u_um").GetDouble() / mean, 2));
        var lengths = readings.GroupBy(r => (r.Field, r.Fibre)).Select(g => g.Sum(r => r.RepresentedLength.Meters)).ToArray();
        var effective = Math.Pow(lengths.Sum(), 2) / lengths.Sum(l => l * l);
        return new FibreDiameters(DiameterDistribution.FromReadings(readings), Math.Min(1, Math.Sqrt(squares)), effective);
    }

    private static DiameterReading[] Readings(JsonElement measurement, string path)
    {
        var readings = Of(measurement).ToArray();
        return readings.Length > 0 ? readings : throw new InputException($"{path}: holds no readings");
    }

    private static T Read<T>(string path, string? layer, Func<JsonElement, T> use) => JsonFile.Read(
        path, $"a measurement file of schema {Schemas.Measurement} or {Schemas.Assessment}", root => use(Measurement(root, path, layer)));

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
