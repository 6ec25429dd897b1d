using FiberScope.Assessment.Input;

namespace FiberScope.Assessment.Tests.Input;

public sealed class MediaFileTests
{
    private const string Good = """
        layers:
          - name: web
            fibre_diameter: {median: 1.8 um, gsd: 1.6}
            solidity: 0.08
            thickness: 310 um
          - fibre_diameter:
              components:
                - {fraction: 0.7, median: 12 um, gsd: 1.2}
                - {fraction: 30 %, median: 18 um, gsd: 1.1}
            basis_weight: 40 g/m2
            polymer: 0.905 g/cm3
            thickness: 420 um
        face_velocity: 5.3 cm/s
        particle_density: 2 g/cm3
        particles: [1 um, 0.3 um]
        correlations: hinds-1999
        """;

    // A log-normal of median m and geometric standard deviation g has the mean m exp(ln² g / 2).
    [Fact]
    public void A_good_file_is_understood()
    {
        var media = Parse(Good);
        Assert.Equal(1.8 * Math.Exp(Math.Pow(Math.Log(1.6), 2) / 2), media.Layers[0].Diameters.Mean.Micrometers, 0.01);
        Assert.Equal(40e-3 / (905 * 420e-6), media.Layers[1].Solidity.Fraction, 1e-9);
        Assert.Equal([0.3, 1.0], media.Operation.Particles.Select(p => Math.Round(p.Micrometers, 9)));
    }

    [Theory]
    [InlineData("solidity: 0.08", "solidity: 1", 4, "between 0 and 1")]
    [InlineData("solidity: 0.08", "solidity: 0.08 um", 4, "a pure number is wanted")]
    [InlineData("solidity: 0.08", "note: x", 4, "unknown key 'note'")]
    [InlineData("gsd: 1.6", "gsd: 0.9", 3, "from 1 to 20")]
    [InlineData(", gsd: 1.6", "", 3, "median and gsd go together")]
    [InlineData("fraction: 0.7", "fraction: 0.5", 7, "must sum to 1")]
    [InlineData("{median: 1.8 um, gsd: 1.6}", "{measurement: nowhere.json}", 3, "no such file")]
    [InlineData("face_velocity: 5.3 cm/s", "note: x", 1, "face_velocity is missing")]
    [InlineData("face_velocity: 5.3 cm/s", "face_velocity: 5.3 Pa", 13, "is a pressure; a velocity is wanted")]
    [InlineData("correlations: hinds-1999", "correlations: best", 16, "not one of kirsch-stechkina-1978, lee-liu-1982, hinds-1999, cell, cell-mat")]
    [InlineData("particles: [1 um, 0.3 um]", "particles: [0]", 15, "no unit")]
    public void A_mistake_is_told_with_its_line(string right, string wrong, int line, string told)
    {
        var problems = Assert.Throws<InputException>(() => Parse(Good.Replace(right, wrong, StringComparison.Ordinal))).Problems;
        Assert.Contains(problems, p => p.Line == line && p.Message.Contains(told, StringComparison.Ordinal));
    }

    private static MediaFile Parse(string text) => MediaFile.Parse(text, "media.yaml", Path.GetTempPath());
}
