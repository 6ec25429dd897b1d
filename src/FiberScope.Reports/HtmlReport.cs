using System.Text;
using FiberScope.Assessment;
using FiberScope.Reports.Html;
using FiberScope.Reports.Sections;

namespace FiberScope.Reports;

/// <summary>Writes an assessment as one HTML file that opens without a network, prints on A4 and reads on a telephone.</summary>
/// <remarks>
/// No scripts, no fonts, nothing loaded from anywhere: figures are inline SVG, pictures inline JPEG. The same assessment gives the
/// same bytes in every culture and on every machine.
/// </remarks>
public sealed class HtmlReport : IReportWriter
{
    private static readonly IReportSection[] Sections =
    [
        new SummarySection(), new CaveatSection(), new DiameterSection(), new SoliditySection(), new StructureSection(), new ForecastSection(),
        new FieldSection(), new RecordSection(),
    ];

    /// <inheritdoc/>
    public string FileName => "report.html";

    /// <inheritdoc/>
    public void Write(SwatchAssessment assessment, Stream destination, CancellationToken cancellation)
    {
        ArgumentNullException.ThrowIfNull(assessment);
        ArgumentNullException.ThrowIfNull(destination);
        using var writer = new StreamWriter(destination, new UTF8Encoding(encoderShouldEmitUTF8Identifier: false), leaveOpen: true) { NewLine = "\n" };
        writer.Write(Page.Head($"{assessment.Identity.Title} – swatch assessment", assessment.Recipe.Software));
        foreach (var section in Sections)
        {
            cancellation.ThrowIfCancellationRequested();
            var content = section.Render(assessment);
            if (!content.IsEmpty)
            {
                writer.Write(Page.Section(section.Anchor, section.Heading, content));
            }
        }

        writer.Write(Page.Foot);
    }
}
