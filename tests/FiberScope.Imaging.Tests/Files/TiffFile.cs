using BitMiracle.LibTiff.Classic;

namespace FiberScope.Imaging.Tests.Files;

/// <summary>Writes the TIFF files that the tests read.</summary>
internal static class TiffFile
{
    public static byte[] Grey8(byte[] pixels, int width, int height, Action<Tiff>? more = null, string mode = "w", Compression compression = Compression.NONE) =>
        Write(mode, tiff => Page(tiff, pixels, width, height, 8, 1, Photometric.MINISBLACK, compression, more));

    public static byte[] Write(string mode, Action<Tiff> pages)
    {
        // LibTiff closes the stream; a memory stream gives its bytes all the same.
        using var stream = new MemoryStream();
        using (var tiff = Tiff.ClientOpen("made", mode, stream, new TiffStream()))
        {
            pages(tiff);
            tiff.Flush();
        }

        return stream.ToArray();
    }

    public static void Page(Tiff tiff, byte[] rows, int width, int height, int bits, int samples, Photometric photometric, Compression compression = Compression.NONE, Action<Tiff>? more = null, bool predictor = false)
    {
        Size(tiff, width, height, bits, samples, photometric, compression);
        tiff.SetField(TiffTag.ROWSPERSTRIP, 7);
        if (predictor)
        {
            tiff.SetField(TiffTag.PREDICTOR, Predictor.HORIZONTAL);
        }

        more?.Invoke(tiff);
        var stride = ((width * bits * samples) + 7) / 8;
        for (var y = 0; y < height; y++)
        {
            Assert.True(tiff.WriteScanline(rows.AsSpan(y * stride, stride).ToArray(), y));
        }

        tiff.WriteDirectory();
    }

    public static void TiledPage(Tiff tiff, byte[] pixels, int width, int height, int tile, Compression compression)
    {
        Size(tiff, width, height, 8, 1, Photometric.MINISBLACK, compression);
        tiff.SetField(TiffTag.TILEWIDTH, tile);
        tiff.SetField(TiffTag.TILELENGTH, tile);
        for (var top = 0; top < height; top += tile)
        {
            for (var left = 0; left < width; left += tile)
            {
                var buffer = new byte[tile * tile];
                for (var y = 0; y < tile && top + y < height; y++)
                {
                    pixels.AsSpan(((top + y) * width) + left, Math.Min(tile, width - left)).CopyTo(buffer.AsSpan(y * tile));
                }

                Assert.True(tiff.WriteTile(buffer, left, top, 0, 0) > 0);
            }
        }

        tiff.WriteDirectory();
    }

    private static void Size(Tiff tiff, int width, int height, int bits, int samples, Photometric photometric, Compression compression)
    {
        tiff.SetField(TiffTag.IMAGEWIDTH, width);
        tiff.SetField(TiffTag.IMAGELENGTH, height);
        tiff.SetField(TiffTag.BITSPERSAMPLE, bits);
        tiff.SetField(TiffTag.SAMPLESPERPIXEL, samples);
        tiff.SetField(TiffTag.PHOTOMETRIC, photometric);
        tiff.SetField(TiffTag.PLANARCONFIG, PlanarConfig.CONTIG);
        tiff.SetField(TiffTag.COMPRESSION, compression);
    }
}
