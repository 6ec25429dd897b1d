using FiberScope.Imaging.Openness;
using FiberScope.Specimens;
using UnitsNet;

namespace FiberScope.Imaging.Tests;

/// <summary>Directions of edges, on drawn stripes and beside the truth of virtual mats.</summary>
public sealed class EdgeDirectionTests
{
    [Theory]
    [InlineData(0)]
    [InlineData(30)]
    [InlineData(90)]
    [InlineData(137)]
    public void Stripes_run_where_they_were_drawn(int degrees)
    {
        var (sin, cos) = Math.SinCos(degrees * Math.PI / 180);
        float[] grey = [.. Enumerable.Range(0, 300 * 300).Select(i => 0.5f + (0.3f * (float)Math.Sin((((i / 300) * cos) - ((i % 300) * sin)) / 3)))];
        var found = Summary([EdgeDirections.Of(Picture(grey, 300, 300))]);
        Assert.InRange(found.Order, 0.98, 1);
        Assert.Equal(0, Math.Sin(found.PrincipalDirection.Radians - (degrees * Math.PI / 180)), 0.02);
    }

    [Fact]
    public void An_even_field_has_no_direction() => Assert.Empty(EdgeDirections.Of(Picture([.. Enumerable.Repeat(0.5f, 100 * 100)], 100, 100)));

    [Fact]
    public void A_mat_laid_along_the_machine_shows_it()
    {
        var (truth, read) = (new List<(double, double)>(), new List<IReadOnlyList<double>>());
        foreach (var seed in (ulong[])[6101, 6102])
        {
            var specimen = VirtualSpecimen.Make(SpecimenFamilies.Find("md-oriented")! with { WidthPixels = 900, HeightPixels = 700 }, seed, TestContext.Current.CancellationToken);
            truth.AddRange(specimen.Truth.Stations.Select(s => ((double)s.Direction, (double)s.Length)));
            read.Add(EdgeDirections.Of(Picture([.. specimen.Pixels.ToArray().Select(p => p / 255f)], specimen.Width, specimen.Height)));
        }

        var (real, found) = (TrueOrientation.Of(truth), Summary(read));

        // Edges count by contrast, the truth by length: over the few fibres of two small fields these differ by some degrees, over the
        // six full ones of the validation program's structure run by less than one.
        Assert.Equal(real.PrincipalDirection.Degrees, found.PrincipalDirection.Degrees, 5.0);
        Assert.Equal(real.Order, found.Order, 0.06);
    }

    private static TrueOrientation Summary(IEnumerable<IReadOnlyList<double>> fields) =>
        TrueOrientation.Of(fields.SelectMany(f => f.Select((share, c) => ((c + 0.5) * Math.PI / EdgeDirections.Classes, share))));

    private static Micrograph Picture(float[] grey, int width, int height) =>
        new(grey, width, height, Length.FromNanometers(200), ImagingMode.SecondaryElectron, new MicrographSource("virtual", string.Empty, 0, 8, "recipe"));
}
