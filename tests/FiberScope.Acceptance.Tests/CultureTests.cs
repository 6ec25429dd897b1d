using System.Globalization;
using FiberScope.Cli;

namespace FiberScope.Acceptance.Tests;

/// <summary>
/// The machine's language changes nothing: a decimal comma (German), a dotless i (Turkish), another calendar and digits (Persian) or
/// an apostrophe between thousands (Swiss) must not reach files, output or complaints.
/// </summary>
public sealed class CultureTests(SmallFields fields) : IClassFixture<SmallFields>
{
    private const string Media = """
        layers:
          - {fibre_diameter: {median: 1.8 um, gsd: 1.6}, solidity: 0.08, thickness: 310 um}
          - {fibre_diameter: 17.5 um, basis_weight: 40 g/m2, polymer: pp, thickness: 0.42 mm}
        face_velocity: 5.3 cm/s
        air: {temperature: 23.5 C, pressure: 1013.25 hPa, humidity: 47.5 %}
        """;

    public static TheoryData<string> Languages => ["de-DE", "tr-TR", "fa-IR", "de-CH"];

    [Theory]
    [MemberData(nameof(Languages))]
    public async Task Measuring_says_and_writes_the_same_in_every_language(string language) => await SameAsync(language, async workspace =>
    {
        var run = await CommandRun.OfAsync("measure", fields.Field(1), "--pixel-size", "0.2 um", "--json", workspace.PathTo("m.json"));
        return (run, await File.ReadAllTextAsync(workspace.PathTo("m.json"), TestContext.Current.CancellationToken));
    });

    [Theory]
    [MemberData(nameof(Languages))]
    public async Task Predicting_says_and_writes_the_same_in_every_language(string language) => await SameAsync(language, async workspace =>
    {
        var run = await CommandRun.OfAsync("predict", workspace.Write("media.yaml", Media), "--json", workspace.PathTo("p.json"));
        return (run, await File.ReadAllTextAsync(workspace.PathTo("p.json"), TestContext.Current.CancellationToken));
    });

    [Theory]
    [MemberData(nameof(Languages))]
    public async Task Assessing_says_and_writes_the_same_in_every_language(string language) => await SameAsync(language, async workspace =>
    {
        workspace.Write("grade.yaml", "grade: Demo\nlimits:\n  mean_diameter: {at_most: 20.5 um}");
        var swatch = workspace.Write("swatch.yaml", $"""
            images: [{"{"}files: {fields.Field(1)}, pixel_size: 0.2 um{"}"}]
            basis_weight: 25.5 g/m2
            thickness: 310.5 um
            polymer: pp
            face_velocity: 5.3 cm/s
            grade: grade.yaml
            """);
        var run = await CommandRun.OfAsync("assess", swatch);
        var written = new[] { "assessment.json", "readings.csv", "report.html" }.Select(name => File.ReadAllText(workspace.PathTo("swatch-assessment", name)));
        return (run, string.Concat(written));
    });

    [Theory]
    [InlineData("de-DE")]
    [InlineData("fa-IR")]
    public async Task Designing_says_and_writes_the_same_in_every_language(string language) => await SameAsync(language, async workspace =>
    {
        var design = Media[..Media.IndexOf("air:", StringComparison.Ordinal)] + """
            polymer: pp
            targets: {penetration_at_mpps: 30.5 %, pressure_drop: 90.5 Pa}
            vary: [{layer: layer 1, fibre_diameter: 1.5 um to 3.5 um}]
            """;
        var run = await CommandRun.OfAsync("design", workspace.Write("design.yaml", design), "--out", workspace.PathTo("out"));
        return (run, await File.ReadAllTextAsync(workspace.PathTo("out", "design.json"), TestContext.Current.CancellationToken) + await File.ReadAllTextAsync(workspace.PathTo("out", "design.html"), TestContext.Current.CancellationToken));
    });

    [Theory]
    [InlineData("de-DE")]
    [InlineData("fa-IR")]
    public async Task Calibrating_says_and_writes_the_same_in_every_language(string language) => await SameAsync(language, async workspace =>
    {
        var rolls = """
            grade: Demo
            face_velocity: 5.3 cm/s
            rolls: [{layers: [{fibre_diameter: {median: 1.8 um, gsd: 1.6}, solidity: 0.08, thickness: 310.5 um}], measured: [{pressure_drop: 45.5 Pa}, {particle: 0.3 um, penetration: 47.5 %, discharged: yes}]}]
            """;
        var run = await CommandRun.OfAsync("calibrate", workspace.Write("rolls.yaml", rolls));
        return (run, await File.ReadAllTextAsync(workspace.PathTo("rolls.calibration.json"), TestContext.Current.CancellationToken));
    });

