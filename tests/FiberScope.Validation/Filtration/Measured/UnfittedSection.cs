using FiberScope.Filtration;
using ScottPlot;

namespace FiberScope.Validation.Filtration.Measured;

/// <summary>Discharged media with nothing fitted but the effective diameter, which comes from the measured pressure drop.</summary>
internal static class UnfittedSection
{
    internal static readonly (CorrelationSet Set, string Word)[] Sets =
    [
        (CorrelationSet.KirschStechkina1978, "kirsch-stechkina-1978"), (CorrelationSet.LeeLiu1982, "lee-liu-1982"),
        (CorrelationSet.Hinds1999, "hinds-1999"), (CorrelationSet.Cell, "cell"), (CorrelationSet.CellMat, "cell-mat"),
    ];

    private sealed record Forecast(MeasuredStack Stack, CorrelationSet Set, double Diameter, MediaForecast Result)
    {
        public IEnumerable<double> Judged => Result.Curve.Zip(Stack.Penetration, Stack.Micrometres)
            .Where(p => MeasuredStack.IsJudged(p.Third)).Select(p => p.First.Penetration - p.Second);
    }

    public static void Write(MarkdownText text, IReadOnlyList<MeasuredStack> stacks)
    {
        var discharged = stacks.Where(s => s.IsDischarged).ToList();
        var forecasts = Sets.SelectMany(set => discharged.Select(s => Make(s, set.Set))).ToList();
        text.Heading(3, "Measured media, nothing fitted but the effective diameter")
            .Paragraph($"Data: S. N. Rogak, T. A. Sipkens, M. Guan, H. Nikookar, D. Vargas Figueroa and J. Wang, \"Properties of materials considered for improvised masks\" (2020), arXiv:2008.06001, with the authors' data table (`Published/measured-media.csv`): salt particles, 4.9 cm/s. Fibre diameters were not reported: each set gets the one diameter at which its own drag law gives the measured pressure drop; solidity from weight, thickness and 905 kg/m³. Judged on the discharged media with a known thickness at 0.33–1.21 µm; wanted: median 0.05, nine in ten 0.12 (absolute).")
            .Table(["set", "points", "median error", "nine in ten", "mean with sign", "wanted"],
                Sets.Select(set => Row($"`{set.Word}`", [.. forecasts.Where(f => f.Set == set.Set)])));
        Values(text, forecasts);
        foreach (var (stack, name) in Pictured(discharged))
        {
            var caption = FormattableString.Invariant($"{stack.Material}, {stack.Treatment}, {stack.Layers} layer{(stack.Layers > 1 ? "s" : "")}");
            text.Picture(Figures.Save(Draw(stack, forecasts, caption), name, 600, 400), caption);
        }
    }

    internal static ForecastSettings Settings(CorrelationSet set) => new() { Correlations = set, Draws = 0 };

    private static Forecast Make(MeasuredStack stack, CorrelationSet set)
    {
        var diameter = stack.EffectiveDiameter(Settings(set));
        return new Forecast(stack, set, diameter, MediaModel.Forecast(stack.Build(diameter), stack.Point, Settings(set)));
    }

    private static IReadOnlyList<string> Row(string word, List<Forecast> forecasts)
    {
        var summary = ErrorSummary.Of(forecasts.SelectMany(f => f.Judged));
        var met = summary is { Median: <= 0.05, NinetyPercent: <= 0.12 };
        return [word, MarkdownText.Number(summary.Count), MarkdownText.Number(summary.Median, "0.000"), MarkdownText.Number(summary.NinetyPercent, "0.000"), MarkdownText.Number(summary.Bias, "+0.000;-0.000"), met ? "met" : "missed"];
    }

