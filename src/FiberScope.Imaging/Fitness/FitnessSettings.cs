using FiberScope.Statistics;

namespace FiberScope.Imaging.Fitness;

/// <summary>The limits beyond which a field is unfit for measuring.</summary>
/// <remarks>
/// Chosen on virtual specimens of known blur and noise and on real micrographs: pictures that a person would measure lie well inside,
/// the ones that a person would take again lie outside.
/// </remarks>
public sealed record FitnessSettings
{
    /// <summary>The widest blur (sigma) of the sharpest edges; pixels. Default 3.3.</summary>
    /// <remarks>Sharp pictures lie between 0.3 and 2.8. See also <see cref="BlurShareOfDiameter"/>.</remarks>
    public double WidestBlurPixels { get; init => field = Require.Positive(value, nameof(WidestBlurPixels)); } = 3.3;

    /// <summary>Blur up to this share of the median fibre diameter is let pass, however wide in pixels. Default 0.1.</summary>
    public double BlurShareOfDiameter { get; init => field = Require.Within(value, 0, 1, nameof(BlurShareOfDiameter)); } = 0.1;

    /// <summary>The least contrast of the strongest edges over the noise of a pixel. Default 1.4.</summary>
    /// <remarks>At 1.4 an edge stands out five-fold once it is averaged along 12 pixels.</remarks>
    public double LeastContrastToNoise { get; init => field = Require.Positive(value, nameof(LeastContrastToNoise)); } = 1.4;

    /// <summary>The largest share of the field in flat saturated patches, white or black beside white. Default 0.04.</summary>
    public double LargestSaturatedShare { get; init => field = Require.Within(value, 0, 1, nameof(LargestSaturatedShare)); } = 0.04;

    /// <summary>The strongest unrest from line to line, over the standard deviation of the picture. Default 0.12.</summary>
    public double StrongestCharging { get; init => field = Require.Positive(value, nameof(StrongestCharging)); } = 0.12;

    /// <summary>The widest sideways jitter from line to line (standard deviation); pixels. Default 0.8.</summary>
    public double WidestJitterPixels { get; init => field = Require.Positive(value, nameof(WidestJitterPixels)); } = 0.8;

    /// <summary>The least median fibre diameter; pixels. Default 3.</summary>
    public double LeastDiameterPixels { get; init => field = Require.Positive(value, nameof(LeastDiameterPixels)); } = 3;

    /// <summary>The least share of the picture that can be measured. Default 0.4.</summary>
    public double LeastUsableShare { get; init => field = Require.Within(value, 0, 1, nameof(LeastUsableShare)); } = 0.4;
}
