using FiberScope.Assessment.Auditing;
using OxyPlot;
using OxyPlot.Annotations;
using OxyPlot.Axes;

namespace FiberScope.Reports.Figures;

/// <summary>Machine and eye on the same readings.</summary>
internal static class AgreementFigures
{
    private const double Width = 560;
    private const double Height = 400;

    /// <summary>Their difference against their mean, with bias and limits of agreement; Bland and Altman (1986).</summary>
    public static SvgFigure Differences(AuditFinding finding)
    {
        (double X, double Y)[] points = [.. finding.Pairs.Select(p => (Math.Sqrt(p.MachineMicrometres * p.PersonMicrometres), 100 * (p.Ratio - 1)))];
        var (bias, limits) = (100 * finding.RelativeBias.Value, finding.RelativeLimits);
        var reach = 1.15 * new[] { 5, Math.Abs(100 * limits.Low), Math.Abs(100 * limits.High), points.Max(p => Math.Abs(p.Y)) }.Max();
        var model = FigureStyle.Plot(Diameters(points.Select(p => p.X), AxisPosition.Bottom, "mean of machine and eye (µm)"), FigureStyle.Straight(AxisPosition.Left, "machine over eye − 1 (%)", -reach, reach));
        Level(model, 0, FigureStyle.Slate, LineStyle.Solid, 1);
        Level(model, bias, FigureStyle.Ink, LineStyle.Solid, 2);
        Level(model, 100 * limits.Low, FigureStyle.Accent, LineStyle.Dash, 1.6);
        Level(model, 100 * limits.High, FigureStyle.Accent, LineStyle.Dash, 1.6);
        model.Series.Add(FigureStyle.Line("bias", [], FigureStyle.Ink));
        model.Series.Add(FigureStyle.Line("limits of agreement, 95 %", [], FigureStyle.Accent, 1.6, LineStyle.Dash));
        model.Series.Add(FigureStyle.Marks("readings", points, FigureStyle.Series[0], MarkerType.Circle, 4));
        return SvgFigure.Draw(model, "differences", "Relative difference of machine and eye against their mean, with bias and limits of agreement.", Width, Height);
    }

    /// <summary>The machine against the eye, with the line of both in error.</summary>
    public static SvgFigure Line(AuditFinding finding)
    {
        (double X, double Y)[] points = [.. finding.Pairs.Select(p => (p.PersonMicrometres, p.MachineMicrometres))];
        var all = points.SelectMany(p => new[] { p.X, p.Y }).ToArray();
        var (across, up) = (Diameters(all, AxisPosition.Bottom, "eye (µm)"), Diameters(all, AxisPosition.Left, "machine (µm)"));
        var model = FigureStyle.Plot(across, up);
        var (low, high) = (across.Minimum, across.Maximum);
        double[] along = [.. Enumerable.Range(0, 60).Select(i => low * Math.Pow(high / low, i / 59.0))];
        model.Series.Add(FigureStyle.Line("equal", along.Select(x => (x, x)), FigureStyle.Slate, 1, LineStyle.Dash));
        model.Series.Add(FigureStyle.Line("Deming's line", along.Select(x => (x, finding.Line.Intercept + (finding.Line.Slope * x))).Where(p => p.Item2 > 0), FigureStyle.Ink));
        model.Series.Add(FigureStyle.Marks("readings", points, FigureStyle.Series[0], MarkerType.Circle, 4));
        return SvgFigure.Draw(model, "line", "The machine's diameters against the eye's, with Deming's line.", Width, Height);
    }

    private static LogarithmicAxis Diameters(IEnumerable<double> values, AxisPosition position, string title)
    {
        double[] all = [.. values];
        return FigureStyle.Logarithmic(position, title, all.Min() / 1.15, all.Max() * 1.15);
    }

    private static void Level(PlotModel model, double y, OxyColor colour, LineStyle style, double width) => model.Annotations.Add(new LineAnnotation
    {
        Type = LineAnnotationType.Horizontal,
        Y = y,
        Color = colour,
        LineStyle = style,
        StrokeThickness = width,
        Layer = AnnotationLayer.BelowSeries,
    });
}
