using FiberScope.Assessment.Input;

namespace FiberScope.Assessment.Tests.Input;

public sealed class UnitTests
{
    [Theory]
    [InlineData("1.5 um", 1.5)]
    [InlineData("1.5um", 1.5)]
    [InlineData("1.5 \u00B5m", 1.5)] // micro sign
    [InlineData("1.5 \u03BCm", 1.5)] // Greek mu
    [InlineData("1.5 micron", 1.5)]
    [InlineData("1500 nm", 1.5)]
    [InlineData("0.0015 mm", 1.5)]
    [InlineData("1.5e-6 m", 1.5)]
    [InlineData("+1.5 um", 1.5)]
    public void A_length_is_read_in_the_spellings_people_type(string text, double micrometres) =>
        Assert.Equal(micrometres, Media($"fibre_diameter: '{text}'").Layers[0].Diameters.Mean.Micrometers, 1e-9);

    [Theory]
    [InlineData("25 g/m2")]
    [InlineData("25 g/m²")]
    [InlineData("25 g/m^2")]
    [InlineData("25 gsm")]
    [InlineData("0.025 kg/m2")]
    public void A_basis_weight_is_read_in_the_spellings_people_type(string text) =>
        Assert.Equal(25e-3 / (905 * 310e-6), Media($"fibre_diameter: 2 um\n    basis_weight: {text}\n    polymer: pp", solidity: "").Layers[0].Solidity.Fraction, 1e-9);

    [Theory]
    [InlineData("0.905 g/cm3")]
    [InlineData("0.905 g/cm³")]
    [InlineData("0.905 g/cc")]
    [InlineData("905 kg/m3")]
    public void A_density_is_read_in_the_spellings_people_type(string text) =>
        Assert.Equal(25e-3 / (905 * 310e-6), Media($"fibre_diameter: 2 um\n    basis_weight: 25 gsm\n    polymer: {text}", solidity: "").Layers[0].Solidity.Fraction, 1e-9);

    [Theory]
    [InlineData("5.3 cm/s")]
    [InlineData("53 mm/s")]
    [InlineData("0.053 m/s")]
    [InlineData("3.18 m/min")]
    public void A_face_velocity_is_read_in_the_spellings_people_type(string text) =>
        Assert.Equal(5.3, Media("fibre_diameter: 2 um", velocity: text).Operation.FaceVelocity.CentimetersPerSecond, 1e-9);

    [Theory]
    [InlineData("23 C", 296.15)]
    [InlineData("23 °C", 296.15)]
    [InlineData("296.15 K", 296.15)]
    [InlineData("73.4 F", 296.15)]
    public void A_temperature_is_read_in_the_spellings_people_type(string text, double kelvins) =>
        Assert.Equal(kelvins, Media("fibre_diameter: 2 um", extra: $"air: {{temperature: {text}}}").Operation.Air.Temperature.Kelvins, 1e-6);

    private static MediaFile Media(string layer, string velocity = "5.3 cm/s", string solidity = "\n    solidity: 0.08", string extra = "") =>
        MediaFile.Parse($"layers:\n  - thickness: 310 um\n    {layer}{solidity}\nface_velocity: {velocity}\n{extra}", "media.yaml", Path.GetTempPath());
}
