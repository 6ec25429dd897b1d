using System.Globalization;
using System.Text.Json.Nodes;
using FiberScope.Cli;
using FiberScope.TestKit;

namespace FiberScope.Acceptance.Tests;

/// <summary><c>calibrate</c>: what rolls with rig results teach, and that the next forecast uses it.</summary>
public sealed class CalibrationTests(SmallFields fields) : IClassFixture<SmallFields>
{
    private const string Next = """
        layers: [{fibre_diameter: {median: 1.85 um, gsd: 1.6}, solidity: 0.08, thickness: 305 um}]
        face_velocity: 5.3 cm/s
        particles: [0.3 um]
        calibration: rolls.calibration.json
        """;

    private static readonly Lazy<Task<byte[]>> Example = new(CalibrateAsync);

    /// <summary>Rig results made by the model with known factors give these factors back.</summary>
    [Fact]
    public async Task Known_factors_are_found_again()
    {
        using var workspace = new Workspace();
        var rolls = new List<string>();
        foreach (var (median, thickness) in new[] { (1.8, 310), (2.1, 290), (1.6, 330) })
        {
            var received = await PredictedAsync(Layer(median, thickness) + ", charge: 30 uC/m2}]\nface_velocity: 5.3 cm/s\nparticles: [0.3 um]");
            var bare = await PredictedAsync(Layer(median, thickness) + "}]\nface_velocity: 5.3 cm/s\nparticles: [0.3 um]");
            rolls.Add(string.Create(CultureInfo.InvariantCulture, $$"""
                  - layers: [{fibre_diameter: {median: {{median}} um, gsd: 1.6}, solidity: 0.08, thickness: {{thickness}} um}]
                    measured: [{pressure_drop: {{Number(bare["pressure_drop_pa"])}} Pa}, {particle: 0.3 um, penetration: {{Passes(bare)}}, discharged: yes}, {particle: 0.3 um, penetration: {{Passes(received)}}}]
                """));
        }

        var run = await CommandRun.WithInputAsync("grade: Demo\nface_velocity: 5.3 cm/s\nrolls:\n" + string.Join('\n', rolls), "calibrate", "-", "--json", "-");
        Assert.Equal((ExitCode.Done, ""), (run.Code, run.Error));
        var calibration = Schema.Kept(run.Output.Span);
        Assert.Equal(1.5, Number(calibration["inhomogeneity_factor"]), 0.01);
        Assert.Equal(30, Number(calibration["charge_uc_per_m2"]), 0.5);
        Assert.InRange(Number(calibration["leave_one_out_penetration_error"]), 0, 0.01);
        Assert.InRange(Number(calibration["leave_one_out_pressure_drop_error"]), 0, 0.01);
    }

    [Fact]
    public async Task The_next_roll_is_forecast_with_what_was_learnt_and_says_so()
    {
        using var workspace = new Workspace();
        var calibration = await CalibratedAsync(workspace);
        var run = await CommandRun.OfAsync("predict", workspace.Write("next.yaml", Next), "--json", workspace.PathTo("next.json"));
        Assert.Equal(ExitCode.Done, run.Code);
        Assert.Contains("Calibrated for grade FM-25 on 3 roll(s)", run.Error, StringComparison.Ordinal);
        var calibrated = Schema.Kept(await File.ReadAllBytesAsync(workspace.PathTo("next.json"), TestContext.Current.CancellationToken));
        Assert.Equal("calibrated", calibrated["warnings"]![0]!["code"]!.GetValue<string>());
        Assert.Contains(calibrated["measurement_bands"]!["ranking"]!.AsArray(), r => r!["input"]!.GetValue<string>() == "charge");

        // The same factors told one by one give the same forecast.
        var told = string.Create(CultureInfo.InvariantCulture, $"inhomogeneity_factor: {Number(calibration["inhomogeneity_factor"])}, charge: {Number(calibration["charge_uc_per_m2"])} uC/m2, basis_weight_variation: {Number(calibration["basis_weight_variation"])}, pinholes: [{{diameter: 0.2 mm, open_area: {Number(calibration["open_area"])}}}]");
        var byHand = await PredictedAsync(Next.Replace("305 um", "305 um, " + told, StringComparison.Ordinal).Replace("calibration: rolls.calibration.json", "", StringComparison.Ordinal));
        Assert.Equal(Passes(byHand), Passes(calibrated), 1e-5);
        Assert.Equal(Number(byHand["pressure_drop_pa"]), Number(calibrated["pressure_drop_pa"]), 1e-3);
    }

    [Fact]
    public async Task Two_runs_write_the_same_bytes() => Assert.Equal(await Example.Value, await CalibrateAsync());

