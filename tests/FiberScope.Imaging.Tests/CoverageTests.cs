using FiberScope.Specimens;
using UnitsNet;

namespace FiberScope.Imaging.Tests;

/// <summary>The share of a field that fibres cover, beside the truth of virtual specimens.</summary>
public sealed class CoverageTests
{
    [Theory]
    [InlineData(5101)]
    [InlineData(5102)]
    public void The_coverage_of_a_thin_layer_is_the_true_one(int seed)
    {
        var specimen = Make("sparse-on-ground", (ulong)seed, 720, 560);
        Assert.Equal(specimen.Truth.Cover, Measure(specimen).FibreShare!.Value, 0.025);
    }

    [Theory]
    [InlineData("electrospun")]
    [InlineData("spun-bonded")]
    [InlineData("ropes-shot-films")]
    public void A_thick_mat_tells_no_coverage(string family) => Assert.Null(Measure(Make(family, 5200, 480, 400)).FibreShare);

    private static FieldMeasurement Measure(Specimen specimen) => FieldMeter.Measure(Picture(specimen), new MeasurementSettings(), TestContext.Current.CancellationToken);

    private static Specimen Make(string family, ulong seed, int width, int height) =>
        VirtualSpecimen.Make(SpecimenFamilies.Find(family)! with { WidthPixels = width, HeightPixels = height }, seed, TestContext.Current.CancellationToken);

    private static Micrograph Picture(Specimen specimen)
    {
        float[] grey = [.. specimen.Pixels.ToArray().Select(p => p / 255f)];
        return new(grey, specimen.Width, specimen.Height, Length.FromNanometers(100), ImagingMode.SecondaryElectron, new MicrographSource("virtual", string.Empty, 0, 8, "recipe"));
    }
}
