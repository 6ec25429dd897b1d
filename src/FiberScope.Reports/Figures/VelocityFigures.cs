using FiberScope.Assessment;
using OxyPlot;
using OxyPlot.Axes;
using OxyPlot.Series;
using UnitsNet;

namespace FiberScope.Reports.Figures;

/// <summary>How the forecast moves with face velocity: pressure drop, quality factor, most-penetrating size.</summary>
internal static class VelocityFigures
{
    private const double Narrow = 460;
    private const double Low = 330;

    /// <summary>Pressure drop against face velocity, with what a rig measured.</summary>
    public static SvgFigure PressureDrop(IReadOnlyList<VelocityPoint> sweep, Speed inUse, IEnumerable<RigPoint> rig)
    {
        (double, double)[] measured = [.. rig.Where(r => r.PressureDrop is not null).Select(r => (r.FaceVelocity.CentimetersPerSecond, r.PressureDrop!.Value.Pascals))];
        var points = Points(sweep, p => p.PressureDrop.Pascals);
        var model = Model(sweep, "pressure drop (Pa)", points.Concat(measured));
        model.Series.Add(FigureStyle.Line("forecast", points, FigureStyle.Ink, 2.4));
        if (measured.Length > 0)
        {
            model.Series.Add(FigureStyle.Marks("measured on the rig", measured, FigureStyle.Accent, MarkerType.Diamond, 6));
        }

        MarkUse(model, points, inUse);
        return SvgFigure.Draw(model, "pressure-drop", "Forecast pressure drop against face velocity.", Narrow, Low);
    }

    /// <summary>The quality factor at the most-penetrating size against face velocity.</summary>
    public static SvgFigure QualityFactor(IReadOnlyList<VelocityPoint> sweep, Speed inUse)
    {
        var points = Points(sweep, p => p.QualityFactorPerPascal * 1000);
        var model = Model(sweep, "quality factor (1/kPa)", points);
        model.Series.Add(FigureStyle.Line("forecast, at the MPPS", points, FigureStyle.Ink, 2.4));
        MarkUse(model, points, inUse);
        return SvgFigure.Draw(model, "quality-factor", "Forecast quality factor against face velocity.", Narrow, Low);
    }

    /// <summary>The most-penetrating size against face velocity; null when no velocity has one.</summary>
    public static SvgFigure? MostPenetratingSize(IReadOnlyList<VelocityPoint> sweep, Speed inUse)
    {
        VelocityPoint[] known = [.. sweep.Where(p => p.MostPenetratingSize is not null)];
        if (known.Length < 2)
        {
            return null;
        }

        var points = Points(known, p => p.MostPenetratingSize!.Value.Micrometers);
        var model = Model(known, "MPPS (µm)", points);
        model.Series.Add(FigureStyle.Line("forecast", points, FigureStyle.Ink, 2.4));
        MarkUse(model, points, inUse);
        return SvgFigure.Draw(model, "mpps", "Forecast most-penetrating particle size against face velocity.", Narrow, Low);
    }

    /// <summary>Penetration at the most-penetrating size against face velocity.</summary>
    public static SvgFigure Penetration(IReadOnlyList<VelocityPoint> sweep, Speed inUse)
    {
        var points = Points(sweep, p => p.Penetration * 100);
        var axis = PenetrationAxis.For(points.Select(p => p.Y));
        var model = FigureStyle.Plot(VelocityAxis(sweep), axis.Drawn("penetration at the MPPS (%)"));
        (double, double)[] clipped = [.. points.Select(p => (p.X, axis.Clip(p.Y)))];
        model.Series.Add(FigureStyle.Line("forecast", clipped, FigureStyle.Ink, 2.4));
        MarkUse(model, clipped, inUse);
        return SvgFigure.Draw(model, "penetration-velocity", "Forecast penetration at the most-penetrating size against face velocity.", Narrow, Low);
    }

    private static (double X, double Y)[] Points(IReadOnlyList<VelocityPoint> sweep, Func<VelocityPoint, double> value) =>
        [.. sweep.Select(p => (p.FaceVelocity.CentimetersPerSecond, value(p)))];

    private static PlotModel Model(IReadOnlyList<VelocityPoint> sweep, string title, IEnumerable<(double X, double Y)> points) =>
        FigureStyle.Plot(VelocityAxis(sweep), FigureStyle.Straight(AxisPosition.Left, title, 0, Math.Max(1e-12, points.Max(p => p.Y) * 1.1)));

    private static Axis VelocityAxis(IReadOnlyList<VelocityPoint> sweep)
    {
        var (slow, fast) = (sweep[0].FaceVelocity.CentimetersPerSecond, sweep[^1].FaceVelocity.CentimetersPerSecond);
        return fast / slow > 20
            ? FigureStyle.Logarithmic(AxisPosition.Bottom, "face velocity (cm/s)", slow, fast)
            : FigureStyle.Straight(AxisPosition.Bottom, "face velocity (cm/s)", 0, fast * 1.03);
    }

    /// <summary>Marks the velocity of use on a curve, between its points where it has none there.</summary>
    private static void MarkUse(PlotModel model, (double X, double Y)[] points, Speed inUse)
    {
        var x = inUse.CentimetersPerSecond;
        var after = Array.FindIndex(points, p => p.X >= x);
        if (after < 0)
        {
            return;
        }

        var (next, before) = (points[after], points[Math.Max(0, after - 1)]);
        var share = next.X > before.X ? (x - before.X) / (next.X - before.X) : 0;
        LineSeries mark = FigureStyle.Marks("at this face velocity", [(x, before.Y + (share * (next.Y - before.Y)))], FigureStyle.Ink, MarkerType.Circle, 4.5);
        model.Series.Add(mark);
    }
}
