namespace FiberScope.Specimens.Mats;

/// <summary>A droplet, bead or grain: an ellipsoid seen from above. Lengths in pixels.</summary>
/// <param name="Kind">What it is.</param>
/// <param name="Group">Bodies of one group are one defect.</param>
/// <param name="X">Centre.</param>
/// <param name="Y">Centre.</param>
/// <param name="Z">Height of its centre.</param>
/// <param name="Along">Longer half-axis.</param>
/// <param name="Across">Shorter half-axis.</param>
/// <param name="Cos">Cosine of the longer axis's direction.</param>
/// <param name="Sin">Sine of it.</param>
/// <param name="Brightness">Relative brightness.</param>
internal sealed record SolidBody(DefectForm Kind, int Group, float X, float Y, float Z, float Along, float Across, float Cos, float Sin, float Brightness);
