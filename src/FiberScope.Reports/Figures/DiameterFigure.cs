using FiberScope.Fibres;
using FiberScope.Reports.Html;
using FiberScope.Statistics;
using OxyPlot;
using OxyPlot.Axes;
using OxyPlot.Series;

namespace FiberScope.Reports.Figures;

/// <summary>The length-weighted histogram of diameters with the shapes fitted to it.</summary>
internal static class DiameterFigure
{
    private const int MostBars = 40;

    public static SvgFigure Draw(DiameterSurvey survey, DiameterScale scale, string id)
    {
        var sample = new WeightedSample([.. survey.Readings.Select(r => scale.In(r.Diameter))], [.. survey.Readings.Select(r => r.RepresentedLength.Meters)]);
        var (low, width, shares) = Bars(sample);
        var top = Math.Max(shares.Max(), Peak(survey, scale, width)) * 1.08;
        var model = FigureStyle.Plot(
            FigureStyle.Straight(AxisPosition.Bottom, $"fibre diameter ({scale.Unit})", Math.Max(0, low - width), low + (width * (shares.Length + 1))),
            FigureStyle.Straight(AxisPosition.Left, "share of fibre length per class (%)", 0, top));
        var bars = new RectangleBarSeries
        {
            Title = "readings, by length",
            FillColor = FigureStyle.Bars,
            StrokeColor = OxyColors.White,
            StrokeThickness = 0.8,
        };
        for (var i = 0; i < shares.Length; i++)
        {
            bars.Items.Add(new RectangleBarItem(low + (i * width), 0, low + ((i + 1) * width), shares[i]));
        }

        model.Series.Add(bars);
        AddShapes(model, survey, scale, low, width, shares.Length);
        return SvgFigure.Draw(model, id, "Histogram of fibre diameters by length, with the fitted distributions.", height: 360);
    }

    private static void AddShapes(PlotModel model, DiameterSurvey survey, DiameterScale scale, double low, double width, int bars)
    {
        if (survey.Shapes is not { } shapes)
        {
            return;
        }

        model.Series.Add(Curve("log-normal fit", shapes.LogNormal, FigureStyle.Ink, LineStyle.Solid));
        if (shapes is { IsBimodal: true, TwoLogNormals: { } two })
        {
            model.Series.Add(Curve("two-part log-normal fit", two, FigureStyle.Accent, LineStyle.Dash));
        }

        LineSeries Curve(string title, DistributionShape shape, OxyColor colour, LineStyle style)
        {
            const int Steps = 240;
            var from = Math.Max(low - width, width * 0.02);
            var to = low + (width * (bars + 1));
            var points = Enumerable.Range(0, Steps + 1).Select(i => from + ((to - from) * i / Steps))
                .Select(x => (x, PerClass(shape, scale, x, width)));
            return FigureStyle.Line(title, points, colour, 2.2, style);
        }
    }

    /// <summary>The share of length (%) that a shape puts into a class of a given width around a diameter.</summary>
    private static double PerClass(DistributionShape shape, DiameterScale scale, double diameter, double width) =>
        100 * shape.Density(scale.Of(diameter).Meters) * scale.Of(width).Meters;

    private static double Peak(DiameterSurvey survey, DiameterScale scale, double width)
    {
        if (survey.Shapes is not { } shapes)
        {
            return 0;
        }

        var shape = shapes.IsBimodal ? shapes.TwoLogNormals! : shapes.LogNormal;
        return shape.Parts.Max(p => PerClass(shape, scale, scale.In(UnitsNet.Length.FromMeters(p.Location)), width));
    }

    /// <summary>
    /// Classes of equal width by the rule of Freedman and Diaconis (1981), Z. Wahrscheinlichkeitstheorie 57, 453 (width 2 IQR n^(−1/3)), with
    /// the effective count of readings; the outermost half per cent of length on each side does not stretch them.
    /// </summary>
    private static (double Low, double Width, double[] Shares) Bars(WeightedSample sample)
    {
        var (low, high) = (sample.Quantile(0.0), sample.Quantile(0.995));
        if (!(high > low))
        {
            return (low * 0.95, low * 0.1, [100]);
        }

        var width = 2 * (sample.Quantile(0.75) - sample.Quantile(0.25)) / Math.Cbrt(sample.EffectiveCount);
        var count = width > 0 ? (int)Math.Clamp(Math.Ceiling((high - low) / width), 5, MostBars) : 10;
        width = (high - low) / count;
        var bars = (int)Math.Min(MostBars * 2, Math.Ceiling((sample.Values[^1] - low) / width));
        var shares = new double[Math.Max(bars, count)];
        for (var i = 0; i < sample.Values.Length; i++)
        {
            var bar = Math.Min(shares.Length - 1, (int)((sample.Values[i] - low) / width));
            shares[bar] += 100 * sample.Weights[i] / sample.TotalWeight;
        }

        return (low, width, shares);
    }
}
