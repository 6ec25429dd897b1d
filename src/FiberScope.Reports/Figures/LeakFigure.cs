using FiberScope.Filtration;
using OxyPlot;
using OxyPlot.Axes;

namespace FiberScope.Reports.Figures;

/// <summary>What gets past a leaking medium in all, against the leak.</summary>
internal static class LeakFigure
{
    private const double LeastLeak = 1e-4;
    private const double MostLeak = 0.5;
    private const int Points = 80;

    /// <summary>Draws the total against the leak's share of the air; where the penetration doubles, a mark.</summary>
    /// <param name="penetration">Of the medium at the most-penetrating size; dimensionless, above 0 to 1.</param>
    public static SvgFigure Draw(double penetration)
    {
        (double X, double Y)[] total = [.. Enumerable.Range(0, Points).Select(i => LeastLeak * Math.Pow(MostLeak / LeastLeak, i / (Points - 1.0)))
            .Select(leak => (100 * leak, 100 * Leakage.Total(penetration, leak)))];
        var axis = PenetrationAxis.For(total.Select(p => p.Y).Append(100 * penetration));
        var model = FigureStyle.Plot(
            FigureStyle.Logarithmic(AxisPosition.Bottom, "share of the air through the leak (%)", 100 * LeastLeak, 100 * MostLeak),
            axis.Drawn("penetration in all (%)"));
        model.Series.Add(FigureStyle.Line("medium alone", [(100 * LeastLeak, axis.Clip(100 * penetration)), (100 * MostLeak, axis.Clip(100 * penetration))], FigureStyle.Slate, 1.4, LineStyle.Dash));
        model.Series.Add(FigureStyle.Line("medium and leak", total.Select(p => (p.X, axis.Clip(p.Y))), FigureStyle.Ink, 2.4));
        var halving = Leakage.HalvingShare(penetration);
        if (halving is > LeastLeak and < MostLeak)
        {
            model.Series.Add(FigureStyle.Marks("protection halved", [(100 * halving, axis.Clip(200 * penetration))], FigureStyle.Accent, MarkerType.Diamond, 6));
        }

        return SvgFigure.Draw(model, "leak", "Penetration in all at the most-penetrating size against the share of the air through a leak.", 560, 330);
    }
}
