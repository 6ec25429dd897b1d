using System.Globalization;
using System.Text.Json.Nodes;
using FiberScope.Cli;

namespace FiberScope.Acceptance.Tests;

/// <summary><c>audit</c>: the machine against a person's eye. The person is played by arithmetic on the key.</summary>
public sealed class AuditTests(AuditTests.Drawn drawn) : IClassFixture<AuditTests.Drawn>
{
    [Fact]
    public async Task A_draw_writes_crops_a_table_to_fill_and_a_key()
    {
        var key = Schema.Kept(await File.ReadAllBytesAsync(drawn.PathTo("a", "audit-key.json"), TestContext.Current.CancellationToken));
        Assert.Equal(24, key["crops"]!.AsArray().Count);
        Assert.Equal(24, Directory.GetFiles(drawn.PathTo("a"), "crop-*.png").Length);
        var lines = await File.ReadAllLinesAsync(drawn.PathTo("a", "by-eye.csv"), TestContext.Current.CancellationToken);
        Assert.Equal("crop,um_per_px,diameter_px,diameter_um,note", lines[0]);
        Assert.All(lines.Skip(1), line => Assert.EndsWith(",,,", line, StringComparison.Ordinal));

        // Blind: the readings do not stand in the order of their diameters, and thin and thick are both there.
        double[] diameters = [.. key["crops"]!.AsArray().Select(c => Number(c!["diameter_um"]))];
        Assert.NotEqual(diameters.Order(), diameters);
        Assert.True(diameters.Max() > diameters.Min());
    }

    [Fact]
    public async Task The_same_seed_draws_the_same_crops_and_another_seed_others()
    {
        await DrawAsync("again", "7");
        await DrawAsync("other", "8");
        foreach (var name in new[] { "by-eye.csv", "audit-key.json", "crop-001.png", "crop-024.png" })
        {
            Assert.Equal(File.ReadAllBytes(drawn.PathTo("a", name)), File.ReadAllBytes(drawn.PathTo("again", name)));
        }

        Assert.NotEqual(File.ReadAllBytes(drawn.PathTo("a", "audit-key.json")), File.ReadAllBytes(drawn.PathTo("other", "audit-key.json")));
    }

    /// <summary>A person who reads everything 10 % small makes the machine read 1 / 0.9 − 1 = 11.1 % more, on a line through the origin.</summary>
    [Theory]
    [InlineData(',')]
    [InlineData(';')]
    public async Task A_known_bias_is_found(char separator)
    {
        var folder = Copied("bias" + (int)separator);
        Fill(folder, (_, um) => 0.9 * um, separator);
        var run = await CommandRun.OfAsync("audit", "compare", Path.Combine(folder, "by-eye.csv"));
        Assert.Equal((ExitCode.Done, ""), (run.Code, run.Error));
        var audit = Schema.Kept(await File.ReadAllBytesAsync(Path.Combine(folder, "audit.json"), TestContext.Current.CancellationToken));
        Assert.Equal(1 / 0.9, 1 + Number(audit["relative"]!["bias"]), 2e-3);
        Assert.Equal(1 / 0.9, Number(audit["deming"]!["slope"]), 2e-3);
        Assert.Equal(0, Number(audit["deming"]!["intercept_um"]), 0.05);
        Assert.StartsWith("The machine reads 11.1 % more than the eye", run.Out, StringComparison.Ordinal);
        var page = await File.ReadAllTextAsync(Path.Combine(folder, "audit.html"), TestContext.Current.CancellationToken);
        Assert.Contains("data:image/png;base64,", page, StringComparison.Ordinal);
        Assert.Equal(2, page.Split("<svg class=\"figure\"").Length - 1);
    }

    [Fact]
    public async Task Diameters_in_pixels_of_the_crop_and_empty_lines_are_understood()
    {
        var folder = Copied("pixels");
        var key = Key(folder);
        var lines = key.Select((c, i) => i == 0 ? $"{c!["crop"]},,,,hidden" : string.Create(CultureInfo.InvariantCulture, $"{c!["crop"]},,{Number(c["diameter_um"]) / Number(c["um_per_px"])},,"));
        await File.WriteAllLinesAsync(Path.Combine(folder, "by-eye.csv"), lines.Prepend("crop,um_per_px,diameter_px,diameter_um,note"), TestContext.Current.CancellationToken);
        var run = await CommandRun.OfAsync("audit", "compare", Path.Combine(folder, "by-eye.csv"), "--json", "-");
        Assert.Equal((ExitCode.Done, ""), (run.Code, run.Error));
        var audit = Schema.Kept(run.Output.Span);
        Assert.Equal(0, Number(audit["relative"]!["bias"]), 1e-5);
        Assert.Equal("crop-001.png", Assert.Single(audit["unfilled"]!.AsArray())!.GetValue<string>());
    }

