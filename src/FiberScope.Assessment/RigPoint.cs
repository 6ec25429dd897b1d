using UnitsNet;

namespace FiberScope.Assessment;

/// <summary>Something measured on a test rig, beside what the forecast says for the same conditions.</summary>
/// <param name="FaceVelocity">Face velocity of the test.</param>
/// <param name="PressureDrop">The measured pressure drop; null when not measured.</param>
/// <param name="Particle">The particle diameter of a penetration test; null when none was made.</param>
/// <param name="Penetration">The measured penetration, 0 to 1; null when none was made.</param>
/// <param name="ForecastPressureDrop">The forecast at the same velocity; null without a forecast.</param>
/// <param name="ForecastPenetration">The forecast at the same velocity and particle size; null without a forecast.</param>
public sealed record RigPoint(
    Speed FaceVelocity,
    Pressure? PressureDrop,
    Length? Particle,
    double? Penetration,
    Pressure? ForecastPressureDrop,
    double? ForecastPenetration)
{
    /// <summary>
    /// The fibre diameter that the measured pressure drop stands for by Davies' law; null without a pressure drop, a forecast, or where
    /// several layers share it.
    /// </summary>
    public Length? EffectiveDiameter { get; init; }
}
