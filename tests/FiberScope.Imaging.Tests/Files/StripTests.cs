using FiberScope.Imaging.Files;
using FiberScope.Specimens;
using OpenCvSharp;

namespace FiberScope.Imaging.Tests.Files;

/// <summary>Information strips and scale bars drawn here with OpenCV, and those of virtual specimens.</summary>
public sealed class StripTests
{
    private const int Width = 640;
    private const int Rows = 400;

    public static TheoryData<int, int, int, bool, string> Strips
    {
        get
        {
            var data = new TheoryData<int, int, int, bool, string>();
            foreach (var (ground, ink) in new[] { (0, 255), (255, 0), (40, 230), (0, 180), (200, 20) })
            {
                foreach (var rows in new[] { 22, 48, 90 })
                {
                    data.Add(ground, ink, rows, rows != 48, ".png");
                    data.Add(ground, ink, rows, rows == 48, ".jpg");
                }
            }

            return data;
        }
    }

    [Theory, MemberData(nameof(Strips))]
    public void A_strip_is_found_to_the_row_and_its_bar_to_the_pixel(int ground, int ink, int rows, bool line, string extension)
    {
        foreach (var bar in new[] { 61, 148, 301 })
        {
            using var picture = Draw(ground, ink, rows, line, bar, ticks: bar != 148);
            var micrograph = Read(picture, extension, new ScaleRequest { ScaleBarLength = UnitsNet.Length.FromMicrometers(10) });
            Assert.InRange(micrograph.ExcludedBottomRows, rows - 1, rows + 3);
            Assert.Equal(bar, 10 / micrograph.PixelSize.Micrometers, 0.6);
        }
    }

    [Fact]
    public void A_bar_drawn_to_a_fraction_of_a_pixel_is_measured_to_one()
    {
        foreach (var bar in new[] { 120.25, 120.5, 120.8 })
        {
            using var picture = Draw(0, 255, 60, line: false, bar: 0, ticks: false);
            Cv2.Rectangle(picture, new Rect(300, Rows + 40, (int)bar, 4), Scalar.White, -1);
            Cv2.Rectangle(picture, new Rect(300 + (int)bar, Rows + 40, 1, 4), new Scalar(255 * (bar - (int)bar)), -1);

            Assert.Equal(bar, 10 / Read(picture, ".png", new ScaleRequest { ScaleBarLength = UnitsNet.Length.FromMicrometers(10) }).PixelSize.Micrometers, 0.05);
        }
    }

    [Fact]
    public void Pictures_without_a_strip_show_no_strip_that_is_not_there()
    {
        foreach (var recipe in Families("sparse-on-ground", "spun-bonded", "transmitted-light", "cross-sections"))
        {
            var specimen = VirtualSpecimen.Make(Small(recipe), 11, TestContext.Current.CancellationToken);
            Assert.Equal((recipe.Name, 0), (recipe.Name, Read(specimen, ScaleRequestOf(recipe)).ExcludedBottomRows));
        }
    }

    [Theory, InlineData(false), InlineData(true)]
    public void The_strip_and_bar_of_a_virtual_specimen_are_found(bool light)
    {
        foreach (var recipe in Families("spun-bonded", "cross-sections", "sparse-on-ground").Append(Families("spun-bonded")[0] with { Camera = new() { JpegQuality = 85 } }))
        {
            var bar = UnitsNet.Length.FromMicrometers(Math.Round(recipe.PixelSize.Micrometers * 150, 1));
            var strip = new StripRecipe { ScaleBar = bar, Light = light, HeightPixels = 44 };
            var specimen = VirtualSpecimen.Make(Small(recipe) with { Strip = strip }, 12, TestContext.Current.CancellationToken);
            var micrograph = Read(specimen, new ScaleRequest { ScaleBarLength = bar });
            Assert.Equal((recipe.Name, true), (recipe.Name, micrograph.ExcludedBottomRows is >= 43 and <= 46));
            Assert.Equal(1, micrograph.PixelSize / recipe.PixelSize, 0.01);
        }
    }

