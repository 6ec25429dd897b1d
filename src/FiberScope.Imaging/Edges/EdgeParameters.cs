namespace FiberScope.Imaging.Edges;

/// <summary>The order of the edge model's parameters: heights first, then what moves the edges.</summary>
internal static class EdgeParameters
{
    /// <summary>Grey next to the left edge, outside.</summary>
    public const int OutsideLeft = 0;
    public const int OutsideRight = 1;

    /// <summary>Grey of the flat inside.</summary>
    public const int Inside = 2;

    /// <summary>Height of the secant law.</summary>
    public const int Rim = 3;

    /// <summary>How much brighter the right edge is than the axis, for lack of symmetry.</summary>
    public const int Tilt = 4;

    /// <summary>How much darker the flanks are than the axis.</summary>
    public const int Dome = 5;

    /// <summary>Growth of the grey away from the fibre on the left; per pixel.</summary>
    public const int SlopeLeft = 6;
    public const int SlopeRight = 7;

    /// <summary>The number of parameters in which the model is linear.</summary>
    public const int Heights = 8;

    public const int Left = 8;
    public const int Right = 9;

    /// <summary>Logarithm of the blur's sigma in pixels.</summary>
    public const int LogBlur = 10;
    public const int Count = 11;
}
