using System.Collections.Immutable;
using FiberScope.Assessment.Input;
using FiberScope.Filtration;
using FiberScope.Imaging;

namespace FiberScope.Assessment.Tests.Input;

public sealed class SwatchFileTests
{
    private const string Good = """
        material: Demo web
        lot: L-1
        roll: R-2
        position: {md: 12 m, cd: left}
        imaging: sem
        images:
          - files: fields/*.png
            pixel_size: 24.8 nm
        basis_weight: 25 g/m2 ± 2 %
        thickness: 310 um ± 6.2 um
        polymer: pp
        face_velocity: 5.3 cm/s
        air: {temperature: 23 C, pressure: 1013 mbar, humidity: 50 %}
        measured:
          - pressure_drop: 4 mmH2O
          - {particle: 0.3 um, penetration: 12 %}
        """;

    [Fact]
    public void A_good_file_is_understood_with_its_units()
    {
        var swatch = Parse(Good);
        var layer = Assert.Single(swatch.Layers);
        Assert.Equal(ImagingMode.SecondaryElectron, layer.Imaging);
        Assert.Equal(24.8, layer.Images[0].PixelSize!.Value.Nanometers, 1e-9);
        Assert.Equal(25, layer.BasisWeight!.Value.GramsPerSquareMeter, 1e-9);
        Assert.Equal(0.02, layer.BasisWeight.RelativeUncertainty!.Value, 1e-12);
        Assert.Equal(0.02, layer.Thickness!.RelativeUncertainty!.Value, 1e-12);
        Assert.Equal(0.053, swatch.Operation!.FaceVelocity.MetersPerSecond, 1e-12);
        Assert.Equal(296.15, swatch.Operation.Air.Temperature.Kelvins, 1e-9);
        Assert.Equal(0.5, swatch.Operation.Air.RelativeHumidity);
        Assert.Equal("Demo web, lot L-1, roll R-2", swatch.Identity.Title);
    }

    // 1 mmH2O = 9.80665 Pa: water column of 1 mm at 1000 kg/m³ and standard gravity (conventional unit, ISO 80000-4 annex).
    [Fact]
    public void A_water_column_is_a_pressure() =>
        Assert.Equal(4 * 9.80665, Parse(Good).RigTests[0].PressureDrop!.Value.Pascals, 1e-3);

    [Fact]
    public void Rig_tests_take_the_face_velocity_of_the_file() =>
        Assert.All(Parse(Good).RigTests, test => Assert.Equal(5.3, test.FaceVelocity.CentimetersPerSecond, 1e-9));

    [Fact]
    public void Flow_and_area_stand_for_a_face_velocity()
    {
        var swatch = Parse(Good.Replace("face_velocity: 5.3 cm/s", "flow: 95 l/min\narea: 150 cm2", StringComparison.Ordinal));
        Assert.Equal(95e-3 / 60 / 150e-4, swatch.Operation!.FaceVelocity.MetersPerSecond, 1e-9);
    }

    [Fact]
    public void Every_value_is_kept_with_its_line()
    {
        var entry = Parse(Good).Entries.Single(e => e.Name == "images[1].pixel_size");
        Assert.Equal(("24.8 nm", "line 8"), (entry.Value, entry.Origin));
    }

    [Fact]
    public void The_short_form_of_images_needs_no_group()
    {
        var swatch = Parse("images: a.tif");
        Assert.Equal(["a.tif"], swatch.Layers[0].Images[0].Patterns);
        Assert.Null(swatch.Operation);
    }

    [Fact]
    public void Layers_carry_their_own_keys()
    {
        var swatch = Parse("""
            layers:
              - {name: web, images: f/*.png, basis_weight: 5 gsm, thickness: 60 um, polymer: pp}
              - {images: c/*.png, solidity: 8 %, thickness: 0.4 mm}
            face_velocity: 10 cm/s
            correlations: lee-liu-1982
            """);
        Assert.Equal(["web", "layer 2"], swatch.Layers.Select(l => l.Name));
        Assert.Equal(0.08, swatch.Layers[1].Solidity);
        Assert.Equal(CorrelationSet.LeeLiu1982, swatch.Correlations);
    }

