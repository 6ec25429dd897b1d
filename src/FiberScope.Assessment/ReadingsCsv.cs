using System.Globalization;
using System.Text;
using FiberScope.Assessment.Measuring;

namespace FiberScope.Assessment;

/// <summary>Writes every reading on one line, for spreadsheets and other programs.</summary>
public static class ReadingsCsv
{
    /// <summary>The first line.</summary>
    public const string Header = "layer,field,image,included,trace,x_px,y_px,direction_deg,diameter_um,u_um,length_um";

    /// <summary>Writes the readings of every field, in order; UTF-8 without a mark, lines ended by CR LF (RFC 4180).</summary>
    /// <param name="layers">Fields by layer name.</param>
    /// <param name="destination">Where to; left open.</param>
    public static void Write(IEnumerable<(string Layer, IEnumerable<FieldFinding> Fields)> layers, Stream destination)
    {
        using var writer = new StreamWriter(destination, new UTF8Encoding(encoderShouldEmitUTF8Identifier: false), leaveOpen: true) { NewLine = "\r\n" };
        writer.WriteLine(Header);
        foreach (var (layer, fields) in layers)
        {
            foreach (var field in fields)
            {
                var pixels = field.Measurement.Readings;
                var lengths = FieldReadings.Of(field.Measurement, field.Number);
                for (var i = 0; i < pixels.Length; i++)
                {
                    writer.WriteLine(string.Create(
                        CultureInfo.InvariantCulture,
                        $"{Quoted(layer)},{field.Number},{Quoted(field.Name)},{(field.IsIncluded ? "yes" : "no")},{pixels[i].Trace},{pixels[i].X:F2},{pixels[i].Y:F2},{pixels[i].Direction * 180 / Math.PI:F1},{lengths[i].Diameter.Micrometers:G7},{lengths[i].StandardUncertainty.Micrometers:G4},{lengths[i].RepresentedLength.Micrometers:G7}"));
                }
            }
        }
    }

    private static string Quoted(string text) =>
        text.AsSpan().ContainsAny(",\"\r\n") ? $"\"{text.Replace("\"", "\"\"", StringComparison.Ordinal)}\"" : text;
}
