using BitMiracle.LibTiff.Classic;

namespace FiberScope.Imaging.Files;

/// <summary>How one page of a TIFF is laid out, read from its tags.</summary>
internal sealed record TiffLayout
{
    public required int Width { get; init; }

    public required int Height { get; init; }

    public required int BitsPerSample { get; init; }

    public required int SamplesPerPixel { get; init; }

    public required Photometric Photometric { get; init; }

    public required PlanarConfig Planar { get; init; }

    public required SampleFormat SampleFormat { get; init; }

    public required Compression Compression { get; init; }

    public required int Orientation { get; init; }

    /// <summary>False for a thumbnail, a lower level of a pyramid, or a mask.</summary>
    public required bool IsFullPicture { get; init; }

    /// <summary>Pixels per resolution unit across; 0 when absent.</summary>
    public required double ResolutionX { get; init; }

    /// <summary>Pixels per resolution unit down; 0 when absent.</summary>
    public required double ResolutionY { get; init; }

    /// <summary>Metres in the file's resolution unit; null when it names none.</summary>
    public required double? MetresPerResolutionUnit { get; init; }

    /// <summary>Reads the tags of the current page.</summary>
    /// <exception cref="ImageRejectedException">The page has no size.</exception>
    public static TiffLayout Read(Tiff tiff, string name)
    {
        var width = Number(tiff, TiffTag.IMAGEWIDTH, 0);
        var height = Number(tiff, TiffTag.IMAGELENGTH, 0);
        if (width <= 0 || height <= 0)
        {
            throw TiffPictures.Damaged(name);
        }

        var kind = (FileType)Number(tiff, TiffTag.SUBFILETYPE, 0);
        return new TiffLayout
        {
            Width = width,
            Height = height,
            BitsPerSample = Number(tiff, TiffTag.BITSPERSAMPLE, 1),
            SamplesPerPixel = Number(tiff, TiffTag.SAMPLESPERPIXEL, 1),
            // A missing tag is against the standard but common; black as zero is what every such file means.
            Photometric = (Photometric)Number(tiff, TiffTag.PHOTOMETRIC, (int)Photometric.MINISBLACK),
            Planar = (PlanarConfig)Number(tiff, TiffTag.PLANARCONFIG, (int)PlanarConfig.CONTIG),
            SampleFormat = (SampleFormat)Number(tiff, TiffTag.SAMPLEFORMAT, (int)SampleFormat.UINT),
            Compression = (Compression)Number(tiff, TiffTag.COMPRESSION, (int)Compression.NONE),
            Orientation = Number(tiff, TiffTag.ORIENTATION, 1),
            IsFullPicture = !kind.HasFlag(FileType.REDUCEDIMAGE) && !kind.HasFlag(FileType.MASK),
            ResolutionX = Real(tiff, TiffTag.XRESOLUTION),
            ResolutionY = Real(tiff, TiffTag.YRESOLUTION),
            MetresPerResolutionUnit = (ResUnit)Number(tiff, TiffTag.RESOLUTIONUNIT, (int)ResUnit.INCH) switch
            {
                ResUnit.INCH => 0.0254,
                ResUnit.CENTIMETER => 0.01,
                _ => null,
            },
        };
    }

    private static int Number(Tiff tiff, TiffTag tag, int otherwise) =>
        tiff.GetField(tag) is [var value, ..] ? value.ToInt() : otherwise;

    private static double Real(Tiff tiff, TiffTag tag) =>
        tiff.GetField(tag) is [var value, ..] && double.IsFinite(value.ToDouble()) ? value.ToDouble() : 0;
}
