namespace FiberScope.Imaging.Files;

/// <summary>The file formats that are read.</summary>
internal enum PictureFormat
{
    Unknown,
    Tiff,
    Png,
    Jpeg,
    Bmp,
}

/// <summary>Tells a format by the first bytes of a file, whatever its name ends in.</summary>
internal static class PictureFormats
{
    /// <summary>The format of a file that begins with these bytes.</summary>
    /// <remarks>
    /// Signatures: TIFF 6.0 (Adobe 1992) section 2, with the 43 of BigTIFF; PNG (ISO/IEC 15948) section 5.2; JPEG (ITU-T T.81)
    /// annex B, marker SOI; BMP: the letters BM.
    /// </remarks>
    public static PictureFormat Of(ReadOnlySpan<byte> head) => head switch
    {
        [0x49, 0x49, 42 or 43, 0, ..] or [0x4D, 0x4D, 0, 42 or 43, ..] => PictureFormat.Tiff,
        [0x89, 0x50, 0x4E, 0x47, 0x0D, 0x0A, 0x1A, 0x0A, ..] => PictureFormat.Png,
        [0xFF, 0xD8, 0xFF, ..] => PictureFormat.Jpeg,
        [0x42, 0x4D, ..] when head.Length >= 26 => PictureFormat.Bmp,
        _ => PictureFormat.Unknown,
    };
}
