using System.Security.Cryptography;
using System.Text.Encodings.Web;
using System.Text.Json;
using System.Text.Json.Nodes;
using FiberScope.Specimens;
using FiberScope.Specimens.Files;
using FiberScope.Statistics;

namespace FiberScope.Validation.Samples;

/// <summary>One sample roll: a manifest that names its pictures, their recipes, seeds and hashes.</summary>
internal static class SampleRoll
{
    private static readonly JsonSerializerOptions Indented = new() { WriteIndented = true, NewLine = "\n", Encoder = JavaScriptEncoder.UnsafeRelaxedJsonEscaping };

    /// <summary>Writes every picture of the roll, a truth file beside each recipe, and the hashes.</summary>
    public static int Write(string manifestPath)
    {
        var folder = Path.GetDirectoryName(manifestPath)!;
        var manifest = JsonNode.Parse(File.ReadAllText(manifestPath))!.AsObject();
        var specimens = new List<(string Recipe, string File, Specimen Specimen)>();
        foreach (var image in manifest["images"]!.AsArray().Select(i => i!.AsObject()))
        {
            var specimen = Make(folder, image);
            var bytes = Encode(specimen);
            var file = (string)image["file"]!;
            Directory.CreateDirectory(Path.GetDirectoryName(Path.Combine(folder, file))!);
            File.WriteAllBytes(Path.Combine(folder, file), bytes);
            image["pixel_size_um"] = specimen.Recipe.PixelSize.Micrometers;
            image["width_px"] = specimen.Width;
            image["height_px"] = specimen.Height;
            image["sha256"] = Hash(bytes);
            image["pixels_sha256"] = Hash(specimen.Pixels);
            specimens.Add(((string)image["recipe"]!, file, specimen));
        }

        File.WriteAllText(manifestPath, manifest.ToJsonString(Indented) + "\n");
        foreach (var layer in specimens.GroupBy(s => s.Recipe, StringComparer.Ordinal))
        {
            var path = Path.Combine(folder, Path.GetDirectoryName(layer.Key)!, "truth.json");
            File.WriteAllText(path, Truth([.. layer.Select(l => (l.File, l.Specimen))]).ToJsonString(Indented) + "\n");
        }

        return 0;
    }

    /// <summary>Compares what is kept with what the recipes make; the number of pictures that differ.</summary>
    /// <remarks>A JPEG's bytes may differ in a last bit on another processor; the pixels before compression may not.</remarks>
    public static int Compare(string manifestPath, TextWriter log)
    {
        var folder = Path.GetDirectoryName(manifestPath)!;
        var wrong = 0;
        foreach (var image in JsonNode.Parse(File.ReadAllText(manifestPath))!["images"]!.AsArray().Select(i => i!.AsObject()))
        {
            var path = Path.Combine(folder, (string)image["file"]!);
            var specimen = Make(folder, image);
            var kept = File.Exists(path) && Hash(File.ReadAllBytes(path)) == (string)image["sha256"]!;
            var same = Hash(specimen.Pixels) == (string)image["pixels_sha256"]!;
            var encoded = Hash(Encode(specimen)) == (string)image["sha256"]!;
            wrong += kept && same ? 0 : 1;
            log.WriteLine($"{Path.GetRelativePath(Repository.Root, path)}: file {(kept ? "as listed" : "CHANGED OR MISSING")}, pixels {(same ? "the same" : "DIFFERENT")}, compressed bytes {(encoded ? "the same" : "different")}");
        }

        return wrong;
    }

    private static Specimen Make(string folder, JsonObject image) =>
        VirtualSpecimen.Make(RecipeFile.Read(File.ReadAllText(Path.Combine(folder, (string)image["recipe"]!))), (ulong)image["seed"]!);

    private static byte[] Encode(Specimen specimen)
    {
        using var stream = new MemoryStream();
        SpecimenWriter.WritePicture(specimen, stream, SpecimenFormat.Jpeg);
        return stream.ToArray();
    }

    private static string Hash(ReadOnlySpan<byte> bytes) => Convert.ToHexStringLower(SHA256.HashData(bytes));

    private static JsonObject Truth((string File, Specimen Specimen)[] fields)
    {
        var recipe = fields[0].Specimen.Recipe;
        var pixel = recipe.PixelSize.Micrometers;
        return new JsonObject
        {
            ["schema"] = "fiberscope/sample-truth/1",
            ["note"] = "Invented: virtual specimens. Diameters are length-weighted over all visible fibre length.",
            ["solidity"] = recipe.Mat.Solidity,
            ["basis_weight_g_m2"] = Math.Round(recipe.Mat.BasisWeight.GramsPerSquareMeter, 3),
            ["thickness_um"] = Math.Round(recipe.Mat.Thickness.Micrometers, 3),
            ["visible"] = Figures([.. fields.SelectMany(f => f.Specimen.Truth.Stations)], pixel),
            ["both_edges"] = Figures([.. fields.SelectMany(f => f.Specimen.Truth.Stations).Where(s => s.BothEdges)], pixel),
            ["fields"] = new JsonArray([.. fields.Select(f => new JsonObject
            {
                ["file"] = f.File,
                ["visible"] = Figures([.. f.Specimen.Truth.Stations], pixel),
                ["principal_direction_deg"] = Math.Round(f.Specimen.Truth.Orientation.PrincipalDirection.Degrees, 1),
                ["orientation_order"] = Math.Round(f.Specimen.Truth.Orientation.Order, 4),
            })]),
        };
    }

    private static JsonObject Figures(TrueStation[] stations, double pixel)
    {
        var sample = new WeightedSample([.. stations.Select(s => s.Diameter * pixel)], [.. stations.Select(s => s.Length * pixel)]);
        return new JsonObject
        {
            ["length_um"] = Math.Round(sample.TotalWeight, 1),
            ["mean_um"] = Math.Round(sample.Mean, 4),
            ["sd_um"] = Math.Round(sample.StandardDeviation, 4),
            ["d10_um"] = Math.Round(sample.Quantile(0.1), 4),
            ["d50_um"] = Math.Round(sample.Quantile(0.5), 4),
            ["d90_um"] = Math.Round(sample.Quantile(0.9), 4),
        };
    }
}
