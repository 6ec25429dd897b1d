using System.Text.Json.Nodes;
using FiberScope.Cli;
using FiberScope.TestKit;

namespace FiberScope.Acceptance.Tests;

/// <summary>Machine output keeps its published schema, and the schemas are strict enough to notice when it does not.</summary>
public sealed class SchemaTests(SmallFields fields) : IClassFixture<SmallFields>
{
    private const string Media = """
        layers:
          - {fibre_diameter: {median: 1.8 um ± 3 %, gsd: 1.6}, solidity: 0.08, thickness: 310 um ± 8 um}
        face_velocity: 5.3 cm/s
        particles: [0.05 um, 0.3 um, 1 um, 3 um]
        """;

    [Theory]
    [InlineData("kirsch-stechkina-1978")]
    [InlineData("lee-liu-1982")]
    [InlineData("hinds-1999")]
    [InlineData("cell")]
    [InlineData("cell-mat")]
    public async Task A_prediction_keeps_its_schema_with_every_correlation_set(string set)
    {
        var run = await CommandRun.WithInputAsync(Media, "predict", "-", "--json", "-", "--correlations", set);
        Assert.Equal((ExitCode.Done, ""), (run.Code, run.Error));
        var prediction = Schema.Kept(run.Output.Span);
        Assert.Equal(set, prediction["correlations"]!.GetValue<string>());
        Assert.Equal([0.05, 0.3, 1, 3], prediction["curve"]!.AsArray().Select(p => Math.Round(p!["particle_um"]!.GetValue<double>(), 9)));
    }

    [Theory]
    [InlineData("png")]
    [InlineData("tiff")]
    [InlineData("jpeg")]
    public async Task A_measurement_keeps_its_schema_from_every_format(string format)
    {
        using var workspace = new Workspace();
        Assert.Equal(ExitCode.Done, (await CommandRun.OfAsync("specimen", fields.Recipe, "--format", format, "--out", workspace.PathTo("made"), "--figures-only")).Code);
        var image = Directory.GetFiles(workspace.PathTo("made"), "field-01.*").Single(f => !f.EndsWith(".json", StringComparison.Ordinal));
        var run = await CommandRun.OfAsync("measure", image, "--pixel-size", "200 nm", "--json", "-");
        Assert.Equal((ExitCode.Done, ""), (run.Code, run.Error));
        var field = Assert.Single(Schema.Kept(run.Output.Span)["fields"]!.AsArray())!;
        Assert.NotEmpty(field["readings"]!.AsArray());
    }

    [Fact]
    public async Task A_field_without_fibres_keeps_the_schema_and_does_not_sink_the_others()
    {
        using var workspace = new Workspace();
        var bare = workspace.Write("bare.bmp", Speckled(400, 300));
        var run = await CommandRun.OfAsync("measure", fields.Field(1), bare, "--pixel-size", "200 nm", "--json", "-");
        Assert.Equal(ExitCode.Done, run.Code);
        var measured = Schema.Kept(run.Output.Span)["fields"]!.AsArray();
        Assert.Null(measured[0]!["left_out_because"]);
        Assert.False(string.IsNullOrWhiteSpace(measured[1]!["left_out_because"]?.GetValue<string>()));
    }

    [Fact]
    public async Task An_assessment_of_two_layers_with_rig_results_and_many_limits_keeps_its_schema()
    {
        using var workspace = new Workspace();
        workspace.Write("grade.yaml", """
            grade: Demo
            limits:
              mean_diameter: {at_most: 40 um}
              diameter_cv: {at_most: 0.9}
              solidity: {at_most: 0.3}
              defect_area: {at_most: 10 %}
              pressure_drop: {at_most: 300 Pa}
              mpps: {at_least: 0.01 um}
              penetration: {particle: 0.3 um, at_most: 99 %}
              air_permeability: {at: 125 Pa, at_least: 1 mm/s}
            """);
        var run = await CommandRun.OfAsync("assess", workspace.Write("swatch.yaml", TwoLayers()));
        Assert.Equal((ExitCode.Done, ""), (run.Code, run.Error));
        var assessment = Schema.Kept(await File.ReadAllBytesAsync(workspace.PathTo("swatch-assessment", "assessment.json"), TestContext.Current.CancellationToken));
        Assert.Equal(["first", "second"], assessment["layers"]!.AsArray().Select(l => l!["name"]!.GetValue<string>()));
        Assert.Equal(2, assessment["measured"]!.AsArray().Count);
        Assert.Equal(8, assessment["verdict"]!["limits"]!.AsArray().Count);
    }

