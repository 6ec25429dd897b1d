using System.Buffers.Binary;

namespace FiberScope.Acceptance.Tests;

/// <summary>The simplest picture files there are, made byte by byte.</summary>
internal static class Bitmaps
{
    private const int HeaderLength = 54;

    /// <summary>A 24-bit BMP of one grey level. Layout: BITMAPFILEHEADER and BITMAPINFOHEADER, the format's own documentation.</summary>
    public static byte[] Flat(int width, int height, byte level)
    {
        var row = (width * 3 + 3) / 4 * 4;
        var bytes = new byte[HeaderLength + (row * height)];
        bytes.AsSpan(HeaderLength).Fill(level);
        (bytes[0], bytes[1]) = ((byte)'B', (byte)'M');
        void Put(int at, int value) => BinaryPrimitives.WriteInt32LittleEndian(bytes.AsSpan(at), value);
        Put(2, bytes.Length);
        Put(10, HeaderLength);
        Put(14, 40);
        Put(18, width);
        Put(22, height);
        bytes[26] = 1;
        bytes[28] = 24;
        Put(34, row * height);
        return bytes;
    }
}
