using FiberScope.Imaging.Tracing;

namespace FiberScope.Imaging.Selection;

/// <summary>How likely a fibre of a width is read, against one that is missed only where it is hidden.</summary>
/// <remarks>
/// <para>Readings stand in for the fibres of their width that were not read (Horvitz and Thompson 1952, J. Am. Stat. Assoc. 47,
/// 663–685: each counts with one over its chance of being in the sample). What hides a thin fibre and not a wide one is noise, so the
/// chance is taken as 1 / (1 + (w₀ / w)^p) with w₀ in proportion to the picture's own noise.</para>
/// <para>Proportion and power are ours, from virtual specimens of eight kinds made for development; how well they carry over to others is
/// in docs/validation.md.</para>
/// </remarks>
/// <param name="HalfWay">The width w₀ at which half are read; pixels, zero or above.</param>
internal sealed record DetectionCurve(double HalfWay)
{
    /// <summary>A correction beyond this factor rests on too few readings to be believed.</summary>
    public const double LargestFactor = 4;

    private const double Power = 1.75;

    /// <summary>w₀ in pixels over the noise's share of the picture's range from black to white.</summary>
    private const double PixelsPerNoise = 20;

    /// <summary>The brightness at which the noise counts: fibres below the topmost, which are the ones that are missed.</summary>
    private const double Brightness = 0.3;

    /// <summary>The curve of a picture with this noise.</summary>
    public static DetectionCurve Of(GreyNoise noise) => new(PixelsPerNoise * noise.At(Brightness));

    /// <summary>The share read at a width in pixels; in (0, 1], never below 1 / <see cref="LargestFactor"/>.</summary>
    public double Share(double widthPixels) => Math.Max(1 / LargestFactor, 1 / (1 + Math.Pow(HalfWay / Math.Max(0.1, widthPixels), Power)));
}
