using BitMiracle.LibTiff.Classic;
using FiberScope.Imaging.Files;
using OpenCvSharp;
using SixLabors.ImageSharp.Formats.Bmp;
using SixLabors.ImageSharp.Formats.Jpeg;
using SixLabors.ImageSharp.Formats.Png;
using SixLabors.ImageSharp.PixelFormats;
using SixLabors.ImageSharp.Processing.Processors.Quantization;

namespace FiberScope.Imaging.Tests.Files;

/// <summary>Pixels that are read are the pixels that were written; a second, independent decoder (OpenCV) agrees.</summary>
public sealed class FormatTests
{
    private static readonly ScaleRequest OneMicrometre = new() { PixelSize = UnitsNet.Length.FromMicrometers(1) };
    private static readonly byte[] Made = Scene.Grey();

    public static TheoryData<string, Compression> TiffKinds => new()
    {
        { "wl", Compression.NONE }, { "wb", Compression.NONE }, { "wl", Compression.LZW }, { "wb", Compression.LZW },
        { "wl", Compression.ADOBE_DEFLATE }, { "wb", Compression.PACKBITS }, { "w8", Compression.DEFLATE },
    };

    [Theory, MemberData(nameof(TiffKinds))]
    public void A_grey_tiff_gives_its_pixels_in_either_byte_order_and_any_compression(string mode, Compression compression)
    {
        if (mode == "w8")
        {
            mode = "wl";
        }

        Same(Made, One(TiffFile.Grey8(Made, Scene.Width, Scene.Height, mode: mode, compression: compression)));
        var deep = Scene.Bytes(Scene.Deep(Made));
        var file = TiffFile.Write(mode, tiff => TiffFile.Page(tiff, deep, Scene.Width, Scene.Height, 16, 1, Photometric.MINISBLACK, compression));
        var micrograph = One(file);
        Same(Made, micrograph);
        Assert.Equal(16, micrograph.Source.BitDepth);
    }

    [Theory, InlineData("wl"), InlineData("wb")]
    public void Differences_between_neighbours_are_summed_up_as_another_decoder_does(string mode)
    {
        // The writer packs big-endian differences wrongly, so the pixels made are no reference here: the other decoder is.
        var file = TiffFile.Write(mode, tiff => TiffFile.Page(tiff, Scene.Bytes(Scene.Deep(Made)), Scene.Width, Scene.Height, 16, 1, Photometric.MINISBLACK, Compression.LZW, predictor: true));
        using var other = Cv2.ImDecode(file, ImreadModes.Unchanged);
        Assert.True(other.GetArray(out ushort[] pixels));
        var grey = One(file).Grey;
        for (var i = 0; i < pixels.Length; i++)
        {
            Assert.Equal(pixels[i] / 65535.0, grey[i], 1e-6);
        }
    }

    [Fact]
    public void Sixteen_bit_pixels_keep_their_sixteen_bits()
    {
        var samples = Enumerable.Range(0, Scene.Width * Scene.Height).Select(i => (ushort)(i * 1.5)).ToArray();
        var file = TiffFile.Write("w", tiff => TiffFile.Page(tiff, Scene.Bytes(samples), Scene.Width, Scene.Height, 16, 1, Photometric.MINISBLACK));
        var grey = One(file).Grey;
        for (var i = 0; i < samples.Length; i++)
        {
            Assert.Equal(samples[i] / 65535.0, grey[i], 1e-6);
        }
    }

    [Fact]
    public void Twelve_bits_stored_in_sixteen_reach_from_black_to_white()
    {
        var samples = Array.ConvertAll(Made, value => (ushort)(value * 4095 / 255));
        var file = TiffFile.Write("w", tiff => TiffFile.Page(tiff, Scene.Bytes(samples), Scene.Width, Scene.Height, 16, 1, Photometric.MINISBLACK));
        Same(Made, One(file), 0.5 / 255);
    }

    [Fact]
    public void White_as_zero_is_turned_round() =>
        Same(Made, One(TiffFile.Write("w", tiff => TiffFile.Page(tiff, Array.ConvertAll(Made, value => (byte)(255 - value)), Scene.Width, Scene.Height, 8, 1, Photometric.MINISWHITE))));

