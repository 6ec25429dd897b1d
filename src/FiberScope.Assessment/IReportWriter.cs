namespace FiberScope.Assessment;

/// <summary>Turns an assessment into a document for people.</summary>
public interface IReportWriter
{
    /// <summary>The name of the file that it writes: <c>report.html</c>.</summary>
    public string FileName { get; }

    /// <summary>Writes the whole document; the same assessment gives the same bytes.</summary>
    /// <param name="assessment">What to report.</param>
    /// <param name="destination">Where to; left open.</param>
    /// <param name="cancellation">Stops the writing between parts.</param>
    public void Write(SwatchAssessment assessment, Stream destination, CancellationToken cancellation);
}
