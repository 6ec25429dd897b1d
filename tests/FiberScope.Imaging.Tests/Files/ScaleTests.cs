using System.Globalization;
using System.Text;
using BitMiracle.LibTiff.Classic;
using FiberScope.Imaging.Files;
using UnitsNet;

namespace FiberScope.Imaging.Tests.Files;

public sealed class ScaleTests
{
    private static readonly byte[] Made = Scene.Grey();

    public static TheoryData<string> TextEntries =>
    [
        "PixelWidth=24.8e-9\nPixelHeight=24.8e-9", "Pixel Size = 24.8 nm", "PixelSizeX: 0.0248 µm\r\nPixelSizeY: 0.0248 µm", "[scan]\npixel_width [nm] = 24.8",
        "IMAGE_PIXEL_SIZE\r\nImage Pixel Size = 24.80 nm\r\n", "{\"pixelSize\": \"24.8nm\"}", "scale 24.8 nm/pixel", "Pixel size (um): 0.0248", "Pixel Size = 24,8 nm",
        "<PixelWidth=\"2.48e-08\"/>", "Pixel Size = 24.8 nm\nCamera Pixel Size = 6.5 um\nMagnification = 4000", "pixel spacing = 0.0248 \\u00B5m",
    ];

    [Theory, MemberData(nameof(TextEntries))]
    public void Pixel_sizes_in_text_tags_are_found(string text)
    {
        Nanometres(24.8, Tiff(tiff => tiff.SetField(TiffTag.IMAGEDESCRIPTION, Latin(text))));
        Nanometres(24.8, Tiff(tiff => PrivateTag(tiff, text)));
    }

    [Theory]
    [InlineData("Pixel Size = 24.8")]
    [InlineData("Pixel Size = 1,234 nm")]
    [InlineData("Camera Pixel Size = 6.5 um")]
    [InlineData("Pixel Size = 24.8 kg")]
    [InlineData("Pixel Size = -24.8 nm")]
    [InlineData("Pixel Size = 24.8 nm²")]
    [InlineData("no pixel size here: 24.8 nm wide letters")]
    public void Nothing_is_guessed_from_text_that_gives_no_size(string text) => Unknown(Tiff(tiff => tiff.SetField(TiffTag.IMAGEDESCRIPTION, Latin(text))));

    [Theory]
    [InlineData(72, ResUnit.INCH)]
    [InlineData(96, ResUnit.INCH)]
    [InlineData(128, ResUnit.INCH)]
    [InlineData(150, ResUnit.INCH)]
    [InlineData(300, ResUnit.INCH)]
    [InlineData(600, ResUnit.INCH)]
    [InlineData(1200, ResUnit.INCH)]
    [InlineData(28.35, ResUnit.CENTIMETER)]
    [InlineData(118, ResUnit.CENTIMETER)]
    [InlineData(472.4, ResUnit.CENTIMETER)]
    [InlineData(40322, ResUnit.NONE)]
    public void A_printing_resolution_is_no_scale(double perUnit, ResUnit unit) => Unknown(Tiff(Resolution(perUnit, perUnit, unit)));

    [Theory]
    [InlineData(403225.8, ResUnit.CENTIMETER, 24.8)]
    [InlineData(1024193.5, ResUnit.INCH, 24.8)]
    [InlineData(2540, ResUnit.INCH, 10000)]
    public void A_microscopes_resolution_is_a_scale(double perUnit, ResUnit unit, double nanometres) => Nanometres(nanometres, Tiff(Resolution(perUnit, perUnit, unit)));

    [Fact]
    public void A_resolution_whose_unit_stands_in_the_description_is_a_scale() => Nanometres(24.8, Tiff(tiff =>
    {
        Resolution(40.3225806, 40.3225806, ResUnit.NONE)(tiff);
        tiff.SetField(TiffTag.IMAGEDESCRIPTION, "images=1\nunit=micron\nloop=false\n");
    }));

