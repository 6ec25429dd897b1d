using OxyPlot;
using OxyPlot.Annotations;
using OxyPlot.Axes;
using OxyPlot.Series;

namespace FiberScope.Reports.Figures;

/// <summary>A quantity over two chosen variables, as a shaded map with contour lines; pale where a target is missed.</summary>
internal static class MapFigure
{
    private const int Contours = 7;
    private const int Shades = 64;

    /// <summary>Axes and quantities that span less than this factor are drawn straight.</summary>
    private const double LeastSpan = 5;

    /// <summary>What lies further below the highest value than this factor has the lowest shade.</summary>
    private const double MostSpan = 1e4;

    /// <summary>Share of white in the shades of places that miss a target.</summary>
    private const double Paleness = 0.72;

    private static readonly OxyColor[] LimitColours = [FigureStyle.Accent, FigureStyle.Ink, OxyColor.FromRgb(0x8a, 0x2d, 0x6b), OxyColors.Black, FigureStyle.Slate];

    /// <summary>Draws a map.</summary>
    /// <param name="map">The grid.</param>
    /// <param name="values">The quantity, [x, y]; NaN where there is none.</param>
    /// <param name="quantity">Its name with its unit.</param>
    /// <param name="id">A name, unique on the page.</param>
    /// <param name="description">What the figure shows, one sentence.</param>
    public static SvgFigure Draw(MapGrid map, double[,] values, string quantity, string id, string description)
    {
        var model = FigureStyle.Plot(Along(AxisPosition.Bottom, map.AcrossTitle, map.Across), Along(AxisPosition.Left, map.UpTitle, map.Up));
        var (low, high) = Range(values);
        var logarithmic = low > 0 && high / low > LeastSpan;
        low = logarithmic ? Math.Max(low, high / MostSpan) : low;
        var scaled = logarithmic ? Mapped(values, v => Math.Log10(Math.Max(v, low))) : values;
        var (least, most) = logarithmic ? (Math.Log10(low), Math.Log10(high)) : (low, high);
        model.Axes.Add(Colours("shades", OxyPalettes.Viridis(Shades), least, most, quantity, logarithmic));
        model.Axes.Add(Colours("pale", Pale(OxyPalettes.Viridis(Shades)), least, most, null, logarithmic));
        model.Series.Add(Cells(map, scaled, wanted: true, "shades"));
        model.Series.Add(Cells(map, scaled, wanted: false, "pale"));
        var levels = Levels(low, high, logarithmic);
        model.Series.Add(Lines(map, scaled, logarithmic ? [.. levels.Select(Math.Log10)] : levels, FigureStyle.Slate, LineStyle.Solid, 0.8));
        foreach (var level in levels)
        {
            Label(model, map, scaled, logarithmic ? Math.Log10(level) : level, Html.Wording.Told(level, 2));
        }

        foreach (var (limit, i) in map.Limits.Select((limit, i) => (limit, i)))
        {
            model.Series.Add(Lines(map, Mapped(limit.Values, Logarithm), [Logarithm(limit.Level)], LimitColours[i % LimitColours.Length], FigureStyle.Dashes[i % FigureStyle.Dashes.Length], 2.4));
            model.Series.Add(FigureStyle.Line(limit.Title, [], LimitColours[i % LimitColours.Length], 2.4, FigureStyle.Dashes[i % FigureStyle.Dashes.Length]));
        }

        MarkBest(model, map);
        return SvgFigure.Draw(model, id, description, 620, 430);
    }

    private static Axis Along(AxisPosition position, string title, double[] values) => values[0] > 0 && values[^1] / values[0] > LeastSpan
        ? FigureStyle.Logarithmic(position, title, values[0], values[^1])
        : FigureStyle.Straight(position, title, values[0], values[^1]);

    private static LinearColorAxis Colours(string key, OxyPalette palette, double low, double high, string? title, bool logarithmic) => new()
    {
        Key = key,
        Position = title is null ? AxisPosition.None : AxisPosition.Right,
        Palette = palette,
        Minimum = low,
        Maximum = high,
        Title = title,
        AxisTitleDistance = 8,
        InvalidNumberColor = OxyColors.White,
        MajorStep = logarithmic && high - low > 1.5 ? 1 : double.NaN,
        LabelFormatter = value => Html.Wording.Told(logarithmic ? Math.Pow(10, value) : value, 2),
    };

    private static OxyPalette Pale(OxyPalette palette) => new(palette.Colors.Select(c => OxyColor.Interpolate(c, OxyColors.White, Paleness)));

