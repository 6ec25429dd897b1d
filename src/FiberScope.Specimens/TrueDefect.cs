using System.Collections.Immutable;

namespace FiberScope.Specimens;

/// <summary>One defect that can be seen.</summary>
/// <param name="Kind">What it is.</param>
/// <param name="AreaPixels">Its visible area; pixels.</param>
/// <param name="Outline">A polygon about its full extent, (x, y) in pixels; what lies over it is not cut out.</param>
public sealed record TrueDefect(DefectForm Kind, double AreaPixels, ImmutableArray<(double X, double Y)> Outline);
