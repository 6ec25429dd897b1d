using FiberScope.Statistics;
using UnitsNet;

namespace FiberScope.Fibres;

/// <summary>What a survey of diameters must be told besides its readings.</summary>
public sealed record SurveySettings
{
    /// <summary>The relative standard uncertainty of the pixel size; dimensionless, 0 to 0.5. Default 0.01.</summary>
    /// <remarks>Common practice, no source: a routinely calibrated microscope is trusted to about 2 % at two sigma.</remarks>
    public double ScaleRelativeUncertainty { get; init => field = Require.Within(value, 0, 0.5); } = 0.01;

    /// <summary>
    /// The standard uncertainty of what the edge finding adds to every diameter alike; zero or above. Default zero: tell it.
    /// </summary>
    public Length EdgeUncertainty { get; init => field = Length.FromMeters(Require.NotNegative(value.Meters)); } = Length.Zero;

    /// <summary>
    /// The relative standard uncertainty of the mean from which fibres get read at all, what remains after weighting; dimensionless,
    /// 0 to 0.5. Default zero: tell it.
    /// </summary>
    public double SelectionRelativeUncertainty { get; init => field = Require.Within(value, 0, 0.5); }

    /// <summary>How many bootstrap draws the intervals of SD and percentiles rest on; 100 to 100,000. Default 1,000.</summary>
    public int BootstrapReplicates { get; init => field = (int)Require.Within(value, 100, 100_000); } = 1000;

    /// <summary>The seed of the bootstrap. Default 1.</summary>
    public int Seed { get; init; } = 1;
}
