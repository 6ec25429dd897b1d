using CsCheck;
using FiberScope.Specimens;

namespace FiberScope.Imaging.Tests.Tracing;

/// <summary>Measuring whole pictures: cylinders of known diameter, the same picture moved, and pictures that show nothing.</summary>
public sealed class FieldMeterTests
{
    private static readonly MeasurementSettings Settings = new();

    private static FieldMeasurement Measure(Micrograph picture) => FieldMeter.Measure(picture, Settings, TestContext.Current.CancellationToken);

    private static double Mean(FieldMeasurement m) => m.Readings.Sum(r => r.Diameter * r.RepresentedLength) / m.Readings.Sum(r => r.RepresentedLength);

    private static Micrograph Crossing() => CylinderPicture.Of((80, 60, 20, 9), (200, 160, 75, 16), (160, 250, -10, 28));

    [Theory]
    [InlineData(6, 0)]
    [InlineData(6, 33)]
    [InlineData(10, 90)]
    [InlineData(17, 45)]
    [InlineData(30, 10)]
    [InlineData(60, 70)]
    public void A_single_cylinder_is_read_at_its_diameter_whatever_its_direction(double diameter, double angle)
    {
        var found = Measure(CylinderPicture.Of((160, 160, angle, diameter)));
        Assert.NotEmpty(found.Readings);
        Assert.InRange(Mean(found), diameter - Math.Max(0.5, 0.03 * diameter), diameter + Math.Max(0.5, 0.03 * diameter));
        Assert.All(found.Readings, r => Assert.InRange(Math.Abs(Math.IEEERemainder(r.Direction - (angle * Math.PI / 180), Math.PI)), 0, 0.1));
    }

    [Fact]
    public void Crossing_cylinders_are_each_read_at_their_own_diameter()
    {
        var found = Measure(Crossing());
        foreach (var diameter in new[] { 9.0, 16, 28 })
        {
            Assert.Contains(found.Readings, r => Math.Abs(r.Diameter - diameter) < Math.Max(0.6, 0.05 * diameter));
        }

        Assert.All(found.Readings, r => Assert.Contains(new[] { 9.0, 16, 28 }, d => Math.Abs(r.Diameter - d) < Math.Max(1, 0.1 * d)));
    }

    [Fact]
    public void Two_cylinders_with_a_gap_between_are_not_read_as_one() =>
        Assert.DoesNotContain(Measure(CylinderPicture.Of((160, 150, 25, 8), (160, 164, 25, 8))).Readings, r => r.Diameter > 11);

    [Fact]
    public void The_dark_gap_between_two_fibres_is_no_fibre() =>
        Assert.All(Measure(CylinderPicture.Of((160, 130, 0, 24), (160, 170, 0, 24))).Readings, r => Assert.InRange(r.Diameter, 22, 26));

    [Theory]
    [InlineData(0.4)]
    [InlineData(0.9)]
    [InlineData(1.5)]
    public void Bright_rims_of_wide_fibres_are_not_read_as_thin_fibres(double rim)
    {
        var family = SpecimenFamilies.Find("spun-bonded")!;
        var specimen = VirtualSpecimen.Make(family with { WidthPixels = 900, HeightPixels = 700, Electrons = family.Electrons with { RimHeight = rim, RimCap = 3.8 } }, 71, TestContext.Current.CancellationToken);
        var grey = specimen.Pixels.ToArray().Select(p => p / 255f).ToArray();
        var found = Measure(new Micrograph(grey, 900, 700, family.PixelSize, ImagingMode.SecondaryElectron, new MicrographSource("spun-bonded", "", 0, 8, "recipe"), 700 - specimen.Truth.Recipe.FieldRows));
        var thinnest = specimen.Truth.Stations.Min(t => t.Diameter);
        Assert.True(found.Readings.Length > 50);
        Assert.InRange(found.Readings.Where(r => r.Diameter < 0.6 * thinnest).Sum(r => r.RepresentedLength) / found.Readings.Sum(r => r.RepresentedLength), 0, 0.02);
    }

    [Fact]
    public void Mirroring_or_turning_a_picture_leaves_the_mean_where_it_was()
    {
        var picture = Crossing();
        var mean = Mean(Measure(picture));
        Assert.Equal(mean, Mean(Measure(CylinderPicture.Moved(picture, (x, y) => (319 - x, y)))), 0.015 * mean);
        Assert.Equal(mean, Mean(Measure(CylinderPicture.Moved(picture, (x, y) => (y, 319 - x)))), 0.015 * mean);
    }

    [Fact]
    public void The_same_picture_gives_the_same_readings_twice() =>
        Assert.Equal(Measure(Crossing()).Readings.AsEnumerable(), Measure(Crossing()).Readings);

    [Fact]
    public void A_picture_without_fibres_gives_no_reading_whatever_its_size() =>
        Gen.Select(Gen.Int[1, 40], Gen.Int[1, 40], Gen.Float[0, 1]).Sample(
            (width, height, level) => FieldMeter.Measure(CylinderPicture.Picture([.. Enumerable.Repeat(level, width * height)], width, height), Settings).Readings.IsEmpty,
            iter: 12);

    [Fact]
    public void Measuring_stops_when_asked()
    {
        using var stop = new CancellationTokenSource();
        stop.Cancel();
        Assert.Throws<OperationCanceledException>(() => FieldMeter.Measure(Crossing(), Settings, stop.Token));
    }
}
