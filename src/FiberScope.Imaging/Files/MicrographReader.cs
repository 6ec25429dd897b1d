using System.Collections.Immutable;
using System.Security.Cryptography;

namespace FiberScope.Imaging.Files;

/// <summary>Reads micrographs from TIFF, PNG, JPEG and BMP files, settles their scale and finds their information strips.</summary>
/// <remarks>
/// The format is told by the file's first bytes, not by its name. Needs no native library. Every failure that comes from the file
/// is an <see cref="ImageRejectedException"/> with one line for people.
/// </remarks>
public static class MicrographReader
{
    /// <summary>Reads a file; each full-size page of a TIFF is a field.</summary>
    /// <param name="path">The file.</param>
    /// <param name="scale">What the user says about the scale.</param>
    /// <param name="mode">How the pictures were made.</param>
    /// <exception cref="ImageRejectedException">The file cannot be read or measured, or its scale is unknown or contradictory.</exception>
    public static IReadOnlyList<Micrograph> Read(string path, ScaleRequest scale, ImagingMode mode)
    {
        ArgumentException.ThrowIfNullOrEmpty(path);
        byte[] bytes;
        try
        {
            bytes = File.ReadAllBytes(path);
        }
        catch (Exception cause) when (cause is FileNotFoundException or DirectoryNotFoundException)
        {
            throw new ImageRejectedException($"{path}: no such image; check the path.", cause);
        }
        catch (Exception cause) when (cause is IOException or UnauthorizedAccessException or NotSupportedException)
        {
            throw Directory.Exists(path)
                ? new ImageRejectedException($"{path}: this is a folder, not an image; name the images in it.", cause)
                : new ImageRejectedException($"{path}: the image cannot be opened ({cause.Message.TrimEnd('.')}).", cause);
        }

        return Read(bytes, path, scale, mode);
    }

    /// <summary>Reads a picture from a stream, such as standard input, to its end.</summary>
    /// <param name="stream">The bytes of the file.</param>
    /// <param name="name">What to call the picture in results and messages.</param>
    /// <param name="scale">What the user says about the scale.</param>
    /// <param name="mode">How the pictures were made.</param>
    /// <exception cref="ImageRejectedException">The file cannot be read or measured, or its scale is unknown or contradictory.</exception>
    public static IReadOnlyList<Micrograph> Read(Stream stream, string name, ScaleRequest scale, ImagingMode mode)
    {
        ArgumentNullException.ThrowIfNull(stream);
        using var copy = new MemoryStream();
        stream.CopyTo(copy);
        return Read(copy.ToArray(), name, scale, mode);
    }

    /// <summary>Reads a picture from the bytes of its file.</summary>
    /// <param name="bytes">The whole file.</param>
    /// <param name="name">What to call the picture in results and messages.</param>
    /// <param name="scale">What the user says about the scale.</param>
    /// <param name="mode">How the pictures were made.</param>
    /// <exception cref="ImageRejectedException">The file cannot be read or measured, or its scale is unknown or contradictory.</exception>
    public static IReadOnlyList<Micrograph> Read(byte[] bytes, string name, ScaleRequest scale, ImagingMode mode)
    {
        ArgumentNullException.ThrowIfNull(bytes);
        ArgumentNullException.ThrowIfNull(scale);
        var sha256 = Convert.ToHexStringLower(SHA256.HashData(bytes));
        return [.. Pictures(bytes, name).Select(picture => ToMicrograph(picture, name, sha256, scale, mode))];
    }

    private static ImmutableArray<Picture> Pictures(byte[] bytes, string name) => PictureFormats.Of(bytes) switch
    {
        PictureFormat.Tiff => TiffPictures.Decode(bytes, name),
        PictureFormat.Unknown when bytes.Length == 0 => throw new ImageRejectedException($"{name}: the file is empty; copy it again from the microscope."),
        PictureFormat.Unknown => throw new ImageRejectedException($"{name}: this is not an image that can be read; save it as TIFF, PNG, JPEG or BMP."),
        var format => [RasterPictures.Decode(bytes, format, name)],
    };

    private static Micrograph ToMicrograph(Picture picture, string name, string sha256, ScaleRequest scale, ImagingMode mode)
    {
        SizeLimit.Check(name, picture.Width, picture.Height);
        var strip = InformationStrip.Find(picture.Grey, picture.Width, picture.Height);
        if (IsConstant(picture.Grey.AsSpan(0, (picture.Height - strip) * picture.Width)))
        {
            throw new ImageRejectedException($"{name}: the picture shows nothing: every pixel has nearly the same grey; check detector and export.");
        }

        var clues = ImmutableArray.CreateBuilder<ScaleClue>();
        if (scale.PixelSize is { } given)
        {
            clues.Add(new ScaleClue(scale.GivenBy, given.Meters));
        }

        clues.AddRange(picture.Clues);
        if (scale.ScaleBarLength is { } bar)
        {
            clues.Add(new ScaleClue("scale bar", bar.Meters / ScaleBar.LengthPixels(picture, strip, name)));
        }

        var (pixelSize, origin) = ScaleDecision.Settle(name, clues);
        var source = new MicrographSource(name, sha256, picture.Page, picture.BitDepth, origin);
        return new Micrograph(picture.Grey, picture.Width, picture.Height, pixelSize, mode, source, strip);
    }

    /// <summary>Whether all but one pixel in a thousand lie within two grey steps of 8 bits.</summary>
    private static bool IsConstant(ReadOnlySpan<float> grey)
    {
        var counts = new int[256];
        foreach (var value in grey)
        {
            counts[Math.Clamp((int)(value * 255.99f), 0, 255)]++;
        }

        var outside = (int)(grey.Length * 0.0005);
        return Level(counts, outside, 0, 1) >= Level(counts, outside, 255, -1) - 2;
    }

    private static int Level(int[] counts, int skip, int from, int step)
    {
        var seen = 0;
        for (var level = from; level is >= 0 and < 256; level += step)
        {
            seen += counts[level];
            if (seen > skip)
            {
                return level;
            }
        }

        return from;
    }
}
