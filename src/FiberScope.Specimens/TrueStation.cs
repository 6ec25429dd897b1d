namespace FiberScope.Specimens;

/// <summary>A visible point on a fibre's axis. Pixels; the centre of the picture's first pixel is (0.5, 0.5).</summary>
/// <param name="Fibre">The fibre's number, from the top of the mat down.</param>
/// <param name="X">To the right.</param>
/// <param name="Y">Downwards.</param>
/// <param name="Direction">Direction of the fibre, radians in [0, π), from the x axis towards the y axis.</param>
/// <param name="Diameter">The fibre's true diameter there; pixels.</param>
/// <param name="Length">The length of centre line that the point stands for; pixels.</param>
/// <param name="BothEdges">Whether both edges can be seen there, falling outwards.</param>
public readonly record struct TrueStation(int Fibre, float X, float Y, float Direction, float Diameter, float Length, bool BothEdges);
