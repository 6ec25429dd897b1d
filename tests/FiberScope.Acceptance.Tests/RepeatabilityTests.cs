using System.Diagnostics;
using System.Text.Json.Nodes;
using FiberScope.Cli;

namespace FiberScope.Acceptance.Tests;

/// <summary>The same input gives the same bytes, whenever and on however many processors it runs.</summary>
public sealed class RepeatabilityTests(SmallFields fields) : IClassFixture<SmallFields>
{
    private const string Media = """
        layers:
          - {fibre_diameter: {median: 1.8 um ± 3 %, gsd: 1.6}, solidity: 0.08, thickness: 310 um ± 8 um}
        face_velocity: 5.3 cm/s
        """;

    [Fact]
    public async Task Measuring_twice_gives_the_same_readings_and_masks()
    {
        using var workspace = new Workspace();
        await MeasureAsync(workspace.PathTo("one"));
        await MeasureAsync(workspace.PathTo("two"));
        AssertSameFiles(workspace.PathTo("one"), workspace.PathTo("two"), 7);
    }

    [Fact]
    public async Task Predicting_twice_gives_the_same_bands()
    {
        var first = await CommandRun.WithInputAsync(Media, "predict", "-", "--json", "-");
        var second = await CommandRun.WithInputAsync(Media, "predict", "-", "--json", "-");
        Assert.Equal(ExitCode.Done, first.Code);
        Assert.Equal(first.Output.ToArray(), second.Output.ToArray());
    }

    [Fact]
    public async Task Assessing_twice_prints_and_writes_the_same()
    {
        using var workspace = new Workspace();
        var swatch = workspace.Write("swatch.yaml", $"""
            images: [{"{"}files: {fields.Folder}/*.png, pixel_size: 200 nm{"}"}]
            basis_weight: 25 g/m2
            thickness: 310 um
            polymer: pp
            face_velocity: 5.3 cm/s
            """);
        var first = await CommandRun.OfAsync("assess", swatch, "--out", workspace.PathTo("one"));
        var second = await CommandRun.OfAsync("assess", swatch, "--out", workspace.PathTo("two"));
        Assert.Equal((ExitCode.Done, ExitCode.Done), (first.Code, second.Code));
        Assert.Equal(first.Out.Replace(workspace.PathTo("one"), "", StringComparison.Ordinal), second.Out.Replace(workspace.PathTo("two"), "", StringComparison.Ordinal));
        AssertSameFiles(workspace.PathTo("one"), workspace.PathTo("two"), 3);
    }

    [Fact]
    public async Task The_seed_reaches_the_interval_and_nothing_else()
    {
        var first = JsonNode.Parse((await MeasuredAsync("1")).Span)!;
        var second = JsonNode.Parse((await MeasuredAsync("2")).Span)!;
        Assert.Equal(first["fields"]!.ToJsonString(), second["fields"]!.ToJsonString());
        Assert.Equal(Pooled(first, "mean_um"), Pooled(second, "mean_um"));
        Assert.NotEqual(first["pooled"]!.ToJsonString(), second["pooled"]!.ToJsonString());
    }

    [Fact]
    public async Task The_number_of_processors_does_not_matter()
    {
        using var workspace = new Workspace();
        foreach (var processors in new[] { "1", "3" })
        {
            await RunAsProcessAsync(processors, "measure", fields.Field(1), fields.Field(2), "--pixel-size", "200 nm", "--json", workspace.PathTo(processors + ".json"));
        }

        Assert.Equal(
            await File.ReadAllBytesAsync(workspace.PathTo("1.json"), TestContext.Current.CancellationToken),
            await File.ReadAllBytesAsync(workspace.PathTo("3.json"), TestContext.Current.CancellationToken));
    }

    private static string Pooled(JsonNode measurement, string figure) => measurement["pooled"]!["length_weighted"]![figure]!.ToJsonString();

    private async Task<ReadOnlyMemory<byte>> MeasuredAsync(string seed)
    {
        var run = await CommandRun.OfAsync("measure", fields.Field(1), fields.Field(2), "--pixel-size", "200 nm", "--json", "-", "--seed", seed);
        Assert.Equal((ExitCode.Done, ""), (run.Code, run.Error));
        return run.Output;
    }

    private async Task MeasureAsync(string folder)
    {
        var run = await CommandRun.OfAsync("measure", fields.Field(1), fields.Field(2), fields.Field(3), "--pixel-size", "200 nm", "--json", Path.Combine(folder, "m.json"), "--masks", folder);
        Assert.Equal(ExitCode.Done, run.Code);
    }

    private static void AssertSameFiles(string one, string other, int count)
    {
        var names = Directory.GetFiles(one).Select(Path.GetFileName).Order(StringComparer.Ordinal).ToArray();
        Assert.Equal(count, names.Length);
        Assert.Equal(names, Directory.GetFiles(other).Select(Path.GetFileName).Order(StringComparer.Ordinal));
        Assert.All(names, name => Assert.Equal(File.ReadAllBytes(Path.Combine(one, name!)), File.ReadAllBytes(Path.Combine(other, name!))));
    }

    /// <summary>Runs the built program on its own, as a user does, with a given number of processors for .NET's pool.</summary>
    private static async Task RunAsProcessAsync(string processors, params string[] arguments)
    {
        var program = typeof(FiberScopeProgram).Assembly.Location;
        var start = new ProcessStartInfo("dotnet", [program, .. arguments]) { UseShellExecute = false, RedirectStandardError = true, RedirectStandardOutput = true };
        start.Environment["DOTNET_PROCESSOR_COUNT"] = processors;
        using var process = Process.Start(start)!;
        var error = process.StandardError.ReadToEndAsync(TestContext.Current.CancellationToken);
        await process.StandardOutput.ReadToEndAsync(TestContext.Current.CancellationToken);
        await process.WaitForExitAsync(TestContext.Current.CancellationToken);
        Assert.True(process.ExitCode == ExitCode.Done, await error);
    }
}