    [Fact]
    public void Grey_saved_as_colour_is_the_same_grey() =>
        Same(Made, One(TiffFile.Write("w", tiff => TiffFile.Page(tiff, [.. Made.SelectMany(v => new[] { v, v, v })], Scene.Width, Scene.Height, 8, 3, Photometric.RGB, Compression.LZW))));

    [Fact]
    public void Colour_with_transparency_ignores_the_transparency() =>
        Same(Made, One(TiffFile.Write("w", tiff => TiffFile.Page(tiff, [.. Made.SelectMany((v, i) => new[] { v, v, v, (byte)(i % 256) })], Scene.Width, Scene.Height, 8, 4, Photometric.RGB))));

    [Fact]
    public void A_palette_is_looked_up()
    {
        var table = Enumerable.Range(0, 256).Select(i => (ushort)((255 - i) * 257)).ToArray();
        Same(Made, One(TiffFile.Write("w", tiff => TiffFile.Page(tiff, Array.ConvertAll(Made, value => (byte)(255 - value)), Scene.Width, Scene.Height, 8, 1, Photometric.PALETTE, more: t => t.SetField(TiffTag.COLORMAP, table, table, table)))));
    }

    [Theory]
    [InlineData(64, Compression.NONE)]
    [InlineData(112, Compression.LZW)]
    public void Tiles_are_put_together(int tile, Compression compression) =>
        Same(Made, One(TiffFile.Write("w", tiff => TiffFile.TiledPage(tiff, Made, Scene.Width, Scene.Height, tile, compression))));

    [Fact]
    public void Each_page_is_a_field_and_thumbnails_are_none()
    {
        var second = Scene.Grey(2);
        var file = TiffFile.Write("w", tiff =>
        {
            TiffFile.Page(tiff, Made, Scene.Width, Scene.Height, 8, 1, Photometric.MINISBLACK);
            TiffFile.Page(tiff, Scene.Grey(3, 60, 45), 60, 45, 8, 1, Photometric.MINISBLACK, more: t => t.SetField(TiffTag.SUBFILETYPE, FileType.REDUCEDIMAGE));
            TiffFile.Page(tiff, second, Scene.Width, Scene.Height, 8, 1, Photometric.MINISBLACK, Compression.PACKBITS);
        });
        var fields = MicrographReader.Read(file, "pages.tif", OneMicrometre, ImagingMode.SecondaryElectron);
        Assert.Equal([0, 2], fields.Select(field => field.Source.Page));
        Same(Made, fields[0]);
        Same(second, fields[1]);
    }

    [Theory]
    [InlineData(Orientation.BOTRIGHT)]
    [InlineData(Orientation.BOTLEFT)]
    public void A_picture_stored_upside_down_is_set_upright(Orientation orientation)
    {
        var stored = new byte[Made.Length];
        for (var y = 0; y < Scene.Height; y++)
        {
            for (var x = 0; x < Scene.Width; x++)
            {
                var column = orientation == Orientation.BOTRIGHT ? Scene.Width - 1 - x : x;
                stored[((Scene.Height - 1 - y) * Scene.Width) + column] = Made[(y * Scene.Width) + x];
            }
        }

        Same(Made, One(TiffFile.Grey8(stored, Scene.Width, Scene.Height, tiff => tiff.SetField(TiffTag.ORIENTATION, orientation))));
    }

    [Fact]
    public void Png_of_8_and_16_bits_and_bmp_give_their_pixels()
    {
        using var image = SixLabors.ImageSharp.Image.LoadPixelData<L8>(Made, Scene.Width, Scene.Height);
        Same(Made, One(Saved(image, new PngEncoder())));
        Same(Made, One(Saved(image, new PngEncoder { BitDepth = PngBitDepth.Bit16, ColorType = PngColorType.Grayscale })));
        Same(Made, One(Saved(image, new PngEncoder { ColorType = PngColorType.Rgb })), 0.51 / 255);
        Same(Made, One(Saved(image, new BmpEncoder { BitsPerPixel = BmpBitsPerPixel.Pixel24 })), 0.51 / 255);
    }

