using FiberScope.Assessment.Input;
using FiberScope.Filtration;

namespace FiberScope.Assessment.Tests.Input;

/// <summary>What a media file may tell beyond fibres, solidity and thickness.</summary>
public sealed class MediaModelKeyTests
{
    private const string Good = """
        layers:
          - fibre_diameter: {median: 1.8 um ± 3 %, gsd: 1.6, fibres: 240}
            solidity: 0.08 ± 0.004
            thickness: 310 um ± 6.2 um
            inhomogeneity_factor: 1.6 ± 5 %
            charge: 4 nC/cm2 ± 10 uC/m2
            fibre_permittivity: 2.1
            basis_weight_variation: 12 %
            bonded_area: 0.08
            pinholes: [{diameter: 100 um, count: 4 per cm2}, {diameter: 50 um, open_area: 0.01 %}]
            openings: {median: 12 um, gsd: 1.6}
          - fibre_diameter: 17 um
            basis_weight: 40 g/m2 ± 3 %
            polymer: 0.905 g/cm3 ± 4 %
            thickness: 420 um
        flow: 95 l/min ± 3 %
        area: 150 cm2 ± 4 %
        air: {temperature: 0 C ± 1.8 F, pressure: 100 kPa ± 0.5 kPa}
        flow_direction: down
        particle_charge: none
        particle_permittivity: 2.3
        edge_leak: {gap: 0.05 mm, length: 60 cm, depth: 10 mm}
        challenge:
          - {standard: cfr84-oil}
          - {name: mist, mass_median: 0.4 um, gsd: 2, by: scattered-light, density: 0.92 g/cm3}
        size_bands: [{from: 0.3 um, to: 1 um}]
        mask: {seal_leak: 2 %, valve_leak: 0.1 %}
        """;

    [Fact]
    public void Every_stated_uncertainty_reaches_the_model()
    {
        var media = Parse(Good);
        var (web, carrier) = (media.Layers[0].Uncertainty!, media.Layers[1].Uncertainty!);
        Assert.Equal((0.03, 240.0), (web.DiameterScale, web.IndependentFibres));
        Assert.Equal([0.05, 0.02, 0.05, 0.25], new[] { web.Solidity, web.Thickness, web.Inhomogeneity, web.Charge }.Select(u => Math.Round(u, 12)));
        Assert.False(web.SolidityByWeighing);

        // Quadrature of weight (3 %) and density (4 %); GUM, JCGM 100:2008, eq. 12 for a product.
        Assert.Equal(0.05, carrier.Solidity, 1e-12);
        Assert.True(carrier.SolidityByWeighing);
        var use = media.Operation.Uncertainty!;
        Assert.Equal(0.05, use.FaceVelocity, 1e-12);
        Assert.Equal(1, use.Temperature.Kelvins, 1e-9);
        Assert.Equal(0.005, use.AirPressure, 1e-12);
    }

    [Fact]
    public void A_layer_takes_charge_unevenness_bonds_holes_and_openings()
    {
        var layer = Parse(Good).Layers[0];

        // 4 nC/cm² = 40 µC/m².
        Assert.Equal(40e-6, layer.Charge!.SurfaceDensity.CoulombsPerSquareMeter, 1e-15);
        Assert.Equal((1.6, 2.1, 0.12, 0.08), (layer.InhomogeneityFactor, layer.Charge.FibrePermittivity, layer.BasisWeightVariation, layer.BondedArea));
        Assert.Equal(4e4 * Math.PI / 4 * 1e-8, layer.Holes[0].OpenArea, 1e-12);
        Assert.Equal(1e-4, layer.Holes[1].OpenArea, 1e-12);
        Assert.Equal(12, layer.Openings!.Median.Micrometers, 1e-9);
    }

    [Fact]
    public void The_use_takes_direction_charging_and_an_edge_leak()
    {
        var use = Parse(Good).Operation;
        Assert.Equal((FlowDirection.Down, ParticleCharging.Neutral, 2.3), (use.Direction, use.Charging, use.ParticlePermittivity));
        Assert.Equal(150, use.Leak!.MediaArea.SquareCentimeters, 1e-9);
        Assert.Equal(60, use.Leak.SlitLength.Centimeters, 1e-9);
    }

    // Hatch and Choate (1929): count median = mass median exp(-3 ln² GSD). 42 CFR 84 tests the R and P series with 85 L/min.
    [Fact]
    public void Aerosols_are_told_by_standard_or_by_their_own_figures()
    {
        var request = Parse(Good).Request;
        Assert.True(request.Challenges[0].Discharged);
        Assert.Equal(85e-3 / 60 / 150e-4, request.Challenges[0].FaceVelocity!.Value.MetersPerSecond, 1e-9);
        var mist = request.Challenges[1].Aerosol;
        Assert.Equal(0.4 * Math.Exp(-3 * Math.Pow(Math.Log(2), 2)), mist.CountMedian.Micrometers, 1e-9);
        Assert.Equal((AerosolBasis.ScatteredLight, 0.92), (mist.CountedBy, mist.ParticleDensity.GramsPerCubicCentimeter));
        Assert.Equal(new MaskLeak(0.02, 0.001), request.Mask);
        Assert.Equal(1, request.Bands[0].To.Micrometers, 1e-9);
    }

