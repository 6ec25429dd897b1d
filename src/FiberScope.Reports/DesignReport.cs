using System.Text;
using FiberScope.Assessment;
using FiberScope.Assessment.Designing;
using FiberScope.Assessment.Input;
using FiberScope.Filtration;
using FiberScope.Reports.Html;
using FiberScope.Reports.Sections;

namespace FiberScope.Reports;

/// <summary>Writes what a design search found as one HTML file that opens without a network.</summary>
public static class DesignReport
{
    /// <summary>The file's usual name.</summary>
    public const string FileName = "design.html";

    private const int Digits = 3;

    /// <summary>Writes the page.</summary>
    /// <param name="finding">The structures found.</param>
    /// <param name="destination">Where to; left open.</param>
    public static void Write(DesignFinding finding, Stream destination)
    {
        using var writer = new StreamWriter(destination, new UTF8Encoding(encoderShouldEmitUTF8Identifier: false), leaveOpen: true) { NewLine = "\n" };
        var title = Path.GetFileNameWithoutExtension(finding.Design.Name);
        writer.Write(Page.Head($"{title} – media design", Software.Version));
        writer.Write(Page.Section("summary", "", Summary(finding, title)));
        writer.Write(Page.Section("structures", finding.IsMet ? "Structures that meet the targets, best first" : "Nearest misses", Structures(finding)));
        writer.Write(Page.Section("map", "Map", DesignMaps.Render(finding)));
        writer.Write(Page.Section("notes", "What to know before relying on it", Notes(finding)));
        writer.Write(Page.Foot);
    }

    private static Markup Summary(DesignFinding finding, string title)
    {
        var point = finding.Design.Start.Operation;
        return Markup.Of(
            $"""
            <p class="kind">Media design</p>
            <h1>{title}</h1>
            <p>At a face velocity of {Wording.Of(point.FaceVelocity)}, by the correlations <code>{Words.Of(Words.Correlations, finding.Correlations)}</code>. {(finding.IsMet ? "The best structure that meets every target:" : "No structure in the ranges meets every target; the nearest miss:")}</p>
            {Keys(finding, finding.Candidates[0])}
            {Targets(finding, finding.Candidates[0], "best structure")}
            {Surer(finding)}
            <p class="fine">Probability: the published models counted as equally likely, each with the uncertainties of the starting medium where the file tells any. Weight and thickness are chosen, not forecast.</p>
            """);
    }

    private static Markup Surer(DesignFinding finding) => finding.Surer is { } surer
        ? Markup.Of(
            $"""
            <h3>A surer choice</h3>
            <p>The best structure just meets its targets by the central forecast. This one keeps them even where the models and the uncertain inputs are against it:</p>
            {Keys(finding, surer)}
            {Targets(finding, surer, "surer choice")}
            """)
        : Markup.Empty;

    private static Markup Keys(DesignFinding finding, DesignCandidate best)
    {
        var keys = finding.Design.Variables.Zip(best.Values, (v, value) => Key(DesignMaps.Name(finding, v), Told(v, value), Ends(v, value)));
        return Markup.Of($"<div class=\"keys\">{keys}</div>");
    }

    private static Markup Key(string name, string value, string note) =>
        Markup.Of($"<div class=\"key\"><p class=\"name\">{name}</p><p class=\"value\">{value}</p><p class=\"interval\">{note}</p></div>");

    /// <summary>Says when a value lies at the end of its range, where a wider range might do better.</summary>
    private static string Ends(DesignVariable v, double value)
    {
        var near = 1e-6 * v.Range.High;
        var at = value <= v.Range.Low + near ? ", at its low end" : value >= v.Range.High - near ? ", at its high end" : "";
        return $"from {Told(v, v.Range.Low)} to {Told(v, v.Range.High)}{at}";
    }

