using System.Collections.Immutable;
using BitMiracle.LibTiff.Classic;

namespace FiberScope.Imaging.Files;

/// <summary>Decodes TIFF files: each full-size page is a picture.</summary>
internal static class TiffPictures
{
    /// <summary>LibTiff speaks of the data orientation in tag 274; 5 and above swap rows and columns.</summary>
    private const int FirstSwappedOrientation = 5;

    static TiffPictures() => Tiff.SetErrorHandler(new SilentTiffErrors());

    /// <summary>Decodes every page that is no thumbnail and no mask.</summary>
    /// <exception cref="ImageRejectedException">The file is damaged, too large, or of a kind that is not read.</exception>
    public static ImmutableArray<Picture> Decode(byte[] bytes, string name)
    {
        try
        {
            return DecodePages(bytes, name);
        }
        catch (Exception cause) when (cause is IndexOutOfRangeException or ArgumentException or ArithmeticException or IOException
            or NullReferenceException or InvalidOperationException or InvalidCastException or OutOfMemoryException)
        {
            // The library runs past the end of damaged data instead of saying so.
            throw new ImageRejectedException(Damaged(name).Message, cause);
        }
    }

    private static ImmutableArray<Picture> DecodePages(byte[] bytes, string name)
    {
        using var stream = new MemoryStream(bytes, writable: false);
        using var tiff = Tiff.ClientOpen(name, "r", stream, new TiffStream()) ?? throw Damaged(name);
        var pictures = ImmutableArray.CreateBuilder<Picture>();
        var firstText = string.Empty;
        long pixels = 0;
        var page = 0;
        do
        {
            var layout = TiffLayout.Read(tiff, name);
            var text = TiffText.Read(tiff);
            firstText = page == 0 ? text : firstText;
            if (layout.IsFullPicture)
            {
                pixels = SizeLimit.Check(name, layout.Width, layout.Height, pixels);
                var grey = Upright(TiffPixels.Decode(tiff, layout, name), layout, out var width, out var height);
                pictures.Add(new Picture(grey, width, height, layout.BitsPerSample, page, [.. Clues(layout, text.Length > 0 ? text : firstText, page, name)]));
            }

            page++;
        }
        while (NextPage(tiff, name));

        return pictures.Count > 0 ? pictures.ToImmutable() : throw new ImageRejectedException($"{name}: the TIFF holds no full-size picture.");
    }

    private static bool NextPage(Tiff tiff, string name)
    {
        var last = tiff.LastDirectory();
        return tiff.ReadDirectory() || (last ? false : throw Damaged(name));
    }

    private static IEnumerable<ScaleClue> Clues(TiffLayout layout, string text, int page, string name)
    {
        if (layout.ResolutionX > 0 && layout.ResolutionY > 0)
        {
            if (Math.Abs((layout.ResolutionX / layout.ResolutionY) - 1) > ScaleDecision.SquareTolerance)
            {
                throw new ImageRejectedException(FormattableString.Invariant($"{name}: the pixels are not square (resolution tags say {layout.ResolutionX:G6} across and {layout.ResolutionY:G6} down); save the picture with square pixels."));
            }

            // A resolution without a unit of its own may have one in the description: pixels per that unit.
            var unit = layout.MetresPerResolutionUnit ?? TextScale.UnitOfResolution(text);
            if (unit is { } metres && !PrintingResolution.Is(metres / layout.ResolutionX))
            {
                yield return new ScaleClue("TIFF resolution tags", metres / layout.ResolutionX, metres / layout.ResolutionY);
            }
        }

        if (OmeScale.Find(text, page) is { } ome)
        {
            yield return ome;
            yield break;
        }

        foreach (var clue in TextScale.Find(text))
        {
            yield return clue;
        }
    }

    /// <summary>Turns the stored rows so that the picture's top is at the top (TIFF 6.0, tag Orientation).</summary>
    private static float[] Upright(float[] stored, TiffLayout layout, out int width, out int height)
    {
        var swap = layout.Orientation >= FirstSwappedOrientation;
        (width, height) = swap ? (layout.Height, layout.Width) : (layout.Width, layout.Height);
        if (layout.Orientation == 1)
        {
            return stored;
        }

        var turned = new float[stored.Length];
        for (var y = 0; y < height; y++)
        {
            for (var x = 0; x < width; x++)
            {
                var (column, row) = layout.Orientation switch
                {
                    2 => (width - 1 - x, y),
                    3 => (width - 1 - x, height - 1 - y),
                    4 => (x, height - 1 - y),
                    5 => (y, x),
                    6 => (y, width - 1 - x),
                    7 => (height - 1 - y, width - 1 - x),
                    8 => (height - 1 - y, x),
                    _ => (x, y),
                };
                turned[(y * width) + x] = stored[(row * layout.Width) + column];
            }
        }

        return turned;
    }

    internal static ImageRejectedException Damaged(string name) =>
        new($"{name}: the TIFF is damaged or cut short; copy it again from the microscope.");

    /// <summary>Every failure is told by a return value; the library's own lines would only clutter the terminal.</summary>
    private sealed class SilentTiffErrors : TiffErrorHandler
    {
        public override void ErrorHandler(Tiff tif, string method, string format, params object[] args)
        {
        }

        public override void ErrorHandlerExt(Tiff tif, object clientData, string method, string format, params object[] args)
        {
        }

        public override void WarningHandler(Tiff tif, string method, string format, params object[] args)
        {
        }

        public override void WarningHandlerExt(Tiff tif, object clientData, string method, string format, params object[] args)
        {
        }
    }
}