    [Fact]
    public async Task An_assessment_brings_the_structure_of_a_roll_and_a_grade_brings_the_calibration()
    {
        using var workspace = new Workspace();
        var swatch = $$"""
            images: [{files: {{fields.Field(1)}}, pixel_size: 200 nm}]
            solidity: 0.08
            thickness: 310 um
            face_velocity: 5.3 cm/s
            """;
        Assert.Equal(ExitCode.Done, (await CommandRun.OfAsync("assess", workspace.Write("swatch.yaml", swatch))).Code);
        var rolls = "grade: Demo\nface_velocity: 5.3 cm/s\nrolls: [{roll: R-1, assessment: swatch-assessment/assessment.json, measured: [{pressure_drop: 2 Pa}]}]";
        Assert.Equal(ExitCode.Done, (await CommandRun.OfAsync("calibrate", workspace.Write("demo.yaml", rolls))).Code);
        var calibration = Schema.Kept(await File.ReadAllBytesAsync(workspace.PathTo("demo.calibration.json"), TestContext.Current.CancellationToken));
        Assert.Equal(2, Number(calibration["rolls"]![0]!["fitted_pressure_drop_pa"]), 1e-3);

        workspace.Write("grade.yaml", "grade: Demo\ncalibration: demo.calibration.json\nlimits: {pressure_drop: {at_most: 5 Pa}}");
        Assert.Equal(ExitCode.Done, (await CommandRun.OfAsync("assess", workspace.Write("again.yaml", swatch + "\ngrade: grade.yaml"))).Code);
        var assessment = Schema.Kept(await File.ReadAllBytesAsync(workspace.PathTo("again-assessment", "assessment.json"), TestContext.Current.CancellationToken));
        Assert.Equal(2, Number(assessment["prediction"]!["pressure_drop_pa"]), 1e-3);
        Assert.Contains(assessment["caveats"]!.AsArray(), c => c!["code"]!.GetValue<string>() == "calibrated");
        Assert.True(assessment["recipe"]!["files_sha256"]!.AsObject().ContainsKey("demo.calibration.json"));
    }

    [Theory]
    [InlineData("305 um}", "305 um, charge: 3 uC/m2}", "is told by 'calibration' already")]
    [InlineData("calibration: rolls", "correlations: cell\ncalibration: rolls", "the calibration holds for kirsch-stechkina-1978")]
    [InlineData("rolls.calibration.json", "nowhere.json", "no such file")]
    [InlineData("rolls.calibration.json", "next.yaml", "is not a calibration of schema")]
    public async Task A_calibration_that_cannot_be_used_is_told_in_one_line(string right, string wrong, string told)
    {
        using var workspace = new Workspace();
        await CalibratedAsync(workspace);
        var file = workspace.Write("next.yaml", Next.Replace(right, wrong, StringComparison.Ordinal));
        var run = await CommandRun.OfAsync("predict", file, "--json", "-");
        Assert.Equal(ExitCode.BadInput, run.Code);
        Assert.Contains(told, Assert.Single(run.ErrorLines), StringComparison.Ordinal);
    }

    [Theory]
    [InlineData("grade: FM-25", "", "grade is missing")]
    [InlineData("roll: R-02", "roll: R-01", "two rolls 'R-01'")]
    [InlineData("{pressure_drop: 45 Pa}", "{pressure_drop: 45 Pa}\n      - {pressure_drop: 46 Pa}", "told twice")]
    [InlineData("{pressure_drop: 45 Pa}", "{particle: 0.3 um}", "particle with penetration")]
    [InlineData("{pressure_drop: 45 Pa}", "{pressure_drop: 45 Pa, discharged: yes}", "belongs to a penetration")]
    [InlineData("penetration: 48 %", "penetration: 0 %", "above zero")]
    [InlineData("penetration: 48 %, discharged: yes", "penetration: 48 %, discharged: maybe", "not one of yes, no")]
    [InlineData("solidity: 0.080", "solidity: 1.2", "between 0 and 1")]
    [InlineData("face_velocity: 5.3 cm/s", "", "face_velocity is missing")]
    public async Task A_mistake_is_told_with_its_line(string right, string wrong, string told)
    {
        using var workspace = new Workspace();
        var file = workspace.Write("rolls.yaml", Rolls().Replace(right, wrong, StringComparison.Ordinal));
        var run = await CommandRun.OfAsync("calibrate", file);
        Assert.Equal(ExitCode.BadInput, run.Code);
        Assert.Contains(run.ErrorLines, line => line.Contains(told, StringComparison.Ordinal));
        Assert.Single(workspace.Everything());
    }

    /// <summary>The calibration of the example, worked out once and put into the workspace.</summary>
    private static async Task<JsonNode> CalibratedAsync(Workspace workspace)
    {
        var bytes = await Example.Value;
        workspace.Write("rolls.calibration.json", bytes);
        return Schema.Kept(bytes);
    }

    private static async Task<byte[]> CalibrateAsync()
    {
        using var workspace = new Workspace();
        var run = await CommandRun.OfAsync("calibrate", workspace.Write("rolls.yaml", Rolls()));
        Assert.Equal((ExitCode.Done, ""), (run.Code, run.Error));
        return await File.ReadAllBytesAsync(workspace.PathTo("rolls.calibration.json"), TestContext.Current.CancellationToken);
    }

    /// <summary>The example of the documentation.</summary>
    private static string Rolls()
    {
        var page = File.ReadAllText(Repository.PathTo("docs", "formats.md"));
        var start = page.IndexOf("```yaml\n", page.IndexOf("## rolls.yaml", StringComparison.Ordinal), StringComparison.Ordinal) + 8;
        return page[start..page.IndexOf("```", start, StringComparison.Ordinal)];
    }

    private static string Layer(double median, int thickness) => string.Create(
        CultureInfo.InvariantCulture, $$"""layers: [{fibre_diameter: {median: {{median}} um, gsd: 1.6}, solidity: 0.08, thickness: {{thickness}} um, inhomogeneity_factor: 1.5""");

    private static double Passes(JsonNode prediction) => Number(prediction["curve"]![0]!["penetration"]);

    private static double Number(JsonNode? node) => node!.GetValue<double>();

    private static async Task<JsonNode> PredictedAsync(string media)
    {
        var run = await CommandRun.WithInputAsync(media, "predict", "-", "--json", "-");
        Assert.Equal((ExitCode.Done, ""), (run.Code, run.Error));
        return Schema.Kept(run.Output.Span);
    }
}
