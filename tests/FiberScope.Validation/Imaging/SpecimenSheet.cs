using FiberScope.Specimens;
using SixLabors.ImageSharp;
using SixLabors.ImageSharp.Formats.Png;
using SixLabors.ImageSharp.PixelFormats;

namespace FiberScope.Validation.Imaging;

/// <summary>A sheet with a piece of one field of each family, at half size.</summary>
internal static class SpecimenSheet
{
    private const int PieceWidth = 300, PieceHeight = 220, Columns = 4, Gap = 4;

    public static void Save(string path)
    {
        if (File.Exists(path))
        {
            return;
        }

        Directory.CreateDirectory(Path.GetDirectoryName(path)!);
        var families = SpecimenFamilies.All;
        var rows = (families.Length + Columns - 1) / Columns;
        using var sheet = new Image<L8>((Columns * (PieceWidth + Gap)) - Gap, (rows * (PieceHeight + Gap)) - Gap, new L8(255));
        for (var i = 0; i < families.Length; i++)
        {
            // A small field of the same mat is quicker to make than a cut-out of a large one.
            var family = families[i] with { WidthPixels = 2 * PieceWidth, HeightPixels = 2 * PieceHeight };
            Place(SpecimenPicture.Of(family, reporting: true, 0), sheet, i % Columns * (PieceWidth + Gap), i / Columns * (PieceHeight + Gap));
        }

        sheet.SaveAsPng(path, new PngEncoder { ColorType = PngColorType.Grayscale, CompressionLevel = PngCompressionLevel.BestCompression });
    }

    private static void Place(SpecimenCase specimen, Image<L8> sheet, int left, int top)
    {
        for (var y = 0; y < PieceHeight; y++)
        {
            for (var x = 0; x < PieceWidth; x++)
            {
                var i = (2 * y * specimen.Width) + (2 * x);
                var p = specimen.Pixels;
                sheet[left + x, top + y] = new L8((byte)((p[i] + p[i + 1] + p[i + specimen.Width] + p[i + specimen.Width + 1]) / 4));
            }
        }
    }
}
