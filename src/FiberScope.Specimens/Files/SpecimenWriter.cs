using SixLabors.ImageSharp;
using SixLabors.ImageSharp.Formats;
using SixLabors.ImageSharp.Formats.Jpeg;
using SixLabors.ImageSharp.Formats.Png;
using SixLabors.ImageSharp.Formats.Tiff;
using SixLabors.ImageSharp.Formats.Tiff.Constants;
using SixLabors.ImageSharp.Metadata;
using SixLabors.ImageSharp.PixelFormats;

namespace FiberScope.Specimens.Files;

/// <summary>Writes a specimen's picture.</summary>
public static class SpecimenWriter
{
    /// <summary>Writes the picture.</summary>
    /// <param name="specimen">The specimen.</param>
    /// <param name="stream">Where to; left open.</param>
    /// <param name="format">The file format.</param>
    /// <param name="jpegQuality">Quality of a JPEG, 1 to 100; the recipe's own when 0, and 90 when that has none.</param>
    /// <remarks>TIFF and PNG hold the pixels as they are; JPEG compresses them, and its encoder may differ in a last bit between processors.</remarks>
    public static void WritePicture(Specimen specimen, Stream stream, SpecimenFormat format, int jpegQuality = 0)
    {
        using var image = Image.LoadPixelData<L8>(specimen.Pixels.ToArray(), specimen.Width, specimen.Height);
        var perCentimetre = 0.01 / specimen.Recipe.PixelSize.Meters;
        image.Metadata.ResolutionUnits = PixelResolutionUnit.PixelsPerCentimeter;
        (image.Metadata.HorizontalResolution, image.Metadata.VerticalResolution) = (perCentimetre, perCentimetre);
        var own = specimen.Recipe.Camera.JpegQuality;
        var quality = jpegQuality > 0 ? jpegQuality : own > 0 ? own : 90;
        if (format == SpecimenFormat.Jpeg)
        {
            // A JPEG's density field has 16 bits: too few for a microscope's scale.
            (image.Metadata.HorizontalResolution, image.Metadata.VerticalResolution) = (72, 72);
            image.Metadata.ResolutionUnits = PixelResolutionUnit.PixelsPerInch;
        }

        IImageEncoder encoder = format switch
        {
            SpecimenFormat.Tiff => new TiffEncoder { BitsPerPixel = TiffBitsPerPixel.Bit8, Compression = TiffCompression.Deflate, PhotometricInterpretation = TiffPhotometricInterpretation.BlackIsZero },
            SpecimenFormat.Png => new PngEncoder { ColorType = PngColorType.Grayscale, BitDepth = PngBitDepth.Bit8, CompressionLevel = PngCompressionLevel.Level6 },
            _ => new JpegEncoder { ColorType = JpegColorType.Luminance, Quality = quality },
        };
        image.Save(stream, encoder);
    }
}