    [Theory]
    [InlineData("pixel_size: 24.8 nm", "pixel_size: 24.8", 8, "no unit")]
    [InlineData("pixel_size: 24.8 nm", "pixel_size: 0 nm", 8, "above zero")]
    [InlineData("pixel_size: 24.8 nm", "pixel_size: -3 nm", 8, "above zero")]
    [InlineData("pixel_size: 24.8 nm", "pixel_size: 24.8 kg", 8, "is a mass; a length is wanted")]
    [InlineData("pixel_size: 24.8 nm", "pixel_size: 24,8 nm", 8, "decimal comma")]
    [InlineData("pixel_size: 24.8 nm", "pixel_size: 24.8 foo", 8, "unknown unit 'foo'")]
    [InlineData("pixel_size: 24.8 nm", "pixel_size: NaN nm", 8, "not a number")]
    [InlineData("thickness: 310 um ± 6.2 um", "thicknes: 310 um", 10, "unknown key 'thicknes'; did you mean 'thickness'?")]
    [InlineData("thickness: 310 um ± 6.2 um", "note: x", 9, "needs 'thickness'")]
    [InlineData("polymer: pp", "note: x", 9, "needs 'polymer'")]
    [InlineData("polymer: pp", "polymer: ppp", 11, "did you mean 'pp'?")]
    [InlineData("polymer: pp", "polymer: 0.905", 11, "no unit")]
    [InlineData("thickness: 310 um ± 6.2 um", "thickness: 3 um", 9, "solidity would be 9.21")]
    [InlineData("basis_weight: 25 g/m2 ± 2 %", "solidity: 1.2", 9, "between 0 and 1")]
    [InlineData("face_velocity: 5.3 cm/s", "face_velocity: 0 cm/s", 12, "above zero")]
    [InlineData("imaging: sem", "imaging: tem", 5, "not one of sem, transmitted, cross-section")]
    [InlineData("humidity: 50 %", "humidity: 50", 13, "from 0 to 1")]
    [InlineData("penetration: 12 %}", "penetration: 120 %}", 16, "from 0 to 1")]
    [InlineData("material: Demo web", "material: {", 2, "not valid YAML")]
    [InlineData("lot: L-1", "material: again", 2, "not valid YAML")]
    [InlineData("lot: L-1", "grade: nowhere.yaml", 0, "no such file")]
    public void A_mistake_is_told_with_its_line(string right, string wrong, int line, string told)
    {
        var problems = Problems(Good.Replace(right, wrong, StringComparison.Ordinal));
        Assert.Contains(problems, p => p.Line == line && p.Message.Contains(told, StringComparison.Ordinal));
    }

    [Fact]
    public void All_mistakes_are_told_at_once_in_the_order_of_the_file()
    {
        var problems = Problems(Good.Replace("24.8 nm", "0 nm", StringComparison.Ordinal).Replace("polymer", "polymr", StringComparison.Ordinal));
        Assert.True(problems.Length >= 3);
        Assert.Equal(problems.Select(p => p.Line).Order(), problems.Select(p => p.Line));
        Assert.All(problems, p => Assert.DoesNotContain('\n', p.ToString()));
    }

    [Fact]
    public void A_forecast_needs_solidity() =>
        Assert.Contains(Problems("images: a.tif\nface_velocity: 5 cm/s"), p => p.Message.Contains("needs the layer's solidity", StringComparison.Ordinal));

    [Theory]
    [InlineData("")]
    [InlineData("just words")]
    [InlineData("- a\n- b")]
    public void Something_that_holds_no_keys_is_refused(string text) => Assert.Single(Problems(text));

    private static SwatchFile Parse(string text) => SwatchFile.Parse(text, "swatch.yaml", Path.GetTempPath());

    private static ImmutableArray<InputProblem> Problems(string text) => Assert.Throws<InputException>(() => Parse(text)).Problems;
}