    [Theory]
    [InlineData("PhysicalSizeX=\"0.0248\" PhysicalSizeY=\"0.0248\"")]
    [InlineData("PhysicalSizeX=\"24.8\" PhysicalSizeXUnit=\"nm\"")]
    [InlineData("PhysicalSizeX=\"2.48e-5\" PhysicalSizeXUnit=\"mm\" PhysicalSizeY=\"24.8\" PhysicalSizeYUnit=\"nm\"")]
    public void Ome_xml_is_read_with_its_units(string attributes) => Nanometres(24.8, Tiff(tiff => tiff.SetField(TiffTag.IMAGEDESCRIPTION, Latin(Ome(attributes)))));

    [Fact]
    public void Ome_xml_in_reference_units_is_no_scale() => Unknown(Tiff(tiff => tiff.SetField(TiffTag.IMAGEDESCRIPTION, Ome("PhysicalSizeX=\"1\" PhysicalSizeXUnit=\"pixel\""))));

    [Fact]
    public void Sources_that_disagree_by_more_than_two_percent_are_refused_with_both_values()
    {
        var file = Tiff(tiff => tiff.SetField(TiffTag.IMAGEDESCRIPTION, "Pixel Size = 24.8 nm"));
        var refusal = Assert.Throws<ImageRejectedException>(() => Read(file, new ScaleRequest { PixelSize = Length.FromNanometers(25.4) })).Message;
        Assert.Contains("24.8 nm", refusal, StringComparison.Ordinal);
        Assert.Contains("25.4 nm", refusal, StringComparison.Ordinal);
        Assert.Equal(25.2, Read(file, new ScaleRequest { PixelSize = Length.FromNanometers(25.2) }).PixelSize.Nanometers, 1e-9);
        Assert.Throws<ImageRejectedException>(() => Read(Tiff(tiff => tiff.SetField(TiffTag.IMAGEDESCRIPTION, "Pixel Size = 24.8 nm\nImage Pixel Size = 49.6 nm")), ScaleRequest.FromFile));
    }

    [Fact]
    public void No_source_at_all_is_refused_with_the_three_ways_to_give_one()
    {
        var refusal = Assert.Throws<ImageRejectedException>(() => Read(Tiff(_ => { }), ScaleRequest.FromFile)).Message;
        Assert.Contains("as a pixel size", refusal, StringComparison.Ordinal);
        Assert.Contains("scale bar", refusal, StringComparison.Ordinal);
        Assert.Contains("OME-XML", refusal, StringComparison.Ordinal);
    }

    [Fact]
    public void Pixels_that_are_not_square_are_refused()
    {
        NotSquare(Tiff(Resolution(403225.8, 390000, ResUnit.CENTIMETER)));
        NotSquare(Tiff(tiff => tiff.SetField(TiffTag.IMAGEDESCRIPTION, "PixelWidth=24.8e-9\nPixelHeight=26e-9")));
        NotSquare(Tiff(tiff => tiff.SetField(TiffTag.IMAGEDESCRIPTION, Ome("PhysicalSizeX=\"0.0248\" PhysicalSizeY=\"0.03\""))));

        static void NotSquare(byte[] file) =>
            Assert.Contains("not square", Assert.Throws<ImageRejectedException>(() => Read(file, ScaleRequest.FromFile)).Message, StringComparison.Ordinal);
    }

    [Fact]
    public void The_scale_of_the_first_page_holds_for_pages_without_text()
    {
        var file = TiffFile.Write("w", tiff =>
        {
            TiffFile.Page(tiff, Made, Scene.Width, Scene.Height, 8, 1, Photometric.MINISBLACK, more: t => t.SetField(TiffTag.IMAGEDESCRIPTION, "Pixel Size = 24.8 nm"));
            TiffFile.Page(tiff, Scene.Grey(8), Scene.Width, Scene.Height, 8, 1, Photometric.MINISBLACK);
        });
        Assert.All(MicrographReader.Read(file, "two", ScaleRequest.FromFile, ImagingMode.SecondaryElectron), field => Assert.Equal(24.8, field.PixelSize.Nanometers, 1e-6));
    }

