using FiberScope.Fibres;
using FiberScope.Statistics;
using OxyPlot;
using OxyPlot.Axes;
using OxyPlot.Series;

namespace FiberScope.Reports.Figures;

/// <summary>What the pictures tell besides diameters: direction of the fibres, openings, evenness of cover.</summary>
internal static class StructureFigures
{
    private const double Narrow = 460;
    private const double Low = 300;
    private const int OpeningBars = 20;

    /// <summary>The share of fibre length by direction, beside that of a random mat.</summary>
    public static SvgFigure Orientation(OrientationSummary orientation, string id)
    {
        var shares = orientation.Shares;
        var width = 180.0 / shares.Length;
        var across = FigureStyle.Straight(AxisPosition.Bottom, "direction in the picture (°)", 0, 180);
        across.MajorStep = 45;
        var model = FigureStyle.Plot(across, FigureStyle.Straight(AxisPosition.Left, "share of fibre length (%)", 0, shares.Max() * 115));
        model.Series.Add(Bars("by length", shares.Select((share, i) => (i * width, (i + 1) * width, share * 100))));
        model.Series.Add(FigureStyle.Line("random mat", [(0, 100.0 / shares.Length), (180, 100.0 / shares.Length)], FigureStyle.Accent, 1.6, LineStyle.Dash));
        return SvgFigure.Draw(model, id, "Share of fibre length by direction: 0° is the picture's horizontal, 90° its vertical.", Narrow, Low);
    }

    /// <summary>The share of the open area by the diameter of the openings; null when there are none to speak of.</summary>
    public static SvgFigure? Openings(OpeningSummary openings, string id)
    {
        double[] micrometres = [.. openings.Diameters.Select(d => d.Micrometers).Where(d => d > 0)];
        if (micrometres.Length < 2)
        {
            return null;
        }

        var sample = new WeightedSample(micrometres, [.. micrometres.Select(d => d * d)]);
        var width = micrometres.Max() / OpeningBars;
        double Share(int bar) => 100 * (sample.ShareAtOrBelow((bar + 1) * width) - (bar == 0 ? 0 : sample.ShareAtOrBelow(bar * width)));
        (double From, double To, double Height)[] bars = [.. Enumerable.Range(0, OpeningBars).Select(i => (i * width, (i + 1) * width, Share(i)))];
        var model = FigureStyle.Plot(
            FigureStyle.Straight(AxisPosition.Bottom, "diameter of the opening (µm)", 0, micrometres.Max() * 1.02),
            FigureStyle.Straight(AxisPosition.Left, "share of the area of all circles (%)", 0, bars.Max(b => b.Height) * 1.15));
        model.Series.Add(Bars("largest circle that fits", bars));
        return SvgFigure.Draw(model, id, "Openings between the foremost fibres by the largest circle that fits, each by its area.", Narrow, Low);
    }

    /// <summary>How uneven the cover is through windows of growing size, beside a random mat; null with fewer than two windows.</summary>
    public static SvgFigure? Uniformity(UniformitySummary uniformity, string id)
    {
        UniformityAtWindow[] windows = [.. uniformity.Windows.Where(w => w.StandardDeviation > 0 && w.RandomStandardDeviation > 0)];
        if (windows.Length < 2)
        {
            return null;
        }

        double[] all = [.. windows.SelectMany(w => new[] { w.StandardDeviation, w.RandomStandardDeviation })];
        var model = FigureStyle.Plot(
            FigureStyle.Logarithmic(AxisPosition.Bottom, "side of the window (µm)", windows[0].Side.Micrometers, windows[^1].Side.Micrometers),
            FigureStyle.Logarithmic(AxisPosition.Left, "standard deviation of cover", all.Min() / 1.4, all.Max() * 1.4));
        model.Series.Add(FigureStyle.Line("random mat", windows.Select(w => (w.Side.Micrometers, w.RandomStandardDeviation)), FigureStyle.Accent, 1.6, LineStyle.Dash));
        var measured = FigureStyle.Marks("measured", windows.Select(w => (w.Side.Micrometers, w.StandardDeviation)), FigureStyle.Ink, MarkerType.Circle, 4.5);
        measured.LineStyle = LineStyle.Solid;
        model.Series.Add(measured);
        return SvgFigure.Draw(model, id, "Standard deviation of local cover against the side of the window, beside a random mat.", Narrow, Low);
    }

    private static RectangleBarSeries Bars(string title, IEnumerable<(double From, double To, double Height)> bars)
    {
        var series = new RectangleBarSeries { Title = title, FillColor = FigureStyle.Bars, StrokeColor = OxyColors.White, StrokeThickness = 0.8 };
        foreach (var (from, to, height) in bars)
        {
            series.Items.Add(new RectangleBarItem(from, 0, to, height));
        }

        return series;
    }
}