    [Fact]
    public void Palettes_of_png_and_bmp_are_looked_up()
    {
        var plain = new WuQuantizer(new QuantizerOptions { Dither = null });
        byte[] steps = [.. Made.Select(value => (byte)(value / 16 * 17))];
        using var image = SixLabors.ImageSharp.Image.LoadPixelData<L8>(steps, Scene.Width, Scene.Height);
        Same(steps, One(Saved(image, new PngEncoder { ColorType = PngColorType.Palette, BitDepth = PngBitDepth.Bit4, Quantizer = plain })), 0.51 / 255);
        Same(steps, One(Saved(image, new BmpEncoder { BitsPerPixel = BmpBitsPerPixel.Pixel8, Quantizer = plain })), 0.51 / 255);
    }

    [Fact]
    public void Jpeg_agrees_with_another_decoder()
    {
        using var image = SixLabors.ImageSharp.Image.LoadPixelData<L8>(Made, Scene.Width, Scene.Height);
        AgreesWithOpenCv(Saved(image, new JpegEncoder { Quality = 90, ColorType = JpegColorType.Luminance }), 1.5 / 255);
        AgreesWithOpenCv(Saved(image, new JpegEncoder { Quality = 90 }), 2.5 / 255);
    }

    [Theory]
    [InlineData(Compression.NONE)]
    [InlineData(Compression.LZW)]
    [InlineData(Compression.PACKBITS)]
    [InlineData(Compression.ADOBE_DEFLATE)]
    public void Tiff_agrees_with_another_decoder(Compression compression) =>
        AgreesWithOpenCv(TiffFile.Grey8(Made, Scene.Width, Scene.Height, compression: compression), 1e-6);

    [Theory]
    [InlineData(".tif", 0)]
    [InlineData(".tif", 1)]
    [InlineData(".tif", 5)]
    [InlineData(".tif", 32946)]
    public void A_tiff_of_another_writer_is_read(string extension, int compression)
    {
        using var mat = Mat.FromPixelData(Scene.Height, Scene.Width, MatType.CV_8UC1, Made);
        int[] parameters = compression == 0 ? [] : [(int)ImwriteFlags.TiffCompression, compression];
        Same(Made, One(mat.ImEncode(extension, parameters)));
        using var deep = new Mat();
        mat.ConvertTo(deep, MatType.CV_16UC1, 257);
        Same(Made, One(deep.ImEncode(extension, parameters)));
        Same(Made, One(deep.ImEncode(".png")));
    }

    [Fact]
    public void The_header_counts_not_the_name()
    {
        using var image = SixLabors.ImageSharp.Image.LoadPixelData<L8>(Made, Scene.Width, Scene.Height);
        Same(Made, MicrographReader.Read(Saved(image, new PngEncoder()), "wrong.tif", OneMicrometre, ImagingMode.SecondaryElectron)[0]);
    }

    [Fact]
    public void The_record_holds_name_hash_and_mode()
    {
        var file = TiffFile.Grey8(Made, Scene.Width, Scene.Height);
        using var stream = new MemoryStream(file);
        var micrograph = MicrographReader.Read(stream, "-", OneMicrometre, ImagingMode.CrossSection)[0];
        Assert.Equal(Convert.ToHexStringLower(System.Security.Cryptography.SHA256.HashData(file)), micrograph.Source.Sha256);
        Assert.Equal("-", micrograph.Source.Name);
        Assert.Equal(ImagingMode.CrossSection, micrograph.Mode);
        Assert.Equal(8, micrograph.Source.BitDepth);
    }

    private static Micrograph One(byte[] file) => Assert.Single(MicrographReader.Read(file, "made", OneMicrometre, ImagingMode.SecondaryElectron));

    private static byte[] Saved(SixLabors.ImageSharp.Image image, SixLabors.ImageSharp.Formats.IImageEncoder encoder)
    {
        using var stream = new MemoryStream();
        image.Save(stream, encoder);
        return stream.ToArray();
    }

    private static void Same(byte[] made, Micrograph read, double tolerance = 1e-6)
    {
        Assert.Equal((Scene.Width, Scene.Height), (read.Width, read.Height));
        for (var i = 0; i < made.Length; i++)
        {
            Assert.Equal(made[i] / 255.0, read.Grey[i], tolerance);
        }
    }

    private static void AgreesWithOpenCv(byte[] file, double tolerance)
    {
        using var other = Cv2.ImDecode(file, ImreadModes.Grayscale);
        Assert.True(other.GetArray(out byte[] pixels));
        Same(pixels, One(file), tolerance);
    }
}
