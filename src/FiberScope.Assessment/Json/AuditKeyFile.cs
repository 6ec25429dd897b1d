using System.Text.Json;
using FiberScope.Assessment.Auditing;
using FiberScope.Assessment.Input;
using FiberScope.Statistics;
using UnitsNet;

namespace FiberScope.Assessment.Json;

/// <summary>Reads the key of an audit back.</summary>
internal static class AuditKeyFile
{
    /// <summary>The key.</summary>
    /// <exception cref="InputException">The file is missing or is no key.</exception>
    public static AuditKey Read(string path) => JsonFile.Read(path, $"the key of an audit, schema {Schemas.AuditKey}", root =>
        root.GetProperty("schema").GetString() == Schemas.AuditKey
            ? new AuditKey(
                Text(root, "source"),
                Text(root, "source_sha256"),
                root.GetProperty("seed").GetInt32(),
                [.. root.GetProperty("crops").EnumerateArray().Select(Crop)])
            : throw new FormatException("Another schema."));

    private static AuditCrop Crop(JsonElement crop) => new(
        Text(crop, "crop"),
        Require.Positive(Number(crop, "um_per_px")),
        new AuditReading(
            Text(crop, "layer"),
            Text(crop, "image"),
            Text(crop, "image_sha256"),
            crop.GetProperty("page").GetInt32(),
            crop.GetProperty("field").GetInt32(),
            crop.GetProperty("trace").GetInt32(),
            Number(crop, "x_px"),
            Number(crop, "y_px"),
            Number(crop, "direction_deg"),
            Length.FromMicrometers(Require.Positive(Number(crop, "diameter_um"))),
            Length.FromMicrometers(Number(crop, "u_um")),
            Length.FromMicrometers(Number(crop, "pixel_size_um"))));

    private static string Text(JsonElement element, string key) => element.GetProperty(key).GetString() ?? "";

    private static double Number(JsonElement element, string key) => element.GetProperty(key).GetDouble();
}
