using FiberScope.Assessment;
using FiberScope.Fibres;
using FiberScope.Reports.Figures;
using FiberScope.Reports.Html;
using FiberScope.Statistics;
using UnitsNet;

namespace FiberScope.Reports.Sections;

/// <summary>The pooled fibre diameters of each layer: figures by both weightings, shape, budget, and how much more to measure.</summary>
internal sealed class DiameterSection : IReportSection
{
    private static readonly double[] WantedHalfWidths = [0.10, 0.05, 0.03, 0.02];

    /// <inheritdoc/>
    public string Anchor => "diameters";

    /// <inheritdoc/>
    public string Heading => "Fibre diameters";

    /// <inheritdoc/>
    public Markup Render(SwatchAssessment assessment) =>
        Markup.Join(assessment.Layers.Select((layer, i) => Layer(layer, assessment.Layers.Length > 1, "diameters-" + Wording.Count(i + 1))));

    private static Markup Layer(LayerFinding layer, bool named, string id)
    {
        var survey = layer.Survey;
        var scale = DiameterScale.For(survey);
        var heading = named ? Markup.Of($"<h3>{layer.Name}</h3>") : Markup.Empty;
        return Markup.Of(
            $"""
            {heading}
            <figure>{Markup.OfSvg(DiameterFigure.Draw(survey, scale, id))}<figcaption>Length-weighted: every micrometre of fibre counts the same, as it does for filtration. {Shape(survey, scale)}</figcaption></figure>
            {Statistics(survey, scale)}
            <p class="fine">Length-weighted figures weigh each reading by the visible length of fibre it stands for. Number-weighted figures count each trace once; a long fibre can show as several traces. Intervals come from the differences between fields and fibres, not from the count of readings.</p>
            {Fields(survey, scale, id + "-fields")}
            <div class="pair"><div>{Budget(survey, scale)}</div><div>{Plan(survey)}</div></div>
            """);
    }

    private static Markup Statistics(DiameterSurvey survey, DiameterScale scale)
    {
        var (length, number) = (survey.LengthWeighted, survey.NumberWeighted);
        var table = new Table("figures", "", "length-weighted", "95 % interval", "number-weighted", "95 % interval");
        table.Row($"mean ({scale.Unit})", scale.Number(length.Mean), Range(survey.MeanInterval95), scale.Number(number.Mean), Range(survey.NumberMeanInterval95));
        table.Row($"SD ({scale.Unit})", scale.Number(length.StandardDeviation), Range(survey.StandardDeviationInterval95), scale.Number(number.StandardDeviation), "");
        table.Row("CV", Wording.Percent(length.CoefficientOfVariation), "", Wording.Percent(number.CoefficientOfVariation), "");
        table.Row($"geometric mean ({scale.Unit})", scale.Number(length.GeometricMean), "", scale.Number(number.GeometricMean), "");
        table.Row("GSD", Wording.Fixed(length.GeometricStandardDeviation, 3), "", Wording.Fixed(number.GeometricStandardDeviation, 3), "");
        table.Row($"D10 ({scale.Unit})", scale.Number(length.D10), Range(survey.D10Interval95), scale.Number(number.D10), "");
        table.Row($"D50 ({scale.Unit})", scale.Number(length.D50), Range(survey.D50Interval95), scale.Number(number.D50), "");
        table.Row($"D90 ({scale.Unit})", scale.Number(length.D90), Range(survey.D90Interval95), scale.Number(number.D90), "");
        table.Row("rests on", Wording.Count(survey.Readings.Length, "reading"), Wording.Count(survey.FieldCount, "field"), Wording.Count(survey.FibreCount, "trace"), "");
        return table.Finish();

        string Range(LengthInterval interval) => $"{scale.Number(interval.Low)} to {scale.Number(interval.High)}";
    }

    private static Markup Fields(DiameterSurvey survey, DiameterScale scale, string id) =>
        FieldSpreadFigure.Draw(survey, scale, id) is { } figure
            ? Markup.Of($"<figure>{Markup.OfSvg(figure)}<figcaption>Field by field, length-weighted. A field that stands apart from the others deserves a second look at its picture.</figcaption></figure>")
            : Markup.Empty;

    private static string Shape(DiameterSurvey survey, DiameterScale scale)
    {
        if (survey.Shapes is not { } shapes)
        {
            return "All readings are equal; there is no shape to fit.";
        }

        var one = $"Log-normal fit: median {Size(shapes.LogNormal.Parts[0])}, GSD {Wording.Fixed(shapes.LogNormal.Parts[0].Spread, 3)}.";
        if (shapes is { IsBimodal: true, TwoLogNormals: { } two })
        {
            var parts = two.Parts.Select(p => $"{Wording.Percent(p.Fraction, 2)} of the length at {Size(p)}, GSD {Wording.Fixed(p.Spread, 2)}");
            return $"{one} Two parts are strongly supported: {string.Join("; ", parts)}.";
        }

        var best = shapes.Ranked[0].Family == ShapeFamily.Normal ? " A normal distribution fits better." : "";
        return $"{one}{best} A second population is not supported by these readings.";

        string Size(ShapePart part) => scale.Text(Length.FromMeters(part.Location));
    }

    private static Markup Budget(DiameterSurvey survey, DiameterScale scale)
    {
        var budget = survey.Budget;
        var combined = budget.Combined.Meters;
        var table = new Table("figures budget", "part", $"u ({scale.Unit})", "share", "meaning");
        foreach (var part in budget.Parts)
        {
            var share = combined > 0 ? Math.Pow(part.StandardUncertainty.Meters / combined, 2) : 0;
            table.Row(part.Name, Fine(part.StandardUncertainty), $"{Wording.Fixed(share * 100, 0)} %", part.Meaning);
        }

        table.Row("total", [Markup.Of($"combined"), Markup.Of($"{Fine(budget.Combined)}"), Markup.Of($"100 %"), Markup.Of($"95 %: ± {Fine(budget.Expanded95)} {scale.Unit}, {Freedom(budget.EffectiveDegreesOfFreedom)}")]);
        return Markup.Of($"<h3>Uncertainty of the mean</h3>{table.Finish()}");

        string Fine(Length u) => Wording.Number(scale.In(u), 2);
    }

    private static string Freedom(double degrees) => double.IsFinite(degrees) && degrees < 1e4
        ? $"{Wording.Number(degrees, 2)} degrees of freedom"
        : "well known";

    private static Markup Plan(DiameterSurvey survey)
    {
        var half = (survey.MeanInterval95.High - survey.MeanInterval95.Low) / 2 / survey.LengthWeighted.Mean;
        var table = new Table("figures", "to bring the mean to", "fields in all");
        foreach (var wanted in WantedHalfWidths)
        {
            var fields = survey.FieldsNeededFor(wanted);
            var text = half <= wanted ? "reached" : fields is { } count ? $"about {Wording.Count(count)}" : "not by more fields";
            table.Row($"± {Wording.Number(wanted * 100, 1)} %", text);
        }

        return Markup.Of($"<h3>How many more fields</h3><p>Now ± {Wording.Percent(half, 2)} with {Wording.Count(survey.FieldCount, "field")}.</p>{table.Finish()}<p class=\"fine\">For more fields like these; scale and edge uncertainty stay as they are.</p>");
    }
}
