using FiberScope.Fibres;
using FiberScope.Reports.Html;
using FiberScope.Statistics;
using OxyPlot;
using OxyPlot.Axes;

namespace FiberScope.Reports.Figures;

/// <summary>Each field's diameters beside the pooled mean: does one field differ from the others?</summary>
internal static class FieldSpreadFigure
{
    private const int MostLabels = 25;

    /// <summary>Draws the fields of a survey; null when there is only one.</summary>
    public static SvgFigure? Draw(DiameterSurvey survey, DiameterScale scale, string id)
    {
        (int Field, WeightedSample Sample)[] fields = [.. survey.Readings.GroupBy(r => r.Field).OrderBy(g => g.Key).Select(g => (g.Key, Sample(g, scale)))];
        if (fields.Length < 2)
        {
            return null;
        }

        var top = fields.Max(f => f.Sample.Quantile(0.9)) * 1.08;
        var across = FigureStyle.Straight(AxisPosition.Bottom, "field", 0.4, fields.Length + 0.6);
        across.MajorStep = Math.Max(1, Math.Ceiling(fields.Length / (double)MostLabels));
        across.MajorGridlineStyle = LineStyle.None;
        across.LabelFormatter = position => Label(fields, position);
        var model = FigureStyle.Plot(across, FigureStyle.Straight(AxisPosition.Left, $"fibre diameter ({scale.Unit})", 0, top));
        var mean = survey.MeanInterval95;
        model.Series.Add(FigureStyle.Band("95 % interval of the pooled mean", [(0.4, scale.In(mean.Low), scale.In(mean.High)), (fields.Length + 0.6, scale.In(mean.Low), scale.In(mean.High))], FigureStyle.Series[0], 50, LineStyle.None));
        for (var i = 0; i < fields.Length; i++)
        {
            var sample = fields[i].Sample;
            model.Series.Add(FigureStyle.Line(i == 0 ? "D10 to D90" : null, [(i + 1, sample.Quantile(0.1)), (i + 1, sample.Quantile(0.9))], FigureStyle.Slate, 1.4));
        }

        model.Series.Add(FigureStyle.Marks("D50", fields.Select((f, i) => (i + 1.0, f.Sample.Quantile(0.5))), FigureStyle.Slate, MarkerType.Square, 3.5));
        model.Series.Add(FigureStyle.Marks("mean", fields.Select((f, i) => (i + 1.0, f.Sample.Mean)), FigureStyle.Ink, MarkerType.Circle, 5));
        return SvgFigure.Draw(model, id, "Mean, median and D10 to D90 of the fibre diameters of each field, by length, beside the pooled mean.", height: 290);
    }

    private static WeightedSample Sample(IEnumerable<DiameterReading> readings, DiameterScale scale)
    {
        DiameterReading[] all = [.. readings];
        return new WeightedSample([.. all.Select(r => scale.In(r.Diameter))], [.. all.Select(r => r.RepresentedLength.Meters)]);
    }

    private static string Label((int Field, WeightedSample Sample)[] fields, double position)
    {
        var index = (int)Math.Round(position) - 1;
        return index >= 0 && index < fields.Length && Math.Abs(position - index - 1) < 0.01 ? Wording.Count(fields[index].Field) : "";
    }
}
