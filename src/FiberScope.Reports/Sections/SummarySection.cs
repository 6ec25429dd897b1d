using FiberScope.Assessment;
using FiberScope.Conformity;
using FiberScope.Reports.Html;

namespace FiberScope.Reports.Sections;

/// <summary>The first page: what it is, the verdict, the key numbers, what they rest on.</summary>
internal sealed class SummarySection : IReportSection
{
    /// <inheritdoc/>
    public string Anchor => "summary";

    /// <inheritdoc/>
    public string Heading => "";

    /// <inheritdoc/>
    public Markup Render(SwatchAssessment assessment) => Markup.Of(
        $"""
        <header>
        <p class="kind">Swatch assessment</p>
        <h1>{assessment.Identity.Title}</h1>
        {Identity(assessment)}
        </header>
        {Verdict(assessment.Verdict)}
        <div class="keys">{assessment.Layers.Select(layer => Measured(layer, assessment.Layers.Length > 1))}{Forecast(assessment)}</div>
        {Limits(assessment.Verdict)}
        {Basis(assessment)}
        <p class="signoff"><span>Checked by</span><span>Date</span><span>Signature</span></p>
        <ul class="cautions">{Cautions.All.Select(caution => Markup.Of($"<li>{caution}</li>"))}</ul>
        """);

    private static Markup Identity(SwatchAssessment assessment)
    {
        var who = assessment.Identity;
        (string Name, string Value)[] parts =
        [
            ("Material", who.Material), ("Lot", who.Lot), ("Roll", who.Roll), ("Swatch", who.Swatch),
            ("Position MD", who.MachineDirectionPosition), ("Position CD", who.CrossDirectionPosition),
            ("Made", Wording.Of(assessment.Recipe.MadeAt)), ("Note", who.Note),
        ];
        var told = parts.Where(p => p.Value.Length > 0).Select(p => Markup.Of($"<div><dt>{p.Name}</dt><dd>{p.Value}</dd></div>"));
        return Markup.Of($"<dl class=\"identity\">{told}</dl>");
    }

    private static Markup Verdict(GradeVerdict? verdict)
    {
        if (verdict is null)
        {
            return Markup.Of($"<p class=\"verdict none\">No grade was given, so there is no verdict: the numbers stand for themselves.</p>");
        }

        var style = verdict.Decision switch { Decision.Pass => "pass", Decision.Fail => "fail", _ => "open" };
        return Markup.Of($"<div class=\"verdict {style}\"><p class=\"word\">{VerdictMark.Of(verdict.Decision, verdict.RestsOnForecast)}</p><p>{verdict.Sentence}</p></div>");
    }

    private static Markup Measured(LayerFinding layer, bool named)
    {
        var scale = DiameterScale.For(layer.Survey);
        var figures = layer.Survey.LengthWeighted;
        var prefix = named && layer.Name.Length > 0 ? $"{layer.Name}: " : "";
        var diameter = Key($"{prefix}mean fibre diameter", scale.Text(figures.Mean), $"95 %: {scale.Text(layer.Survey.MeanInterval95)}", "length-weighted");
        var spread = Key($"{prefix}spread", $"CV {Wording.Percent(figures.CoefficientOfVariation, 2)}", $"D10 {scale.Number(figures.D10)}, D50 {scale.Number(figures.D50)}, D90 {scale.Text(figures.D90)}", "length-weighted");
        return Markup.Of($"{diameter}{spread}{Solidity(layer, prefix)}");
    }

    private static Markup Solidity(LayerFinding layer, string prefix) => layer.Solidity is not { } solidity
        ? Markup.Empty
        : Key(
            $"{prefix}solidity",
            Wording.Number(solidity.Combined.Value.Fraction),
            $"95 %: {Wording.Number(solidity.Combined.Interval95.Low)} to {Wording.Number(solidity.Combined.Interval95.High)}",
            solidity.Routes.Length > 1 ? Wording.Count(solidity.Routes.Length, "route") + " combined" : Wording.Of(solidity.Combined.Route));

    private static Markup Forecast(SwatchAssessment assessment)
    {
        if (assessment.Forecast is not { } forecast)
        {
            return Markup.Empty;
        }

        var at = $"forecast at {Wording.Of(forecast.OperatingPoint.FaceVelocity)}";
        var worst = ForecastSection.AtMpps(forecast);
        var inputs = (forecast.Uncertainty?.PenetrationAtMostPenetratingSize ?? worst.MeasurementBand) is { } band ? $"inputs, 95 %: {Wording.Percent(band, 2)}; " : "";
        var drop = forecast.PressureDropModelBandPascals is { } drops ? $"models: {Wording.Number(drops.Low)} to {Wording.Number(drops.High)} Pa" : "";
        return Markup.Of(
            $"""
            {Key("pressure drop", Wording.Of(forecast.PressureDrop), drop, at)}
            {Key("penetration at the MPPS", Wording.Percent(forecast.PenetrationAtMostPenetratingSize), $"{inputs}models: {Wording.Percent(worst.ModelBand, 2)}", at)}
            {Key("most-penetrating size", forecast.MostPenetratingSize is { } size ? Wording.Particle(size) : "none in range", "", at)}
            {Key("quality factor at the MPPS", $"{Wording.Number(forecast.QualityFactorPerPascal * 1000)} /kPa", "", at)}
            """);
    }