    private static void Values(MarkdownText text, List<Forecast> forecasts)
    {
        var sizes = new[] { 0, 3, 5, 6, 9, 12 };
        var stacks = forecasts.Select(f => f.Stack).Distinct().ToList();
        text.Paragraph($"Penetration forecast with `kirsch-stechkina-1978` / `cell-mat` and, after the colon, measured, by particle size; d: the effective diameters of the two sets:")
            .Table(["medium", "layers", "α", "d, µm", .. sizes.Select(i => MarkdownText.Number(stacks[0].Micrometres[i], "0.00") + " µm")], stacks.Select(s =>
            {
                var fan = forecasts.Single(f => f.Stack == s && f.Set == CorrelationSet.KirschStechkina1978);
                var cell = forecasts.Single(f => f.Stack == s && f.Set == CorrelationSet.CellMat);
                string P(double value) => MarkdownText.Number(value, "0.00");
                return (IReadOnlyList<string>)
                [
                    $"{s.Material}, {s.Treatment}", MarkdownText.Number(s.Layers), MarkdownText.Number(s.Solidity, "0.000"), FormattableString.Invariant($"{1e6 * fan.Diameter:0.0} / {1e6 * cell.Diameter:0.0}"),
                    .. sizes.Select(i => $"{P(fan.Result.Curve[i].Penetration)} / {P(cell.Result.Curve[i].Penetration)} : {P(s.Penetration[i])}"),
                ];
            }));
    }

    private static IEnumerable<(MeasuredStack Stack, string Name)> Pictured(List<MeasuredStack> discharged)
    {
        yield return (discharged.First(s => s.Material.StartsWith("SMS", StringComparison.Ordinal)), "media-sms-b-discharged");
        yield return (discharged.First(s => s.Material.StartsWith("spun", StringComparison.Ordinal) && s.Layers == 3), "media-spun-a-discharged-3");
    }

    private static Plot Draw(MeasuredStack stack, List<Forecast> forecasts, string title)
    {
        var plot = new Plot();
        var x = stack.Micrometres.Select(Math.Log10).ToArray();
        var mine = forecasts.Where(f => f.Stack == stack).ToList();
        double[] Curve(CorrelationSet set) => [.. mine.Single(f => f.Set == set).Result.Curve.Select(c => c.Penetration)];
        var published = mine.Where(f => f.Set < CorrelationSet.Cell).Select(f => f.Result.Curve.Select(c => c.Penetration).ToArray()).ToList();
        var band = plot.Add.FillY(x, [.. x.Select((_, i) => published.Min(c => c[i]))], [.. x.Select((_, i) => published.Max(c => c[i]))]);
        band.FillStyle.Color = new ScottPlot.Color(190, 205, 225);
        band.LineStyle.Width = 0;
        band.LegendText = "published sets, each with its own diameter";
        Line(plot, x, Curve(CorrelationSet.KirschStechkina1978), "kirsch-stechkina-1978", new ScottPlot.Color(33, 85, 150));
        Line(plot, x, Curve(CorrelationSet.CellMat), "cell-mat", new ScottPlot.Color(20, 120, 80));
        var measured = plot.Add.ScatterPoints(x, [.. stack.Penetration]);
        measured.Color = Colors.Black;
        measured.MarkerSize = 7;
        measured.LegendText = "measured";
        Dress(plot, title);
        return plot;
    }

    internal static void Line(Plot plot, double[] x, double[] y, string legend, ScottPlot.Color color)
    {
        var line = plot.Add.ScatterLine(x, y);
        line.Color = color;
        line.LineWidth = 2.2f;
        line.LegendText = legend;
    }

    internal static void Dress(Plot plot, string title)
    {
        double[] ticks = [0.3, 0.5, 1, 2, 4];
        plot.Axes.Bottom.TickGenerator = new ScottPlot.TickGenerators.NumericManual([.. ticks.Select(Math.Log10)], [.. ticks.Select(t => MarkdownText.Number(t))]);
        plot.XLabel("particle diameter, µm", 13);
        plot.YLabel("penetration", 13);
        plot.Title(title, 15);
        plot.Axes.SetLimits(Math.Log10(0.29), Math.Log10(5), 0, 1.08);
        plot.ShowLegend(Alignment.LowerLeft);
        plot.Legend.FontSize = 12;
    }
}
