using UnitsNet;

namespace FiberScope.Fibres;

/// <summary>One diameter at one place on one fibre.</summary>
/// <param name="Diameter">The fibre's geometric diameter there; above zero.</param>
/// <param name="StandardUncertainty">The standard uncertainty of <paramref name="Diameter"/> (one sigma); zero or above.</param>
/// <param name="RepresentedLength">
/// The length of centre line that the reading stands for; above zero. It is the reading's weight in every length-weighted figure.
/// </param>
/// <param name="Fibre">Which fibre (trace) of the field the reading lies on; readings on one fibre are not independent.</param>
/// <param name="Field">Which field of view the reading comes from; readings in one field are not independent.</param>
/// <param name="Swatch">Which swatch the field was cut from; fields of one swatch are not independent. Field numbers are unique across swatches.</param>
public readonly record struct DiameterReading(Length Diameter, Length StandardUncertainty, Length RepresentedLength, int Fibre, int Field, int Swatch = 0);