    [Fact]
    public void A_bar_without_a_strip_a_strip_without_a_bar_and_two_bars_are_told()
    {
        var scale = new ScaleRequest { ScaleBarLength = UnitsNet.Length.FromMicrometers(10) };
        using var none = Field();
        Assert.Contains("no information strip", Refusal(none), StringComparison.Ordinal);
        using var empty = Draw(0, 255, 50, line: true, bar: 0, ticks: false);
        Assert.Contains("no scale bar", Refusal(empty), StringComparison.Ordinal);
        using var two = Draw(0, 255, 70, line: true, bar: 100, ticks: false);
        Cv2.Rectangle(two, new Rect(60, Rows + 52, 130, 3), Scalar.White, -1);
        Assert.Contains("2 strokes", Refusal(two), StringComparison.Ordinal);

        string Refusal(Mat picture) => Assert.Throws<ImageRejectedException>(() => Read(picture, ".png", scale)).Message;
    }

    [Fact]
    public void A_bar_that_contradicts_the_given_pixel_size_is_refused()
    {
        using var picture = Draw(0, 255, 60, line: true, bar: 200, ticks: true);
        var scale = new ScaleRequest { ScaleBarLength = UnitsNet.Length.FromMicrometers(10), PixelSize = UnitsNet.Length.FromNanometers(52) };
        var refusal = Assert.Throws<ImageRejectedException>(() => Read(picture, ".png", scale)).Message;
        Assert.Contains("52 nm", refusal, StringComparison.Ordinal);
        Assert.Contains("50 nm", refusal, StringComparison.Ordinal);
    }

    [Fact]
    public void A_dark_sky_below_a_few_fibres_is_no_strip()
    {
        using var picture = new Mat(Rows, Width, MatType.CV_8UC1, Scalar.Black);
        for (var i = 0; i < 14; i++)
        {
            Cv2.Line(picture, new Point(40 * i, 0), new Point((97 * i) % Width, Rows), new Scalar(190), 5, LineTypes.AntiAlias);
        }

        Assert.Equal(0, Read(picture, ".png", new ScaleRequest { PixelSize = UnitsNet.Length.FromMicrometers(1) }).ExcludedBottomRows);
    }

    private static SpecimenRecipe[] Families(params string[] names) => [.. names.Select(name => SpecimenFamilies.Find(name)!)];

    private static ScaleRequest ScaleRequestOf(SpecimenRecipe recipe) => new() { PixelSize = recipe.PixelSize };

    private static SpecimenRecipe Small(SpecimenRecipe recipe) => recipe with { WidthPixels = 400, HeightPixels = 320 };

    private static Micrograph Read(Specimen specimen, ScaleRequest scale)
    {
        using var mat = Mat.FromPixelData(specimen.Height, specimen.Width, MatType.CV_8UC1, specimen.Pixels.ToArray());
        return Read(mat, ".png", scale);
    }

    private static Micrograph Read(Mat picture, string extension, ScaleRequest scale) =>
        MicrographReader.Read(picture.ImEncode(extension, [(int)ImwriteFlags.JpegQuality, 92]), "drawn", scale, ImagingMode.SecondaryElectron)[0];

    private static Mat Field()
    {
        using var made = Mat.FromPixelData(Rows, Width, MatType.CV_8UC1, Scene.Grey(3, Width, Rows));
        return made.GaussianBlur(new Size(0, 0), 0.8);
    }

    private static Mat Draw(int ground, int ink, int rows, bool line, int bar, bool ticks)
    {
        using var field = Field();
        var picture = new Mat(Rows + rows, Width, MatType.CV_8UC1, new Scalar(ground));
        field.CopyTo(picture.RowRange(0, Rows));
        if (line)
        {
            Cv2.Rectangle(picture, new Rect(0, Rows, Width, 2), new Scalar(ink), -1);
        }

        var scale = rows / 70.0;
        var lines = rows < 40 ? 1 : 2;
        for (var i = 0; i < lines; i++)
        {
            Cv2.PutText(picture, "HV 5.0 kV  WD 8.2 mm  4000 x  roll 7", new Point(6, Rows + ((i + 1) * rows / (lines + 1)) + (int)(6 * scale)), HersheyFonts.HersheySimplex, 0.35 + (0.2 * scale), new Scalar(ink), 1, LineTypes.AntiAlias);
        }

        if (bar > 0)
        {
            var y = Rows + rows - Math.Max(5, rows / 7);
            Cv2.Rectangle(picture, new Rect(320, y, bar, 2), new Scalar(ink), -1);
            if (ticks)
            {
                Cv2.Rectangle(picture, new Rect(320, y - 3, 2, 8), new Scalar(ink), -1);
                Cv2.Rectangle(picture, new Rect(320 + bar - 2, y - 3, 2, 8), new Scalar(ink), -1);
            }
        }

        return picture;
    }
}
