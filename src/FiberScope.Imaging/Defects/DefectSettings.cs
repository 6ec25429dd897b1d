using FiberScope.Statistics;

namespace FiberScope.Imaging.Defects;

/// <summary>How regions that are not single fibres are found.</summary>
public sealed record DefectSettings
{
    /// <summary>Sigma of the smoothing, over the median fibre diameter. Default 0.21.</summary>
    public double SmoothingShare { get; init => field = Require.Positive(value, nameof(SmoothingShare)); } = 0.21;

    /// <summary>Steepness below which a place is free of edges: rise over one smoothing sigma, over the brightness near by. Default 0.068.</summary>
    /// <remarks>Higher finds more clumps and more of the places where clean fibres lie in heaps.</remarks>
    public double FreeSteepness { get; init => field = Require.Positive(value, nameof(FreeSteepness)); } = 0.068;

    /// <summary>Brightness of a defect, over the brightest near by, at least. Default 0.65.</summary>
    public double LeastBrightness { get; init => field = Require.Within(value, 0, 1, nameof(LeastBrightness)); } = 0.65;

    /// <summary>Radius of the free circle that a defect holds, over the median fibre diameter, at least. Default 0.55.</summary>
    public double LeastRadius { get; init => field = Require.Positive(value, nameof(LeastRadius)); } = 0.55;

    /// <summary>Elongation beyond which a free place is a fibre, unless it is wide. Default 1.6.</summary>
    public double FibreElongation { get; init => field = Require.Positive(value, nameof(FibreElongation)); } = 1.6;

    /// <summary>Radius of the free circle that no fibre holds, over the median fibre diameter. Default 1.1.</summary>
    public double WideRadius { get; init => field = Require.Positive(value, nameof(WideRadius)); } = 1.1;

    /// <summary>Share of a region that measured fibres cover for it to be fibre after all. Default 0.35.</summary>
    public double FibreCover { get; init => field = Require.Within(value, 0, 1, nameof(FibreCover)); } = 0.35;
}
