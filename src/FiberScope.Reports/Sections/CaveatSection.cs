using FiberScope.Assessment;
using FiberScope.Reports.Html;

namespace FiberScope.Reports.Sections;

/// <summary>What a reader must know before relying on the numbers.</summary>
internal sealed class CaveatSection : IReportSection
{
    /// <inheritdoc/>
    public string Anchor => "caveats";

    /// <inheritdoc/>
    public string Heading => "Before relying on this";

    /// <inheritdoc/>
    public Markup Render(SwatchAssessment assessment)
    {
        var caveats = assessment.Caveats.Select(c => c.Message).Distinct(StringComparer.Ordinal).Select(m => Markup.Of($"<li>{m}</li>"))
            .Concat(assessment.Fields.Where(f => !f.IsIncluded).Select(f => Markup.Of($"<li>Field {Wording.Count(f.Number)} ({f.Name}) is left out: {f.LeftOutBecause}</li>")))
            .ToArray();
        return caveats.Length == 0 ? Markup.Empty : Markup.Of($"<ul class=\"caveats\">{caveats}</ul>");
    }
}
