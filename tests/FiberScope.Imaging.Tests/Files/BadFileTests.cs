using BitMiracle.LibTiff.Classic;
using FiberScope.Imaging.Files;
using SixLabors.ImageSharp;
using SixLabors.ImageSharp.PixelFormats;

namespace FiberScope.Imaging.Tests.Files;

/// <summary>Every bad file is refused with one line that names it.</summary>
public sealed class BadFileTests
{
    private static readonly ScaleRequest OneMicrometre = new() { PixelSize = UnitsNet.Length.FromMicrometers(1) };

    public static TheoryData<string, string> Bad => new()
    {
        { "empty", "empty" }, { "text", "not an image" }, { "tiny", "1 × 1" }, { "black", "shows nothing" }, { "nearly-black", "shows nothing" },
        { "cut-tiff", "cut short" }, { "cut-tiff-lzw", "cut short" }, { "cut-tiff-head", "cut short" }, { "cut-second-page", "cut short" },
        { "cut-png", "cut short" }, { "cut-jpeg", "cut short" }, { "cut-bmp", "cut short" }, { "png-head", "cut short" },
        { "bomb-png", "million" }, { "bomb-tiff", "million" }, { "float", "floating-point" },
    };

    [Theory, MemberData(nameof(Bad))]
    public void A_bad_file_is_refused_in_one_line(string kind, string says)
    {
        var refusal = Assert.Throws<ImageRejectedException>(() => MicrographReader.Read(Make(kind), "field-3", OneMicrometre, ImagingMode.SecondaryElectron));
        Assert.StartsWith("field-3: ", refusal.Message, StringComparison.Ordinal);
        Assert.Contains(says, refusal.Message, StringComparison.Ordinal);
        Assert.DoesNotContain('\n', refusal.Message);
    }

    [Fact]
    public void A_missing_file_and_a_folder_are_refused()
    {
        Assert.Contains("no such image", Refusal("nowhere/none.tif"), StringComparison.Ordinal);
        Assert.Contains("folder", Refusal(AppContext.BaseDirectory), StringComparison.Ordinal);

        static string Refusal(string path) =>
            Assert.Throws<ImageRejectedException>(() => MicrographReader.Read(path, OneMicrometre, ImagingMode.SecondaryElectron)).Message;
    }

    [Fact]
    public void A_file_cut_anywhere_is_refused_or_whole()
    {
        var made = Scene.Grey();
        using var image = Image.LoadPixelData<L8>(made, Scene.Width, Scene.Height);
        byte[][] files =
        [
            TiffFile.Grey8(made, Scene.Width, Scene.Height), TiffFile.Grey8(made, Scene.Width, Scene.Height, compression: Compression.LZW),
            TiffFile.Grey8(made, Scene.Width, Scene.Height, compression: Compression.PACKBITS), TiffFile.Grey8(made, Scene.Width, Scene.Height, compression: Compression.ADOBE_DEFLATE),
            Saved(image, (i, s) => i.SaveAsPng(s)), Saved(image, (i, s) => i.SaveAsJpeg(s)), Saved(image, (i, s) => i.SaveAsBmp(s)),
        ];
        foreach (var file in files)
        {
            for (var share = 0.02; share < 1; share += 0.07)
            {
                Assert.Throws<ImageRejectedException>(() => MicrographReader.Read(file[..(int)(share * file.Length)], "cut", OneMicrometre, ImagingMode.SecondaryElectron));
            }
        }
    }

    [Fact]
    public void Damaged_bytes_never_escape_as_another_exception()
    {
        var made = Scene.Grey(4, 64, 64);
        using var image = Image.LoadPixelData<L8>(made, 64, 64);
        byte[][] files =
        [
            TiffFile.Grey8(made, 64, 64, compression: Compression.LZW), TiffFile.Grey8(made, 64, 64, compression: Compression.PACKBITS),
            TiffFile.Write("w", t => TiffFile.TiledPage(t, made, 64, 64, 32, Compression.ADOBE_DEFLATE)),
            Saved(image, (i, s) => i.SaveAsPng(s)), Saved(image, (i, s) => i.SaveAsJpeg(s)), Saved(image, (i, s) => i.SaveAsBmp(s)),
        ];
        var random = new Random(5);
        for (var trial = 0; trial < 600; trial++)
        {
            var file = (byte[])files[trial % files.Length].Clone();
            var head = Math.Min(file.Length, trial % 2 == 0 ? 300 : file.Length);
            for (var i = 0; i < 3; i++)
            {
                // Tags of a TIFF stand at its end.
                var place = random.Next(head);
                file[trial % 4 < 2 ? place : file.Length - 1 - place] = (byte)random.Next(256);
            }

            try
            {
                MicrographReader.Read(file, "damaged", OneMicrometre, ImagingMode.SecondaryElectron);
            }
            catch (ImageRejectedException refusal)
            {
                Assert.DoesNotContain('\n', refusal.Message);
            }
        }
    }

