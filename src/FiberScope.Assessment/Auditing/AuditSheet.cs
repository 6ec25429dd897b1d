using System.Globalization;
using System.Text;
using FiberScope.Assessment.Input;
using Microsoft.VisualBasic.FileIO;

namespace FiberScope.Assessment.Auditing;

/// <summary>The table that a person fills in: written empty, read back filled.</summary>
public static class AuditSheet
{
    /// <summary>The file's name in the audit's folder.</summary>
    public const string FileName = "by-eye.csv";

    /// <summary>The first line.</summary>
    public const string Header = "crop,um_per_px,diameter_px,diameter_um,note";

    /// <summary>Diameters in both columns may differ by this share: a person rounds.</summary>
    private const double Rounding = 0.03;

    /// <summary>Writes the empty table; UTF-8 without a mark, lines ended by CR LF (RFC 4180).</summary>
    /// <param name="key">The crops.</param>
    /// <param name="destination">Where to; left open.</param>
    public static void Write(AuditKey key, Stream destination)
    {
        using var writer = new StreamWriter(destination, new UTF8Encoding(encoderShouldEmitUTF8Identifier: false), leaveOpen: true) { NewLine = "\r\n" };
        writer.WriteLine(Header);
        foreach (var crop in key.Crops)
        {
            writer.WriteLine(string.Create(CultureInfo.InvariantCulture, $"{crop.Name},{crop.MicrometresPerPixel:G7},,,"));
        }
    }

    /// <summary>Reads the person's diameters, µm, by crop; crops that were left empty are not in it.</summary>
    /// <param name="path">The filled table; with semicolons between the columns a decimal comma counts as a decimal point.</param>
    /// <param name="key">The crops.</param>
    /// <exception cref="InputException">Something in it is wrong; every problem is listed.</exception>
    public static IReadOnlyDictionary<string, double> Read(string path, AuditKey key)
    {
        var text = Text(path);
        var semicolons = text.Split('\n')[0].Contains(';', StringComparison.Ordinal);
        var rows = Rows(text, semicolons ? ";" : ",", path);
        var problems = new List<InputProblem>();
        var columns = rows.Count == 0 ? [] : rows[0].Cells.Select(c => c.Trim().ToLowerInvariant()).ToList();
        foreach (var wanted in new[] { "crop", "diameter_px", "diameter_um" }.Where(w => !columns.Contains(w)))
        {
            problems.Add(new InputProblem(path, 1, $"has no column '{wanted}'; its first line must hold {Header}"));
        }

        var found = new Dictionary<string, double>(StringComparer.Ordinal);
        foreach (var (line, cells) in problems.Count > 0 ? [] : rows.Skip(1))
        {
            string Cell(string column) => columns.IndexOf(column) is var i && i < cells.Length ? cells[i].Trim() : "";
            if (Diameter(Cell, key, semicolons, out var diameter) is { } complaint)
            {
                problems.Add(new InputProblem(path, line, complaint));
            }
            else if (diameter is { } known && !found.TryAdd(Cell("crop"), known))
            {
                problems.Add(new InputProblem(path, line, $"{Cell("crop")}: is there twice; keep one line"));
            }
        }

        return problems.Count > 0 ? throw new InputException(problems) : found;
    }

    private static string? Diameter(Func<string, string> cell, AuditKey key, bool semicolons, out double? diameter)
    {
        diameter = null;
        var crop = key.Crops.FirstOrDefault(c => c.Name == cell("crop"));
        if (crop is null)
        {
            return $"'{cell("crop")}' is no crop of this audit";
        }

        if ((Number(cell("diameter_px"), semicolons, out var pixels) ?? Number(cell("diameter_um"), semicolons, out var micrometres)) is { } complaint)
        {
            return $"{crop.Name}: {complaint}";
        }

        Number(cell("diameter_um"), semicolons, out micrometres);
        var fromPixels = pixels * crop.MicrometresPerPixel;
        if (fromPixels is { } a && micrometres is { } b && Math.Abs((a / b) - 1) > Rounding)
        {
            return FormattableString.Invariant($"{crop.Name}: {pixels:G4} px are {a:G4} µm, not {b:G4} µm; fill in one of the two");
        }

        diameter = micrometres ?? fromPixels;
        return null;
    }

    private static string? Number(string text, bool semicolons, out double? number)
    {
        number = null;
        if (text.Length == 0)
        {
            return null;
        }

        var plain = semicolons ? text.Replace(',', '.') : text;
        if (!double.TryParse(plain, NumberStyles.Float, CultureInfo.InvariantCulture, out var value))
        {
            return $"'{text}' is not a number; leave it empty where the fibre cannot be measured";
        }

        if (!(value > 0 && double.IsFinite(value)))
        {
            return $"'{text}' must be above zero; leave it empty where the fibre cannot be measured";
        }

        number = value;
        return null;
    }

    private static string Text(string path)
    {
        try
        {
            return File.ReadAllText(path);
        }
        catch (Exception e) when (e is IOException or UnauthorizedAccessException)
        {
            throw new InputException($"{path}: {(File.Exists(path) ? "cannot be read" : "no such file")}", e);
        }
    }

    private static List<(int Line, string[] Cells)> Rows(string text, string separator, string path)
    {
        using var parser = new TextFieldParser(new StringReader(text)) { TextFieldType = FieldType.Delimited, HasFieldsEnclosedInQuotes = true, TrimWhiteSpace = false };
        parser.SetDelimiters(separator);
        var rows = new List<(int, string[])>();
        try
        {
            while (!parser.EndOfData)
            {
                var line = (int)parser.LineNumber;
                if (parser.ReadFields() is { } cells)
                {
                    rows.Add((line, cells));
                }
            }
        }
        catch (MalformedLineException e)
        {
            throw new InputException(new InputProblem(path, (int)parser.ErrorLineNumber, "the quotes of this line do not close").ToString(), e);
        }

        return rows;
    }
}
