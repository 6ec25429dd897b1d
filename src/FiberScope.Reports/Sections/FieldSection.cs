using FiberScope.Assessment;
using FiberScope.Imaging;
using FiberScope.Reports.Html;
using FiberScope.Reports.Pictures;

namespace FiberScope.Reports.Sections;

/// <summary>Every field: its picture with traces and readings, its fitness, its own figures, what was refused.</summary>
internal sealed class FieldSection : IReportSection
{
    private const double MicrometresPerMillimetre = 1000;

    /// <inheritdoc/>
    public string Anchor => "fields";

    /// <inheritdoc/>
    public string Heading => "Fields";

    /// <inheritdoc/>
    public Markup Render(SwatchAssessment assessment)
    {
        var budget = PictureBudget.For(assessment.Fields.Count());
        var legend = Markup.Of($"<p class=\"legend\"><span class=\"trace\"></span> trace (centre line) <span class=\"reading\"></span> reading, edge to edge (some of them; all are in readings.csv) <span class=\"defect\"></span> region left out as a defect <span class=\"excluded\"></span> information strip, excluded</p>");
        return Markup.Of($"{legend}{assessment.Layers.SelectMany(layer => layer.Fields.Select(field => Field(field, layer, assessment.Layers.Length > 1, budget)))}");
    }

    private static Markup Field(FieldFinding field, LayerFinding layer, bool named, PictureBudget budget)
    {
        var measurement = field.Measurement;
        var picture = measurement.Micrograph;
        var state = field.IsIncluded ? Markup.Of($"<span class=\"mark pass\">used</span>") : Markup.Of($"<span class=\"mark fail\">left out</span>");
        var reason = field.LeftOutBecause is { } because ? Markup.Of($"<p><b>Left out:</b> {because}</p>") : Markup.Empty;
        var where = named ? $"{layer.Name}, " : "";
        return Markup.Of(
            $"""
            <article class="fieldcard">
            <h3>Field {Wording.Count(field.Number)} <small>{where}{field.Name}</small> {state}</h3>
            {reason}
            <figure>{Markup.OfPicture(measurement, budget)}<figcaption>{Wording.Of(picture.PixelSize * picture.Width)} across, {Wording.Told(picture.PixelSize.Nanometers)} nm per pixel ({picture.Source.PixelSizeOrigin}), {Wording.Count(picture.Width)} × {Wording.Count(picture.Height)} px{Strip(picture)}.</figcaption></figure>
            <div class="pair"><div>{Figures(field)}</div><div>{Fitness(measurement.Fitness)}</div></div>
            </article>
            """);
    }

    private static string Strip(Micrograph picture) => picture.ExcludedBottomRows > 0
        ? $", the lowest {Wording.Count(picture.ExcludedBottomRows)} rows excluded"
        : "";

    private static Markup Figures(FieldFinding field)
    {
        var measurement = field.Measurement;
        var pixel = measurement.Micrograph.PixelSize;
        var table = new Table("text", "", "");
        table.Row("readings", $"{Wording.Count(measurement.Readings.Length)} on {Wording.Count(measurement.Readings.Select(r => r.Trace).Distinct().Count())} traces");
        if (field.LengthWeighted is { } length)
        {
            table.Row("mean, length-weighted", Wording.Of(length.Mean));
            table.Row("D10, D50, D90", $"{Wording.Of(length.D10)}, {Wording.Of(length.D50)}, {Wording.Of(length.D90)}");
        }

        table.Row("smallest measurable", $"{Wording.Of(pixel * measurement.DetectionLimitPixels)} (blur {Wording.Number(measurement.BlurPixels, 2)} px)");
        if (!measurement.Rejected.IsEmpty)
        {
            table.Row("stations refused", string.Join(", ", measurement.Rejected.OrderByDescending(r => r.Value).Select(r => $"{Wording.Words(r.Key)} {Wording.Count(r.Value)}")));
        }

        if (!measurement.Defects.IsEmpty)
        {
            table.Row("defects", Defects(measurement));
        }

        return table.Finish();
    }

    private static string Defects(FieldMeasurement measurement)
    {
        var picture = measurement.Micrograph;
        var area = picture.Width * (double)picture.UsableHeight;
        var squareMillimetres = area * Math.Pow(picture.PixelSize.Micrometers / MicrometresPerMillimetre, 2);
        var kinds = measurement.Defects.GroupBy(d => d.Kind).OrderBy(g => g.Key).Select(g =>
            $"{g.Key.ToString().ToLowerInvariant()} {Wording.Count(g.Count())} ({Wording.Number(g.Count() / squareMillimetres, 2)} per mm², {Wording.Percent(g.Sum(d => d.AreaPixels) / area, 2)} of the area)");
        return string.Join("; ", kinds);
    }

    private static Markup Fitness(FieldFitness fitness)
    {
        var table = new Table("text", "fitness", "found", "limit", "");
        foreach (var check in fitness.Checks)
        {
            var mark = check.Passed ? Markup.Of($"<span class=\"mark pass\">✓ fit</span>") : Markup.Of($"<span class=\"mark fail\">✕ unfit</span>");
            var advice = check.Passed ? Markup.Empty : Markup.Of($"<br><span class=\"advice\">{check.Advice}</span>");
            table.Row("", [Markup.Of($"{Wording.Words(check.Name)}<br><span class=\"u\">{check.Meaning}</span>{advice}"), Markup.Of($"{Wording.Told(check.Value, 3)}"), Markup.Of($"{Wording.Told(check.Limit, 3)}"), mark]);
        }

        return table.Finish();
    }
}
