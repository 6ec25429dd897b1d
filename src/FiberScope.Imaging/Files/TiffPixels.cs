using BitMiracle.LibTiff.Classic;

namespace FiberScope.Imaging.Files;

/// <summary>Decodes the pixels of one page of a TIFF into grey.</summary>
internal static class TiffPixels
{
    /// <summary>Grey, row by row as stored; 0 (black) to 1 (white).</summary>
    /// <exception cref="ImageRejectedException">The data are cut short, or of a kind that is not read.</exception>
    public static float[] Decode(Tiff tiff, TiffLayout layout, string name)
    {
        if (layout.Photometric is not (Photometric.MINISBLACK or Photometric.MINISWHITE or Photometric.RGB or Photometric.PALETTE)
            || layout.Compression is Compression.JPEG or Compression.OJPEG)
        {
            return DecodeByLibrary(tiff, layout, name);
        }

        if (layout.SampleFormat is not (SampleFormat.UINT or SampleFormat.VOID) || layout.BitsPerSample is not (1 or 2 or 4 or 8 or 16))
        {
            throw new ImageRejectedException(FormattableString.Invariant($"{name}: the TIFF holds {layout.BitsPerSample}-bit {(layout.SampleFormat == SampleFormat.IEEEFP ? "floating-point" : layout.SampleFormat == SampleFormat.INT ? "signed" : "unsigned")} values; save it as 8-bit or 16-bit grey."));
        }

        var samples = TiffSamples.Read(tiff, layout, name);
        return layout.Photometric switch
        {
            Photometric.PALETTE => FromPalette(tiff, layout, samples, name),
            Photometric.RGB when layout.SamplesPerPixel >= 3 => FromColour(layout, samples),
            _ => FromGrey(layout, samples),
        };
    }

    private static float[] FromGrey(TiffLayout layout, ushort[] samples)
    {
        var white = layout.BitsPerSample == 16 ? SampleRange.WhiteOf(samples) : (1 << layout.BitsPerSample) - 1;
        var grey = new float[layout.Width * layout.Height];
        var stride = layout.SamplesPerPixel;
        var scale = 1f / white;
        var inverted = layout.Photometric == Photometric.MINISWHITE;
        for (var i = 0; i < grey.Length; i++)
        {
            var value = samples[i * stride] * scale;
            grey[i] = inverted ? 1 - value : value;
        }

        return grey;
    }

    private static float[] FromColour(TiffLayout layout, ushort[] samples)
    {
        var white = layout.BitsPerSample == 16 ? SampleRange.WhiteOf(samples) : (1 << layout.BitsPerSample) - 1;
        var grey = new float[layout.Width * layout.Height];
        var stride = layout.SamplesPerPixel;
        var scale = 1f / white;
        for (var i = 0; i < grey.Length; i++)
        {
            grey[i] = Luminance.Of(samples[i * stride] * scale, samples[(i * stride) + 1] * scale, samples[(i * stride) + 2] * scale);
        }

        return grey;
    }

    private static float[] FromPalette(Tiff tiff, TiffLayout layout, ushort[] samples, string name)
    {
        if (layout.BitsPerSample > 8 || tiff.GetField(TiffTag.COLORMAP) is not [var r, var g, var b])
        {
            throw TiffPictures.Damaged(name);
        }

        var (red, green, blue) = (r.ToUShortArray(), g.ToUShortArray(), b.ToUShortArray());
        var entries = 1 << layout.BitsPerSample;
        if (red.Length < entries || green.Length < entries || blue.Length < entries)
        {
            throw TiffPictures.Damaged(name);
        }

        // Some writers fill the 16-bit table with 8-bit values.
        var white = red.Concat(green).Concat(blue).Max() < 256 ? 255f : 65535f;
        var shade = new float[entries];
        for (var i = 0; i < entries; i++)
        {
            shade[i] = Luminance.Of(red[i] / white, green[i] / white, blue[i] / white);
        }

        var grey = new float[layout.Width * layout.Height];
        for (var i = 0; i < grey.Length; i++)
        {
            grey[i] = shade[samples[i * layout.SamplesPerPixel]];
        }

        return grey;
    }

    /// <summary>The rarer colour models go through the library's own conversion to 8-bit colour.</summary>
    private static float[] DecodeByLibrary(Tiff tiff, TiffLayout layout, string name)
    {
        var raster = new int[layout.Width * layout.Height];
        if (!tiff.RGBAImageOK(out var reason))
        {
            throw new ImageRejectedException($"{name}: this kind of TIFF is not read ({reason.TrimEnd('.').ToLowerInvariant()}); save it as 8-bit or 16-bit grey.");
        }

        // As stored: the orientation is applied afterwards, for every kind alike.
        if (!tiff.ReadRGBAImageOriented(layout.Width, layout.Height, raster, (Orientation)layout.Orientation, stopOnError: true))
        {
            throw TiffPictures.Damaged(name);
        }

        var grey = new float[raster.Length];
        for (var i = 0; i < grey.Length; i++)
        {
            grey[i] = Luminance.Of(Tiff.GetR(raster[i]) / 255f, Tiff.GetG(raster[i]) / 255f, Tiff.GetB(raster[i]) / 255f);
        }

        return grey;
    }
}