    [Fact]
    public void Without_any_uncertainty_nothing_is_drawn()
    {
        var media = Parse("layers: [{fibre_diameter: 2 um, basis_weight: 25 g/m2, polymer: pp, thickness: 300 um}]\nface_velocity: 5 cm/s");
        Assert.Null(media.Layers[0].Uncertainty);
        Assert.Null(media.Operation.Uncertainty);
    }

    [Theory]
    [InlineData("solidity: 0.08 ± 0.004", "solidity: 8 % ± 0.5 %", 3, "can be read in two ways")]
    [InlineData("solidity: 0.08 ± 0.004", "solidity: 0.08 ± 0.2", 3, "between zero and the value itself")]
    [InlineData("solidity: 0.08 ± 0.004", "solidity: 0.08 ± x", 3, "not a number")]
    [InlineData("gsd: 1.6, fibres: 240", "gsd: 1.6 ± 0.1", 2, "none is taken here")]
    [InlineData("fibres: 240", "fibres: 1", 2, "from 2 to")]
    [InlineData("charge: 4 nC/cm2 ± 10 uC/m2", "charge: 40 uC", 6, "a charge per fibre surface is wanted")]
    [InlineData("charge: 4 nC/cm2 ± 10 uC/m2", "charge: -40 uC/m2", 6, "below zero")]
    [InlineData("charge: 4 nC/cm2 ± 10 uC/m2", "inhomogeneity_factor: 1", 6, "not valid YAML")]
    [InlineData("basis_weight_variation: 12 %", "basis_weight_variation: 95 %", 8, "from 0 to 0.9")]
    [InlineData("bonded_area: 0.08", "bonded_area: 1", 9, "from 0 to 0.95")]
    [InlineData("count: 4 per cm2", "count: 400000 per cm2", 10, "must be 0 to 99 %")]
    [InlineData("count: 4 per cm2", "count: 4", 10, "no unit")]
    [InlineData("count: 4 per cm2", "area: 4 per cm2", 10, "unknown key 'area'")]
    [InlineData("openings: {median: 12 um, gsd: 1.6}", "openings: {median: 12 um}", 11, "median and gsd go together")]
    [InlineData("temperature: 0 C ± 1.8 F", "temperature: 0 C ± 3 %", 18, "is one difference")]
    [InlineData("temperature: 0 C ± 1.8 F", "temperature: 400 C", 18, "from -100 C to 300 C")]
    [InlineData("flow_direction: down", "flow_direction: left", 19, "not one of horizontal, down, up")]
    [InlineData("depth: 10 mm", "deep: 10 mm", 22, "unknown key 'deep'")]
    [InlineData("standard: cfr84-oil", "standard: n95", 24, "not one of en149-salt")]
    [InlineData("standard: cfr84-oil", "standard: cfr84-oil, gsd: 2", 24, "of your own")]
    [InlineData("by: scattered-light", "by: light", 25, "not one of count, mass, scattered-light")]
    [InlineData("mass_median: 0.4 um, ", "", 25, "give count_median or mass_median")]
    [InlineData("{from: 0.3 um, to: 1 um}", "{from: 3 um, to: 1 um}", 26, "must be below 'to'")]
    [InlineData("seal_leak: 2 %", "seal_leak: 99.95 %", 27, "more than all the air")]
    public void A_mistake_is_told_with_its_line(string right, string wrong, int line, string told)
    {
        var problems = Assert.Throws<InputException>(() => Parse(Good.Replace(right, wrong, StringComparison.Ordinal))).Problems;
        Assert.Contains(problems, p => p.Line == line && p.Message.Contains(told, StringComparison.Ordinal));
    }

    [Fact]
    public void A_swatch_layer_takes_the_same_keys()
    {
        var swatch = SwatchFile.Parse("""
            images: a.tif
            solidity: 0.08 ± 5 %
            thickness: 310 um
            charge: 40 uC/m2
            basis_weight_variation: 9 %
            face_velocity: 5.3 cm/s ± 2 %
            challenge: {standard: latex}
            """, "swatch.yaml", Path.GetTempPath());
        Assert.Equal((0.08, 0.05), (swatch.Layers[0].Solidity, swatch.Layers[0].SolidityUncertainty));
        Assert.Equal(0.09, swatch.Layers[0].Traits.BasisWeightVariation);
        Assert.Equal(0.02, swatch.Operation!.Uncertainty!.FaceVelocity, 1e-12);
        Assert.Equal("latex", Assert.Single(swatch.Request.Challenges).Name);
    }

    [Fact]
    public void A_challenge_without_a_velocity_is_told()
    {
        var problems = Assert.Throws<InputException>(() => SwatchFile.Parse("images: a.tif\nmask: {seal_leak: 2 %}", "swatch.yaml", Path.GetTempPath())).Problems;
        Assert.Contains(problems, p => p.Line == 2 && p.Message.Contains("needs 'face_velocity'", StringComparison.Ordinal));
    }

    private static MediaFile Parse(string text) => MediaFile.Parse(text, "media.yaml", Path.GetTempPath());
}
