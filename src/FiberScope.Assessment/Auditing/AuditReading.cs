using UnitsNet;

namespace FiberScope.Assessment.Auditing;

/// <summary>One of the machine's readings, with where to find it.</summary>
/// <param name="Layer">The layer; empty for the only one.</param>
/// <param name="Image">The image as the file names it.</param>
/// <param name="ImageSha256">SHA-256 of the image when it was measured.</param>
/// <param name="Page">Page of a multi-page image, from 0.</param>
/// <param name="Field">The field, from 1 through the whole file.</param>
/// <param name="Trace">The trace that it lies on.</param>
/// <param name="X">Pixels from the left; the first pixel's centre is 0.5.</param>
/// <param name="Y">Pixels from the top.</param>
/// <param name="DirectionDegrees">The fibre's direction, from the x axis towards the y axis.</param>
/// <param name="Diameter">What the machine read.</param>
/// <param name="StandardUncertainty">Its standard uncertainty.</param>
/// <param name="PixelSize">The side of a pixel.</param>
public sealed record AuditReading(
    string Layer,
    string Image,
    string ImageSha256,
    int Page,
    int Field,
    int Trace,
    double X,
    double Y,
    double DirectionDegrees,
    Length Diameter,
    Length StandardUncertainty,
    Length PixelSize);
