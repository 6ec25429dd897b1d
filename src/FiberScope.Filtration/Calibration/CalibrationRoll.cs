using UnitsNet;

namespace FiberScope.Filtration;

/// <summary>A penetration measured on a rig.</summary>
/// <param name="Particle">The particle size.</param>
/// <param name="Penetration">Measured; dimensionless, above 0 to 1.</param>
/// <param name="Discharged">Whether the charge had been taken off before the test.</param>
public sealed record RigPenetration(Length Particle, double Penetration, bool Discharged = false);

/// <summary>One roll with its structure and what a rig showed for it.</summary>
/// <param name="Name">The roll.</param>
/// <param name="Layers">Its structure, upstream first; factors and charge in it are disregarded, they are what is fitted.</param>
/// <param name="Point">The conditions of the test.</param>
/// <param name="PressureDrop">Measured; null when it was not.</param>
/// <param name="Penetrations">Measured; may be empty.</param>
public sealed record CalibrationRoll(string Name, IReadOnlyList<MediaLayer> Layers, OperatingPoint Point, Pressure? PressureDrop, IReadOnlyList<RigPenetration> Penetrations);
