using System.Collections.Immutable;
using System.Security.Cryptography;
using System.Text.Json;
using FiberScope.Assessment.Input;
using FiberScope.Assessment.Json;
using UnitsNet;

namespace FiberScope.Assessment.Auditing;

/// <summary>The readings of an assessment or measurement file, to draw from.</summary>
/// <param name="Name">The file as the user named it.</param>
/// <param name="Sha256">SHA-256 of the file.</param>
/// <param name="SwatchFile">The swatch file that an assessment names; null in a measurement.</param>
/// <param name="Readings">Every reading of the fields that count.</param>
public sealed record AuditSource(string Name, string Sha256, string? SwatchFile, ImmutableArray<AuditReading> Readings)
{
    /// <summary>Reads a file.</summary>
    /// <exception cref="InputException">The file is missing, is none of the two kinds, or has no readings.</exception>
    public static AuditSource Read(string path) => JsonFile.Read(path, $"an assessment or a measurement of schema {Schemas.Assessment} or {Schemas.Measurement}", root =>
    {
        var readings = Layers(root).SelectMany(l => Fields(l.Name, l.Measurement)).ToArray();
        var numbered = readings.GroupBy(r => (r.Layer, r.Field)).SelectMany((g, i) => g.Select(r => r with { Field = i + 1 })).ToImmutableArray();
        var swatch = root.TryGetProperty("recipe", out var recipe) ? recipe.GetProperty("swatch_file").GetString() : null;
        return numbered.IsEmpty
            ? throw new InputException($"{path}: holds no readings")
            : new AuditSource(path, Convert.ToHexStringLower(SHA256.HashData(File.ReadAllBytes(path))), swatch, numbered);
    });

    private static IEnumerable<(string Name, JsonElement Measurement)> Layers(JsonElement root) => root.GetProperty("schema").GetString() switch
    {
        Schemas.Measurement => [("", root)],
        Schemas.Assessment => root.GetProperty("layers").EnumerateArray().Select(l => (l.GetProperty("name").GetString() ?? "", l.GetProperty("measurement"))),
        _ => throw new FormatException("Another schema."),
    };

    private static IEnumerable<AuditReading> Fields(string layer, JsonElement measurement)
    {
        var number = 0;
        foreach (var field in measurement.GetProperty("fields").EnumerateArray())
        {
            number++;
            if (field.GetProperty("left_out_because").ValueKind == JsonValueKind.String)
            {
                continue;
            }

            foreach (var r in field.GetProperty("readings").EnumerateArray())
            {
                yield return new AuditReading(
                    layer,
                    field.GetProperty("image").GetString() ?? "",
                    field.GetProperty("sha256").GetString() ?? "",
                    field.GetProperty("page").GetInt32(),
                    number,
                    r.GetProperty("trace").GetInt32(),
                    r.GetProperty("x_px").GetDouble(),
                    r.GetProperty("y_px").GetDouble(),
                    r.GetProperty("direction_deg").GetDouble(),
                    Length.FromMicrometers(r.GetProperty("diameter_um").GetDouble()),
                    Length.FromMicrometers(r.GetProperty("u_um").GetDouble()),
                    Length.FromMicrometers(field.GetProperty("pixel_size_um").GetDouble()));
            }
        }
    }
}