    [Theory]
    [InlineData("crop-002.png,,,x,", "crop-002.png: 'x' is not a number")]
    [InlineData("crop-002.png,,,-3,", "must be above zero")]
    [InlineData("crop-999.png,,,3,", "is no crop of this audit")]
    [InlineData("crop-001.png,,,3,\ncrop-001.png,,,4,", "is there twice")]
    [InlineData("crop-001.png,,5,900,", "fill in one of the two")]
    [InlineData("crop-001.png,,,3,", "only 1 of 24 crops")]
    public async Task A_mistake_in_the_table_is_told_in_one_line(string lines, string told)
    {
        var folder = Copied("wrong" + string.GetHashCode(lines, StringComparison.Ordinal).ToString(CultureInfo.InvariantCulture));
        await File.WriteAllTextAsync(Path.Combine(folder, "by-eye.csv"), "crop,um_per_px,diameter_px,diameter_um,note\n" + lines, TestContext.Current.CancellationToken);
        var run = await CommandRun.OfAsync("audit", "compare", Path.Combine(folder, "by-eye.csv"));
        Assert.Equal(ExitCode.BadInput, run.Code);
        Assert.Contains(told, Assert.Single(run.ErrorLines), StringComparison.Ordinal);
        Assert.False(File.Exists(Path.Combine(folder, "audit.json")));
    }

    [Fact]
    public async Task What_cannot_be_drawn_from_or_compared_is_told_in_one_line()
    {
        async Task Refused(string told, params string[] arguments)
        {
            var run = await CommandRun.OfAsync(["audit", .. arguments]);
            Assert.Equal(ExitCode.BadInput, run.Code);
            Assert.Contains(told, Assert.Single(run.ErrorLines), StringComparison.Ordinal);
        }

        var scrap = drawn.PathTo("scrap.json");
        await File.WriteAllTextAsync(scrap, "{}", TestContext.Current.CancellationToken);
        await Refused("no such file", "draw", drawn.PathTo("nowhere.json"), "--out", drawn.PathTo("x"));
        await Refused("is not an assessment or a measurement", "draw", scrap, "--out", drawn.PathTo("x"));
        await Refused("holds an audit already", "draw", drawn.Measurement, "--out", drawn.PathTo("a"));
        await Refused("too few", "draw", drawn.Measurement, "--count", "2", "--out", drawn.PathTo("x"));
        await Refused("has no audit-key.json", "compare", scrap);
        await Refused("no such file", "compare", drawn.PathTo("nowhere.csv"));
        Assert.False(Directory.Exists(drawn.PathTo("x")));
    }

    [Fact]
    public async Task An_image_that_is_not_the_measured_one_is_refused()
    {
        var text = await File.ReadAllTextAsync(drawn.Measurement, TestContext.Current.CancellationToken);
        var measurement = JsonNode.Parse(text)!;
        foreach (var field in measurement["fields"]!.AsArray())
        {
            field!["sha256"] = new string('0', 64);
        }

        var changed = drawn.PathTo("changed.json");
        await File.WriteAllTextAsync(changed, measurement.ToJsonString(), TestContext.Current.CancellationToken);
        var run = await CommandRun.OfAsync("audit", "draw", changed, "--out", drawn.PathTo("y"));
        Assert.Equal(ExitCode.BadInput, run.Code);
        Assert.Contains("is not the image that was measured", Assert.Single(run.ErrorLines), StringComparison.Ordinal);
    }

    private static double Number(JsonNode? node) => node!.GetValue<double>();

    private static JsonArray Key(string folder) => JsonNode.Parse(File.ReadAllText(Path.Combine(folder, "audit-key.json")))!["crops"]!.AsArray();

    private static void Fill(string folder, Func<int, double, double> eye, char separator)
    {
        var lines = Key(folder).Select((c, i) => string.Join(separator, c!["crop"]!.GetValue<string>(), "", "", eye(i, Number(c["diameter_um"])).ToString("F4", CultureInfo.GetCultureInfo(separator == ';' ? "de-DE" : "")), ""));
        File.WriteAllLines(Path.Combine(folder, "by-eye.csv"), lines.Prepend(string.Join(separator, "crop", "um_per_px", "diameter_px", "diameter_um", "note")));
    }

    private string Copied(string name)
    {
        var folder = Directory.CreateDirectory(drawn.PathTo(name)).FullName;
        foreach (var file in Directory.GetFiles(drawn.PathTo("a")))
        {
            File.Copy(file, Path.Combine(folder, Path.GetFileName(file)));
        }

        return folder;
    }

    private async Task DrawAsync(string folder, string seed) =>
        Assert.Equal(ExitCode.Done, (await CommandRun.OfAsync("audit", "draw", drawn.Measurement, "--count", "24", "--seed", seed, "--out", drawn.PathTo(folder))).Code);

    /// <summary>A measurement of two small fields and one draw from it, made once.</summary>
    public sealed class Drawn : IAsyncLifetime
    {
        private readonly SmallFields _fields = new();
        private readonly Workspace _workspace = new();

        public string Measurement => _workspace.PathTo("m.json");

        public string PathTo(params string[] parts) => _workspace.PathTo(parts);

        public async ValueTask InitializeAsync()
        {
            await _fields.InitializeAsync();
            Assert.Equal(ExitCode.Done, (await CommandRun.OfAsync("measure", _fields.Field(1), _fields.Field(2), "--pixel-size", "200 nm", "--json", Measurement)).Code);
            Assert.Equal(ExitCode.Done, (await CommandRun.OfAsync("audit", "draw", Measurement, "--count", "24", "--seed", "7", "--out", PathTo("a"))).Code);
        }

        public async ValueTask DisposeAsync()
        {
            _workspace.Dispose();
            await _fields.DisposeAsync();
        }
    }
}