    private static Markup Targets(DesignFinding finding, DesignCandidate best, string heading)
    {
        var targets = finding.Design.Targets;
        var table = new Table("figures", "target", "at most", heading, "probability that it is met");
        void Row(string name, string? limit, string value, string? key)
        {
            if (limit is not null)
            {
                table.Row(name, limit, value, key is not null && best.Probabilities.TryGetValue(key, out var p) ? Wording.Probability(p) : "–");
            }
        }

        Row("penetration at the MPPS", targets.PenetrationAtMostPenetratingSize is { } worst ? Wording.Percent(worst) : null, Wording.Percent(best.PenetrationAtMostPenetratingSize), "penetration-at-most-penetrating-size");
        Row($"penetration, {finding.Design.AerosolName}", targets.AerosolPenetration is { } passes ? Wording.Percent(passes) : null, best.AerosolPenetration is { } own ? Wording.Percent(own) : "–", "aerosol-penetration");
        Row("pressure drop", targets.PressureDrop is { } drop ? Wording.Of(drop) : null, Wording.Of(best.PressureDrop), "pressure-drop");
        Row("basis weight", targets.BasisWeight is { } weight ? Wording.Of(weight) : null, $"{Wording.Told(best.BasisWeight.GramsPerSquareMeter, Digits)} g/m²", null);
        Row("thickness", targets.Thickness is { } thickness ? Wording.Thickness(thickness) : null, $"{Wording.Told(best.Thickness.Millimeters, Digits)} mm", null);
        return table.Finish();
    }

    private static Markup Structures(DesignFinding finding)
    {
        string[] variables = [.. finding.Design.Variables.Select(v => DesignMaps.Name(finding, v) + DesignMaps.Unit(v))];
        var table = new Table("figures", ["", .. variables, "penetration at the MPPS", "pressure drop", "quality factor (1/kPa)", "basis weight (g/m²)", "thickness (mm)"]);
        foreach (var (c, i) in finding.Candidates.Select((c, i) => (c, i + 1)))
        {
            table.Row([
                Wording.Count(i),
                .. finding.Design.Variables.Zip(c.Values, (v, value) => Wording.Told(DesignScale.Of(v.Kind).In(value), Digits)),
                Wording.Percent(c.PenetrationAtMostPenetratingSize), Wording.Of(c.PressureDrop), Wording.Number(c.QualityFactorPerPascal * 1000),
                Wording.Told(c.BasisWeight.GramsPerSquareMeter, Digits), Wording.Told(c.Thickness.Millimeters, Digits),
            ]);
        }

        var layers = new Table("figures", "best structure, layer", "mean fibre diameter", "solidity", "thickness (mm)", "basis weight (g/m²)", "charge (µC/m²)");
        foreach (var l in finding.Candidates[0].Layers)
        {
            var grams = l.Solidity.Fraction * l.Thickness.Meters * finding.Design.FibreDensity.KilogramsPerCubicMeter * 1e3;
            layers.Row(l.Name, Wording.Of(l.Diameters.Mean), Wording.Told(l.Solidity.Fraction, Digits), Wording.Told(l.Thickness.Millimeters, Digits), Wording.Told(grams, Digits), l.Charge is { } charge ? Wording.Number(charge.SurfaceDensity.CoulombsPerSquareMeter * 1e6) : "none");
        }

        return Markup.Of($"{table.Finish()}{layers.Finish()}");
    }

    private static Markup Notes(DesignFinding finding)
    {
        var caveats = finding.Caveats.Select(c => Markup.Of($"<li>{c.Message}</li>"));
        var cautions = Cautions.All.Select(c => Markup.Of($"<li>{c}</li>"));
        return Markup.Of($"<ul class=\"caveats\">{caveats}</ul><ul class=\"cautions\">{cautions}</ul>");
    }

    private static string Told(DesignVariable v, double value)
    {
        var scale = DesignScale.Of(v.Kind);
        return scale.Unit.Length > 0 ? $"{Wording.Told(scale.In(value), Digits)} {scale.Unit}" : Wording.Told(value, Digits);
    }
}
