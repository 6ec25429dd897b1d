using FiberScope.Imaging;
using FiberScope.Statistics;

namespace FiberScope.Assessment.Measuring;

/// <summary>Everything that changes a measured number besides the pictures themselves.</summary>
public sealed record MeasuringSettings
{
    /// <summary>How single fields are measured.</summary>
    public MeasurementSettings Fields { get; init; } = new();

    /// <summary>Whether fields that are unfit for measuring count all the same. Default no.</summary>
    public bool IncludeUnfit { get; init; }

    /// <summary>The relative standard uncertainty of a pixel size that came without one; 0 to 0.5. Default 0.01.</summary>
    /// <remarks>Common practice, no source: a routinely calibrated microscope is trusted to about 2 % at two sigma.</remarks>
    public double ScaleUncertainty { get; init => field = Require.Within(value, 0, 0.5); } = 0.01;

    /// <summary>What the edge finding leaves in common in every diameter, as a standard uncertainty in pixels; 0 to 2. Default 0.1.</summary>
    public double EdgeUncertainty { get; init => field = Require.Within(value, 0, 2); } = 0.1;

    /// <summary>
    /// What the choice of readable fibres leaves open in the mean after weighting, as a relative standard uncertainty; 0 to 0.5. Default
    /// 0.02, about what virtual specimens with known truth show (docs/validation.md, selection).
    /// </summary>
    public double SelectionUncertainty { get; init => field = Require.Within(value, 0, 0.5); } = 0.02;

    /// <summary>Bootstrap draws behind the intervals of SD and percentiles; 100 to 100,000. Default 1,000.</summary>
    public int BootstrapDraws { get; init => field = (int)Require.Within(value, 100, 100_000); } = 1000;

    /// <summary>The seed of every random number. Default 1.</summary>
    public int Seed { get; init; } = 1;

    /// <summary>How many fields are measured at the same time; 1 or more. It changes no number. Default: one per core.</summary>
    public int Parallelism { get; init => field = (int)Require.Within(value, 1, 1024); } = Environment.ProcessorCount;
}
