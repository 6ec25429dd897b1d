using FiberScope.Specimens;
using FiberScope.Statistics;
using OpenCvSharp;

namespace FiberScope.Imaging.Tests.Sections;

/// <summary>Sections drawn here with OpenCV at sixteen times the resolution, and a virtual one.</summary>
public sealed class SectionTests
{
    private const int Fine = 8;

    [Theory]
    [InlineData(10)]
    [InlineData(18)]
    [InlineData(40)]
    public void Ellipses_are_read_by_their_shorter_axis_and_weighed_by_their_longer(double minor)
    {
        var found = Measure(500, 400, 0.7, [(120.3, 110.6, minor, minor, 0), (300.8, 250.2, minor, 2 * minor, 35)]);
        Assert.Equal(2, found.Readings.Length);
        Assert.All(found.Readings, reading => Assert.Equal(minor, reading.Diameter, (0.01 * minor) + 0.12));
        var tilted = found.Readings.MaxBy(reading => reading.RepresentedLength);
        Assert.Equal(2, tilted.RepresentedLength / found.Readings.Min(reading => reading.RepresentedLength), 0.35);
        Assert.Equal(35 * Math.PI / 180, tilted.Direction, 0.03);
        Assert.Equal((300.8, 250.2), (Math.Round(tilted.X, 1), Math.Round(tilted.Y, 1)));
    }

    [Fact]
    public void Touching_discs_are_split_and_a_long_ellipse_is_not()
    {
        var found = Measure(400, 300, 0.7, [(100, 100, 24, 24, 0), (123, 104, 24, 24, 0), (250, 180, 20, 64, 70)]);
        Assert.Equal(3, found.Readings.Length);
        Assert.Equal([20, 24, 24], found.Readings.Select(reading => Math.Round(reading.Diameter)).Order());
    }

    [Fact]
    public void The_share_of_area_is_the_share_that_was_drawn()
    {
        (double, double, double, double, double)[] discs = [.. Enumerable.Range(0, 30).Select(i => (30.0 + (60 * (i % 6)), 30.0 + (60 * (i / 6)), 12.0 + i, 14.0 + i, 7.0 * i))];
        var share = discs.Sum(disc => Math.PI / 4 * disc.Item3 * disc.Item4) / (360 * 300);
        Assert.Equal(share, Measure(360, 300, 1, discs).FibreShare!.Value, 0.015 * share);
    }

    [Fact]
    public void Fibres_darker_than_the_resin_are_read_alike()
    {
        (double, double, double, double, double)[] discs = [(100, 100, 24, 24, 0), (200, 150, 30, 45, 20)];
        var bright = Measure(400, 300, 0.7, discs);
        var dark = Measure(400, 300, 0.7, discs, inverted: true);
        Assert.Equal(bright.Readings[0].Diameter, dark.Readings[0].Diameter, 0.05);
        Assert.Equal(bright.FibreShare!.Value, dark.FibreShare!.Value, 0.001);
    }

    [Fact]
    public void What_the_border_cuts_is_not_read_but_counted()
    {
        var found = Measure(400, 300, 0.7, [(2, 150, 30, 30, 0), (200, 150, 30, 30, 0)]);
        Assert.Single(found.Readings);
        Assert.Equal(1, found.Rejected["cut-by-border"]);
    }

    [Fact]
    public void A_virtual_section_gives_its_diameters_and_its_solidity()
    {
        var recipe = SpecimenFamilies.Find("cross-sections")! with { WidthPixels = 800, HeightPixels = 640 };
        var specimen = VirtualSpecimen.Make(recipe, 21, TestContext.Current.CancellationToken);
        var found = FieldMeter.Measure(Of([.. specimen.Pixels.ToArray().Select(value => value / 255f)], specimen.Width, specimen.Height), new MeasurementSettings(), TestContext.Current.CancellationToken);
        var sample = new WeightedSample([.. found.Readings.Select(reading => reading.Diameter)], [.. found.Readings.Select(reading => reading.RepresentedLength)]);
        Assert.Equal(specimen.Truth.Visible.Mean, sample.Mean, 0.06 * specimen.Truth.Visible.Mean);
        Assert.Equal(specimen.Truth.Solidity, found.FibreShare!.Value, Math.Max(0.005, 0.03 * specimen.Truth.Solidity));
    }

    private static FieldMeasurement Measure(int width, int height, double blur, (double X, double Y, double Minor, double Major, double Degrees)[] discs, bool inverted = false)
    {
        using var drawn = new Mat(Fine * height, Fine * width, MatType.CV_32FC1, new Scalar(0.25));
        foreach (var disc in discs)
        {
            // OpenCV's pixel centres are whole numbers, ours halves.
            var centre = new Point2f((float)((disc.X * Fine) - 0.5), (float)((disc.Y * Fine) - 0.5));
            Cv2.Ellipse(drawn, new RotatedRect(centre, new Size2f((float)(disc.Major * Fine), (float)(disc.Minor * Fine)), (float)disc.Degrees), new Scalar(0.7), -1);
        }

        using var small = new Mat();
        Cv2.Resize(drawn, small, new Size(width, height), interpolation: InterpolationFlags.Area);
        using var blurred = small.GaussianBlur(new Size(0, 0), blur);
        blurred.GetArray(out float[] picture);
        var random = new Random(9);
        for (var i = 0; i < picture.Length; i++)
        {
            picture[i] += (float)(0.06 * (random.NextDouble() - 0.5));
            picture[i] = inverted ? 1 - picture[i] : picture[i];
        }

        return FieldMeter.Measure(Of(picture, width, height), new MeasurementSettings(), TestContext.Current.CancellationToken);
    }

    private static Micrograph Of(float[] picture, int width, int height) =>
        new(picture, width, height, UnitsNet.Length.FromMicrometers(0.4), ImagingMode.CrossSection, new MicrographSource("made", string.Empty, 0, 8, "made"));
}
