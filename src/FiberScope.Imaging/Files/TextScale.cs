using System.Globalization;
using System.Text.RegularExpressions;

namespace FiberScope.Imaging.Files;

/// <summary>Finds pixel sizes written as <c>key = value unit</c> in the text that instruments leave in a file.</summary>
/// <remarks>
/// Keys are compared without blanks, underscores and case, so that <c>Pixel Size = 24.8 nm</c>, <c>PixelSizeX: 0.0248 µm</c>,
/// <c>pixel_width [nm] = 24.8</c> and <c>PixelWidth=24.8e-9</c> all count. A number without a unit is in metres when it could be
/// one (1 pm to 50 µm); anything else is left alone, because a pixel size is never guessed.
/// </remarks>
internal static partial class TextScale
{
    private const string Number = @"(?<number>[+-]?(?:\d+(?:[.,]\d*)?|[.,]\d+)(?:[eE][+-]?\d+)?)";

    /// <summary>Every pixel size in the text.</summary>
    public static IEnumerable<ScaleClue> Find(string text)
    {
        double? x = null;
        double? y = null;
        var found = new List<ScaleClue>();
        foreach (Match match in Entry().Matches(text))
        {
            if (Axis(match.Groups["key"].Value) is { } axis && Metres(match) is { } metres)
            {
                Add(found, axis, metres, ref x, ref y);
            }
        }

        if (x is { } || y is { })
        {
            found.Insert(0, new ScaleClue("pixel size in a text tag", x ?? y!.Value, y ?? x!.Value));
        }

        found.AddRange(PerPixel().Matches(text).Select(match => Metres(match)).OfType<double>().Select(metres => new ScaleClue("pixel size in a text tag", metres)));
        return found.Distinct();
    }

    /// <summary>The unit that a text names for the file's resolution (<c>unit=micron</c>), in metres; null when it names none.</summary>
    public static double? UnitOfResolution(string text) =>
        Unit().Match(text) is { Success: true } match ? LengthUnits.MetresPer(match.Groups["unit"].Value) : null;

    private static void Add(List<ScaleClue> found, char axis, double metres, ref double? x, ref double? y)
    {
        switch (axis)
        {
            case 'x' when x is null:
                x = metres;
                break;
            case 'y' when y is null:
                y = metres;
                break;
            case 'x' when x != metres:
            case 'y' when y != metres:
            case 'b':
                found.Add(new ScaleClue("pixel size in a text tag", metres));
                break;
            default:
                break;
        }
    }

    /// <summary>Which side of a pixel a key speaks of: <c>x</c>, <c>y</c>, <c>b</c> for both; null when it speaks of something else.</summary>
    /// <remarks>A camera's or a screen's own pixel is no scale, so only whole keys count; a section name before a dot is dropped.</remarks>
    private static char? Axis(string key) => string.Concat(key.Split('.')[^1].Where(char.IsLetter)).ToUpperInvariant() switch
    {
        "PIXELSIZE" or "IMAGEPIXELSIZE" or "PIXELSPACING" or "PIXELPITCH" or "PHYSICALPIXELSIZE" or "SIZEOFPIXEL" or "SIZEOFAPIXEL" => 'b',
        "PIXELSIZEX" or "PIXELWIDTH" or "XPIXELSIZE" or "PIXELSPACINGX" or "PIXELXSIZE" or "PIXELSIZEWIDTH" => 'x',
        "PIXELSIZEY" or "PIXELHEIGHT" or "YPIXELSIZE" or "PIXELSPACINGY" or "PIXELYSIZE" or "PIXELSIZEHEIGHT" => 'y',
        _ => null,
    };

    private static double? Metres(Match match)
    {
        var number = match.Groups["number"].Value;
        if (number.Contains(',', StringComparison.Ordinal))
        {
            // A comma before exactly three digits may divide thousands: that reading would be a guess.
            if (number.Contains('.', StringComparison.Ordinal) || Thousands().IsMatch(number))
            {
                return null;
            }

            number = number.Replace(',', '.');
        }

        if (!double.TryParse(number, NumberStyles.Float, CultureInfo.InvariantCulture, out var value) || value <= 0)
        {
            return null;
        }

        var unit = match.Groups["unit"].Success ? match.Groups["unit"].Value : match.Groups["bracket"].Value;
        var metres = unit.Length == 0 ? value : value * (LengthUnits.MetresPer(unit) ?? double.NaN);
        return metres is >= 1e-12 and <= PrintingResolution.LargestPixelMetres ? metres : null;
    }

    [GeneratedRegex(@"(?<![A-Za-z])(?<key>[A-Za-z][A-Za-z _\-.]{3,40}?)[ \t]*(?:[\[(][ \t]*(?<bracket>" + LengthUnits.Pattern + @")(?:/p(?:i)?x(?:el)?)?[ \t]*[\])])?[ \t""]*[:=][ \t""]*" + Number + @"(?:[ \t]*(?<unit>" + LengthUnits.Pattern + @")(?![A-Za-z0-9²^]))?", RegexOptions.IgnoreCase | RegexOptions.CultureInvariant, 60_000)]
    private static partial Regex Entry();

    [GeneratedRegex(@"(?<![\w.,+-])" + Number + @"[ \t]*(?<unit>" + LengthUnits.Pattern + @")[ \t]*(?:/|per)[ \t]*(?:pixel|px)\b", RegexOptions.IgnoreCase | RegexOptions.CultureInvariant, 60_000)]
    private static partial Regex PerPixel();

    [GeneratedRegex(@"(?m)^[ \t]*unit[ \t]*=[ \t]*(?<unit>[^\r\n\0]{1,20}?)[ \t\0]*$", RegexOptions.IgnoreCase | RegexOptions.CultureInvariant, 60_000)]
    private static partial Regex Unit();

    [GeneratedRegex(@"^[+-]?[1-9]\d{0,2},\d{3}$", RegexOptions.CultureInvariant, 60_000)]
    private static partial Regex Thousands();
}