    [Fact]
    public void German_readers_get_the_same_scale()
    {
        var before = CultureInfo.CurrentCulture;
        try
        {
            CultureInfo.CurrentCulture = CultureInfo.GetCultureInfo("de-DE");
            Nanometres(24.8, Tiff(tiff => tiff.SetField(TiffTag.IMAGEDESCRIPTION, "Pixel Size = 24.8 nm")));
            Nanometres(24.8, Tiff(tiff => tiff.SetField(TiffTag.IMAGEDESCRIPTION, Ome("PhysicalSizeX=\"0.0248\""))));
            var refusal = Assert.Throws<ImageRejectedException>(() => Read(Tiff(tiff => tiff.SetField(TiffTag.IMAGEDESCRIPTION, "Pixel Size = 24.8 nm")), new ScaleRequest { PixelSize = Length.FromNanometers(20.5) })).Message;
            Assert.Contains("20.5 nm", refusal, StringComparison.Ordinal);
        }
        finally
        {
            CultureInfo.CurrentCulture = before;
        }
    }

    [Theory]
    [InlineData(0)]
    [InlineData(-24.8)]
    [InlineData(double.NaN)]
    public void A_pixel_size_that_is_not_above_zero_is_refused(double nanometres) =>
        Assert.ThrowsAny<ArgumentException>(() => new ScaleRequest { PixelSize = Length.FromNanometers(nanometres) });

    private static byte[] Tiff(Action<Tiff> more) => TiffFile.Grey8(Made, Scene.Width, Scene.Height, more);

    private static Action<Tiff> Resolution(double x, double y, ResUnit unit) => tiff =>
    {
        tiff.SetField(TiffTag.XRESOLUTION, x);
        tiff.SetField(TiffTag.YRESOLUTION, y);
        tiff.SetField(TiffTag.RESOLUTIONUNIT, unit);
    };

    private static void PrivateTag(Tiff tiff, string text)
    {
        var tag = (TiffTag)40321;
        tiff.MergeFieldInfo([new TiffFieldInfo(tag, TiffFieldInfo.Variable2, TiffFieldInfo.Variable2, TiffType.ASCII, FieldBit.Custom, true, false, "private")], 1);
        tiff.SetField(tag, Latin(text));
    }

    /// <summary>The writer stores a string's characters as bytes: UTF-8 spelled in Latin-1 gives UTF-8 in the file.</summary>
    private static string Latin(string text) => Encoding.Latin1.GetString(Encoding.UTF8.GetBytes(text));

    private static string Ome(string attributes) =>
        $"<?xml version=\"1.0\" encoding=\"UTF-8\"?><OME xmlns=\"http://www.openmicroscopy.org/Schemas/OME/2016-06\"><Image ID=\"Image:0\"><Pixels ID=\"Pixels:0\" Type=\"uint8\" SizeX=\"240\" SizeY=\"180\" {attributes}><TiffData IFD=\"0\" PlaneCount=\"1\"/></Pixels></Image></OME>";

    private static Micrograph Read(byte[] file, ScaleRequest scale) => MicrographReader.Read(file, "field", scale, ImagingMode.SecondaryElectron)[0];

    private static void Nanometres(double expected, byte[] file) => Assert.Equal(expected, Read(file, ScaleRequest.FromFile).PixelSize.Nanometers, expected * 1e-4);

    private static void Unknown(byte[] file) =>
        Assert.Contains("no pixel size is known", Assert.Throws<ImageRejectedException>(() => Read(file, ScaleRequest.FromFile)).Message, StringComparison.Ordinal);
}
