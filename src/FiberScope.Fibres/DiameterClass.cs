using UnitsNet;

namespace FiberScope.Fibres;

/// <summary>One class of a length-weighted fibre-diameter distribution.</summary>
/// <param name="Diameter">The fibre diameter that stands for the class; above zero.</param>
/// <param name="LengthFraction">The share of the fibre length that has this diameter; dimensionless, in (0, 1].</param>
public readonly record struct DiameterClass(Length Diameter, double LengthFraction);
