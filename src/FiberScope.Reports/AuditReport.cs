using System.Text;
using FiberScope.Assessment;
using FiberScope.Assessment.Auditing;
using FiberScope.Reports.Figures;
using FiberScope.Reports.Html;

namespace FiberScope.Reports;

/// <summary>Writes an audit as one HTML file that opens without a network.</summary>
public static class AuditReport
{
    /// <summary>The file's usual name.</summary>
    public const string FileName = "audit.html";

    private const int MostShown = 8;

    /// <summary>Writes the page.</summary>
    /// <param name="finding">The comparison.</param>
    /// <param name="crops">The folder of the crops, to show where the two differ most; crops that are not there are left out.</param>
    /// <param name="destination">Where to; left open.</param>
    public static void Write(AuditFinding finding, string crops, Stream destination)
    {
        using var writer = new StreamWriter(destination, new UTF8Encoding(encoderShouldEmitUTF8Identifier: false), leaveOpen: true) { NewLine = "\n" };
        writer.Write(Page.Head($"{Name(finding)} – audit by eye", Software.Version));
        writer.Write(Page.Section("summary", "", Summary(finding)));
        writer.Write(Page.Section("agreement", "Agreement", Agreement(finding)));
        writer.Write(Page.Section("differences", "Where the two differ most", Largest(finding, crops)));
        writer.Write(Page.Section("readings", "All readings", All(finding)));
        writer.Write(Page.Foot);
    }

    private static string Name(AuditFinding finding) => Path.GetFileName(finding.Key.Source);

    private static Markup Summary(AuditFinding finding)
    {
        var unfilled = finding.Unfilled.IsEmpty ? "" : $" {Wording.Count(finding.Unfilled.Length)} of {Wording.Count(finding.Key.Crops.Length)} crops were left empty; where a person could not measure, ask what the machine measured there.";
        return Markup.Of(
            $"""
            <p class="kind">Audit of diameter readings by eye</p>
            <h1>{finding.Sentence}</h1>
            <p>Readings drawn at random from {Name(finding)} (SHA-256 <code>{finding.Key.SourceSha256}</code>), from six strata of diameter, seed {Wording.Count(finding.Key.Seed)}; measured in marked crops without sight of the machine's number.{unfilled}</p>
            """);
    }

    private static Markup Agreement(AuditFinding finding)
    {
        var (bias, limits, line) = (finding.RelativeBias, finding.RelativeLimits, finding.Line);
        var absolute = finding.Micrometres;
        var table = new Table("figures", "machine against eye", "value", "95 % interval")
            .Row("bias, relative", Signed(bias.Value), $"{Signed(bias.Interval95.Low)} to {Signed(bias.Interval95.High)}")
            .Row("limits of agreement, relative", $"{Signed(limits.Low)} to {Signed(limits.High)}", "–")
            .Row("bias", $"{Wording.Number(absolute.Bias)} µm", $"{Wording.Number(absolute.BiasInterval95.Low)} to {Wording.Number(absolute.BiasInterval95.High)} µm")
            .Row("limits of agreement", $"{Wording.Number(absolute.LowerLimit)} to {Wording.Number(absolute.UpperLimit)} µm", $"each ± {Wording.Number(1.96 * absolute.LimitStandardError)} µm")
            .Row("Deming's line, slope", Wording.Fixed(line.Slope, 3), $"{Wording.Fixed(line.SlopeInterval95.Low, 3)} to {Wording.Fixed(line.SlopeInterval95.High, 3)}")
            .Row("Deming's line, intercept", $"{Wording.Number(line.Intercept)} µm", $"{Wording.Number(line.InterceptInterval95.Low)} to {Wording.Number(line.InterceptInterval95.High)} µm");
        return Markup.Of(
            $"""
            {table.Finish()}
            <div class="pair"><figure>{Markup.OfSvg(AgreementFigures.Differences(finding))}</figure><figure>{Markup.OfSvg(AgreementFigures.Line(finding))}</figure></div>
            <p class="fine">Bias and limits of agreement: Bland and Altman (1986); the relative ones on logarithms, since differences grow with the diameter. Line: Deming (1943), machine and eye in error alike. The spread holds the person's own scatter too: measure the same crops twice to learn it.</p>
            """);
    }

    private static Markup Largest(AuditFinding finding, string crops)
    {
        var largest = finding.Pairs.OrderByDescending(p => Math.Abs(Math.Log(p.Ratio))).Take(MostShown);
        return Markup.Of($"<div class=\"crops\">{largest.Select(p => Card(p, Path.Combine(crops, p.Crop.Name)))}</div>");
    }

    private static Markup Card(AuditPair pair, string path) => Markup.Of(
        $"""
        <figure>{Picture(path)}<figcaption>{pair.Crop.Name}: machine {Wording.Number(pair.MachineMicrometres)} µm, eye {Wording.Number(pair.PersonMicrometres)} µm ({Signed(pair.Ratio - 1)})</figcaption></figure>
        """);

    private static Markup Picture(string path) => File.Exists(path) ? Markup.OfPng(File.ReadAllBytes(path), "The crop with the place marked") : Markup.Empty;

    private static Markup All(AuditFinding finding)
    {
        var table = new Table("figures", "crop", "image", "x, y (px)", "machine (µm)", "its uncertainty (µm)", "eye (µm)", "machine over eye − 1");
        foreach (var pair in finding.Pairs)
        {
            var r = pair.Crop.Reading;
            table.Row(pair.Crop.Name, r.Image, $"{Wording.Fixed(r.X, 0)}, {Wording.Fixed(r.Y, 0)}", Wording.Number(pair.MachineMicrometres), Wording.Number(r.StandardUncertainty.Micrometers, 2), Wording.Number(pair.PersonMicrometres), Signed(pair.Ratio - 1));
        }

        return table.Finish();
    }

    private static string Signed(double share) => $"{(share > 0 ? "+" : "")}{Wording.Fixed(share * 100, 1)} %";
}
