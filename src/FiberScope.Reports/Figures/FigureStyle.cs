using System.Globalization;
using OxyPlot;
using OxyPlot.Axes;
using OxyPlot.Legends;
using OxyPlot.Series;

namespace FiberScope.Reports.Figures;

/// <summary>The look that all figures share: thin grey scaffolding, few colours, each told apart without colour vision.</summary>
internal static class FigureStyle
{
    /// <summary>The face whose built-in metrics lay the text out.</summary>
    public const string MeasuringFont = "Arial";

    private const double TextSize = 13;

    /// <summary>The main thing a figure shows.</summary>
    public static readonly OxyColor Ink = OxyColor.FromRgb(0x12, 0x4e, 0x78);

    /// <summary>What is set against it.</summary>
    public static readonly OxyColor Accent = OxyColor.FromRgb(0xc8, 0x55, 0x1b);

    /// <summary>A third thing.</summary>
    public static readonly OxyColor Third = OxyColor.FromRgb(0x1c, 0x8a, 0x73);

    /// <summary>Bars of histograms and rankings.</summary>
    public static readonly OxyColor Bars = OxyColor.FromRgb(0xa9, 0xc3, 0xd7);

    /// <summary>Letters and lines of the scaffolding.</summary>
    public static readonly OxyColor Slate = OxyColor.FromRgb(0x3c, 0x46, 0x50);

    private static readonly OxyColor Grid = OxyColor.FromRgb(0xe4, 0xe7, 0xea);

    /// <summary>
    /// Colours for several lines, in order; the set of Okabe and Ito (2008), made for readers who confuse red and green.
    /// </summary>
    public static readonly OxyColor[] Series =
    [
        OxyColor.FromRgb(0x00, 0x72, 0xb2), OxyColor.FromRgb(0xd5, 0x5e, 0x00), OxyColor.FromRgb(0x00, 0x9e, 0x73),
        OxyColor.FromRgb(0xcc, 0x79, 0xa7), OxyColor.FromRgb(0xe6, 0x9f, 0x00), OxyColor.FromRgb(0x56, 0xb4, 0xe9),
        OxyColor.FromRgb(0x5a, 0x5a, 0x5a),
    ];

    /// <summary>Dash patterns that go with <see cref="Series"/>, so that lines differ in print as well.</summary>
    public static readonly LineStyle[] Dashes =
        [LineStyle.Solid, LineStyle.Dash, LineStyle.DashDot, LineStyle.LongDash, LineStyle.Dot, LineStyle.LongDashDot, LineStyle.DashDotDot];

    /// <summary>An empty plot in the house look, its legend above the drawing.</summary>
    public static PlotModel Plot(params Axis[] axes)
    {
        var model = new PlotModel
        {
            Culture = CultureInfo.InvariantCulture,
            DefaultFont = MeasuringFont,
            DefaultFontSize = TextSize,
            TextColor = Slate,
            PlotAreaBorderColor = Slate,
            PlotAreaBorderThickness = new OxyThickness(1, 0, 0, 1),
            Padding = new OxyThickness(4, 8, 18, 4),
        };
        foreach (var axis in axes)
        {
            model.Axes.Add(axis);
        }

        model.Legends.Add(new Legend
        {
            LegendPlacement = LegendPlacement.Outside,
            LegendPosition = LegendPosition.TopLeft,
            LegendOrientation = LegendOrientation.Horizontal,
            LegendFontSize = TextSize - 1,
            LegendTextColor = Slate,
            LegendItemSpacing = 26,
            LegendSymbolLength = 24,
            LegendLineSpacing = 3,
            LegendPadding = 5,
            LegendMargin = 2,
        });
        return model;
    }

    /// <summary>A straight axis.</summary>
    public static LinearAxis Straight(AxisPosition position, string title, double from, double to) => Dress(
        new LinearAxis { Position = position, Minimum = from, Maximum = to, MinimumPadding = 0, MaximumPadding = 0, MinorTickSize = 0 }, title);

    /// <summary>A logarithmic axis; both ends above zero.</summary>
    public static LogarithmicAxis Logarithmic(AxisPosition position, string title, double from, double to)
    {
        var axis = Dress(new LogarithmicAxis { Position = position, Minimum = from, Maximum = to }, title);
        axis.MinorTickSize = 3;
        axis.UseSuperExponentialFormat = false;
        axis.LabelFormatter = value => Html.Wording.Number(value, 1);
        return axis;
    }

    /// <summary>A band between two curves.</summary>
    public static AreaSeries Band(string title, IEnumerable<(double X, double Low, double High)> points, OxyColor colour, byte opacity, LineStyle edge)
    {
        var band = new AreaSeries
        {
            Title = title,
            Fill = OxyColor.FromAColor(opacity, colour),
            Color = colour,
            Color2 = colour,
            StrokeThickness = edge == LineStyle.None ? 0 : 0.8,
            LineStyle = edge == LineStyle.None ? LineStyle.Solid : edge,
        };
        foreach (var (x, low, high) in points)
        {
            band.Points.Add(new DataPoint(x, high));
            band.Points2.Add(new DataPoint(x, low));
        }

        return band;
    }

    /// <summary>A curve.</summary>
    public static LineSeries Line(string? title, IEnumerable<(double X, double Y)> points, OxyColor colour, double width = 2, LineStyle style = LineStyle.Solid)
    {
        var line = new LineSeries { Title = title, Color = colour, StrokeThickness = width, LineStyle = style, LineJoin = LineJoin.Round };
        line.Points.AddRange(points.Select(p => new DataPoint(p.X, p.Y)));
        return line;
    }

    /// <summary>Points told apart by their mark.</summary>
    public static LineSeries Marks(string? title, IEnumerable<(double X, double Y)> points, OxyColor colour, MarkerType marker, double size = 5)
    {
        var marks = new LineSeries
        {
            Title = title,
            Color = colour,
            LineStyle = LineStyle.None,
            MarkerType = marker,
            MarkerSize = size,
            MarkerFill = OxyColors.White,
            MarkerStroke = colour,
            MarkerStrokeThickness = 2,
        };
        marks.Points.AddRange(points.Select(p => new DataPoint(p.X, p.Y)));
        return marks;
    }

    private static T Dress<T>(T axis, string title)
        where T : Axis
    {
        axis.Title = title;
        axis.TitleFontSize = TextSize;
        axis.AxisTitleDistance = 8;
        axis.MajorGridlineStyle = LineStyle.Solid;
        axis.MajorGridlineColor = Grid;
        axis.MajorGridlineThickness = 1;
        axis.TicklineColor = Slate;
        axis.MajorTickSize = 4;
        axis.TickStyle = TickStyle.Outside;
        return axis;
    }
}
