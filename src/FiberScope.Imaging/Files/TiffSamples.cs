using BitMiracle.LibTiff.Classic;

namespace FiberScope.Imaging.Files;

/// <summary>Reads the samples of one page, strip by strip or tile by tile, into one array.</summary>
internal static class TiffSamples
{
    /// <summary>The samples, pixel by pixel and channel by channel as stored.</summary>
    /// <exception cref="ImageRejectedException">The data are cut short.</exception>
    public static ushort[] Read(Tiff tiff, TiffLayout layout, string name)
    {
        var samples = new ushort[checked((long)layout.Width * layout.Height * layout.SamplesPerPixel)];
        if (tiff.IsTiled())
        {
            ReadTiles(tiff, layout, samples, name);
        }
        else
        {
            ReadStrips(tiff, layout, samples, name);
        }

        return samples;
    }

    private static void ReadStrips(Tiff tiff, TiffLayout layout, ushort[] samples, string name)
    {
        var separate = layout.Planar == PlanarConfig.SEPARATE && layout.SamplesPerPixel > 1;
        var row = new byte[Math.Max(tiff.ScanlineSize(), 1)];
        for (var plane = 0; plane < (separate ? layout.SamplesPerPixel : 1); plane++)
        {
            for (var y = 0; y < layout.Height; y++)
            {
                if (!tiff.ReadScanline(row, 0, y, (short)plane))
                {
                    throw TiffPictures.Damaged(name);
                }

                Unpack(row, 0, layout, separate ? plane : 0, separate ? 1 : layout.SamplesPerPixel, 0, layout.Width, y, samples);
            }
        }
    }

    private static void ReadTiles(Tiff tiff, TiffLayout layout, ushort[] samples, string name)
    {
        var separate = layout.Planar == PlanarConfig.SEPARATE && layout.SamplesPerPixel > 1;
        var tileWidth = tiff.GetField(TiffTag.TILEWIDTH)[0].ToInt();
        var tileHeight = tiff.GetField(TiffTag.TILELENGTH)[0].ToInt();
        if (tileWidth <= 0 || tileHeight <= 0)
        {
            throw TiffPictures.Damaged(name);
        }

        var tile = new byte[tiff.TileSize()];
        var rowBytes = tiff.TileRowSize();
        for (var plane = 0; plane < (separate ? layout.SamplesPerPixel : 1); plane++)
        {
            for (var top = 0; top < layout.Height; top += tileHeight)
            {
                for (var left = 0; left < layout.Width; left += tileWidth)
                {
                    if (tiff.ReadTile(tile, 0, left, top, 0, (short)plane) < 0)
                    {
                        throw TiffPictures.Damaged(name);
                    }

                    for (var row = 0; row < tileHeight && top + row < layout.Height; row++)
                    {
                        Unpack(tile, row * rowBytes, layout, separate ? plane : 0, separate ? 1 : layout.SamplesPerPixel, left, Math.Min(tileWidth, layout.Width - left), top + row, samples);
                    }
                }
            }
        }
    }

    private static void Unpack(byte[] from, int start, TiffLayout layout, int channel, int channels, int left, int count, int y, ushort[] samples)
    {
        var target = (((long)y * layout.Width) + left) * layout.SamplesPerPixel;
        for (var i = 0; i < count * channels; i++)
        {
            var place = channels == 1 ? target + ((long)i * layout.SamplesPerPixel) + channel : target + i;
            samples[place] = Sample(from, start, i, layout.BitsPerSample);
        }
    }

    /// <summary>16-bit samples arrive in the machine's byte order; narrower ones are packed from the high bits down.</summary>
    private static ushort Sample(byte[] from, int start, int index, int bits) => bits switch
    {
        8 => from[start + index],
        16 => BitConverter.ToUInt16(from, start + (2 * index)),
        _ => (ushort)((from[start + (index * bits / 8)] >> (8 - bits - (index * bits % 8))) & ((1 << bits) - 1)),
    };
}
