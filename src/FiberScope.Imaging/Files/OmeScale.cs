using System.Globalization;
using System.Xml;
using System.Xml.Linq;

namespace FiberScope.Imaging.Files;

/// <summary>Reads the pixel size from OME-XML, the open metadata format of light microscopy.</summary>
/// <remarks>OME Data Model, schema 2016-06, element Pixels: PhysicalSizeX, PhysicalSizeXUnit (default µm), and the same for Y.</remarks>
internal static class OmeScale
{
    /// <summary>The pixel size for a page; null when the text is no OME-XML or gives none.</summary>
    public static ScaleClue? Find(string text, int page)
    {
        if (!text.Contains("<OME", StringComparison.Ordinal) && !text.Contains(":OME", StringComparison.Ordinal))
        {
            return null;
        }

        XDocument document;
        try
        {
            using var reader = XmlReader.Create(
                new StringReader(Markup(text)),
                new XmlReaderSettings { DtdProcessing = DtdProcessing.Prohibit, XmlResolver = null });
            document = XDocument.Load(reader);
        }
        catch (XmlException)
        {
            return null;
        }

        var pixels = document.Descendants().Where(element => element.Name.LocalName == "Pixels").ToArray();
        var one = pixels.FirstOrDefault(element => Holds(element, page)) ?? pixels.FirstOrDefault();
        return one is null ? null : FromPixels(one);
    }

    /// <summary>The text from its first to its last angle bracket: other tags' text may follow.</summary>
    private static string Markup(string text) =>
        text[text.IndexOf('<', StringComparison.Ordinal)..(text.LastIndexOf('>') + 1)];

    private static ScaleClue? FromPixels(XElement pixels)
    {
        var x = Size(pixels, "PhysicalSizeX");
        return x is null ? null : new ScaleClue("OME-XML", x.Value, Size(pixels, "PhysicalSizeY") ?? x.Value);
    }

    private static double? Size(XElement pixels, string name)
    {
        var unit = (string?)pixels.Attribute(name + "Unit") ?? "µm";
        return double.TryParse((string?)pixels.Attribute(name), NumberStyles.Float, CultureInfo.InvariantCulture, out var value)
            && value > 0 && double.IsFinite(value) && LengthUnits.MetresPer(unit) is { } metres
            ? value * metres
            : null;
    }

    private static bool Holds(XElement pixels, int page) => pixels.Elements().Any(element =>
        element.Name.LocalName == "TiffData"
        && (int?)element.Attribute("IFD") is { } first
        && page >= first && page < first + ((int?)element.Attribute("PlaneCount") ?? 1));
}
