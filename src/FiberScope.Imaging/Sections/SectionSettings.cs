using FiberScope.Statistics;

namespace FiberScope.Imaging.Sections;

/// <summary>How cut fibres are found and read in an embedded section.</summary>
public sealed record SectionSettings
{
    /// <summary>Sigma of the smoothing that beats the noise; pixels. Default 1.2.</summary>
    /// <remarks>Its effect on the outlines of small discs is worked out and taken off.</remarks>
    public double SmoothingPixels { get; init => field = Require.Within(value, 0.3, 10, nameof(SmoothingPixels)); } = 1.2;

    /// <summary>The smallest minor axis that is read; pixels. Default 4.</summary>
    public double SmallestPixels { get; init => field = Require.Positive(value, nameof(SmallestPixels)); } = 4;

    /// <summary>The largest root-mean-square departure of an outline from its ellipse, over the minor axis. Default 0.06.</summary>
    public double LargestDeparture { get; init => field = Require.Positive(value, nameof(LargestDeparture)); } = 0.06;

    /// <summary>How deep the neck between two touching discs is, over the smaller disc's radius, for them to be split. Default 0.12.</summary>
    public double NeckDepth { get; init => field = Require.Within(value, 0, 1, nameof(NeckDepth)); } = 0.12;

    /// <summary>The least share of an outline, by angle, that must show against the resin. Default 0.4.</summary>
    public double LeastOutline { get; init => field = Require.Within(value, 0, 1, nameof(LeastOutline)); } = 0.4;
}
