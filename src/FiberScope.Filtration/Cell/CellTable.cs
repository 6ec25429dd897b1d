using System.Collections.Immutable;
using System.Globalization;

namespace FiberScope.Filtration.Cell;

/// <summary>Numbers on a grid of four axes: solidity, fibre Knudsen number and two more.</summary>
/// <remarks>
/// Text form: comment lines begin with '#'; four lines 'axis,name,offset,node,node,…'; then one line per pair of the first
/// two axes and the third, holding the values along the fourth.
/// </remarks>
public sealed class CellTable
{
    private readonly double[] _values;

    /// <summary>Makes a table.</summary>
    /// <param name="axes">Four axes, solidity and fibre Knudsen number first.</param>
    /// <param name="values">The values, the last axis fastest.</param>
    /// <exception cref="ArgumentException">There are not four axes, or the values do not fill the grid.</exception>
    public CellTable(ImmutableArray<TableAxis> axes, ImmutableArray<double> values)
    {
        if (axes.Length != 4 || values.Length != axes.Aggregate(1, (product, axis) => product * axis.Nodes.Length))
        {
            throw new ArgumentException("A cell table has four axes and one value for each of their nodes.", nameof(values));
        }

        Axes = axes;
        _values = [.. values];
    }

    /// <summary>The four axes.</summary>
    public ImmutableArray<TableAxis> Axes { get; }

    /// <summary>The two remaining axes at one solidity and fibre Knudsen number; outside the table its nearest end.</summary>
    public CellSurface At(double solidity, double fibreKnudsen)
    {
        var alpha = Axes[0].Cubic(solidity);
        var knudsen = Axes[1].Cubic(fibreKnudsen);
        var sheet = Axes[2].Nodes.Length * Axes[3].Nodes.Length;
        var row = Axes[1].Nodes.Length * sheet;
        var slice = new double[sheet];
        ReadOnlySpan<double> a = [alpha.W0, alpha.W1, alpha.W2, alpha.W3];
        ReadOnlySpan<double> k = [knudsen.W0, knudsen.W1, knudsen.W2, knudsen.W3];
        for (var i = 0; i < 4; i++)
        {
            for (var j = 0; j < 4; j++)
            {
                var weight = a[i] * k[j];
                var source = _values.AsSpan(((alpha.First + i) * row) + ((knudsen.First + j) * sheet), sheet);
                for (var n = 0; weight != 0 && n < sheet; n++)
                {
                    slice[n] += weight * source[n];
                }
            }
        }

        return new CellSurface(Axes[2], Axes[3], slice);
    }

    /// <summary>The table in its text form.</summary>
    /// <param name="about">Comment lines, without their '#'.</param>
    public string ToText(IEnumerable<string> about)
    {
        static string Number(double value, string format) => value.ToString(format, CultureInfo.InvariantCulture);
        var lines = about.Select(line => $"# {line}").ToList();
        lines.AddRange(Axes.Select(axis => string.Join(',', ["axis", axis.Name, Number(axis.Offset, "R"), .. axis.Nodes.Select(x => Number(x, "R"))])));
        var width = Axes[3].Nodes.Length;
        for (var at = 0; at < _values.Length; at += width)
        {
            lines.Add(string.Join(',', _values.Skip(at).Take(width).Select(x => Number(x, "0.#####"))));
        }

        return string.Join('\n', lines) + '\n';
    }

    /// <summary>Reads the text form.</summary>
    /// <exception cref="FormatException">A number cannot be read.</exception>
    /// <exception cref="ArgumentException">The values do not fill the grid.</exception>
    public static CellTable Parse(string text)
    {
        static double Number(string value) => double.Parse(value, NumberStyles.Float, CultureInfo.InvariantCulture);
        var rows = text.Split('\n', StringSplitOptions.RemoveEmptyEntries).Where(line => line[0] != '#').Select(line => line.Split(',')).ToList();
        return new CellTable(
            [.. rows.Take(4).Select(row => new TableAxis(row[1], Number(row[2]), [.. row.Skip(3).Select(Number)]))],
            [.. rows.Skip(4).SelectMany(row => row.Select(Number))]);
    }
}