    [Fact]
    public async Task The_schemas_notice_what_is_missing_strange_or_of_the_wrong_kind()
    {
        var run = await CommandRun.WithInputAsync(Media, "predict", "-", "--json", "-");
        void Refused(Action<JsonNode> spoil)
        {
            var document = JsonNode.Parse(run.Output.Span)!;
            spoil(document);
            Assert.False(Schema.Keeps(document, "prediction-1", out _));
        }

        Assert.True(Schema.Keeps(JsonNode.Parse(run.Output.Span)!, "prediction-1", out _));
        Refused(d => d.AsObject().Remove("mpps_um"));
        Refused(d => d["remark"] = "new");
        Refused(d => d["pressure_drop_pa"] = "41");
        Refused(d => d["penetration_at_mpps"] = 1.2);
        Refused(d => d["schema"] = "fiberscope/prediction/2");
        Refused(d => d["curve"]!.AsArray()[0]!["band"] = new JsonArray(0.1));
    }

    [Fact]
    public void Every_schema_names_itself_and_is_documented()
    {
        var formats = File.ReadAllText(Repository.PathTo("docs", "formats.md"));
        Assert.All(Directory.GetFiles(Repository.PathTo("docs", "schemas"), "*.schema.json"), path =>
        {
            var schema = JsonNode.Parse(File.ReadAllText(path))!;
            var name = schema["properties"]!["schema"]!["const"]!.GetValue<string>();
            Assert.Equal(Path.GetFileName(path), name["fiberscope/".Length..].Replace('/', '-') + ".schema.json");
            Assert.StartsWith("fiberscope/", name, StringComparison.Ordinal);
            Assert.Contains(name, formats, StringComparison.Ordinal);
        });
    }

    [Fact]
    public async Task The_media_example_of_the_documentation_works()
    {
        var example = ExampleAfter("## media.yaml");
        var run = await CommandRun.WithInputAsync(example, "predict", "-", "--json", "-");
        Assert.Equal((ExitCode.Done, ""), (run.Code, run.Error));
        Schema.Kept(run.Output.Span);
    }

    private string TwoLayers() => $$"""
        lot: L-2
        layers:
          - name: first
            images: [{files: {{fields.Field(1)}}, pixel_size: 200 nm}]
            basis_weight: 25 g/m2
            thickness: 310 um
            polymer: pp
          - name: second
            images: [{files: {{fields.Field(2)}}, pixel_size: 200 nm}]
            basis_weight: 40 g/m2
            thickness: 420 um
            polymer: pp
        face_velocity: 5.3 cm/s
        measured:
          - pressure_drop: 11 Pa
          - {particle: 0.3 um, penetration: 92 %}
        grade: grade.yaml
        """;

    private static string ExampleAfter(string heading)
    {
        const string Opening = "```yaml\n";
        var page = File.ReadAllText(Repository.PathTo("docs", "formats.md"));
        var from = page.IndexOf(heading, StringComparison.Ordinal);
        Assert.True(from >= 0, $"docs/formats.md has no '{heading}'");
        var start = page.IndexOf(Opening, from, StringComparison.Ordinal) + Opening.Length;
        return page[start..page.IndexOf("```", start, StringComparison.Ordinal)];
    }

    /// <summary>Grain without any fibre: every pixel of its own grey, from a fixed linear congruential sequence.</summary>
    private static byte[] Speckled(int width, int height)
    {
        var bytes = Bitmaps.Flat(width, height, 0);
        var state = 12345u;
        for (var i = bytes.Length - (width * 3 * height); i < bytes.Length; i += 3)
        {
            // Constants of Knuth (1981), The Art of Computer Programming 2, section 3.3.4 (from memory).
            state = unchecked((state * 1664525u) + 1013904223u);
            bytes.AsSpan(i, 3).Fill((byte)(90 + (state >> 27)));
        }

        return bytes;
    }
}
