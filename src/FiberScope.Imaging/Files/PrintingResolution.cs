using System.Collections.Immutable;

namespace FiberScope.Imaging.Files;

/// <summary>Tells a resolution that means the specimen from one that means paper.</summary>
/// <remarks>
/// Most programs write a printing resolution into every file they save. It says how large the picture shall come out of a
/// printer, not how large the specimen is, and taking it for a scale would be wrong by a factor of thousands.
/// </remarks>
internal static class PrintingResolution
{
    /// <summary>Pixels larger than this on the specimen belong to no microscope: 50 µm.</summary>
    /// <remarks>508 dpi. It is above every field of a stereo microscope that could show a fibre of filter media.</remarks>
    public const double LargestPixelMetres = 50e-6;

    private const double MetresPerInch = 0.0254;

    /// <summary>Settings of printers and scanners finer than 508 dpi (common practice, no source).</summary>
    private static readonly ImmutableArray<double> DotsPerInch =
        [600, 720, 800, 1000, 1200, 1440, 1600, 2000, 2400, 2880, 3000, 3200, 3600, 4000, 4800, 5760, 6400, 7200, 9600];

    /// <summary>Whether a pixel of this size can only be a printing or scanning resolution.</summary>
    /// <remarks>
    /// 0.3 % of play covers settings that were rounded to whole dots per centimetre. 2540 and 5080 dpi (10 µm and 5 µm) are not in
    /// the list: round in micrometres, they are more likely a stereo microscope's.
    /// </remarks>
    public static bool Is(double metres) =>
        metres > LargestPixelMetres || DotsPerInch.Any(dpi => Math.Abs((MetresPerInch / metres / dpi) - 1) < 0.003);
}