    private static Markup Key(string name, string value, string interval, string note) => Markup.Of(
        $"<div class=\"key\"><p class=\"name\">{name}</p><p class=\"value\">{value}</p><p class=\"interval\">{interval}</p><p class=\"note\">{note}</p></div>");

    private static Markup Limits(GradeVerdict? verdict)
    {
        if (verdict is null)
        {
            return Markup.Empty;
        }

        var table = new Table("text", "limit", "allowed", "found", "verdict", "risk of breach", "agreed");
        foreach (var v in verdict.Verdicts)
        {
            table.Row(
                Markup.Of($"{v.Limit.Name}"),
                Markup.Of($"{v.Limit.Bounds}"),
                v.Observed is { } found ? Found(v, found) : Markup.Of($"nothing"),
                VerdictMark.Of(v.Decision, v.Limit.Characteristic.IsForecast),
                Markup.Of($"{Risk(v)}"),
                Markup.Of($"{Wording.Told(v.Limit.MaximumRisk * 100, 2)} %"));
        }

        var open = verdict.Verdicts.Where(v => v.WayToDecide is not null).Select(v => Markup.Of($"<li><b>{v.Limit.Name}</b>: {v.WayToDecide!.Sentence}</li>")).ToArray();
        var advice = open.Length == 0 ? Markup.Empty : Markup.Of($"<p>What would decide what is open:</p><ul>{open}</ul>");
        return Markup.Of(
            $"""
            <h3>Limits of {verdict.Grade.Name}</h3>
            {table.Finish()}
            {advice}
            <p class="fine">Decision rule: a limit passes when the probability that the true value breaks it is within the agreed risk, and fails when the probability that it is kept all the same is; between the two it is undecided (guarded acceptance and rejection; JCGM 106:2012, ISO 14253-1:2017). A forecast is judged by the worst of the published models. u is the standard uncertainty.{Whole(verdict)}</p>
            """);
    }

    private static string Whole(GradeVerdict verdict) => verdict.Decision == Decision.Pass
        ? $" The risk that any limit at all is broken is at most {Wording.Probability(verdict.HighestConsumersRisk)}."
        : "";

    private static Markup Found(Verdict verdict, ObservedValue found)
    {
        var characteristic = verdict.Limit.Characteristic;
        var uncertainty = characteristic.In(found.StandardUncertainty) > 0
            ? $"u {characteristic.FormatUncertainty(found.StandardUncertainty)}"
            : characteristic.IsForecast ? "models only" : "taken as exact";
        return Markup.Of($"{characteristic.Format(found.Value)} <span class=\"u\">({uncertainty})</span>");
    }

    private static string Risk(Verdict verdict) => verdict.Observed is null
        ? "unknown"
        : verdict.BreachProbability.Width < 0.0005
            ? Wording.Probability(verdict.BreachProbability.High)
            : $"{Wording.Probability(verdict.BreachProbability.Low)} to {Wording.Probability(verdict.BreachProbability.High)}";

    /// <summary>What the page rests on, so that it can be traced back to the pixels.</summary>
    private static Markup Basis(SwatchAssessment assessment)
    {
        var fields = assessment.Fields.ToArray();
        var included = fields.Count(f => f.IsIncluded);
        var scales = assessment.Recipe.Images.Select(i => i.PixelSizeOrigin).Distinct(StringComparer.Ordinal);
        var sizes = assessment.Recipe.Images.Select(i => $"{Wording.Told(i.PixelSize.Nanometers)} nm").Distinct(StringComparer.Ordinal);
        var swatchHash = assessment.Recipe.FileHashes.TryGetValue(assessment.Recipe.SwatchFile, out var hash) ? hash : assessment.Recipe.FileHashes.Values.FirstOrDefault("");
        return Markup.Of(
            $"""
            <dl class="basis">
            <div><dt>Fields</dt><dd>{Wording.Count(included)} of {Wording.Count(fields.Length)} used</dd></div>
            <div><dt>Readings</dt><dd>{Wording.Count(assessment.Layers.Sum(l => l.Survey.Readings.Length))} on {Wording.Count(assessment.Layers.Sum(l => l.Survey.FibreCount))} traces</dd></div>
            <div><dt>Pixel size</dt><dd>{string.Join(", ", sizes)} ({string.Join(", ", scales)})</dd></div>
            <div><dt>Software</dt><dd>{Wording.Software(assessment.Recipe.Software)}</dd></div>
            <div class="long"><dt>SHA-256 of {assessment.Recipe.SwatchFile}</dt><dd><code>{swatchHash}</code></dd></div>
            </dl>
            """);
    }
}
