using FiberScope.Filtration;
using FiberScope.Reports.Html;
using FiberScope.Statistics;
using OxyPlot;

namespace FiberScope.Reports.Figures;

/// <summary>What each mechanism alone would let through, against particle size.</summary>
/// <remarks>
/// A mechanism that brings the share s of −ln P would by itself let through P to the power s: penetrations of mechanisms multiply.
/// </remarks>
internal static class MechanismFigure
{
    private const double LeastShare = 0.005;

    /// <summary>Where less than this gets through, everything is stopped several times over and shares mean little.</summary>
    private const double LeastPenetration = 1e-6;

    public static SvgFigure Draw(MediaForecast forecast)
    {
        CurvePoint[] curve = [.. forecast.Curve.Where(p => p.Penetration >= LeastPenetration)];
        if (curve.Length < 2)
        {
            curve = [.. forecast.Curve];
        }

        string[] mechanisms = [.. curve.SelectMany(p => p.ByMechanism.Where(m => m.Value >= LeastShare).Select(m => m.Key)).Distinct(StringComparer.Ordinal).Order(StringComparer.Ordinal)];
        var axis = PenetrationAxis.For(curve.Select(p => p.Penetration * 100).Append(100));
        var model = FigureStyle.Plot(PenetrationFigure.ParticleAxis(curve), axis.Drawn("penetration (%)"));
        Band(model, "spread of the models", curve.Select(p => (p, (Interval?)p.ModelBand)), axis, FigureStyle.Slate, 30);
        Band(model, "measured inputs, 95 %", curve.Select(p => (p, p.MeasurementBand)), axis, FigureStyle.Series[0], 60);
        model.Series.Add(FigureStyle.Line("all together", curve.Select(p => (p.Particle.Micrometers, axis.Clip(p.Penetration * 100))), FigureStyle.Ink, 3));
        foreach (var (mechanism, i) in mechanisms.Select((m, i) => (m, i)))
        {
            var style = FigureStyle.Dashes[(i + 1) % FigureStyle.Dashes.Length];
            var points = curve.Select(p => (p.Particle.Micrometers, axis.Clip(100 * Math.Pow(p.Penetration, p.ByMechanism.GetValueOrDefault(mechanism)))));
            model.Series.Add(FigureStyle.Line(Wording.Words(mechanism) + " alone", points, FigureStyle.Series[(i + 1) % FigureStyle.Series.Length], 1.8, style));
        }

        return SvgFigure.Draw(model, "mechanisms", "Penetration that each mechanism alone would give, against particle size.", height: 390);
    }

    private static void Band(PlotModel model, string title, IEnumerable<(CurvePoint Point, Interval? Band)> curve, PenetrationAxis axis, OxyColor colour, byte opacity)
    {
        (double, double, double)[] known = [.. curve.Where(c => c.Band is not null).Select(c => (c.Point.Particle.Micrometers, axis.Clip(100 * c.Band!.Value.Low), axis.Clip(100 * c.Band.Value.High)))];
        if (known.Length > 1)
        {
            model.Series.Add(FigureStyle.Band(title, known, colour, opacity, LineStyle.None));
        }
    }
}
