using System.Collections.Immutable;
using UnitsNet;

namespace FiberScope.Fibres;

/// <summary>Fields of one swatch that were taken at one pixel size.</summary>
/// <param name="Readings">Their readings.</param>
/// <param name="SeenArea">The area of specimen that the fields show together, information strips excluded; above zero.</param>
/// <param name="ValidDiameters">The range of diameters that this pixel size and field of view can show without favour.</param>
public sealed record MagnificationGroup(ImmutableArray<DiameterReading> Readings, Area SeenArea, LengthInterval ValidDiameters);