    private static byte[] Make(string kind)
    {
        var made = Scene.Grey();
        using var image = Image.LoadPixelData<L8>(made, Scene.Width, Scene.Height);
        return kind switch
        {
            "empty" => [],
            "text" => "pixel_size: 24.8 nm and more of the same text"u8.ToArray(),
            "tiny" => TiffFile.Grey8([7], 1, 1),
            "black" => TiffFile.Grey8(new byte[made.Length], Scene.Width, Scene.Height),
            "nearly-black" => TiffFile.Grey8([.. made.Select((_, i) => (byte)(i % 3))], Scene.Width, Scene.Height),
            "cut-tiff" => Half(TiffFile.Grey8(made, Scene.Width, Scene.Height, mode: "w")),
            "cut-tiff-lzw" => Half(TiffFile.Grey8(made, Scene.Width, Scene.Height, compression: Compression.LZW)),
            "cut-tiff-head" => TiffFile.Grey8(made, Scene.Width, Scene.Height)[..6],
            "cut-second-page" => TiffFile.Write("w", tiff =>
            {
                TiffFile.Page(tiff, made, Scene.Width, Scene.Height, 8, 1, Photometric.MINISBLACK);
                TiffFile.Page(tiff, made, Scene.Width, Scene.Height, 8, 1, Photometric.MINISBLACK);
            })[..(2 * made.Length)],
            "cut-png" => Half(Saved(image, (i, s) => i.SaveAsPng(s))),
            "png-head" => Saved(image, (i, s) => i.SaveAsPng(s))[..20],
            "cut-jpeg" => Half(Saved(image, (i, s) => i.SaveAsJpeg(s))),
            "cut-bmp" => Half(Saved(image, (i, s) => i.SaveAsBmp(s))),
            "bomb-png" => Bomb(Saved(image, (i, s) => i.SaveAsPng(s))),
            "bomb-tiff" => TiffFile.Write("w", tiff => TiffFile.Page(tiff, new byte[25000], 25000, 1, 8, 1, Photometric.MINISBLACK, more: t => t.SetField(TiffTag.IMAGELENGTH, 25000))),
            _ => TiffFile.Write("w", tiff => TiffFile.Page(tiff, new byte[4 * made.Length], Scene.Width, Scene.Height, 32, 1, Photometric.MINISBLACK, more: t => t.SetField(TiffTag.SAMPLEFORMAT, SampleFormat.IEEEFP))),
        };
    }

    private static byte[] Half(byte[] file) => file[..(file.Length / 2)];

    /// <summary>Writes 60000 × 60000 into the header of a PNG, with its checksum (ISO/IEC 15948 annex D).</summary>
    private static byte[] Bomb(byte[] png)
    {
        System.Buffers.Binary.BinaryPrimitives.WriteInt32BigEndian(png.AsSpan(16), 60000);
        System.Buffers.Binary.BinaryPrimitives.WriteInt32BigEndian(png.AsSpan(20), 60000);
        var crc = 0xFFFFFFFFu;
        foreach (var value in png.AsSpan(12, 17))
        {
            crc ^= value;
            for (var bit = 0; bit < 8; bit++)
            {
                crc = (crc & 1) == 1 ? (crc >> 1) ^ 0xEDB88320u : crc >> 1;
            }
        }

        System.Buffers.Binary.BinaryPrimitives.WriteUInt32BigEndian(png.AsSpan(29), ~crc);
        return png;
    }

    private static byte[] Saved(Image image, Action<Image, Stream> save)
    {
        using var stream = new MemoryStream();
        save(image, stream);
        return stream.ToArray();
    }
}
