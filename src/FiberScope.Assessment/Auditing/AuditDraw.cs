using System.Collections.Immutable;
using FiberScope.Assessment.Input;
using FiberScope.Imaging;
using FiberScope.Imaging.Crops;
using FiberScope.Imaging.Files;

namespace FiberScope.Assessment.Auditing;

/// <summary>Prepares an audit: a sample of readings and the pictures to measure them in.</summary>
/// <param name="source">The readings.</param>
/// <param name="images">The folder that the images' names start from; null to look where the file and its swatch file lie.</param>
public sealed class AuditDraw(AuditSource source, string? images)
{
    private readonly Dictionary<string, IReadOnlyList<Micrograph>> _read = new(StringComparer.Ordinal);

    /// <summary>Draws the sample and finds every image of it.</summary>
    /// <param name="count">How many readings.</param>
    /// <param name="seed">The seed of the draw.</param>
    /// <exception cref="InputException">An image is missing or is not the one that was measured.</exception>
    public AuditKey Draw(int count, int seed)
    {
        var sample = AuditSample.Draw(source.Readings, count, seed);
        foreach (var reading in sample)
        {
            Picture(reading);
        }

        var crops = sample.Select((r, i) => new AuditCrop(
            FormattableString.Invariant($"crop-{i + 1:000}.png"),
            r.PixelSize.Micrometers / MarkedCrop.Zoom(r.Diameter / r.PixelSize),
            r));
        return new AuditKey(source.Name, source.Sha256, seed, [.. crops]);
    }

    /// <summary>Writes the picture of a crop.</summary>
    public void Write(AuditCrop crop, Stream destination)
    {
        var r = crop.Reading;
        MarkedCrop.Write(Picture(r), r.X, r.Y, r.DirectionDegrees * Math.PI / 180, r.Diameter / r.PixelSize, destination);
    }

    private Micrograph Picture(AuditReading reading)
    {
        if (!_read.TryGetValue(reading.Image, out var pages))
        {
            var path = PathOf(reading.Image);
            pages = MicrographReader.Read(path, new ScaleRequest { PixelSize = reading.PixelSize, GivenBy = "pixel size of the measurement" }, ImagingMode.SecondaryElectron);
            _read[reading.Image] = pages;
        }

        var page = pages.FirstOrDefault(p => p.Source.Page == reading.Page) ?? pages[0];
        return page.Source.Sha256 == reading.ImageSha256
            ? page
            : throw new InputException($"{reading.Image}: is not the image that was measured (its SHA-256 differs); put the measured one back, or measure again");
    }

    private string PathOf(string image)
    {
        var number = image.LastIndexOf('#');
        var name = number > 0 ? image[..number] : image;
        var beside = Path.GetDirectoryName(Path.GetFullPath(source.Name))!;
        string?[] folders = images is not null
            ? [images]
            : [beside, Path.GetDirectoryName(beside), source.SwatchFile is { } swatch ? Path.GetDirectoryName(Path.GetFullPath(swatch)) : null, Directory.GetCurrentDirectory()];
        ImmutableArray<string> tried = [.. folders.OfType<string>().SelectMany(f => images is null ? [Path.Combine(f, name)] : new[] { Path.Combine(f, name), Path.Combine(f, Path.GetFileName(name)) })];
        return tried.FirstOrDefault(File.Exists) ?? throw new InputException($"{source.Name}: the image '{name}' cannot be found; say where it lies with --images FOLDER");
    }
}
