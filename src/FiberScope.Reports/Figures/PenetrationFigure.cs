using FiberScope.Assessment;
using FiberScope.Filtration;
using FiberScope.Reports.Html;
using OxyPlot;
using OxyPlot.Annotations;
using OxyPlot.Axes;

namespace FiberScope.Reports.Figures;

/// <summary>Penetration against particle size, with the two bands apart and the most-penetrating size marked.</summary>
internal static class PenetrationFigure
{
    public static SvgFigure Draw(MediaForecast forecast, IEnumerable<RigPoint> rig)
    {
        var curve = forecast.Curve;
        var axis = PenetrationAxis.For(curve.SelectMany(p => new[] { p.Penetration, p.ModelBand.Low, p.ModelBand.High, p.MeasurementBand?.High ?? 0 }).Select(p => p * 100));
        var model = FigureStyle.Plot(ParticleAxis(curve), axis.Drawn("penetration (%)"));
        model.Series.Add(FigureStyle.Band(
            "spread of the published models",
            curve.Select(p => (p.Particle.Micrometers, axis.Clip(p.ModelBand.Low * 100), axis.Clip(p.ModelBand.High * 100))),
            FigureStyle.Slate,
            34,
            LineStyle.Dash));
        if (curve.Any(p => p.MeasurementBand is not null))
        {
            model.Series.Add(FigureStyle.Band(
                "95 % band of the measured inputs",
                curve.Where(p => p.MeasurementBand is not null).Select(p => (p.Particle.Micrometers, axis.Clip(p.MeasurementBand!.Value.Low * 100), axis.Clip(p.MeasurementBand.Value.High * 100))),
                FigureStyle.Series[0],
                70,
                LineStyle.None));
        }

        model.Series.Add(FigureStyle.Line("forecast", curve.Select(p => (p.Particle.Micrometers, axis.Clip(p.Penetration * 100))), FigureStyle.Ink, 2.4));
        (double, double)[] measured = [.. rig.Where(r => r.Particle is not null && r.Penetration is not null).Select(r => (r.Particle!.Value.Micrometers, axis.Clip(r.Penetration!.Value * 100)))];
        if (measured.Length > 0)
        {
            model.Series.Add(FigureStyle.Marks("measured on the rig", measured, FigureStyle.Accent, MarkerType.Diamond, 6));
        }

        if (forecast.MostPenetratingSize is { } size)
        {
            Mark(model, size.Micrometers, axis.Clip(forecast.PenetrationAtMostPenetratingSize * 100), $"MPPS {Wording.Particle(size)}", axis);
        }

        return SvgFigure.Draw(model, "penetration", "Forecast penetration against particle size, with the spread of the models and the band of the measured inputs.", height: 410);
    }

    internal static Axis ParticleAxis(IEnumerable<CurvePoint> curve)
    {
        double[] sizes = [.. curve.Select(p => p.Particle.Micrometers)];
        return sizes.Max() > sizes.Min()
            ? FigureStyle.Logarithmic(AxisPosition.Bottom, "particle diameter (µm)", sizes.Min(), sizes.Max())
            : FigureStyle.Logarithmic(AxisPosition.Bottom, "particle diameter (µm)", sizes[0] / 2, sizes[0] * 2);
    }

    private static void Mark(PlotModel model, double x, double y, string text, PenetrationAxis axis)
    {
        var foot = axis.IsLogarithmic ? axis.Low : 0;
        model.Series.Add(FigureStyle.Line(null, [(x, foot), (x, y)], FigureStyle.Accent, 1.2, LineStyle.Dash));
        model.Series.Add(FigureStyle.Marks(null, [(x, y)], FigureStyle.Accent, MarkerType.Circle, 4.5));
        var middle = axis.IsLogarithmic ? Math.Sqrt(foot * y) : (foot + y) / 2;
        model.Annotations.Add(new TextAnnotation
        {
            Text = text,
            TextPosition = new DataPoint(x, middle),
            Offset = new ScreenVector(8, 0),
            TextHorizontalAlignment = HorizontalAlignment.Left,
            TextVerticalAlignment = VerticalAlignment.Middle,
            StrokeThickness = 0,
            Background = OxyColor.FromAColor(200, OxyColors.White),
            TextColor = FigureStyle.Accent,
            FontWeight = 700,
        });
    }
}
