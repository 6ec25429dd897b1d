using FiberScope.Imaging.Coverage;
using FiberScope.Imaging.Defects;
using FiberScope.Imaging.Fitness;
using FiberScope.Imaging.Sections;
using FiberScope.Imaging.Tracing;
using FiberScope.Imaging.Transmitted;

namespace FiberScope.Imaging;

/// <summary>Every setting of measuring one field; recorded with the result.</summary>
public sealed record MeasurementSettings
{
    /// <summary>How fibres are found and read.</summary>
    public TracingSettings Tracing { get; init; } = new();

    /// <summary>When a field is unfit for measuring.</summary>
    public FitnessSettings Fitness { get; init; } = new();

    /// <summary>How regions that are not single fibres are found.</summary>
    public DefectSettings Defects { get; init; } = new();

    /// <summary>How cut fibres are read in a section.</summary>
    public SectionSettings Sections { get; init; } = new();

    /// <summary>How fibres are read in transmitted light.</summary>
    public TransmittedSettings Transmitted { get; init; } = new();

    /// <summary>When and how the share of a field that fibres cover is told.</summary>
    public CoverageSettings Coverage { get; init; } = new();
}
