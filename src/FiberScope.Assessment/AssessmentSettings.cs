using FiberScope.Assessment.Measuring;
using FiberScope.Filtration;

namespace FiberScope.Assessment;

/// <summary>Everything that changes an assessment besides the swatch file and its images.</summary>
public sealed record AssessmentSettings
{
    /// <summary>How the images are measured.</summary>
    public MeasuringSettings Measuring { get; init; } = new();

    /// <summary>The correlations to use whatever the swatch file says; null to leave it to the file.</summary>
    public CorrelationSet? Correlations { get; init; }
}
