using System.Text.Json.Nodes;
using FiberScope.Cli;

namespace FiberScope.Acceptance.Tests;

/// <summary>Solidity told by pictures alone, through the front door, beside what the virtual mats were made with.</summary>
public sealed class ImageSolidityTests
{
    [Fact]
    public async Task Sections_tell_the_solidity_in_a_measurement()
    {
        using var workspace = new Workspace();
        var truth = await MakeAsync(workspace, "cross-sections", 900, 700, seed: 4100, fields: 2);
        var run = await CommandRun.OfAsync("measure", workspace.PathTo("cross-sections", "*.png"), "--pixel-size", "400 nm", "--imaging", "cross-section", "--json", "-");
        Assert.Equal(ExitCode.Done, run.Code);
        var solidity = Schema.Kept(run.Output.Span)["solidity"]!;
        Assert.Equal(truth, solidity["value"]!.GetValue<double>(), Math.Max(0.005, 0.03 * truth));
        Assert.Equal("cross-section", solidity["routes"]![0]!["route"]!.GetValue<string>());
    }

    [Fact]
    public async Task Sections_beside_top_views_give_the_layer_its_solidity_and_a_forecast()
    {
        using var workspace = new Workspace();
        var truth = await MakeAsync(workspace, "cross-sections", 900, 700, seed: 4200, fields: 2);
        await MakeAsync(workspace, "spun-bonded", 700, 500, seed: 4300, fields: 1);
        var swatch = workspace.Write("swatch.yaml", """
            images:
              - {files: spun-bonded/*.png, pixel_size: 600 nm}
              - {files: cross-sections/*.png, pixel_size: 400 nm, imaging: cross-section}
            thickness: 310 um
            face_velocity: 5.3 cm/s
            """);
        var assessment = await AssessAsync(workspace, swatch);
        var layer = assessment["layers"]![0]!["measurement"]!;
        Assert.Equal(truth, layer["solidity"]!["value"]!.GetValue<double>(), Math.Max(0.005, 0.03 * truth));
        Assert.NotNull(assessment["prediction"]);
        var fields = layer["fields"]!.AsArray();
        Assert.Null(fields[0]!["left_out_because"]);
        Assert.All(fields.Skip(1), f => Assert.Contains("solidity only", f!["left_out_because"]!.GetValue<string>(), StringComparison.Ordinal));
        Assert.InRange(layer["pooled"]!["length_weighted"]!["mean_um"]!.GetValue<double>(), 14, 21);
    }

    [Fact]
    public async Task A_thick_mat_seen_from_above_gets_a_wide_band_and_says_so()
    {
        using var workspace = new Workspace();
        await MakeAsync(workspace, "spun-bonded", 700, 500, seed: 4300, fields: 1);
        var swatch = workspace.Write("swatch.yaml", "images:\n  - {files: spun-bonded/*.png, pixel_size: 600 nm}\nthickness: 310 um\nface_velocity: 5.3 cm/s\n");
        var assessment = await AssessAsync(workspace, swatch);
        var solidity = assessment["layers"]![0]!["measurement"]!["solidity"]!;
        Assert.Equal("top-view", solidity["routes"]![0]!["route"]!.GetValue<string>());
        Assert.True(solidity["ci95"]![1]!.GetValue<double>() > 10 * solidity["ci95"]![0]!.GetValue<double>());
        Assert.Contains(assessment["caveats"]!.AsArray(), c => c!["code"]!.GetValue<string>() == "solidity-not-measured");
    }

    private static async Task<JsonNode> AssessAsync(Workspace workspace, string swatch)
    {
        var run = await CommandRun.OfAsync("assess", swatch, "--out", workspace.PathTo("out"), "--include-unfit");
        Assert.True(run.Code == ExitCode.Done, run.Error);
        return Schema.Kept(await File.ReadAllBytesAsync(workspace.PathTo("out", "assessment.json")));
    }

    /// <summary>Makes fields of a family at a size of the test's own; their mean true solidity comes back.</summary>
    private static async Task<double> MakeAsync(Workspace workspace, string family, int width, int height, int seed, int fields)
    {
        Assert.Equal(ExitCode.Done, (await CommandRun.OfAsync("specimen", family, "--out", workspace.PathTo("family-" + family), "--figures-only")).Code);
        var recipe = JsonNode.Parse(await File.ReadAllTextAsync(workspace.PathTo("family-" + family, "recipe.json")))!;
        (recipe["width_pixels"], recipe["height_pixels"]) = (width, height);
        var made = await CommandRun.OfAsync("specimen", workspace.Write(family + ".json", recipe.ToJsonString()), "--seed", FormattableString.Invariant($"{seed}"), "--fields", FormattableString.Invariant($"{fields}"), "--out", workspace.PathTo(family), "--figures-only");
        Assert.Equal(ExitCode.Done, made.Code);
        return Directory.GetFiles(workspace.PathTo(family), "*.truth.json").Average(f => JsonNode.Parse(File.ReadAllText(f))!["solidity"]!.GetValue<double>());
    }
}
