using FiberScope.Cli;

namespace FiberScope.Acceptance.Tests;

/// <summary>What a measured pressure drop says about the fibres.</summary>
public sealed class FlowDiameterTests(SmallFields fields) : IClassFixture<SmallFields>
{
    /// <summary>
    /// Davies (1952): drop = 64 solidity^1.5 (1 + 56 solidity^3) viscosity velocity thickness / d². Viscosity of air at 20 °C: 18.2 µPa s,
    /// handbook value (CRC Handbook of Chemistry and Physics, from memory).
    /// </summary>
    [Fact]
    public async Task A_pressure_drop_far_from_the_pictures_is_translated_and_explained()
    {
        using var workspace = new Workspace();
        var run = await CommandRun.OfAsync("assess", workspace.Write("swatch.yaml", $$"""
            images: [{files: {{fields.Field(1)}}, pixel_size: 200 nm}]
            solidity: 0.08
            thickness: 310 um
            face_velocity: 5.3 cm/s
            measured: [{pressure_drop: 4100 Pa}]
            """));
        Assert.Equal((ExitCode.Done, ""), (run.Code, run.Error));
        var expected = Math.Sqrt(64 * Math.Pow(0.08, 1.5) * (1 + (56 * Math.Pow(0.08, 3))) * 18.2e-6 * 0.053 * 310e-6 / 4100) * 1e6;
        var assessment = Schema.Kept(await File.ReadAllBytesAsync(workspace.PathTo("swatch-assessment", "assessment.json"), TestContext.Current.CancellationToken));
        Assert.Equal(expected, assessment["measured"]![0]!["effective_diameter_um"]!.GetValue<double>(), 0.01 * expected);

        // So much pressure drop needs fibres below a micrometre, and a pixel is a fifth of one.
        Assert.Contains(assessment["caveats"]!.AsArray(), c => c!["code"]!.GetValue<string>() == "flow-diameter-tight");
        Assert.Contains("stands for fibres of", run.Out, StringComparison.Ordinal);
        var laws = assessment["prediction"]!["pressure_drop_by_law_pa"]!.AsObject();
        Assert.Contains("davies-1952", laws);
        Assert.True(laws.Count >= 4);
    }
}
