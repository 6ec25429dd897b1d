using FiberScope.Statistics;

namespace FiberScope.Imaging.Coverage;

/// <summary>When and how the share of a field that fibres cover is told.</summary>
public sealed record CoverageSettings
{
    /// <summary>Sigma of the smoothing that beats the noise; pixels. Default 1.2.</summary>
    public double SmoothingPixels { get; init => field = Require.Within(value, 0.3, 10, nameof(SmoothingPixels)); } = 1.2;

    /// <summary>
    /// The widest spread of the ground's grey (5th to 95th percentile, smoothed) over the contrast of fibre to ground; above it what
    /// is dark is taken for the depth of a thick mat, and no coverage is told. Default 0.16.
    /// </summary>
    /// <remarks>A substrate has one grey; the gaps of a thick mat show fibres at every depth and so every grey down to black.</remarks>
    public double WidestGround { get; init => field = Require.Positive(value, nameof(WidestGround)); } = 0.16;

    /// <summary>The largest coverage that tells how many fibres there are; dimensionless. Default 0.9.</summary>
    public double LargestCoverage { get; init => field = Require.Inside(value, 0, 1, nameof(LargestCoverage)); } = 0.9;
}
