namespace FiberScope.Imaging;

/// <summary>One diameter reading in picture coordinates.</summary>
/// <param name="X">Centre of the fibre, to the right from the picture's left edge; pixels (first pixel's centre is 0.5).</param>
/// <param name="Y">Centre of the fibre, down from the picture's top edge; pixels.</param>
/// <param name="Direction">Direction of the fibre, radians in [0, π), from the x axis towards the y axis (downwards).</param>
/// <param name="Diameter">Fibre diameter; pixels, above zero.</param>
/// <param name="StandardUncertainty">Standard uncertainty of the diameter; pixels.</param>
/// <param name="RepresentedLength">
/// Length of visible centre line that the reading stands for, the correction for what the picture hides included; pixels.
/// </param>
/// <param name="Trace">The <see cref="Imaging.Trace.Id"/> it lies on.</param>
public readonly record struct PixelReading(double X, double Y, double Direction, double Diameter, double StandardUncertainty, double RepresentedLength, int Trace);
