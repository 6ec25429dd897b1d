using System.Text.Json.Nodes;
using FiberScope.Cli;

namespace FiberScope.Acceptance.Tests;

/// <summary>A prediction carries what the media file tells: bands, ranking, aerosols, leaks and classes.</summary>
public sealed class PredictionTests
{
    private const string Media = """
        layers:
          - {fibre_diameter: {median: 1.8 um ± 3 %, gsd: 1.6}, solidity: 0.08 ± 0.004, thickness: 310 um ± 8 um}
        face_velocity: 5.3 cm/s
        particles: [0.1 um, 0.3 um, 1 um]
        challenge: {count_median: 0.3 um, gsd: 1, by: count, density: 1 g/cm3, permittivity: 6.1}
        mask: {seal_leak: 2 %, valve_leak: 1 %}
        """;

    [Fact]
    public async Task Stated_uncertainties_give_bands_and_a_ranking()
    {
        var prediction = await PredictedAsync(Media);
        Assert.All(prediction["curve"]!.AsArray(), point => Assert.InRange(Number(point!["penetration"]), Number(point["measurement_band"]![0]), Number(point["measurement_band"]![1])));
        var ranking = prediction["measurement_bands"]!["ranking"]!.AsArray();
        Assert.Equal(["diameter-scale", "solidity", "thickness"], ranking.Select(r => r!["input"]!.GetValue<string>()).Order(StringComparer.Ordinal));
        Assert.Equal(1, ranking.Sum(r => Number(r!["penetration_share"])), 1e-5);
    }

    [Fact]
    public async Task Without_uncertainties_there_is_no_measurement_band() =>
        Assert.Null((await PredictedAsync(Media.Replace(" ± 3 %", "", StringComparison.Ordinal).Replace(" ± 0.004", "", StringComparison.Ordinal).Replace(" ± 8 um", "", StringComparison.Ordinal)))["measurement_bands"]);

    [Fact]
    public async Task An_aerosol_of_one_size_passes_as_that_size_does()
    {
        var prediction = await PredictedAsync(Media);
        var atSize = prediction["curve"]!.AsArray().Single(p => Math.Abs(Number(p!["particle_um"]) - 0.3) < 1e-9)!;
        Assert.Equal(Number(atSize["penetration"]), Number(prediction["challenges"]![0]!["penetration"]), 1e-6);
    }

    // Total inward leakage: P (1 - leak) + leak, and a leak of P / (1 - P) doubles the penetration (mass balance).
    [Fact]
    public async Task Leaks_add_up_as_a_mass_balance_says()
    {
        var prediction = await PredictedAsync(Media);
        var worst = Number(prediction["penetration_at_mpps"]);
        Assert.Equal((worst * 0.97) + 0.03, Number(prediction["leakage"]!["total_inward_leakage"]), 1e-6);
        Assert.Equal(worst / (1 - worst), Number(prediction["leakage"]!["halving_share"]), 1e-6);
    }

    [Fact]
    public async Task An_edge_leak_lets_more_through()
    {
        var leaky = Media + "\nmedia_area: 150 cm2\nedge_leak: {gap: 0.2 mm, length: 60 cm, depth: 10 mm}";
        var (tight, open) = (await PredictedAsync(Media), await PredictedAsync(leaky));
        Assert.True(Number(open["leakage"]!["edge_share"]) > 0.001);
        Assert.True(Number(open["penetration_at_mpps"]) > Number(tight["penetration_at_mpps"]));
        Assert.True(Number(open["pressure_drop_pa"]) < Number(tight["pressure_drop_pa"]));
    }

    [Fact]
    public async Task The_summary_says_the_caution_beside_every_class()
    {
        using var workspace = new Workspace();
        var run = await CommandRun.OfAsync("predict", workspace.Write("media.yaml", Media), "--json", workspace.PathTo("p.json"));
        Assert.Equal(ExitCode.Done, run.Code);
        Assert.Contains("points to", run.Out, StringComparison.Ordinal);
        Assert.Contains("only the standard's own test", run.Out, StringComparison.Ordinal);
        Assert.Contains("total inward leakage", run.Out, StringComparison.Ordinal);
        Assert.True(run.Out.Split('\n').Length < 25);
    }

    [Fact]
    public async Task The_seed_moves_the_bands_and_nothing_else()
    {
        var (one, two) = (await PredictedAsync(Media, "1"), await PredictedAsync(Media, "2"));
        Assert.NotEqual(one["measurement_bands"]!.ToJsonString(), two["measurement_bands"]!.ToJsonString());
        Assert.Equal(one["penetration_at_mpps"]!.ToJsonString(), two["penetration_at_mpps"]!.ToJsonString());
    }

    /// <summary>A pair of penetrations made with a known charge gives that charge back, and the forecast that goes with it.</summary>
    [Fact]
    public async Task Two_penetrations_tell_the_charge()
    {
        const string Bare = "layers: [{fibre_diameter: {median: 1.8 um, gsd: 1.6}, solidity: 0.08, thickness: 310 um CHARGE}]\nface_velocity: 5.3 cm/s\nparticles: [0.3 um]\n";
        async Task<JsonNode> WithAsync(string charge, string more) => await PredictedAsync(Bare.Replace(" CHARGE", charge, StringComparison.Ordinal) + more);
        double Passes(JsonNode prediction) => Number(prediction["curve"]![0]!["penetration"]);
        var (received, discharged) = (await WithAsync(", charge: 30 uC/m2", ""), await WithAsync("", ""));
        var pair = string.Create(System.Globalization.CultureInfo.InvariantCulture, $"charge_from: {{particle: 0.3 um, as_received: {Passes(received)} ± 5 %, discharged: {Passes(discharged)}}}");
        var inferred = await WithAsync("", pair);
        Assert.Equal(Passes(received), Passes(inferred), 1e-4);
        var note = inferred["warnings"]!.AsArray().Single(w => w!["code"]!.GetValue<string>() == "charge-inferred")!["message"]!.GetValue<string>();
        Assert.StartsWith("Charge of 30 µC/m²", note, StringComparison.Ordinal);
        Assert.Equal("charge", inferred["measurement_bands"]!["ranking"]![0]!["input"]!.GetValue<string>());
    }

    [Theory]
    [InlineData("charge_from: {particle: 0.3 um, as_received: 2 %}", "needs two penetrations")]
    [InlineData("charge_from: {particle: 0.3 um, as_received: 2 %, discharged: 100 %}", "between 0 and 1")]
    [InlineData("charge_from: {particle: 0.3 um, as_received: 2 %, discharged: 40 %}", "is told by 'charge_from' already")]
    public async Task A_pair_that_cannot_be_used_is_told_in_one_line(string key, string told)
    {
        var charge = told.Contains("already", StringComparison.Ordinal) ? "charge: 3 uC/m2, thickness: 310 um" : "thickness: 310 um";
        var run = await CommandRun.WithInputAsync(Media.Replace("thickness: 310 um", charge, StringComparison.Ordinal) + "\n" + key, "predict", "-", "--json", "-");
        Assert.Equal(ExitCode.BadInput, run.Code);
        Assert.Contains(told, Assert.Single(run.ErrorLines), StringComparison.Ordinal);
    }

    private static double Number(JsonNode? node) => node!.GetValue<double>();

    private static async Task<JsonNode> PredictedAsync(string media, string seed = "1")
    {
        var run = await CommandRun.WithInputAsync(media, "predict", "-", "--json", "-", "--seed", seed);
        Assert.Equal((ExitCode.Done, ""), (run.Code, run.Error));
        return Schema.Kept(run.Output.Span);
    }
}
