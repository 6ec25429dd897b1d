using ScottPlot;

namespace FiberScope.Validation.Filtration;

/// <summary>Small figures for the validation document.</summary>
internal static class Figures
{
    private const int Width = 640;
    private const int Height = 420;

    /// <summary>A map of signed errors in per cent over two logarithmic axes; blue is too low, red too high.</summary>
    /// <param name="title">What is shown.</param>
    /// <param name="columns">Values along the horizontal axis, evenly spaced in logarithm.</param>
    /// <param name="rows">Values along the vertical axis.</param>
    /// <param name="errors">Relative error by row and column; NaN where there is none.</param>
    /// <param name="labels">Names of the horizontal and vertical axis.</param>
    /// <param name="limit">The error at which the colour is full.</param>
    public static Plot ErrorMap(string title, double[] columns, double[] rows, double[,] errors, (string X, string Y) labels, double limit = 0.5)
    {
        var plot = new Plot();
        var cells = new double[rows.Length, columns.Length];
        for (var i = 0; i < rows.Length; i++)
        {
            for (var j = 0; j < columns.Length; j++)
            {
                var error = errors[i, j];
                cells[rows.Length - 1 - i, j] = Math.Clamp(error, -limit, limit);
                if (double.IsFinite(error))
                {
                    var label = plot.Add.Text(MarkdownText.Signed(error), j, i);
                    label.Alignment = Alignment.MiddleCenter;
                    label.LabelFontSize = 11;
                    label.LabelFontColor = Math.Abs(error) > 0.7 * limit ? Colors.White : Colors.Black;
                }
            }
        }

        var map = plot.Add.Heatmap(cells);
        map.Colormap = new ScottPlot.Colormaps.CustomPalette([.. Shades()]);
        map.ManualRange = new ScottPlot.Range(-limit, limit);
        map.NaNCellColor = Colors.LightGray;
        plot.MoveToBottom(map);
        Ticks(plot.Axes.Bottom, columns);
        Ticks(plot.Axes.Left, rows);
        plot.Title(title, 15);
        plot.XLabel(labels.X, 13);
        plot.YLabel(labels.Y, 13);
        plot.Axes.SetLimits(-0.5, columns.Length - 0.5, -0.5, rows.Length - 0.5);
        plot.HideGrid();
        return plot;
    }

    /// <summary>Saves a figure as PNG beside the validation document and returns the path to put into it.</summary>
    public static string Save(Plot plot, string name, int width = Width, int height = Height)
    {
        var folder = Repository.Locate("docs", "validation-filtration");
        Directory.CreateDirectory(folder);
        plot.SavePng(Path.Combine(folder, name + ".png"), width, height);
        return $"validation-filtration/{name}.png";
    }

    /// <summary>Ticks at decades of a quantity that is plotted as its logarithm.</summary>
    public static void Decades(IXAxis axis, int first, int last) =>
        axis.TickGenerator = new ScottPlot.TickGenerators.NumericManual(
            [.. Enumerable.Range(first, last - first + 1).Select(k => (double)k)],
            [.. Enumerable.Range(first, last - first + 1).Select(k => MarkdownText.Number(Math.Pow(10, k), "G3"))]);

    private static void Ticks(IAxis axis, double[] values)
    {
        var ticks = new ScottPlot.TickGenerators.NumericManual(
            [.. Enumerable.Range(0, values.Length).Select(k => (double)k)],
            [.. values.Select(v => v >= 1e4 ? MarkdownText.Number(v, "0E+0") : MarkdownText.Number(v, "0.###"))]);
        axis.TickGenerator = ticks;
    }

    private static IEnumerable<Color> Shades()
    {
        var (low, middle, high) = (new Color(33, 85, 150), new Color(247, 247, 247), new Color(178, 40, 40));
        for (var k = 0; k <= 40; k++)
        {
            yield return k <= 20 ? Mix(low, middle, k / 20d) : Mix(middle, high, (k - 20) / 20d);
        }
    }

    private static Color Mix(Color from, Color to, double share)
    {
        byte Channel(byte a, byte b) => (byte)Math.Round(a + ((b - a) * share));
        return new Color(Channel(from.R, to.R), Channel(from.G, to.G), Channel(from.B, to.B));
    }
}
