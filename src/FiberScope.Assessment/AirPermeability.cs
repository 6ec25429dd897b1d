using UnitsNet;

namespace FiberScope.Assessment;

/// <summary>The face velocity that a pressure drop drives through the medium.</summary>
/// <param name="PressureDrop">The pressure drop of the test.</param>
/// <param name="FaceVelocity">Flow over area at that pressure drop; the same number in mm/s is litres per second per square metre.</param>
public sealed record AirPermeability(Pressure PressureDrop, Speed FaceVelocity);
