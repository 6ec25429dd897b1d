using OxyPlot;
using OxyPlot.Axes;
using OxyPlot.Series;

namespace FiberScope.Reports.Figures;

/// <summary>A quantity over two chosen variables, as a shaded map with contour lines.</summary>
internal static class MapFigure
{
    private const int Contours = 8;

    /// <summary>Draws a map.</summary>
    /// <param name="x">The values of the variable across, ascending and evenly spaced (on their logarithm where so said).</param>
    /// <param name="y">The values of the variable upwards, likewise.</param>
    /// <param name="values">The quantity, [x, y]; NaN where there is none.</param>
    /// <param name="titles">Axis titles with units, and that of the quantity.</param>
    /// <param name="id">A name, unique on the page.</param>
    /// <param name="description">What the figure shows, one sentence.</param>
    public static SvgFigure Draw(double[] x, double[] y, double[,] values, (string X, string Y, string Quantity) titles, string id, string description)
    {
        var across = FigureStyle.Straight(AxisPosition.Bottom, titles.X, x[0], x[^1]);
        var up = FigureStyle.Straight(AxisPosition.Left, titles.Y, y[0], y[^1]);
        var model = FigureStyle.Plot(across, up);
        var (low, high) = Range(values);
        model.Axes.Add(new LinearColorAxis
        {
            Position = AxisPosition.Right,
            Palette = OxyPalettes.Viridis(64),
            Minimum = low,
            Maximum = high,
            Title = titles.Quantity,
            InvalidNumberColor = OxyColors.White,
        });
        model.Series.Add(Shades(x, y, values));
        model.Series.Add(new ContourSeries
        {
            ColumnCoordinates = x,
            RowCoordinates = y,
            Data = values,
            ContourLevelStep = (high - low) / Contours,
            Color = OxyColors.White,
            LabelBackground = OxyColor.FromAColor(150, OxyColors.Black),
            TextColor = OxyColors.White,
            LabelFormatString = "G3",
            StrokeThickness = 1,
        });
        return SvgFigure.Draw(model, id, description, 680, 460);
    }

    /// <summary>One rectangle per cell, so that the map stays vector and needs no picture inside the SVG.</summary>
    private static RectangleSeries Shades(double[] x, double[] y, double[,] values)
    {
        var shades = new RectangleSeries();
        for (var i = 0; i < x.Length - 1; i++)
        {
            for (var j = 0; j < y.Length - 1; j++)
            {
                var mean = (values[i, j] + values[i + 1, j] + values[i, j + 1] + values[i + 1, j + 1]) / 4;
                if (double.IsFinite(mean))
                {
                    shades.Items.Add(new RectangleItem(x[i], x[i + 1], y[j], y[j + 1], mean));
                }
            }
        }

        return shades;
    }

    private static (double Low, double High) Range(double[,] values)
    {
        double[] finite = [.. values.Cast<double>().Where(double.IsFinite)];
        return finite.Length == 0 ? (0, 1) : finite.Max() > finite.Min() ? (finite.Min(), finite.Max()) : (finite[0] - 0.5, finite[0] + 0.5);
    }
}
