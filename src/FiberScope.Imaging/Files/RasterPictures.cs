using SixLabors.ImageSharp;
using SixLabors.ImageSharp.Formats;
using SixLabors.ImageSharp.Formats.Bmp;
using SixLabors.ImageSharp.Formats.Jpeg;
using SixLabors.ImageSharp.Formats.Png;
using SixLabors.ImageSharp.Metadata;
using SixLabors.ImageSharp.PixelFormats;
using SixLabors.ImageSharp.Processing;

namespace FiberScope.Imaging.Files;

/// <summary>Decodes PNG, JPEG and BMP files.</summary>
internal static class RasterPictures
{
    /// <summary>Decodes the one picture in the file.</summary>
    /// <exception cref="ImageRejectedException">The file is damaged, cut short or too large.</exception>
    public static Picture Decode(byte[] bytes, PictureFormat format, string name)
    {
        var label = format.ToString().ToUpperInvariant();
        try
        {
            IImageDecoder decoder = format switch
            {
                PictureFormat.Png => new PngDecoder { IgnoreMetadata = true },
                PictureFormat.Jpeg => new JpegDecoder(),
                _ => new BmpDecoder(),
            };
            using var stream = new MemoryStream(bytes, writable: false);
            var header = Image.Identify(stream) ?? throw Damaged(label, name);
            SizeLimit.Check(name, header.Width, header.Height);
            if (!RasterEnd.IsComplete(bytes, format))
            {
                throw Damaged(label, name);
            }

            stream.Position = 0;
            using var image = Image.Load<L16>(stream, decoder);
            image.Mutate(operation => operation.AutoOrient());
            var depth = format == PictureFormat.Png && header.Metadata.GetPngMetadata().BitDepth == PngBitDepth.Bit16 ? 16 : 8;
            return new Picture(Grey(image, depth), image.Width, image.Height, depth, 0, format == PictureFormat.Png ? Clues(header.Metadata, name) : []);
        }
        catch (Exception cause) when (cause is ImageFormatException or InvalidImageContentException or IOException or NotSupportedException
            or ArgumentException or IndexOutOfRangeException or OverflowException or NullReferenceException or InvalidOperationException)
        {
            throw new ImageRejectedException(Damaged(label, name).Message, cause);
        }
    }

    private static float[] Grey(Image<L16> image, int depth)
    {
        var samples = new ushort[image.Width * image.Height];
        image.ProcessPixelRows(rows =>
        {
            for (var y = 0; y < rows.Height; y++)
            {
                var row = rows.GetRowSpan(y);
                for (var x = 0; x < row.Length; x++)
                {
                    samples[(y * rows.Width) + x] = row[x].PackedValue;
                }
            }
        });
        var white = depth == 16 ? SampleRange.WhiteOf(samples) : ushort.MaxValue;
        return Array.ConvertAll(samples, sample => sample / (float)white);
    }

    /// <summary>PNG holds a resolution in whole pixels per metre (chunk pHYs), fine enough for a microscope's scale.</summary>
    private static System.Collections.Immutable.ImmutableArray<ScaleClue> Clues(ImageMetadata metadata, string name)
    {
        var (x, y) = (metadata.HorizontalResolution, metadata.VerticalResolution);
        if (!(x > 0 && y > 0))
        {
            return [];
        }

        if (Math.Abs((x / y) - 1) > ScaleDecision.SquareTolerance)
        {
            throw new ImageRejectedException(FormattableString.Invariant($"{name}: the pixels are not square (the PNG's resolution is {x:G6} across and {y:G6} down); save the picture with square pixels."));
        }

        double? metresPerUnit = metadata.ResolutionUnits switch
        {
            PixelResolutionUnit.PixelsPerMeter => 1,
            PixelResolutionUnit.PixelsPerCentimeter => 0.01,
            PixelResolutionUnit.PixelsPerInch => 0.0254,
            _ => null,
        };
        return metresPerUnit is { } metres && !PrintingResolution.Is(metres / x) ? [new ScaleClue("PNG resolution", metres / x, metres / y)] : [];
    }

    private static ImageRejectedException Damaged(string label, string name) =>
        new($"{name}: the {label} is damaged or cut short; copy it again from the microscope.");
}
