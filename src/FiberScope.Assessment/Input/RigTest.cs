using UnitsNet;

namespace FiberScope.Assessment.Input;

/// <summary>Something that a test rig measured on the material.</summary>
/// <param name="FaceVelocity">Face velocity of the test.</param>
/// <param name="PressureDrop">Pressure drop; null when not measured.</param>
/// <param name="Particle">Particle diameter of the penetration; null when none was measured.</param>
/// <param name="Penetration">Penetration, 0 to 1; null when not measured.</param>
public sealed record RigTest(Speed FaceVelocity, Pressure? PressureDrop, Length? Particle, double? Penetration);