    /// <summary>One rectangle per cell, so that the map stays vector and needs no picture inside the SVG.</summary>
    private static RectangleSeries Cells(MapGrid map, double[,] values, bool wanted, string key)
    {
        var cells = new RectangleSeries { ColorAxisKey = key };
        for (var i = 0; i < map.Across.Length - 1; i++)
        {
            for (var j = 0; j < map.Up.Length - 1; j++)
            {
                var mean = (values[i, j] + values[i + 1, j] + values[i, j + 1] + values[i + 1, j + 1]) / 4;
                if (double.IsFinite(mean) && map.IsAllowed(i, j) == wanted)
                {
                    cells.Items.Add(new RectangleItem(map.Across[i], map.Across[i + 1], map.Up[j], map.Up[j + 1], mean));
                }
            }
        }

        return cells;
    }

    private static ContourSeries Lines(MapGrid map, double[,] values, double[] levels, OxyColor colour, LineStyle style, double width) => new()
    {
        ColumnCoordinates = map.Across,
        RowCoordinates = map.Up,
        Data = values,
        ContourLevels = levels,
        Color = colour,
        LineStyle = style,
        StrokeThickness = width,
        FontSize = 0,
        RenderInLegend = false,
    };

    /// <summary>Writes a level where its line first meets one of the map's diagonals.</summary>
    private static void Label(PlotModel model, MapGrid map, double[,] values, double level, string text)
    {
        var last = Math.Min(map.Across.Length, map.Up.Length) - 1;
        foreach (var falling in new[] { true, false })
        {
            for (var i = 0; i < last; i++)
            {
                var (j, next) = falling ? (last - i, last - i - 1) : (i, i + 1);
                var (from, to) = (values[i, j], values[i + 1, next]);
                if ((from - level) * (to - level) > 0 || from == to)
                {
                    continue;
                }

                var share = (level - from) / (to - from);
                model.Annotations.Add(new TextAnnotation
                {
                    Text = text,
                    TextPosition = new DataPoint(Between(map.Across[i], map.Across[i + 1], share), Between(map.Up[j], map.Up[next], share)),
                    TextHorizontalAlignment = HorizontalAlignment.Center,
                    TextVerticalAlignment = VerticalAlignment.Middle,
                    FontSize = 11,
                    StrokeThickness = 0,
                    TextColor = FigureStyle.Slate,
                    Background = OxyColor.FromAColor(190, OxyColors.White),
                });
                return;
            }
        }
    }

    private static double Between(double from, double to, double share) => from > 0 && to > 0 ? from * Math.Pow(to / from, share) : from + (share * (to - from));

    /// <summary>Straightens what spans decades, so that lines between grid points run smoothly; what is not above zero has none.</summary>
    private static double Logarithm(double value) => value > 0 ? Math.Log(value) : double.NaN;

    /// <summary>Moves a mark in by a trifle, so that the edge of the map, where the best often lies, does not cut it in half.</summary>
    private static double Inside(double[] axis, double value)
    {
        const double Margin = 0.016;
        return Math.Clamp(value, Between(axis[0], axis[^1], Margin), Between(axis[0], axis[^1], 1 - Margin));
    }

    private static void MarkBest(PlotModel model, MapGrid map)
    {
        var best = map.Best;
        model.Series.Add(FigureStyle.Marks("best structure found", [], FigureStyle.Ink, MarkerType.Diamond, 6));
        model.Annotations.Add(new PointAnnotation
        {
            X = Inside(map.Across, best.X),
            Y = Inside(map.Up, best.Y),
            Shape = MarkerType.Diamond,
            Size = 7,
            Fill = OxyColors.White,
            Stroke = FigureStyle.Ink,
            StrokeThickness = 2.4,
        });
    }

    private static double[] Levels(double low, double high, bool logarithmic)
    {
        if (!(high > low))
        {
            return [];
        }

        var raw = Enumerable.Range(1, Contours).Select(i => (double)i / (Contours + 1))
            .Select(share => logarithmic ? low * Math.Pow(high / low, share) : low + (share * (high - low)));
        return [.. raw.Select(TwoDigits).Distinct()];
    }

    private static double TwoDigits(double value)
    {
        if (value == 0)
        {
            return 0;
        }

        var unit = Math.Pow(10, Math.Floor(Math.Log10(Math.Abs(value))) - 1);
        return Math.Round(value / unit) * unit;
    }

    private static double[,] Mapped(double[,] values, Func<double, double> by)
    {
        var mapped = new double[values.GetLength(0), values.GetLength(1)];
        for (var i = 0; i < mapped.GetLength(0); i++)
        {
            for (var j = 0; j < mapped.GetLength(1); j++)
            {
                mapped[i, j] = by(values[i, j]);
            }
        }

        return mapped;
    }

    private static (double Low, double High) Range(double[,] values)
    {
        double[] finite = [.. values.Cast<double>().Where(double.IsFinite)];
        return finite.Length == 0 ? (0, 1) : finite.Max() > finite.Min() ? (finite.Min(), finite.Max()) : (finite[0] - 0.5, finite[0] + 0.5);
    }
}
