using System.Text;
using FiberScope.Cli;

namespace FiberScope.Acceptance.Tests;

public sealed class MachineOutputTests(SmallFields fields) : IClassFixture<SmallFields>
{
    private const string Media = """
        layers:
          - {fibre_diameter: {median: 1.8 um, gsd: 1.6}, solidity: 0.08, thickness: 310 um}
          - {fibre_diameter: 17 um, basis_weight: 40 g/m2, polymer: pp, thickness: 420 um}
        face_velocity: 5.3 cm/s
        """;

    [Fact]
    public async Task A_measurement_keeps_its_schema()
    {
        var run = await CommandRun.OfAsync("measure", fields.Field(1), fields.Field(2), "--pixel-size", "200 nm", "--json", "-");
        Assert.Equal((ExitCode.Done, ""), (run.Code, run.Error));
        var measurement = Schema.Kept(run.Output.Span);
        Assert.Equal(2, measurement["fields"]!.AsArray().Count);
        Assert.Equal(0.2, measurement["fields"]![0]!["pixel_size_um"]!.GetValue<double>(), 1e-9);
    }

    [Fact]
    public async Task A_prediction_keeps_its_schema()
    {
        var run = await CommandRun.WithInputAsync(Media, "predict", "-", "--json", "-");
        Assert.Equal((ExitCode.Done, ""), (run.Code, run.Error));
        var curve = Schema.Kept(run.Output.Span)["curve"]!.AsArray();
        Assert.All(curve, point => Assert.Equal(1, point!["by_mechanism"]!.AsObject().Sum(m => m.Value!.GetValue<double>()), 1e-4));
    }

    [Fact]
    public async Task A_prediction_can_start_from_a_measurement()
    {
        using var workspace = new Workspace();
        var measured = await CommandRun.OfAsync("measure", fields.Field(1), "--pixel-size", "200 nm", "--json", workspace.PathTo("m.json"));
        Assert.Equal(ExitCode.Done, measured.Code);
        var media = workspace.Write("media.yaml", Media.Replace("{median: 1.8 um, gsd: 1.6}", "{measurement: m.json}", StringComparison.Ordinal));
        var run = await CommandRun.OfAsync("predict", media, "--json", "-");
        Assert.Equal((ExitCode.Done, ""), (run.Code, run.Error));
        Schema.Kept(run.Output.Span);
    }

    [Fact]
    public async Task An_assessment_keeps_its_schema_and_comes_with_readings_and_report()
    {
        using var workspace = new Workspace();
        var swatch = workspace.Write("swatch.yaml", Swatch());
        workspace.Write("grade.yaml", "grade: Demo\nlimits:\n  mean_diameter: {at_most: 20 um}\n  pressure_drop: {at_most: 1000 Pa}");
        var run = await CommandRun.OfAsync("assess", swatch);
        Assert.Equal((ExitCode.Done, ""), (run.Code, run.Error));
        Assert.Contains("length-weighted", run.Out, StringComparison.Ordinal);
        Assert.DoesNotContain('\u001b', run.Out);
        var assessment = Schema.Kept(await BytesAsync(workspace, "assessment.json"));
        Assert.Equal("2031-05-17T08:30:00+00:00", assessment["recipe"]!["made_at"]!.GetValue<string>());
        Assert.Equal("Demo", assessment["verdict"]!["grade"]!.GetValue<string>());
        Assert.StartsWith("<!doctype html>", Encoding.UTF8.GetString(await BytesAsync(workspace, "report.html")), StringComparison.OrdinalIgnoreCase);
        var lines = (await File.ReadAllLinesAsync(workspace.PathTo("swatch-assessment", "readings.csv"), TestContext.Current.CancellationToken)).Length;
        Assert.Equal(assessment["layers"]![0]!["measurement"]!["fields"]!.AsArray().Sum(f => f!["readings"]!.AsArray().Count) + 1, lines);
    }

    [Fact]
    public async Task Masks_have_the_size_of_their_image()
    {
        using var workspace = new Workspace();
        var run = await CommandRun.OfAsync("measure", fields.Field(1), fields.Field(2), "--pixel-size", "200 nm", "--json", workspace.PathTo("m.json"), "--masks", workspace.PathTo("masks"));
        Assert.Equal(ExitCode.Done, run.Code);
        foreach (var name in new[] { "field-01.defects.png", "field-01.traces.png", "field-02.defects.png", "field-02.traces.png" })
        {
            var bytes = await File.ReadAllBytesAsync(workspace.PathTo("masks", name), TestContext.Current.CancellationToken);
            // Width and height are the first two big-endian numbers of a PNG's IHDR chunk (ISO/IEC 15948, section 11.2.2).
            Assert.Equal((512, 400), (System.Buffers.Binary.BinaryPrimitives.ReadInt32BigEndian(bytes.AsSpan(16)), System.Buffers.Binary.BinaryPrimitives.ReadInt32BigEndian(bytes.AsSpan(20))));
        }
    }

    [Fact]
    public async Task An_image_can_come_through_standard_input()
    {
        var bytes = await File.ReadAllBytesAsync(fields.Field(1), TestContext.Current.CancellationToken);
        var run = await CommandRun.OfAsync(bytes, TestContext.Current.CancellationToken, "measure", "-", "--pixel-size", "200 nm", "--json", "-");
        Assert.Equal((ExitCode.Done, ""), (run.Code, run.Error));
        Assert.Equal("standard input", Schema.Kept(run.Output.Span)["fields"]![0]!["image"]!.GetValue<string>());
    }

    [Theory]
    [InlineData("at_most: 20 um", ExitCode.Done)]
    [InlineData("at_least: 20 um", ExitCode.VerdictFail)]
    public async Task The_exit_code_tells_the_verdict_when_asked(string limit, int code)
    {
        using var workspace = new Workspace();
        workspace.Write("grade.yaml", $"grade: Demo\nlimits:\n  mean_diameter: {{{limit}}}");
        var run = await CommandRun.OfAsync("assess", workspace.Write("swatch.yaml", Swatch()), "--fail-on-verdict");
        Assert.Equal(code, run.Code);
    }

    [Fact]
    public async Task The_same_seed_gives_the_same_specimen()
    {
        using var workspace = new Workspace();
        foreach (var folder in new[] { "a", "b" })
        {
            await CommandRun.OfAsync("specimen", "thin-fibres", "--seed", "3", "--out", workspace.PathTo(folder), "--figures-only");
        }

        Assert.Equal(
            await File.ReadAllBytesAsync(workspace.PathTo("a", "field-01.png"), TestContext.Current.CancellationToken),
            await File.ReadAllBytesAsync(workspace.PathTo("b", "field-01.png"), TestContext.Current.CancellationToken));
    }

    private string Swatch() => $"""
        lot: L-1
        images:
          - files: {fields.Folder}/*.png
            pixel_size: 200 nm
        basis_weight: 25 g/m2
        thickness: 310 um
        polymer: pp
        face_velocity: 5.3 cm/s
        grade: grade.yaml
        """;

    private static Task<byte[]> BytesAsync(Workspace workspace, string name) =>
        File.ReadAllBytesAsync(workspace.PathTo("swatch-assessment", name), TestContext.Current.CancellationToken);
}
