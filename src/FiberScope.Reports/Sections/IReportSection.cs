using FiberScope.Assessment;
using FiberScope.Reports.Html;

namespace FiberScope.Reports.Sections;

/// <summary>One section of the report.</summary>
internal interface IReportSection
{
    /// <summary>The name of its anchor on the page.</summary>
    public string Anchor { get; }

    /// <summary>Its heading; empty for the first page, which has its own.</summary>
    public string Heading { get; }

    /// <summary>Its content; empty when the assessment has nothing for it, and then the heading is left out as well.</summary>
    public Markup Render(SwatchAssessment assessment);
}
