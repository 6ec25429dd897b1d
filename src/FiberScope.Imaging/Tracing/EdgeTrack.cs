namespace FiberScope.Imaging.Tracing;

/// <summary>One edge of a straightened fibre, row by row.</summary>
internal sealed class EdgeTrack(int rows)
{
    /// <summary>Distance from the centre line, outwards; pixels.</summary>
    public double[] Offset { get; } = new double[rows];

    /// <summary>How steeply brightness falls outwards there; per pixel.</summary>
    public double[] Fall { get; } = new double[rows];

    /// <summary>Whether a local maximum of the fall was found.</summary>
    public bool[] Found { get; } = new bool[rows];
}
