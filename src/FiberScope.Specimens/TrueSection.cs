namespace FiberScope.Specimens;

/// <summary>One fibre cut by the plane of a section: an ellipse. Pixels; the first pixel's centre is (0.5, 0.5).</summary>
/// <param name="X">Centre, to the right.</param>
/// <param name="Y">Centre, downwards.</param>
/// <param name="Minor">The shorter axis: the fibre's diameter.</param>
/// <param name="Major">The longer axis.</param>
/// <param name="Direction">Direction of the longer axis; radians.</param>
/// <param name="Whole">Whether the ellipse lies in the picture as a whole.</param>
public readonly record struct TrueSection(float X, float Y, float Minor, float Major, float Direction, bool Whole);
