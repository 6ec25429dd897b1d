using System.Globalization;

namespace FiberScope.Validation.Filtration;

/// <summary>Comma-separated values with a head line; comment lines begin with '#'.</summary>
internal static class DataFile
{
    /// <summary>The rows of a file under <c>Filtration/Published</c>, each by column name.</summary>
    public static IReadOnlyList<IReadOnlyDictionary<string, string>> Read(string name)
    {
        var lines = File.ReadAllLines(Repository.Locate("tests", "FiberScope.Validation", "Filtration", "Published", name))
            .Where(line => line.Length > 0 && line[0] != '#').Select(Cells).ToList();
        return [.. lines.Skip(1).Select(cells => (IReadOnlyDictionary<string, string>)lines[0].Zip(cells).ToDictionary(p => p.First, p => p.Second, StringComparer.Ordinal))];
    }

    /// <summary>A number; 'inf' is infinity.</summary>
    public static double Number(string text) =>
        text == "inf" ? double.PositiveInfinity : double.Parse(text, NumberStyles.Float, CultureInfo.InvariantCulture);

    private static List<string> Cells(string line)
    {
        var cells = new List<string> { "" };
        var quoted = false;
        foreach (var c in line)
        {
            if (c == '"')
            {
                quoted = !quoted;
            }
            else if (c == ',' && !quoted)
            {
                cells.Add("");
            }
            else
            {
                cells[^1] += c;
            }
        }

        return cells;
    }
}
