using OxyPlot;
using OxyPlot.Axes;
using OxyPlot.Series;

namespace FiberScope.Reports.Figures;

/// <summary>Bars that rank causes, the largest on top.</summary>
internal static class RankingFigure
{
    /// <summary>Draws a ranking.</summary>
    /// <param name="causes">Each cause with its share of the variance; dimensionless, 0 to 1.</param>
    /// <param name="title">What the bars measure.</param>
    /// <param name="id">A name, unique on the page.</param>
    /// <param name="description">What the figure shows, one sentence.</param>
    public static SvgFigure Draw(IEnumerable<(string Name, double Share)> causes, string title, string id, string description)
    {
        (string Name, double Share)[] ascending = [.. causes.OrderBy(c => c.Share)];
        var names = new CategoryAxis
        {
            Position = AxisPosition.Left,
            GapWidth = 0.5,
            MajorTickSize = 0,
            AxislineStyle = LineStyle.None,
        };
        names.Labels.AddRange(ascending.Select(c => c.Name));
        var model = FigureStyle.Plot(names, FigureStyle.Straight(AxisPosition.Bottom, title, 0, Math.Max(5, ascending.Max(c => c.Share) * 112)));
        var bars = new BarSeries
        {
            FillColor = FigureStyle.Bars,
            StrokeThickness = 0,
            LabelFormatString = "{0:0} %",
            LabelPlacement = LabelPlacement.Outside,
            LabelMargin = 4,
        };
        bars.Items.AddRange(ascending.Select(c => new BarItem(c.Share * 100)));
        model.Series.Add(bars);
        return SvgFigure.Draw(model, id, description, 620, 90 + (30 * ascending.Length));
    }
}
