namespace FiberScope.Imaging.Edges;

/// <summary>Grey across a fibre, the mean along a stretch of it. A view: it owns no memory.</summary>
internal readonly ref struct EdgeProfile
{
    /// <summary>Places across, rising, closer near the edges; pixels from the centre line.</summary>
    public required ReadOnlySpan<double> Offsets { get; init; }

    /// <summary>Grey at the places; linear in electrons.</summary>
    public required ReadOnlySpan<double> Grey { get; init; }

    /// <summary>Standard deviation of one pixel's noise at the brightness inside.</summary>
    public required double PixelNoise { get; init; }

    /// <summary>Length of fibre that the profile is the mean of; pixels.</summary>
    public required double Length { get; init; }

    /// <summary>Where the left edge seems to be (steepest climb); pixels.</summary>
    public required double Left { get; init; }

    /// <summary>Where the right edge seems to be (steepest fall); pixels.</summary>
    public required double Right { get; init; }

    public double Width => Right - Left;
}
