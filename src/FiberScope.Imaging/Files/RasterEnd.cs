using System.Buffers.Binary;

namespace FiberScope.Imaging.Files;

/// <summary>Tells whether a file holds its whole picture: decoders fill what is missing with grey or black and say nothing.</summary>
internal static class RasterEnd
{
    /// <summary>Whether the file's own structure reaches its end.</summary>
    public static bool IsComplete(ReadOnlySpan<byte> bytes, PictureFormat format) => format switch
    {
        PictureFormat.Png => PngEnds(bytes),
        PictureFormat.Jpeg => JpegEnds(bytes),
        PictureFormat.Bmp => BmpEnds(bytes),
        _ => true,
    };

    /// <summary>PNG (ISO/IEC 15948) section 5.3: chunks of length, type, data and checksum, the last of type IEND.</summary>
    private static bool PngEnds(ReadOnlySpan<byte> bytes)
    {
        long at = 8;
        while (at + 12 <= bytes.Length)
        {
            var length = BinaryPrimitives.ReadUInt32BigEndian(bytes[(int)at..]);
            var type = bytes.Slice((int)at + 4, 4);
            at += 12L + length;
            if (type.SequenceEqual("IEND"u8))
            {
                return at <= bytes.Length;
            }
        }

        return false;
    }

    /// <summary>JPEG (ITU-T T.81) annex B: after the first scan of the picture itself there must be an end marker, FF D9.</summary>
    private static bool JpegEnds(ReadOnlySpan<byte> bytes)
    {
        var at = 2;
        while (at + 4 <= bytes.Length && bytes[at] == 0xFF)
        {
            var marker = bytes[at + 1];
            if (marker == 0xDA)
            {
                return bytes[at..].LastIndexOf([(byte)0xFF, (byte)0xD9]) > 0;
            }

            // FF may be repeated as padding; other segments carry their length, so a preview inside one is stepped over.
            at += marker == 0xFF ? 1 : 2 + BinaryPrimitives.ReadUInt16BigEndian(bytes[(at + 2)..]);
        }

        return false;
    }

    private static bool BmpEnds(ReadOnlySpan<byte> bytes)
    {
        if (bytes.Length < 54 || BinaryPrimitives.ReadInt32LittleEndian(bytes[14..]) < 40)
        {
            return bytes.Length >= 26;
        }

        var offset = BinaryPrimitives.ReadUInt32LittleEndian(bytes[10..]);
        long width = BinaryPrimitives.ReadInt32LittleEndian(bytes[18..]);
        long height = Math.Abs((long)BinaryPrimitives.ReadInt32LittleEndian(bytes[22..]));
        var bits = BinaryPrimitives.ReadUInt16LittleEndian(bytes[28..]);
        var compression = BinaryPrimitives.ReadInt32LittleEndian(bytes[30..]);

        // 0 and 3 are uncompressed: rows padded to whole double words.
        return compression is not (0 or 3) || offset + (((width * bits) + 31) / 32 * 4 * height) <= bytes.Length;
    }
}
