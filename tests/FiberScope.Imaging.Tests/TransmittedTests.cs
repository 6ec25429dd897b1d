using FiberScope.Specimens;
using FiberScope.Statistics;
using UnitsNet;

namespace FiberScope.Imaging.Tests;

/// <summary>Fibres in transmitted light, beside the truth of a virtual layer whose light follows another law than the model's.</summary>
public sealed class TransmittedTests(TransmittedTests.Layer layer) : IClassFixture<TransmittedTests.Layer>
{
    [Fact]
    public void Fibres_are_read_by_their_outer_edges_and_not_by_their_rims()
    {
        double[] ratios = [.. layer.Found.Readings.Select(Ratio).Where(double.IsFinite)];
        Assert.InRange(ratios.Length, 200, int.MaxValue);
        Assert.InRange(ratios.Count(r => Math.Abs(r - 1) > 0.25) / (double)ratios.Length, 0, 0.05);
        Assert.Equal(1, WeightedSample.Even(ratios).Quantile(0.5), 0.03);
    }

    [Fact]
    public void Fibres_out_of_focus_are_left_out_and_counted()
    {
        Assert.True(layer.Found.Rejected.GetValueOrDefault("out-of-focus") > 0);
        Assert.InRange(layer.Found.Readings.Count(r => !double.IsFinite(Ratio(r))) / (double)layer.Found.Readings.Length, 0, 0.05);
    }

    [Fact]
    public void The_light_taken_tells_the_coverage() => Assert.Equal(layer.Truth.Cover, layer.Found.FibreShare!.Value, 0.05);

    [Fact]
    public void An_empty_field_gives_nothing_and_does_not_fail()
    {
        float[] grey = [.. Enumerable.Repeat(0.7f, 200 * 150)];
        var found = FieldMeter.Measure(Picture(grey, 200, 150), new MeasurementSettings(), TestContext.Current.CancellationToken);
        Assert.Empty(found.Readings);
        Assert.Null(found.FibreShare);
    }

    private double Ratio(PixelReading reading)
    {
        var near = layer.Truth.Stations.Where(s => Math.Pow(s.X - reading.X, 2) + Math.Pow(s.Y - reading.Y, 2) < 16 && Math.Abs(Math.Sin(s.Direction - reading.Direction)) < 0.2).ToArray();
        return near.Length == 0 ? double.NaN : reading.Diameter / near.MinBy(s => Math.Pow(s.X - reading.X, 2) + Math.Pow(s.Y - reading.Y, 2)).Diameter;
    }

    private static Micrograph Picture(float[] grey, int width, int height) =>
        new(grey, width, height, Length.FromNanometers(500), ImagingMode.Transmitted, new MicrographSource("virtual", string.Empty, 0, 8, "recipe"));

    /// <summary>One virtual layer, made and measured once.</summary>
    public sealed class Layer
    {
        public Layer()
        {
            var specimen = VirtualSpecimen.Make(SpecimenFamilies.Find("transmitted-light")! with { WidthPixels = 1000, HeightPixels = 800 }, 5301, TestContext.Current.CancellationToken);
            Truth = specimen.Truth;
            Found = FieldMeter.Measure(Picture([.. specimen.Pixels.ToArray().Select(p => p / 255f)], specimen.Width, specimen.Height), new MeasurementSettings(), TestContext.Current.CancellationToken);
        }

        public SpecimenTruth Truth { get; }

        public FieldMeasurement Found { get; }
    }
}
