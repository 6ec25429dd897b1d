namespace FiberScope.Imaging.Files;

/// <summary>Refuses sizes that cannot be a micrograph, by the header, before anything is decoded.</summary>
internal static class SizeLimit
{
    /// <summary>The most pixels that a file may hold, all its pages together: 400 million.</summary>
    /// <remarks>A few kilobytes of compressed file can ask for more memory than any machine has; this is where that stops.</remarks>
    public const long MostPixels = 400_000_000;

    /// <summary>The shortest side that could show a fibre and its surroundings; pixels.</summary>
    public const int ShortestSide = 32;

    /// <summary>Returns the pixels counted so far, this page included.</summary>
    /// <exception cref="ImageRejectedException">The page is too small to measure, or the file too large to read.</exception>
    public static long Check(string name, long width, long height, long before = 0)
    {
        if (width < ShortestSide || height < ShortestSide)
        {
            throw new ImageRejectedException(FormattableString.Invariant($"{name}: the picture is {width} × {height} pixels; at least {ShortestSide} × {ShortestSide} are needed to show a fibre."));
        }

        var total = before + checked(width * height);
        return total <= MostPixels
            ? total
            : throw new ImageRejectedException(FormattableString.Invariant($"{name}: the file says it holds {width} × {height} pixels ({total / 1_000_000} million in all), more than the {MostPixels / 1_000_000} million that are read; crop it or check that the file is not damaged."));
    }
}
