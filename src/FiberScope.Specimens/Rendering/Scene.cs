namespace FiberScope.Specimens.Rendering;

/// <summary>What a painter hands to the camera: the picture before the detector, and which surface is uppermost where.</summary>
/// <param name="Light">Brightness before gain and noise, blurred; row by row.</param>
/// <param name="TopFibre">The uppermost fibre at each pixel's centre, its place in the mat from the top; −1 none, below that a defect.</param>
/// <param name="LineShift">How far to the right of a pixel the scene point that it shows lies, line by line; pixels.</param>
/// <param name="SigmaAt">The blur (sigma) at a depth in mean depths; pixels.</param>
internal sealed record Scene(float[] Light, int[] TopFibre, float[] LineShift, Func<double, double> SigmaAt);
