namespace FiberScope.Imaging.Tracing;

/// <summary>How noisy a picture is at a brightness: electron counts scatter more where it is bright.</summary>
/// <param name="Floor">The standard deviation of the linear grey over the whole picture.</param>
/// <param name="Stabilised">The standard deviation of the square root of the grey.</param>
internal sealed record GreyNoise(double Floor, double Stabilised)
{
    /// <summary>The standard deviation of the linear grey at a brightness: d(v) = 2 √v d(√v).</summary>
    public double At(double grey) => Math.Max(0.7 * Floor, 2 * Math.Sqrt(Math.Max(0, grey) + 0.02) * Stabilised);

    /// <summary>
    /// The share of the pixel noise left in a slope across, after Gaussian smoothing along and across; sigmas in pixels.
    /// </summary>
    public static double SlopeShare(double along, double across) =>
        1 / Math.Sqrt(2 * Math.Sqrt(Math.PI) * Math.Max(0.7, along)) / Math.Sqrt(4 * Math.Sqrt(Math.PI) * Math.Pow(Math.Max(0.6, across), 3));

    /// <summary>The share of the pixel noise left in a level, after Gaussian smoothing along and across; sigmas in pixels.</summary>
    public static double LevelShare(double along, double across) =>
        1 / Math.Sqrt(2 * Math.Sqrt(Math.PI) * Math.Max(0.5, along)) / Math.Sqrt(2 * Math.Sqrt(Math.PI) * Math.Max(0.5, across));
}
