namespace FiberScope.Imaging;

/// <summary>A point on a centre line, in pixels from the top left corner of the top left pixel.</summary>
/// <param name="X">To the right; the centre of the first pixel is 0.5.</param>
/// <param name="Y">Downwards; the centre of the first pixel is 0.5.</param>
/// <param name="HalfWidth">Half the fibre's width there; pixels.</param>
public readonly record struct TracePoint(double X, double Y, double HalfWidth);
