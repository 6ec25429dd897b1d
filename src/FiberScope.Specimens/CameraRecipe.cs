using FiberScope.Statistics;

namespace FiberScope.Specimens;

/// <summary>What the instrument does to the picture.</summary>
public sealed record CameraRecipe
{
    /// <summary>Sigma of the blur at the focal plane; pixels.</summary>
    public double BlurPixels { get; init => field = Require.Within(value, 0, 30, nameof(BlurPixels)); } = 0.9;

    /// <summary>Growth of the blur (sigma) per mean depth away from the focal plane; pixels.</summary>
    public double DefocusPixels { get; init => field = Require.Within(value, 0, 30, nameof(DefocusPixels)); } = 0.4;

    /// <summary>Where the focal plane lies below the mat's top, in mean depths.</summary>
    public double FocusDepth { get; init => field = Require.Within(value, -20, 20, nameof(FocusDepth)); } = 0.5;

    /// <summary>Electrons (or photons) behind a white pixel: their number is Poisson-distributed. Zero turns the noise off.</summary>
    public double ElectronsPerPixel { get; init => field = Require.Within(value, 0, 100000, nameof(ElectronsPerPixel)); } = 25;

    /// <summary>Standard deviation of the reading noise as a share of white.</summary>
    public double ReadNoise { get; init => field = Require.Within(value, 0, 0.5, nameof(ReadNoise)); } = 0.01;

    /// <summary>Share of the noise-free pixels that are brighter than white and clip.</summary>
    public double ClippedShare { get; init => field = Require.Within(value, 0, 0.3, nameof(ClippedShare)); } = 0.002;

    /// <summary>Grey value of no signal, as a share of white; below zero clips the darkest parts.</summary>
    public double BlackLevel { get; init => field = Require.Within(value, -0.3, 0.5, nameof(BlackLevel)); } = 0.02;

    /// <summary>Strength of charging streaks along the lines, as a share of white.</summary>
    public double Charging { get; init => field = Require.Within(value, 0, 1, nameof(Charging)); }

    /// <summary>How far the specimen drifts sideways from the first line to the last; pixels.</summary>
    public double DriftPixels { get; init => field = Require.Within(value, -100, 100, nameof(DriftPixels)); }

    /// <summary>Standard deviation of each line's sideways jitter; pixels.</summary>
    public double JitterPixels { get; init => field = Require.Within(value, 0, 3, nameof(JitterPixels)); } = 0.03;

    /// <summary>Quality of a JPEG compression that the picture went through, 1 to 100; 0 for none.</summary>
    public int JpegQuality { get; init => field = (int)Require.Within(value, 0, 100, nameof(JpegQuality)); }
}