    [Theory]
    [InlineData("de-DE")]
    [InlineData("fa-IR")]
    public async Task Comparing_an_audit_says_and_writes_the_same_in_every_language(string language) => await SameAsync(language, async workspace =>
    {
        var crop = (int i, double um) => string.Create(CultureInfo.InvariantCulture, $$"""{"crop": "crop-00{{i}}.png", "um_per_px": 0.025, "layer": "", "image": "a.png", "image_sha256": "{{new string('0', 64)}}", "page": 0, "field": 1, "trace": {{i}}, "x_px": 10.5, "y_px": 20.5, "direction_deg": 30.5, "diameter_um": {{um}}, "u_um": 0.02, "pixel_size_um": 0.1}""");
        workspace.Write("audit-key.json", $$"""{"schema": "fiberscope/audit-key/1", "software": "", "source": "m.json", "source_sha256": "{{new string('0', 64)}}", "seed": 1, "crops": [{{crop(1, 1.5)}}, {{crop(2, 2.25)}}, {{crop(3, 3.125)}}, {{crop(4, 1.75)}}]}""");
        var run = await CommandRun.OfAsync("audit", "compare", workspace.Write("by-eye.csv", "crop;um_per_px;diameter_px;diameter_um;note\ncrop-001.png;;;1,45;\ncrop-002.png;;;2,3;\ncrop-003.png;;120,5;;\ncrop-004.png;;;1.8;"));
        return (run, await File.ReadAllTextAsync(workspace.PathTo("audit.json"), TestContext.Current.CancellationToken) + await File.ReadAllTextAsync(workspace.PathTo("audit.html"), TestContext.Current.CancellationToken));
    });

    [Theory]
    [MemberData(nameof(Languages))]
    public async Task Complaints_read_the_same_in_every_language(string language) => await SameAsync(language, async workspace =>
    {
        var run = await CommandRun.OfAsync("predict", workspace.Write("media.yaml", Media.Replace("thickness: 310 um", "thickness: 0.35 um", StringComparison.Ordinal)), "--json", workspace.PathTo("p.json"));
        return (run, "");
    });

    [Theory]
    [InlineData("en-US")]
    [InlineData("de-DE")]
    public async Task A_decimal_comma_is_refused_and_never_read_as_thousands(string language)
    {
        using var culture = new Speaking(language);
        var run = await CommandRun.OfAsync("measure", fields.Field(1), "--pixel-size", "24,8 nm", "--json", "-");
        Assert.Equal(ExitCode.BadInput, run.Code);
        Assert.Contains("24,8", Assert.Single(run.ErrorLines), StringComparison.Ordinal);
        Assert.True(run.Output.IsEmpty);
    }

    private static async Task SameAsync(string language, Func<Workspace, Task<(CommandRun Run, string Written)>> action)
    {
        using var here = new Workspace();
        using var there = new Workspace();
        (CommandRun Run, string Written) plain, spoken;
        using (new Speaking(""))
        {
            plain = await action(here);
        }

        using (new Speaking(language))
        {
            spoken = await action(there);
        }

        Assert.Equal(plain.Run.Code, spoken.Run.Code);
        Assert.Equal(Placeless(plain.Run.Out, here), Placeless(spoken.Run.Out, there));
        Assert.Equal(Placeless(plain.Run.Error, here), Placeless(spoken.Run.Error, there));
        Assert.Equal(Placeless(plain.Written, here), Placeless(spoken.Written, there));
    }

    private static string Placeless(string text, Workspace workspace) => text.Replace(workspace.Root, "", StringComparison.Ordinal);

    /// <summary>Sets the language of the test and of every thread that starts meanwhile, and puts it back.</summary>
    private sealed class Speaking : IDisposable
    {
        private readonly (CultureInfo Culture, CultureInfo Words) _before = (CultureInfo.CurrentCulture, CultureInfo.CurrentUICulture);

        public Speaking(string language) => CultureInfo.CurrentCulture = CultureInfo.CurrentUICulture = CultureInfo.GetCultureInfo(language);

        public void Dispose() => (CultureInfo.CurrentCulture, CultureInfo.CurrentUICulture) = _before;
    }
}
